package org.modestead.engine.recording;

/**
 * Delay coordinates: a state stacks the newest sample and earlier ones.
 *
 * <p>The state at sample k is {@code [y_k, y_(k-s), y_(k-2s), ..., y_(k-(d-1)s)]}, so column
 * {@code delay * n + channel} with delay 0 the newest. Depth 1 is the plain sample.
 *
 * @param depth d, number of stacked samples, at least 1
 * @param spacing s, samples between neighbours in the stack, at least 1
 */
public record DelayEmbedding(int depth, int spacing) {

    /** No delays: the state is the sample. */
    public static final DelayEmbedding NONE = new DelayEmbedding(1, 1);

    /** Checks the ranges. */
    public DelayEmbedding {
        if (depth < 1 || spacing < 1) {
            throw new IllegalArgumentException("delay depth " + depth + " and spacing " + spacing + " must be at least 1");
        }
    }

    /** Returns how many samples before the newest one a state reaches: {@code (d-1)s}. */
    public int reach() {
        return (depth - 1) * spacing;
    }
}
