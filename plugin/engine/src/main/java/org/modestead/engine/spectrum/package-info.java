/**
 * Eigenvalues, eigenfunctions and the weights of the signal on them, told as modes with rates, frequencies, damping and shapes;
 * and the matching of spectra.
 */
package org.modestead.engine.spectrum;
