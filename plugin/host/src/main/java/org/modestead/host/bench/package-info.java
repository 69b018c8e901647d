/** The bench: a page on the loopback address on which a workflow is built, run and looked at by hand and eye. */
package org.modestead.host.bench;
