package org.modestead.engine.watch;

import java.util.ArrayList;
import java.util.List;
import java.util.Locale;
import java.util.stream.Collectors;
import org.modestead.engine.Doubt;
import org.modestead.engine.modelfile.Model;

/**
 * What a reader of a watch must know.
 *
 * @param model stored
 * @param length of a window
 * @param watched modes
 * @param before windows of the model's recordings
 * @param now windows of the new recordings
 * @param leftOut recorded time too short for a window
 */
record WatchDoubts(Model model, double length, List<WatchedMode> watched, List<Look> before, List<Look> now, double leftOut) {

    /** Fewer cycles in a window than this tell a frequency and, more so, a damping ratio only roughly. */
    static final double FEW_CYCLES = 10;
    private static final int FEW_WINDOWS = 12;
    private static final int STATES_A_RANK = 3;

    List<Doubt> all() {
        List<Doubt> doubts = new ArrayList<>();
        windows(doubts);
        baseline(doubts);
        unfitted(doubts, before, "of the model's own recordings");
        unfitted(doubts, now, "of the new recordings");
        if (leftOut > 0) {
            doubts.add(new Doubt("watch-left-out", String.format(Locale.ROOT, "%s of the new recordings was too short for a window and was"
                    + " left out.", span(leftOut))));
        }
        return doubts;
    }

    private void windows(List<Doubt> doubts) {
        watched.stream().filter(mode -> mode.cycles() < FEW_CYCLES).forEach(mode -> doubts.add(new Doubt("short-windows", String.format(
                Locale.ROOT, "A window of %s holds only %.3g cycles of mode %d: its frequency and more so its damping scatter widely, and only"
                        + " large changes can be told. Windows of %s would hold %.0f.", span(length), mode.cycles(), mode.mode().number(),
                span(FEW_CYCLES / mode.mode().frequency()), FEW_CYCLES))));
        double samples = now.stream().mapToInt(look -> look.window().samples()).average().orElse(0);
        int rank = model.operator().rank();
        if (samples < STATES_A_RANK * rank) {
            doubts.add(new Doubt("small-windows", String.format(Locale.ROOT, "A window holds %.0f samples for a fit of rank %d: fewer than three"
                    + " a direction leave little to average over. Lengthen the window or lower the rank of the model.", samples, rank)));
        }
    }

    private void baseline(List<Doubt> doubts) {
        long fitted = before.stream().filter(Look::fitted).count();
        if (fitted < Reference.FEWEST) {
            doubts.add(new Doubt("short-baseline", String.format(Locale.ROOT, "The model's own recordings hold %d windows of %s, too few to see"
                    + " how figures scatter from window to window: limits rest on the bootstrap of the stored fit alone, and shapes have none.",
                    fitted, span(length))));
        } else if (fitted < FEW_WINDOWS) {
            doubts.add(new Doubt("short-baseline", String.format(Locale.ROOT, "The limits rest on %d windows of the model's own recordings and"
                    + " are wide for that: with more recordings smaller changes would be found.", fitted)));
        }
        tell(doubts, "seldom-found", watched.stream().filter(mode -> mode.references().isEmpty() && mode.missingInARow() == 0).toList(),
                "%s found in fewer than half of the windows of the model's own recordings and cannot be watched: lengthen the window.");
        tell(doubts, "no-limits", watched.stream().filter(mode -> mode.references().isEmpty() && mode.missingInARow() > 0).toList(),
                "%s without control limits: neither windows nor the bootstrap tell how the figures scatter. Only a missing mode is told.");
        tell(doubts, "baseline-wanders", watched.stream().filter(mode -> mode.references().values().stream()
                .anyMatch(reference -> reference.widened() > 1)).toList(),
                "%s changing slowly already in the model's own recordings, with load, temperature or season perhaps: the limits were widened"
                        + " for it.");
    }

    private static void tell(List<Doubt> doubts, String code, List<WatchedMode> modes, String sentence) {
        if (!modes.isEmpty()) {
            String names = modes.stream().map(mode -> String.valueOf(mode.mode().number())).collect(Collectors.joining(", "));
            doubts.add(new Doubt(code, String.format(Locale.ROOT, sentence, modes.size() == 1 ? "Mode " + names + " is" : "Modes " + names
                    + " are")));
        }
    }

    private static void unfitted(List<Doubt> doubts, List<Look> looks, String whose) {
        List<Look> refused = looks.stream().filter(look -> !look.fitted()).toList();
        if (!refused.isEmpty()) {
            doubts.add(new Doubt("windows-not-fitted", String.format(Locale.ROOT, "%d of %d windows %s could not be fitted (window %d: %s) and say"
                    + " nothing.", refused.size(), looks.size(), whose, refused.get(0).window().number(), refused.get(0).refused().orElse(""))));
        }
    }

    private String span(double time) {
        String unit = model.operator().snapshots().time().unit();
        return String.format(Locale.ROOT, "%.4g", time) + (unit.isEmpty() ? "" : " " + unit);
    }
}
