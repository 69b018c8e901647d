package org.modestead.engine.forecast;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.Doubt;
import org.modestead.engine.Progress;
import org.modestead.engine.recording.DelayEmbedding;
import org.modestead.engine.recording.Preparation;

/**
 * The forecast of every run by one route, back in recorded units, with what is doubtful about it.
 *
 * @param rows by run, time and channel
 * @param doubts forecasts cut short, forecasts that leave the sampled region, runs too short to start from
 */
record ForecastTable(List<ForecastRow> rows, List<Doubt> doubts) {

    private static final int NAMED = 5;

    /**
     * Forecasts.
     *
     * @param beyond the bands at longer leads, where they can be told
     * @throws ForecastFault if there is no run to start from
     */
    static ForecastTable of(ForecastTask task, ForecastRoute route, Bands bands, Optional<BandsBeyond> beyond, Progress progress) {
        List<Series> all = starts(task);
        Builder builder = new Builder(task, bands, beyond);
        List<String> tooShort = new ArrayList<>();
        for (int s = 0; s < all.size(); s++) {
            progress.checkCancelled();
            progress.report((double) s / all.size(), "forecasting run " + all.get(s).id());
            if (all.get(s).length() < route.memory()) {
                tooShort.add(all.get(s).id() + " (" + all.get(s).length() + " samples)");
            } else {
                builder.add(all.get(s), route);
            }
        }
        if (tooShort.size() == all.size()) {
            throw new ForecastFault("forecast", "no run is long enough for a state of " + route.memory() + " samples: "
                    + named(tooShort), "longer runs or fewer delays are needed");
        }
        return new ForecastTable(builder.rows, builder.doubts(all.size(), tooShort));
    }

    private static List<Series> starts(ForecastTask task) {
        if (task.plan().origin() == Origin.RECORDING_END) {
            return Series.ends(task.snapshots(), task.step());
        }
        if (task.holdout().isEmpty()) {
            throw new ForecastFault("forecast origin", "it is before the holdout, but the snapshots hold nothing back",
                    "choose a holdout when building the snapshots, or start at the end of the recording");
        }
        return task.holdout();
    }

    private static String named(List<String> items) {
        String head = String.join(", ", items.subList(0, Math.min(NAMED, items.size())));
        return items.size() > NAMED ? head + " and " + (items.size() - NAMED) + " more" : head;
    }

    /** Collects rows run by run, and where something was doubtful. */
    private static final class Builder {
        private final ForecastTask task;
        private final Bands bands;
        private final Optional<BandsBeyond> beyond;
        private final List<ForecastRow> rows = new ArrayList<>();
        private final List<String> cut = new ArrayList<>();
        private final List<String> left = new ArrayList<>();

        Builder(ForecastTask task, Bands bands, Optional<BandsBeyond> beyond) {
            this.task = task;
            this.bands = bands;
            this.beyond = beyond;
        }

        void add(Series series, ForecastRoute route) {
            boolean end = task.plan().origin() == Origin.RECORDING_END;
            int origin = end ? series.length() - 1 : series.firstOrigin(route.memory());
            int steps = end || task.plan().horizon().isPresent()
                    ? task.steps() : Math.min(task.steps(), series.ahead(route.memory()));
            if (steps < 1) {
                return;
            }
            DMatrixRMaj values = route.forecast(series.history(origin, route.memory()),
                    series.inputs(origin, route.memory(), steps), steps);
            int kept = sensible(values);
            if (kept < steps) {
                cut.add("run " + series.id() + " at " + label(time(series, origin, kept + 1)));
            }
            noteLeaving(series, origin, values, kept);
            DMatrixRMaj halves = halves(series.history(origin, route.memory()), steps);
            for (int lead = 1; lead <= kept; lead++) {
                addRows(series, time(series, origin, lead), lead, values, halves);
            }
        }

        private DMatrixRMaj halves(DMatrixRMaj history, int steps) {
            if (beyond.isPresent()) {
                DelayEmbedding delay = task.snapshots().delay();
                return beyond.get().halfWidths(DelayState.at(history, history.numRows - 1, delay), steps);
            }
            DMatrixRMaj out = new DMatrixRMaj(steps, task.snapshots().channels().size());
            for (int k = 0; k < out.data.length; k++) {
                out.data[k] = bands.halfWidth(k / out.numCols + 1, k % out.numCols);
            }
            return out;
        }

        private int sensible(DMatrixRMaj values) {
            for (int k = 0; k < values.data.length; k++) {
                if (task.region().absurd(k % values.numCols, values.data[k])) {
                    return k / values.numCols;
                }
            }
            return values.numRows;
        }

        private void noteLeaving(Series series, int origin, DMatrixRMaj values, int kept) {
            for (int k = 0; k < kept * values.numCols; k++) {
                int channel = k % values.numCols;
                if (task.region().leaves(channel, values.data[k])) {
                    left.add("run " + series.id() + ", " + task.snapshots().channels().get(channel).label() + " at "
                            + label(time(series, origin, k / values.numCols + 1)));
                    return;
                }
            }
        }

        private void addRows(Series series, double time, int lead, DMatrixRMaj values, DMatrixRMaj halves) {
            Preparation preparation = task.snapshots().preparation();
            for (int c = 0; c < values.numCols; c++) {
                double value = preparation.restore(c, time, values.get(lead - 1, c));
                double half = halves.get(lead - 1, c) * preparation.scale()[c];
                rows.add(new ForecastRow(series.id(), time, c, value, value - half, value + half));
            }
        }

        // Where the future was observed its own times are used, so that the tables can be joined on time.
        private double time(Series series, int origin, int lead) {
            int sample = origin + lead;
            int beyond = sample - series.length() + 1;
            return beyond <= 0 ? series.times()[sample] : series.end() + beyond * task.step();
        }

        private String label(double time) {
            return "time " + task.snapshots().time().format(time);
        }

        List<Doubt> doubts(int runs, List<String> tooShort) {
            List<Doubt> out = new ArrayList<>();
            if (!cut.isEmpty()) {
                out.add(new Doubt("forecast-cut", "The forecast overflows or goes beyond 1000 times the range of the"
                        + " training data and is cut there: " + named(cut) + "."));
            }
            if (!left.isEmpty()) {
                out.add(new Doubt("forecast-extrapolates", "In " + left.size() + " of " + runs + " runs the forecast leaves"
                        + " the range that training sampled (with a margin of 10 %) and is extrapolated from there on: "
                        + named(left) + "."));
            }
            if (!tooShort.isEmpty()) {
                out.add(new Doubt("run-too-short", "No forecast from runs shorter than one state of " + task.memory()
                        + " samples: " + named(tooShort) + "."));
            }
            return out;
        }
    }
}
