package org.modestead.engine.battery;

import java.util.List;

/**
 * Judges the whole battery and prints the confusion tables; arguments: number of seeds, {@code wrong} to
 * list every wrong verdict first (anything else for no list), and {@code reporting} or {@code calibration} for one part only.
 */
public final class BatteryMain {

    private BatteryMain() {}

    /** Runs it. */
    public static void main(String[] arguments) {
        int seeds = arguments.length > 0 ? Integer.parseInt(arguments[0]) : 2;
        boolean listed = arguments.length > 1 && arguments[1].equals("wrong");
        System.out.println(run(seeds, listed, arguments.length > 2 ? arguments[2] : ""));
    }

    static String run(int seeds, boolean listed, String part) {
        List<Trial.Outcome> outcomes = Battery.trials(Battery.part(part), seeds).parallelStream().map(Trial::judge).toList();
        StringBuilder out = new StringBuilder();
        if (listed) {
            outcomes.stream().filter(outcome -> !outcome.right()).forEach(outcome -> out.append(outcome).append(System.lineSeparator()));
        }
        Confusion confusion = new Confusion(outcomes);
        return out + confusion.byCase() + confusion.report() + confusion.summary();
    }
}
