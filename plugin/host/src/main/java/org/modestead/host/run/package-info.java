/** Running a checked workflow: scheduling, the cache of results, and what a run leaves behind. */
package org.modestead.host.run;
