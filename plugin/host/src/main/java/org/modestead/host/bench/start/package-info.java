/** The ways in: examples, workflow files, recordings, and what was left on another day. */
package org.modestead.host.bench.start;
