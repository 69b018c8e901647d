package org.modestead.host.bench.trial;

import static org.junit.jupiter.api.Assertions.assertEquals;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;
import org.modestead.host.TestWorkflows;
import org.modestead.nodes.contract.Setting;

/**
 * How the pump-house example, or a branch of it, is built by hand.
 *
 * @param moves in order: {@code node} is put into its band, {@code node < step.port} onto an output, {@code step.port > step.port} linked
 * @param names what the bench calls a step, and what the example calls it; in the order in which they are set up
 * @param verdict the step whose verdict is read
 * @param modes modes that it tells as {@code stands} or {@code settles}
 * @param behindKernel steps that hang on the kernel
 */
record PumpHouse(List<String> moves, List<Map.Entry<String, String>> names, String verdict, List<Integer> modes, Set<String> behindKernel) {

    static final Path EXAMPLE = Path.of("..", "..", "test-workflows", "pump-house");
    private static final ObjectMapper JSON = new ObjectMapper();

    /** From the recording over a kernel to the report; the kernel is given, not ranked, so that it takes seconds. */
    static final PumpHouse BRANCH = new PumpHouse(
            List.of("table-source", "snapshot-builder < table-source.table", "kernel-chooser < snapshot-builder.snapshots",
                    "operator-fitter < kernel-chooser.kernel", "spectrum-extractor < operator-fitter.operator",
                    "wellposedness-checker < spectrum-extractor.spectrum", "forecast < wellposedness-checker.verdict",
                    "mode-report < wellposedness-checker.verdict", "spectrum-extractor.spectrum > mode-report.spectrum",
                    "forecast.forecast > mode-report.forecast"),
            List.of(Map.entry("table-source", "source"), Map.entry("snapshot-builder", "snapshots-coarse"), Map.entry("kernel-chooser", "kernel"),
                    Map.entry("operator-fitter", "fit-kernel"), Map.entry("spectrum-extractor", "spectrum-kernel"),
                    Map.entry("wellposedness-checker", "check-kernel"), Map.entry("forecast", "forecast"), Map.entry("mode-report", "report")),
            "wellposedness-checker", List.of(),
            Set.of("kernel-chooser", "operator-fitter", "spectrum-extractor", "wellposedness-checker", "forecast", "mode-report"));

    /** All of it. */
    static final PumpHouse WHOLE = new PumpHouse(
            List.of("table-source", "snapshot-builder < table-source.table", "operator-fitter < snapshot-builder.snapshots",
                    "spectrum-extractor < operator-fitter.operator", "wellposedness-checker < spectrum-extractor.spectrum",
                    "stabilisation < operator-fitter.operator", "snapshot-builder.snapshots > stabilisation.snapshots",
                    "snapshot-builder < table-source.table", "kernel-chooser < snapshot-builder-2.snapshots", "operator-fitter < kernel-chooser.kernel",
                    "spectrum-extractor < operator-fitter-2.operator", "wellposedness-checker < spectrum-extractor-2.spectrum",
                    "shape-comparison < spectrum-extractor.spectrum", "spectrum-extractor-2.spectrum > shape-comparison.spectrum-b",
                    "forecast < wellposedness-checker.verdict", "rate-refinement < spectrum-extractor.spectrum",
                    "mode-report < wellposedness-checker.verdict", "snapshot-builder.snapshots > mode-report.snapshots",
                    "operator-fitter.operator > mode-report.operator", "spectrum-extractor.spectrum > mode-report.spectrum",
                    "forecast.forecast > mode-report.forecast", "forecast.reconstruction > mode-report.reconstruction",
                    "forecast.scores > mode-report.scores"),
            List.of(Map.entry("table-source", "source"), Map.entry("snapshot-builder", "snapshots"), Map.entry("operator-fitter", "fit"),
                    Map.entry("spectrum-extractor", "spectrum"), Map.entry("wellposedness-checker", "check"), Map.entry("stabilisation", "stabilisation"),
                    Map.entry("snapshot-builder-2", "snapshots-coarse"), Map.entry("kernel-chooser", "kernel"), Map.entry("operator-fitter-2", "fit-kernel"),
                    Map.entry("spectrum-extractor-2", "spectrum-kernel"), Map.entry("wellposedness-checker-2", "check-kernel"),
                    Map.entry("shape-comparison", "compare"), Map.entry("forecast", "forecast"), Map.entry("rate-refinement", "refined"),
                    Map.entry("mode-report", "report")),
            "wellposedness-checker", List.of(2, 3),
            Set.of("kernel-chooser", "operator-fitter-2", "spectrum-extractor-2", "wellposedness-checker-2", "shape-comparison"));

    /** Returns the recording: for the branch its first six runs, which take less time. */
    List<String> recording() throws IOException {
        List<String> lines = Files.readAllLines(EXAMPLE.resolve("data/recordings.csv"));
        int run = List.of(lines.get(0).split(",")).indexOf("run");
        List<String> taken = lines.stream().skip(1).map(line -> line.split(",")[run]).distinct().limit(this == BRANCH ? 6 : Long.MAX_VALUE).toList();
        return lines.stream().filter(line -> line == lines.get(0) || taken.contains(line.split(",")[run])).toList();
    }

    /** Builds it with the mouse. */
    void build(Trial trial) {
        for (String move : moves) {
            if (move.contains(" < ")) {
                String[] ends = move.split(" < ");
                trial.feed(ends[0], ends[1]);
            } else if (move.contains(" > ")) {
                String[] ends = move.split(" > ");
                trial.link(ends[0], ends[1]);
            } else {
                trial.put(move, "[data-band=data]");
            }
        }
    }

    /** Sets every step up in its dialog as the example has it. */
    void configure(Trial trial, Path data) {
        Form form = new Form(trial.browser());
        for (Map.Entry<String, String> name : names) {
            JsonNode wanted = settings(name.getValue(), data);
            if (!wanted.isEmpty()) {
                trial.settings(name.getKey());
                form.fill(wanted);
                trial.browser().reads("dialog .dialog-foot [role=status]", "All settings can be used");
                if (name.getKey().equals("snapshot-builder")) {
                    trial.browser().picture("dialog");
                }
                trial.keep();
            }
        }
        trial.browser().reads("[data-action=problems]", "Nothing to set right");
    }

    private JsonNode settings(String step, Path data) {
        if (step.equals("source")) {
            return JSON.createObjectNode().put("path", data.toString());
        }
        if (step.equals("kernel") && this == BRANCH) {
            return JSON.createObjectNode().put("family", "gaussian").put("scale-factor", 16);
        }
        for (JsonNode found : example().path("steps")) {
            if (found.path("id").asText().equals(step)) {
                return found.path("settings");
            }
        }
        throw new AssertionError("the example has no step " + step);
    }

    private static JsonNode example() {
        try {
            return JSON.readTree(EXAMPLE.resolve("workflow.json").toFile());
        } catch (IOException broken) {
            throw new UncheckedIOException(broken);
        }
    }

    /** Asserts that a file holds the example: steps, settings, links, but for choices that are the default. Names are those that the bench gave, and the recording lies elsewhere. */
    void assertIsTheExample(Path file) throws IOException {
        assertEquals(told(example(), List.of()), told(JSON.readTree(file.toFile()), names));
    }

    private static Set<String> told(JsonNode workflow, List<Map.Entry<String, String>> names) {
        Map<String, String> known = names.stream().collect(Collectors.toMap(Map.Entry::getKey, Map.Entry::getValue));
        Set<String> told = new TreeSet<>();
        for (JsonNode step : workflow.path("steps")) {
            String id = known.getOrDefault(step.path("id").asText(), step.path("id").asText());
            told.add("step " + id + ": " + step.path("node").asText());
            step.path("settings").properties().forEach(one -> {
                if (!one.getKey().equals("path") && !isDefaultChoice(step.path("node").asText(), one.getKey(), one.getValue().asText())) {
                    told.add("set " + id + "." + one.getKey() + " = " + plain(one.getValue()));
                }
            });
        }
        for (JsonNode link : workflow.path("links")) {
            told.add("link " + named(link.path("from").asText(), known) + " > " + named(link.path("to").asText(), known));
        }
        return told;
    }

    /** What is chosen already needs no press, and is not written. */
    private static boolean isDefaultChoice(String node, String key, String value) {
        return TestWorkflows.allNodes().find(node).orElseThrow().declaration().settings().stream().anyMatch(setting ->
                setting instanceof Setting.Choice choice && choice.common().key().equals(key) && choice.initial().equals(value));
    }

    private static String plain(JsonNode value) {
        if (value.isArray()) {
            List<String> all = new ArrayList<>();
            value.forEach(one -> all.add(plain(one)));
            return all.toString();
        }
        return value.isNumber() ? String.valueOf(value.asDouble()) : value.asText();
    }

    private static String named(String end, Map<String, String> names) {
        int dot = end.lastIndexOf('.');
        return names.getOrDefault(end.substring(0, dot), end.substring(0, dot)) + end.substring(dot);
    }
}
