/** How numbers, units and verdicts are written for people. */
package org.modestead.nodes.words;
