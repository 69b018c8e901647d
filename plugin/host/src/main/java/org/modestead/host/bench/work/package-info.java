/** The one place where the desk that is open lives: edits one after the other, runs in the background, everybody told of both. */
package org.modestead.host.bench.work;
