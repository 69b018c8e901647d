package org.modestead.knime;

import java.util.LinkedHashMap;
import java.util.Map;
import org.knime.core.node.port.PortObject;

/** The six nodes and their company on a small recording of the pump house, run once through native nodes. */
final class Chain {

    static final Map<String, Object> SNAPSHOTS = Map.of("time-column", "time", "run-column", "run", "time-unit", "s", "resampling", "uniform",
            "detrend", "mean", "scaling", "std", "delay-depth", 4L, "holdout", "run-share", "calibration", "run-share");

    private final Map<String, Rig> rigs = new LinkedHashMap<>();
    private final Map<String, PortObject[]> inputs = new LinkedHashMap<>();
    private final Map<String, PortObject[]> outputs = new LinkedHashMap<>();

    private Chain() {}

    static Chain run() throws Exception {
        Chain chain = new Chain();
        chain.step("signal-generator", Map.of("runs", 6L, "duration", 8.0, "rate", 12.0));
        chain.step("snapshot-builder", SNAPSHOTS, chain.out("signal-generator", "table"));
        chain.step("kernel-chooser", Map.of(), chain.out("snapshot-builder", "snapshots"));
        chain.step("operator-fitter", Map.of("estimator", "linear", "rank-rule", "fixed", "rank", 7L), chain.out("snapshot-builder", "snapshots"),
                chain.out("kernel-chooser", "kernel"));
        chain.step("spectrum-extractor", Map.of(), chain.out("operator-fitter", "operator"));
        chain.step("wellposedness-checker", Map.of(), chain.out("snapshot-builder", "snapshots"), chain.out("operator-fitter", "operator"),
                chain.out("spectrum-extractor", "spectrum"));
        chain.step("forecast", Map.of(), chain.out("snapshot-builder", "snapshots"), chain.out("operator-fitter", "operator"),
                chain.out("spectrum-extractor", "spectrum"), chain.out("wellposedness-checker", "verdict"));
        chain.step("backtest", Map.of("origins", 2L, "refit", "never"), chain.out("snapshot-builder", "snapshots"),
                chain.out("operator-fitter", "operator"), chain.out("wellposedness-checker", "verdict"));
        chain.step("mode-report", Map.of(), null, chain.out("operator-fitter", "operator"), chain.out("spectrum-extractor", "spectrum"),
                chain.out("wellposedness-checker", "verdict"), chain.out("forecast", "forecast"), null, chain.out("forecast", "scores"));
        return chain;
    }

    private void step(String id, Map<String, Object> raw, PortObject... in) throws Exception {
        Rig rig = Rig.of(id).with(raw);
        rigs.put(id, rig);
        inputs.put(id, in);
        outputs.put(id, rig.run(in));
    }

    Rig rig(String id) {
        return rigs.get(id);
    }

    PortObject out(String id, String port) {
        return outputs.get(id)[rigs.get(id).output(port)];
    }

    /** What a node was run on. */
    PortObject[] inputs(String id) {
        return inputs.get(id).clone();
    }

    Map<String, PortObject[]> all() {
        return outputs;
    }
}
