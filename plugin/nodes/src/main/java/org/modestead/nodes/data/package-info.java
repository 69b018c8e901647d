/** Invented recordings whose truth is known: for the demonstration and for checks. */
package org.modestead.nodes.data;
