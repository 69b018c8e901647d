/**
 * The mathematics of dynamic modes: from recordings to states, operators, spectra, verdicts and forecasts. No user interface, no
 * host and no table format.
 *
 * <p>One type a stage, immutable: {@code Recording -> Snapshots -> Kernel -> FittedOperator -> Spectrum -> Verdict -> ForecastResult}.
 *
 * <p><b>Letters</b>, the same everywhere: x, y states; N state components; n channels; m snapshots or basis functions; r, R ranks;
 * K kernel; H its space; A the operator; g the full-state observable; G, M, N, B the four arrays of a compression; q orthonormal
 * functions; Ã the compressed operator; v eigenvectors; φ eigenfunctions; μ eigenvalues; λ rates in continuous time; ξ joint weights;
 * Δ the time step; Γ occupation functions; γ a run; τ a lag.
 *
 * <p><b>Missing and infinite numbers.</b> NaN in a recording is a missing cell and is dealt with by the preparation; no NaN reaches a
 * fit. Infinite values are refused where they are read. A result that could not be computed is NaN and says so in its finding.
 */
package org.modestead.engine;
