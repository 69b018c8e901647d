package org.modestead.nodes.render;

import java.awt.Color;

/**
 * Colours of a map in equal steps, on white paper: from light to dark, or to both sides of a light middle. The two ends of the parting
 * scale differ in lightness from the middle by as much, and stay apart for colour-blind readers.
 *
 * @param first of the lowest value
 * @param middle half-way
 * @param last of the highest value
 */
record ColourScale(Color first, Color middle, Color last) {

    static final int STEPS = 64;
    static final ColourScale SEQUENCE = new ColourScale(new Color(0xf3f6fa), new Color(0x6f9cc9), new Color(0x0f2f57));
    static final ColourScale APART = new ColourScale(new Color(0x8a4b00), new Color(0xf4f5f2), new Color(0x17508f));

    /** Returns the step in which a share of the way lies. */
    static int step(double share) {
        return (int) Math.min(STEPS - 1.0, Math.max(0, Math.floor(share * STEPS)));
    }

    /** Returns the colour of a step. */
    Color colour(int step) {
        double share = step / (STEPS - 1.0);
        return share < 0.5 ? between(first, middle, 2 * share) : between(middle, last, 2 * share - 1);
    }

    private static Color between(Color a, Color b, double share) {
        return new Color(mixed(a.getRed(), b.getRed(), share), mixed(a.getGreen(), b.getGreen(), share), mixed(a.getBlue(), b.getBlue(), share));
    }

    private static int mixed(int a, int b, double share) {
        return (int) Math.round(a + share * (b - a));
    }
}
