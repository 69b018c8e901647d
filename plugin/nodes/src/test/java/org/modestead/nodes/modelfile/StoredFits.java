package org.modestead.nodes.modelfile;

import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;
import org.modestead.nodes.testing.Ringing;
import org.modestead.nodes.testing.Steps;

/** Small fits of every kind, each with the settings that lead to it. */
enum StoredFits {
    LINEAR(Map.of(), Map.of("scaling", "std", "detrend", "linear", "delay-depth", 3), Map.of()),
    TOTAL_LEAST_SQUARES(Map.of("noise-correction", "total-least-squares"), Map.of("delay-depth", 2), Map.of()),
    FORWARD_BACKWARD(Map.of("noise-correction", "forward-backward"), Map.of("delay-depth", 2), Map.of()),
    EXTRAPOLATED(Map.of("estimator", "dictionary", "degree", 2, "noise-correction", "extrapolation"), Map.of(), Map.of()),
    RIDGE(Map.of("ridge", 1e-4), Map.of("delay-depth", 2), Map.of()),
    STABLE(Map.of("structure", "stable"), Map.of("delay-depth", 2), Map.of()),
    MONOMIALS(Map.of("estimator", "dictionary", "degree", 3), Map.of(), Map.of()),
    FOURIER(Map.of("estimator", "dictionary", "dictionary", "fourier", "order", 2, "periods", List.of(6.0, 8.0)), Map.of(), Map.of()),
    SECTIONS(Map.of("estimator", "kernel-step", "rank-rule", "fixed", "rank", 4), Map.of(), Map.of("family", "polynomial")),
    WEIGHTED_SECTIONS(Map.of("estimator", "kernel-step", "rank-rule", "fixed", "rank", 6), Map.of("run-weights", "noise"),
            Map.of("family", "gaussian")),
    LANDMARKS(Map.of("estimator", "kernel-step", "rank-rule", "fixed", "rank", 4), Map.of(), Map.of("family", "polynomial"), 12),
    GENERATOR(Map.of("estimator", "generator", "segment-samples", 12, "rank-rule", "fixed", "rank", 5), Map.of("run-weights", "noise"),
            Map.of("family", "exponential")),
    SCALED_GENERATOR(Map.of("estimator", "scaled-generator", "contraction", 0.9, "segment-samples", 12, "rank-rule", "fixed", "rank", 5),
            Map.of(), Map.of("family", "polynomial"), 40),
    DRIVEN(Map.of("inputs", "straight"), Map.of("inputs", List.of("valve [%]"), "delay-depth", 2), Map.of()),
    DRIVEN_DICTIONARY(Map.of("estimator", "dictionary", "degree", 2, "inputs", "held"), Map.of("inputs", List.of("valve [%]")), Map.of());

    private final Map<String, Object> fit;
    private final Map<String, Object> prepared;
    private final Map<String, Object> kernel;
    private final int runs;

    StoredFits(Map<String, Object> fit, Map<String, Object> prepared, Map<String, Object> kernel) {
        this(fit, prepared, kernel, 6);
    }

    StoredFits(Map<String, Object> fit, Map<String, Object> prepared, Map<String, Object> kernel, int runs) {
        this.fit = fit;
        this.prepared = prepared;
        this.kernel = kernel;
        this.runs = runs;
    }

    Object snapshots() {
        Map<String, Object> settings = new HashMap<>(Map.of("time-column", "time", "run-column", "run", "holdout", "run-share",
                "holdout-run-share", 0.2, "calibration", "run-share", "calibration-run-share", 0.2));
        settings.putAll(prepared);
        boolean driven = prepared.containsKey("inputs");
        return Steps.run("snapshot-builder", Map.of("table", driven ? tank() : noisyRinging(runs)), settings).outputs().get("snapshots");
    }

    boolean usesKernel() {
        return !kernel.isEmpty();
    }

    Object kernel(Object snapshots) {
        return Steps.run("kernel-chooser", Map.of("snapshots", snapshots), kernel).outputs().get("kernel");
    }

    NodeResult operator(Object snapshots) {
        Map<String, Object> inputs = new HashMap<>(Map.of("snapshots", snapshots));
        if (usesKernel()) {
            inputs.put("kernel", kernel(snapshots));
        }
        return Steps.run("operator-fitter", inputs, fit);
    }

    private static MemoryTable noisyRinging(int runs) {
        MemoryTable.Builder rows = MemoryTable.builder(TableSchema.of(Column.text("run"), Column.number("time"), Column.number("x [bar]"),
                Column.number("y [m]")), "ringing");
        Random random = new Random(5);
        for (List<String> row : Steps.texts(Ringing.numbers(runs))) {
            rows.row(row.get(0), Double.parseDouble(row.get(1)), Double.parseDouble(row.get(2)) + 0.01 * random.nextGaussian(),
                    Double.parseDouble(row.get(3)) + 0.01 * random.nextGaussian());
        }
        return rows.build();
    }

    private static MemoryTable tank() {
        MemoryTable.Builder rows = MemoryTable.builder(TableSchema.of(Column.text("run"), Column.number("time"), Column.number("level [m]"),
                Column.number("valve [%]")), "tank");
        Random random = new Random(7);
        for (int run = 0; run < 5; run++) {
            double level = 1 + run;
            for (int k = 0; k < 40; k++) {
                double valve = random.nextDouble();
                rows.row("t" + run, 0.5 * k, level + 0.01 * random.nextGaussian(), valve);
                level = 0.8 * level + 0.3 * valve;
            }
        }
        return rows.build();
    }
}
