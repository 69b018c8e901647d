package org.modestead.knime.testing;

import java.nio.file.Path;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.modestead.engine.Progress;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.NodeInputs;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.RunContext;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.contract.SettingsReader;
import org.modestead.nodes.modelfile.ResultFile;

/** Runs nodes one after the other, each on what those before it gave, for tests that need real results. */
public final class Bench {
    private final NodeCatalog catalog = NodeCatalog.load(List.of(Node.class.getClassLoader()));
    private final Map<String, NodeResult> results = new LinkedHashMap<>();
    private final Map<String, Map<String, Object>> given = new LinkedHashMap<>();
    private final Path folder;

    /** @param folder for what nodes write */
    public Bench(Path folder) {
        this.folder = folder;
    }

    /**
     * Runs every node on a short recording of the invented pump house.
     */
    public static Bench pumpHouse(Path folder) {
        Bench bench = new Bench(folder);
        bench.run("signal-generator", Map.of("runs", 8, "duration", 15), Map.of());
        bench.run("snapshot-builder", Map.of("time-column", "time", "time-unit", "s", "run-column", "run", "resampling", "uniform", "step", 0.1,
                "detrend", "mean", "scaling", "std", "delay-depth", 6, "holdout", "run-share", "calibration", "run-share"),
                Map.of("table", "signal-generator.table"));
        Map<String, String> snapshots = Map.of("snapshots", "snapshot-builder.snapshots");
        bench.run("kernel-chooser", Map.of("choose", "rank", "candidates", List.of("linear", "gaussian"), "rank", 6, "judge", false), snapshots);
        bench.run("operator-fitter", Map.of("rank-rule", "fixed", "rank", 6), snapshots);
        Map<String, String> fitted = Map.of("snapshots", "snapshot-builder.snapshots", "operator", "operator-fitter.operator");
        bench.run("spectrum-extractor", Map.of("replicates", 20), Map.of("operator", "operator-fitter.operator"));
        Map<String, String> judged = with(fitted, "spectrum", "spectrum-extractor.spectrum");
        bench.run("wellposedness-checker", Map.of("ladder-to", 12), judged);
        bench.run("stabilisation", Map.of("highest-order", 12), fitted);
        bench.run("shape-comparison", Map.of(), Map.of("spectrum-a", "spectrum-extractor.spectrum"));
        bench.run("rate-refinement", Map.of("least-share", 0.05), Map.of("snapshots", "snapshot-builder.snapshots", "spectrum",
                "spectrum-extractor.spectrum"));
        Map<String, String> told = with(judged, "verdict", "wellposedness-checker.verdict");
        bench.run("forecast", Map.of("horizon", 3, "origin", "before-holdout"), told);
        bench.run("backtest", Map.of("origins", 3, "refit", "never", "horizon", 2), judged);
        Map<String, String> model = Map.of("operator", "operator-fitter.operator", "spectrum", "spectrum-extractor.spectrum", "verdict",
                "wellposedness-checker.verdict");
        bench.run("model-writer", Map.of("file", "pump-house.zip", "name", "Pump house"), model);
        bench.run("model-reader", Map.of("file", "pump-house.zip"), Map.of());
        bench.run("model-applier", Map.of(), Map.of("model", "model-reader.model", "snapshots", "snapshot-builder.snapshots"));
        bench.run("mode-watch", Map.of("window", 5, "watched-modes", "any-verdict", "window-replicates", 0, "replicates", 20), Map.of("model",
                "model-reader.model", "snapshots", "snapshot-builder.snapshots"));
        bench.run("mode-report", Map.of("title", "Pump house"), with(with(with(told, "forecast", "forecast.forecast"), "reconstruction",
                "forecast.reconstruction"), "scores", "forecast.scores"));
        return bench;
    }

    private static Map<String, String> with(Map<String, String> links, String port, String from) {
        Map<String, String> more = new HashMap<>(links);
        more.put(port, from);
        return more;
    }

    /**
     * Runs a node.
     *
     * @param links by input port: {@code node.port} of a node that has run
     */
    public NodeResult run(String id, Map<String, Object> stored, Map<String, String> links) {
        Node node = catalog.find(id).orElseThrow();
        Settings settings = SettingsReader.read(node, stored).settings()
                .orElseThrow(() -> new IllegalArgumentException(SettingsReader.read(node, stored).problems().toString()));
        Map<String, Object> inputs = new HashMap<>();
        links.forEach((port, from) -> inputs.put(port, value(from)));
        NodeResult result = node.run(new NodeInputs(inputs), settings, new RunContext(Progress.NONE, folder, folder));
        results.put(id, result);
        given.put(id, stored);
        return result;
    }

    /** Returns the output {@code node.port} of a node that has run. */
    public Object value(String from) {
        return results.get(from.substring(0, from.indexOf('.'))).outputs().get(from.substring(from.indexOf('.') + 1));
    }

    /** Returns what a node shows beside its outputs. */
    public ResultFile shown(String id) {
        return ResultFile.of(catalog.find(id).orElseThrow().declaration(), results.get(id));
    }

    /** Returns the settings that nodes ran with by node id. */
    public Map<String, Map<String, Object>> settings() {
        return given;
    }

    /** Returns the results so far by node id, in order. */
    public Map<String, NodeResult> results() {
        return results;
    }
}
