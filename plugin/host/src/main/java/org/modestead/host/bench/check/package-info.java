/** What is told of a workflow while it is edited: problems by step, columns at hand, dialogs, which ends fit. */
package org.modestead.host.bench.check;
