package org.modestead.engine.moments;

/**
 * Sums over snapshot pairs (x, y) of conditioned functions f:
 * {@code G = Σ f(x) f(x)ᵀ, M = Σ f(x) f(y)ᵀ, N = Σ f(y) f(y)ᵀ, B = Σ f(x) xᵀ}.
 *
 * @param pairs their number
 * @param gram G, P x P
 * @param action M, P x P
 * @param second N, P x P
 * @param observable B, P x N; without columns where the state's components are the functions
 */
public record PairMoments(long pairs, CompensatedSums gram, CompensatedSums action, CompensatedSums second, CompensatedSums observable) {

    static PairMoments none(int functions, int observed) {
        CompensatedSums square = CompensatedSums.zero(functions, functions);
        return new PairMoments(0, square, square, square, CompensatedSums.zero(functions, observed));
    }

    /** Returns the sums over both together. */
    public PairMoments plus(PairMoments other) {
        return new PairMoments(pairs + other.pairs, gram.plus(other.gram), action.plus(other.action), second.plus(other.second),
                observable.plus(other.observable));
    }
}
