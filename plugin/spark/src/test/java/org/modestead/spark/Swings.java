package org.modestead.spark;

import java.util.ArrayList;
import java.util.List;
import java.util.Random;

/** Invented recordings: one long run of pushed swings with a gap, and short ones, in order of run and time. */
final class Swings {

    static final int LONG = 5000;

    private Swings() {}

    /** A row. */
    record Sample(String run, double time, double level, double flow) {}

    static List<Sample> rows() {
        Random random = new Random(12);
        List<Sample> out = new ArrayList<>();
        for (int run = 0; run < 6; run++) {
            int samples = run == 0 ? LONG : 150 + 40 * run;
            double a = 1;
            double b = 0;
            for (int k = 0; k < samples; k++) {
                double next = 0.99 * (Math.cos(0.2) * a - Math.sin(0.2) * b) + 0.1 * random.nextGaussian();
                b = 0.99 * (Math.sin(0.2) * a + Math.cos(0.2) * b) + 0.1 * random.nextGaussian();
                a = next;
                double time = 3 * run + (k + (run == 0 && k >= 1197 ? 30 : 0)) * 0.05;
                boolean missing = run == 0 && (k == 400 || k == 2399);
                out.add(new Sample("run " + run, time, 5 + a + 0.05 * random.nextGaussian(), missing ? Double.NaN : 20 * b + a * a));
            }
        }
        return out;
    }
}
