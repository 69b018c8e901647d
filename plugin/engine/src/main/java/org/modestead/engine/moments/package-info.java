/**
 * Fits of recordings that do not fit into memory: one pass over the rows, sums over snapshot pairs that merge in any order, and what is
 * kept of the recording for the steps that need to look at it.
 */
package org.modestead.engine.moments;
