/**
 * Fits the operator that carries functions of the state forward. Every estimator fills the same
 * {@link org.modestead.engine.operator.Compression}; whitening turns it into nested orthonormal functions, and everything
 * downstream works on those.
 */
package org.modestead.engine.operator;
