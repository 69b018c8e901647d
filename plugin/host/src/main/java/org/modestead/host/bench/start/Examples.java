package org.modestead.host.bench.start;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import org.modestead.host.bench.desk.DeskFault;
import org.modestead.host.workflow.Step;
import org.modestead.host.workflow.Workflow;
import org.modestead.host.workflow.WorkflowFile;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.Setting;

/** The test workflows, which the program carries with their data. */
public final class Examples {

    private static final String PLACE = "/org/modestead/host/bench/examples/";

    private static final List<Example> ALL = List.of(
            new Example("pump-house", "Pump house: which modes stand?",
                    "invented pumping station: 16 runs, 8 channels, noise, gaps, uneven steps; surge, draining, a bearing resonance, a growing whirl"),
            new Example("three-flows", "Three flows: stands, drifts, absent",
                    "three flows with a known answer: x' = x stands, x' = 1 drifts, x' = x² is absent"),
            new Example("driven-shaft", "Driven shaft: free motion beside known inputs",
                    "invented surge shaft: 8 runs, driven by a gate and a pump that are recorded"),
            new Example("city-weather", "City weather: the year and the next one",
                    "daily temperatures and wind of one city over four years; a forecast of the fourth"),
            new Example("sunspots", "Sunspots: the cycle of about eleven years",
                    "yearly sunspot numbers 1700-2008: a cycle of about eleven years"),
            new Example("three-decays", "Three decays: certified rates",
                    "a sum of three decays with certified rates"),
            new Example("one-pass", "One pass: sums over rows give the fit in memory",
                    "invented pumping station, fitted in one pass over its rows as tables larger than memory are, and in memory beside it"),
            new Example("air-vessel", "Air vessel: the surge of a rising main watched from stop to stop",
                    "invented rising main that loses charge of its air vessel: a kept model held against later recordings, with charts and alarms"),
            new Example("tower-ring-down", "Tower ring-down: sway, twist and damping after a release",
                    "invented building: ten releases, five channels; sway and twist with damping, against what a wind study assumed"),
            new Example("grid-ring-down", "Grid ring-down: swings between areas after a line trip",
                    "invented power grid: twelve line trips at five stations; a swing between areas against limits of its damping"),
            new Example("kept-model", "Pump house: a kept model on new recordings, without fitting",
                    "a kept model and new recordings of the pumping station: forecast and judged without fitting"));

    private Examples() {}

    /**
     * An example as the start page shows it. The title is told here once more, so that the page does not wait for the files to be read.
     *
     * @param id of the folder
     * @param title name of the workflow
     * @param words what it is, for people
     */
    public record Example(String id, String title, String words) {}

    /** Returns them as they are offered. */
    public static List<Example> all() {
        return ALL;
    }

    private static Optional<Workflow> workflow(String id, Path file) {
        return bytes(id + "/" + WorkflowFile.DEFAULT_NAME).flatMap(bytes -> WorkflowFile.parse(file, bytes).workflow());
    }

    /**
     * Copies the files of an example into a folder.
     *
     * @return its workflow, with the file in that folder
     * @throws DeskFault if there is none of this name, or the folder cannot be written
     */
    public static Workflow copy(String id, Path folder, NodeCatalog catalog) {
        Workflow workflow = ALL.stream().filter(example -> example.id().equals(id)).findFirst()
                .flatMap(example -> workflow(example.id(), folder.resolve(WorkflowFile.DEFAULT_NAME)))
                .orElseThrow(() -> new DeskFault("example " + id, "there is none of this name", "choose one of the start page"));
        for (Step step : workflow.steps()) {
            for (Setting setting : catalog.find(step.node()).map(node -> node.declaration().settings()).orElse(List.of())) {
                if (setting instanceof Setting.File file && file.reading() && step.settings().get(setting.key()) instanceof String name) {
                    bytes(id + "/" + name).ifPresent(bytes -> write(folder.resolve(name), bytes));
                }
            }
        }
        return workflow;
    }

    private static Optional<byte[]> bytes(String name) {
        try (InputStream in = Examples.class.getResourceAsStream(PLACE + name)) {
            return in == null ? Optional.empty() : Optional.of(in.readAllBytes());
        } catch (IOException unreadable) {
            return Optional.empty();
        }
    }

    private static void write(Path file, byte[] bytes) {
        try {
            Files.createDirectories(file.getParent());
            Files.write(file, bytes);
        } catch (IOException unwritable) {
            throw new DeskFault("file " + file, "it cannot be written (" + unwritable.getMessage() + ")", "make room, or allow writing there");
        }
    }
}
