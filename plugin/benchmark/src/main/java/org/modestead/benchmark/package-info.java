/**
 * What the engine computes most, measured by itself: linear algebra in pure Java against the accelerator, kernel matrices and the choice of
 * landmarks. Whole jobs are measured by the scripts beside it.
 */
package org.modestead.benchmark;
