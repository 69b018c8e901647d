package org.modestead.engine.battery;

import java.util.ArrayList;
import java.util.List;

/** All cases, and all trials of them. */
final class Battery {

    static final double[] NOISE = {0, 0.001, 0.01, 0.05};
    static final int[] RUNS = {5, 20, 80};

    private Battery() {}

    /** Those on which thresholds are set, then those that are reported. */
    static List<Case> cases() {
        List<Case> out = new ArrayList<>(calibrating());
        out.addAll(Fresh.cases());
        return out;
    }

    /** The calibration part; the last eight of it were reported before. */
    static List<Case> calibrating() {
        List<Case> out = new ArrayList<>();
        out.addAll(LinearFlows.cases());
        out.addAll(LineFlows.cases());
        out.addAll(Oscillators.cases());
        out.addAll(Signals.cases());
        out.addAll(NoModes.cases());
        out.addAll(Second.cases());
        out.addAll(Third.cases());
        out.addAll(Fourth.cases());
        out.addAll(Fifth.cases());
        out.addAll(Sixth.cases());
        out.addAll(Seventh.cases());
        out.addAll(Eighth.cases());
        out.addAll(Ninth.cases());
        return out;
    }

    /** Returns one part by name, or all cases for an empty name. */
    static List<Case> part(String name) {
        return switch (name) {
            case "" -> cases();
            case "calibration" -> calibrating();
            case "reporting" -> Fresh.cases();
            default -> throw new IllegalArgumentException("a part is called calibration or reporting, not " + name);
        };
    }

    /** Every given case at every noise and number of runs, seeds 1 to a number. */
    static List<Trial> trials(List<Case> cases, int seeds) {
        List<Trial> out = new ArrayList<>();
        for (Case known : cases) {
            for (double noise : NOISE) {
                for (int runs : RUNS) {
                    for (long seed = 1; seed <= seeds; seed++) {
                        out.add(new Trial(known, noise, runs, seed));
                    }
                }
            }
        }
        return out;
    }
}
