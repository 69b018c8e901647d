package org.modestead.engine.watch;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.EnumMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.modestead.engine.Doubt;
import org.modestead.engine.Progress;
import org.modestead.engine.RecordingFault;
import org.modestead.engine.modelfile.Model;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.Snapshots.Part;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spread.ModeSpread;
import org.modestead.engine.spread.SamplingSpread;

/**
 * Holds a stored spectrum against new recordings, window by window.
 *
 * <p>Both the recordings of the model and the new ones are cut into windows of equal recorded time and each is fitted as the model was.
 * The windows of the model tell what frequency, damping and shape of a mode are and how they scatter from window to window; the bootstrap
 * of the stored fit tells the same from within, and the larger of the two counts. Each quantity of each mode has a chart of the
 * exponentially weighted moving average of its scores (Roberts 1959), with limits that allow for how little a short baseline tells
 * ({@link ControlLimit}). The false alarms allowed are shared out equally among all charts (Bonferroni).
 */
public final class ModeWatch {

    private final Model model;
    private final WatchPlan plan;
    private final List<Mode> modes;
    private final double length;
    private final ControlLimits limits;
    private final List<Look> before;
    private final List<Look> now;
    private final double leftOut;

    private ModeWatch(Model model, Snapshots snapshots, WatchPlan plan, Progress progress) {
        this.model = model;
        this.plan = plan;
        this.modes = Watched.modes(model, plan);
        List<Run> known = Windows.runs(model.operator().snapshots(), List.of(Part.values()));
        this.length = Watched.length(model, modes, known, plan.window());
        int least = model.operator().snapshots().delay().reach() + 2;
        Windows baseline = Windows.of(known, length, least);
        Windows fresh = Windows.of(Windows.runs(snapshots, List.of(Part.HOLDOUT)), length, least);
        this.leftOut = fresh.leftOut();
        if (fresh.windows().isEmpty()) {
            throw new RecordingFault("new recordings", "they hold " + fresh.leftOut() + " of recorded time, less than half a window of " + length,
                    "bring longer recordings or shorten the window");
        }
        this.limits = new ControlLimits(plan.weight(), 1 / (plan.falseAlarmEvery() * charts()));
        this.before = looks(baseline.windows(), progress.part(0, 0.5));
        this.now = looks(fresh.windows(), progress.part(0.5, 0.9));
    }

    /**
     * Watches.
     *
     * @param model stored
     * @param fresh new recordings, prepared in any way; see {@link Model#on}
     * @param plan how
     * @param progress polled for cancel
     * @return every window and every event
     * @throws org.modestead.engine.FitFault if the model has no mode to watch
     * @throws RecordingFault if the new recordings do not suit the model or are shorter than half a window
     */
    public static WatchResult of(Model model, Snapshots fresh, WatchPlan plan, Progress progress) {
        Snapshots alike = model.on(fresh);
        WatchResult result = new ModeWatch(model, alike, plan, progress).result(progress.part(0.9, 1));
        List<Doubt> doubts = new ArrayList<>(result.doubts());
        List<Doubt> known = model.operator().snapshots().doubts();
        alike.doubts().stream().filter(doubt -> !known.contains(doubt)).forEach(doubts::add);
        return new WatchResult(result.length(), result.modes(), result.looks(), result.rows(), result.alarms(), result.charts(), doubts);
    }

    private int charts() {
        boolean shapes = model.spectrum().channels().size() > 1;
        return modes.size() * (shapes ? Quantity.values().length + 1 : Quantity.values().length);
    }

    private List<Look> looks(List<Window> windows, Progress progress) {
        Looker looker = new Looker(model.operator(), model.spectrum(), modes, length, plan);
        List<Look> looks = new ArrayList<>();
        for (Window window : windows) {
            progress.report((double) looks.size() / windows.size(), "window " + window.number());
            looks.add(looker.at(window, Progress.NONE));
            progress.checkCancelled();
        }
        return List.copyOf(looks);
    }

    private WatchResult result(Progress progress) {
        List<WatchedMode> watched = references(progress);
        List<Map<Quantity, Chart>> charts = new ArrayList<>();
        List<Alarm> alarms = new ArrayList<>();
        for (int m = 0; m < watched.size(); m++) {
            Map<Quantity, Chart> own = new EnumMap<>(Quantity.class);
            for (Quantity quantity : watched.get(m).quantities()) {
                Reference reference = watched.get(m).references().get(quantity);
                Chart chart = Chart.of(scores(m, reference), reference.limit(), quantity.oneSided());
                own.put(quantity, chart);
                alarms.addAll(new Events(watched.get(m).mode(), m, now).of(quantity, reference, chart));
            }
            charts.add(own);
            alarms.addAll(new Events(watched.get(m).mode(), m, now).missing(watched.get(m).missingInARow()));
        }
        alarms.sort(Comparator.comparingInt(Alarm::first).thenComparingInt(Alarm::mode).thenComparing(Alarm::kind));
        List<Alarm> numbered = new ArrayList<>();
        alarms.forEach(alarm -> numbered.add(alarm.numbered(numbered.size() + 1)));
        return new WatchResult(length, watched, now, rows(watched, charts, numbered), numbered, charts(),
                new WatchDoubts(model, length, watched, before, now, leftOut).all());
    }

    private List<WatchRow> rows(List<WatchedMode> watched, List<Map<Quantity, Chart>> charts, List<Alarm> alarms) {
        List<WatchRow> rows = new ArrayList<>();
        for (int t = 0; t < now.size(); t++) {
            for (int m = 0; m < watched.size(); m++) {
                int at = t;
                int mode = watched.get(m).mode().number();
                Map<Quantity, Double> averages = new EnumMap<>(Quantity.class);
                charts.get(m).forEach((quantity, chart) -> averages.put(quantity, chart.average()[at]));
                rows.add(new WatchRow(now.get(t), watched.get(m), now.get(t).modes().get(m), averages, alarms.stream()
                        .filter(alarm -> alarm.mode() == mode && alarm.first() <= at && at <= alarm.last()).map(Alarm::kind).toList()));
            }
        }
        return rows;
    }

    private double[] scores(int m, Reference reference) {
        return now.stream().mapToDouble(look -> look.modes().get(m)
                .map(sighting -> reference.score(sighting, look.window().recorded() / length)).orElse(Double.NaN)).toArray();
    }

    private List<WatchedMode> references(Progress progress) {
        SamplingSpread bootstrap = SamplingSpread.of(model.operator(), model.spectrum(), plan.baseline(), progress);
        int fitted = (int) before.stream().filter(Look::fitted).count();
        List<WatchedMode> out = new ArrayList<>();
        for (int m = 0; m < modes.size(); m++) {
            int at = m;
            Mode mode = modes.get(m);
            int found = (int) before.stream().filter(look -> look.modes().get(at).isPresent()).count();
            boolean seldom = fitted >= Reference.FEWEST && 2 * found < fitted;
            Map<Quantity, Reference> references = new EnumMap<>(Quantity.class);
            for (Quantity quantity : Quantity.values()) {
                Reference reference = reference(m, quantity, bootstrap);
                if (reference.known() && !seldom) {
                    references.put(quantity, reference);
                }
            }
            out.add(new WatchedMode(mode, length * mode.frequency(), fitted, found,
                    seldom ? 0 : MissingRule.of(fitted - found, fitted, limits.rate()).row(), references));
        }
        return out;
    }

    private Reference reference(int m, Quantity quantity, SamplingSpread bootstrap) {
        Mode mode = modes.get(m);
        double scale = Quantity.scale(mode, length);
        double windows = training() / length;
        Optional<ModeSpread> spread = bootstrap.of(mode.number());
        double own = switch (quantity) {
            case FREQUENCY -> Looker.deviation(spread, Mode::frequency, quantity, scale);
            case DAMPING -> Looker.deviation(spread, Mode::dampingRatio, quantity, scale);
            case SHAPE -> Double.NaN;
        };
        Reference.Bootstrap from = new Reference.Bootstrap(quantity.chart(stored(mode, quantity), scale), own * Math.sqrt(windows),
                bootstrap.pieces(), windows);
        return Reference.of(quantity, scale, figures(m, sighting -> quantity.chart(sighting.figure(quantity), scale)),
                before.stream().mapToDouble(look -> look.window().recorded() / length).toArray(),
                figures(m, sighting -> sighting.spread(quantity)), from, limits, plan.worth());
    }

    private double training() {
        return Windows.runs(model.operator().snapshots(), List.of(Part.TRAINING)).stream().mapToDouble(Windows::recorded).sum();
    }

    private static double stored(Mode mode, Quantity quantity) {
        return switch (quantity) {
            case FREQUENCY -> mode.frequency();
            case DAMPING -> mode.dampingRatio();
            case SHAPE -> 1;
        };
    }

    private double[] figures(int m, java.util.function.ToDoubleFunction<Sighting> figure) {
        double[] out = new double[before.size()];
        Arrays.setAll(out, k -> before.get(k).modes().get(m).map(figure::applyAsDouble).orElse(Double.NaN));
        return out;
    }
}
