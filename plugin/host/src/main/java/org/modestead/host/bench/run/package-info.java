/** Runs of the bench: what is fresh, what is out of date, how far work is, and results kept over a restart. */
package org.modestead.host.bench.run;
