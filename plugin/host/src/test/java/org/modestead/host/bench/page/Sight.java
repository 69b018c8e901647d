package org.modestead.host.bench.page;

/**
 * Contrast (WCAG 2.2) and distance in CIE L*a*b* (1976, D65) of colours as people with different sight see them: severity 1.0 of
 * Machado, Oliveira, Fernandes, IEEE TVCG 15:1291, 2009. Colours are linear red, green and blue in [0, 1].
 */
enum Sight {
    FULL(new double[][] {{1, 0, 0}, {0, 1, 0}, {0, 0, 1}}),
    PROTANOPIA(new double[][] {{0.152286, 1.052583, -0.204868}, {0.114503, 0.786281, 0.099216}, {-0.003882, -0.048116, 1.051998}}),
    DEUTERANOPIA(new double[][] {{0.367322, 0.860646, -0.227968}, {0.280085, 0.672501, 0.047413}, {-0.011820, 0.042940, 0.968881}}),
    TRITANOPIA(new double[][] {{1.255528, -0.076749, -0.178779}, {-0.078411, 0.930809, 0.147602}, {0.004733, 0.691367, 0.303900}});

    private final double[][] seen;

    Sight(double[][] seen) {
        this.seen = seen;
    }

    static double[] linear(int rgb) {
        return new double[] {linear(rgb >> 16 & 255, 255), linear(rgb >> 8 & 255, 255), linear(rgb & 255, 255)};
    }

    static double contrast(double[] one, double[] other) {
        double bright = Math.max(luminance(one), luminance(other));
        double dim = Math.min(luminance(one), luminance(other));
        return (bright + 0.05) / (dim + 0.05);
    }

    /** Returns the distance ΔE*ab of two colours as seen. */
    double distance(double[] one, double[] other) {
        double[] a = lab(one);
        double[] b = lab(other);
        return Math.sqrt(Math.pow(a[0] - b[0], 2) + Math.pow(a[1] - b[1], 2) + Math.pow(a[2] - b[2], 2));
    }

    private double[] lab(double[] rgb) {
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

    private static double linear(int channel, double whole) {
        double c = channel / whole;
        return c <= 0.04045 ? c / 12.92 : Math.pow((c + 0.055) / 1.055, 2.4);
    }
}
