package org.modestead.nodes.render;

import java.awt.Color;

/** Contrast (WCAG 2.2) and distance in CIE L*a*b* (1976, D65) of colours as people with different sight see them. */
public enum ColourVision {
    FULL(new double[][] {{1, 0, 0}, {0, 1, 0}, {0, 0, 1}}),
    // Severity 1.0 of Machado, Oliveira, Fernandes, IEEE TVCG 15:1291, 2009.
    PROTANOPIA(new double[][] {{0.152286, 1.052583, -0.204868}, {0.114503, 0.786281, 0.099216},
            {-0.003882, -0.048116, 1.051998}}),
    DEUTERANOPIA(new double[][] {{0.367322, 0.860646, -0.227968}, {0.280085, 0.672501, 0.047413},
    {-0.011820, 0.042940, 0.968881}}),
    TRITANOPIA(new double[][] {{1.255528, -0.076749, -0.178779}, {-0.078411, 0.930809, 0.147602},
    {0.004733, 0.691367, 0.303900}});

    private final double[][] seen;

    ColourVision(double[][] seen) {
        this.seen = seen;
    }

    /** Returns the contrast ratio in [1, 21]. */
    public static double contrast(Color a, Color b) {
        double one = luminance(linear(a));
        double other = luminance(linear(b));
        return (Math.max(one, other) + 0.05) / (Math.min(one, other) + 0.05);
    }

    /** Returns the distance ΔE*ab of two colours as seen. */
    public double distance(Color a, Color b) {
        double[] one = lab(a);
        double[] other = lab(b);
        return Math.sqrt(Math.pow(one[0] - other[0], 2) + Math.pow(one[1] - other[1], 2) + Math.pow(one[2] - other[2], 2));
    }

    private double[] lab(Color colour) {
        double[] rgb = linear(colour);
        double[] sight = new double[3];
        for (int i = 0; i < 3; i++) {
            sight[i] = Math.min(1, Math.max(0, seen[i][0] * rgb[0] + seen[i][1] * rgb[1] + seen[i][2] * rgb[2]));
        }
        double x = root((0.4124 * sight[0] + 0.3576 * sight[1] + 0.1805 * sight[2]) / 0.95047);
        double y = root(luminance(sight));
        double z = root((0.0193 * sight[0] + 0.1192 * sight[1] + 0.9505 * sight[2]) / 1.08883);
        return new double[] {116 * y - 16, 500 * (x - y), 200 * (y - z)};
    }

    private static double root(double t) {
        return t > 0.008856 ? Math.cbrt(t) : 7.787 * t + 16.0 / 116;
    }

    private static double luminance(double[] rgb) {
        return 0.2126 * rgb[0] + 0.7152 * rgb[1] + 0.0722 * rgb[2];
    }

    private static double[] linear(Color colour) {
        return new double[] {linear(colour.getRed()), linear(colour.getGreen()), linear(colour.getBlue())};
    }

    private static double linear(int channel) {
        double c = channel / 255.0;
        return c <= 0.04045 ? c / 12.92 : Math.pow((c + 0.055) / 1.055, 2.4);
    }
}
