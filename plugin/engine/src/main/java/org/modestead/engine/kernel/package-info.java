/**
 * Kernels and the function spaces they make: the functions a signal is looked at through. What a space cannot hold (constants,
 * coordinates, polynomials) decides which modes can exist in it, so every kernel says so.
 */
package org.modestead.engine.kernel;
