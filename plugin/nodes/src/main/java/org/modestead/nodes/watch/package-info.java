/** The node that watches a stored spectrum in new recordings. */
package org.modestead.nodes.watch;
