/**
 * Refines rates by the optimised fit: sums of exponentials fitted to the samples themselves, at any times, by variable
 * projection.
 */
package org.modestead.engine.refine;
