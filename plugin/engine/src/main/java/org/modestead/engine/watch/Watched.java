package org.modestead.engine.watch;

import java.util.List;
import java.util.OptionalDouble;
import org.modestead.engine.FitFault;
import org.modestead.engine.modelfile.Model;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.wellposed.Grade;

/** Which modes of a model are watched, and in windows of which length. */
final class Watched {

    private static final double CYCLES = 30;
    private static final double FEWEST_CYCLES = 10;
    private static final double STATES_A_RANK = 10;
    private static final double WINDOWS = 20;

    private Watched() {}

    /**
     * Returns the oscillating modes that carry the share asked for and, unless any verdict will do, stand or settle.
     *
     * @throws FitFault if there is none
     */
    static List<Mode> modes(Model model, WatchPlan plan) {
        List<Mode> oscillating = model.spectrum().modes().stream().filter(mode -> mode.oscillates() && mode.cluster() == 0).toList();
        List<Mode> strong = oscillating.stream().filter(mode -> mode.energyShare() >= plan.leastShare()).toList();
        List<Mode> watched = strong.stream().filter(mode -> plan.anyVerdict() || exists(model, mode)).toList();
        if (watched.isEmpty()) {
            throw new FitFault("watch", "of " + oscillating.size() + " oscillating modes of the model " + strong.size() + " carry "
                    + 100 * plan.leastShare() + " % of the signal" + (plan.anyVerdict() ? "" : " and none of these stands or settles"),
                    "watch a model with modes that exist, lower the least share, or watch modes of any verdict");
        }
        return watched;
    }

    private static boolean exists(Model model, Mode mode) {
        return model.verdict().of(mode.number()).map(verdict -> verdict.grade()).filter(grade -> grade == Grade.STANDS || grade == Grade.SETTLES)
                .isPresent();
    }

    /**
     * Returns the length asked for, or one that holds 30 cycles of the slowest mode and ten states for each direction of the fit, but lets
     * the recordings of the model fill 20 windows, as long as 10 cycles remain.
     */
    static double length(Model model, List<Mode> modes, List<Run> runs, OptionalDouble asked) {
        if (asked.isPresent()) {
            return asked.getAsDouble();
        }
        Snapshots snapshots = model.operator().snapshots();
        double recorded = runs.stream().mapToDouble(Windows::recorded).sum();
        double step = snapshots.step().orElse(recorded / runs.stream().mapToInt(Run::samples).sum());
        double slowest = modes.stream().mapToDouble(Mode::period).max().orElseThrow();
        double least = Math.max(FEWEST_CYCLES * slowest, STATES_A_RANK * model.operator().rank() * step + snapshots.delay().reach() * step);
        return Math.max(least, Math.min(CYCLES * slowest, recorded / WINDOWS));
    }
}
