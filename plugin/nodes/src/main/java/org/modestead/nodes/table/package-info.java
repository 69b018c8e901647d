/** Tables as the nodes see them, whichever host holds them. */
package org.modestead.nodes.table;
