/** Modes, and whether they exist. */
package org.modestead.nodes.judge;
