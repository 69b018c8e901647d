package org.modestead.knime.trial;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import org.modestead.host.workflow.Link;
import org.modestead.host.workflow.Step;
import org.modestead.host.workflow.Workflow;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.Setting;

/**
 * A workflow file of the embedded host, built node by node in the platform. Its table sources become the platform's own CSV Reader; the one of
 * {@link EveryKind}, which no CSV file can hold, becomes the trial's source of that table.
 *
 * @param workflow as the host reads it
 * @param numbers of the platform's nodes by step
 */
record PlatformWorkflow(Workflow workflow, Map<String, Integer> numbers) {

    private static final String CSV_READER = "org.knime.base.node.io.filehandling.csv.reader.CSVTableReaderNodeFactory";

    /** Builds the workflow in a folder of the platform, the data in the folder's {@code data}, where the platform looks for them. */
    static PlatformWorkflow build(Platform platform, Workflow workflow, Path folder) throws IOException {
        platform.ask("create", folder);
        Map<String, Integer> numbers = new LinkedHashMap<>();
        for (Step step : workflow.steps()) {
            boolean source = step.node().equals(HostRun.SOURCE);
            boolean typed = source && step.settings().get("path").toString().endsWith(".parquet");
            String node = typed ? EveryKindFactory.class.getName() : source ? CSV_READER : step.node();
            int number = platform.node(node, step.id());
            numbers.put(step.id(), number);
            if (source && !typed) {
                read(platform, number, workflow.baseFolder().resolve((String) step.settings().get("path")), folder);
            } else if (!source && !step.settings().isEmpty()) {
                bring(workflow.baseFolder(), declaration(step), step.settings(), folder);
                platform.ask("set", settings(number, declaration(step), step.settings()));
            }
        }
        PlatformWorkflow built = new PlatformWorkflow(workflow, numbers);
        workflow.links().forEach(link -> platform.ask("link", built.end(link.from(), false), built.end(link.to(), true)));
        return built;
    }

    private static void read(Platform platform, int number, Path file, Path folder) throws IOException {
        Path data = Files.createDirectories(folder.resolve("data"));
        Files.copy(file, data.resolve(file.getFileName()), StandardCopyOption.REPLACE_EXISTING);
        String path = "settings/file_selection/path/";
        platform.ask("set", number, path + "file_system_type", "text", "RELATIVE", path + "file_system_specifier", "text",
                "knime.workflow.data", path + "path", "text", file.getFileName());
    }

    /** Copies the files that a node of ours reads to where it will look for them. */
    private static void bring(Path from, NodeDeclaration declaration, Map<String, Object> raw, Path folder) throws IOException {
        for (Setting setting : declaration.settings()) {
            if (setting instanceof Setting.File file && file.reading() && raw.get(file.key()) instanceof String name) {
                Files.createDirectories(folder.resolve(name).getParent());
                Files.copy(from.resolve(name), folder.resolve(name), StandardCopyOption.REPLACE_EXISTING);
            }
        }
    }

    private static NodeDeclaration declaration(Step step) {
        return HostRun.NODES.find(step.node()).orElseThrow().declaration();
    }

    /** Returns the arguments of a request that changes settings of a node of ours. */
    static List<Object> settings(int number, NodeDeclaration declaration, Map<String, Object> raw) {
        List<Object> arguments = new ArrayList<>(List.of(number));
        raw.forEach((key, value) -> {
            Setting setting = declaration.settings().stream().filter(candidate -> candidate.key().equals(key)).findFirst().orElseThrow();
            arguments.add(key);
            arguments.add(type(setting));
            arguments.add(value instanceof List<?> list ? list.stream().map(Object::toString).collect(Collectors.joining("|"))
                    : value.toString());
        });
        return arguments;
    }

    private static String type(Setting setting) {
        if (setting instanceof Setting.Number) {
            return "number";
        } else if (setting instanceof Setting.Whole) {
            return "whole";
        } else if (setting instanceof Setting.Flag) {
            return "flag";
        } else if (setting instanceof Setting.Numbers) {
            return "numbers";
        }
        return setting instanceof Setting.Columns || setting instanceof Setting.Texts ? "texts" : "text";
    }

    private List<Object> end(Link.End end, boolean input) {
        Step step = workflow.step(end.step()).orElseThrow();
        int port = 1;
        if (!step.node().equals(HostRun.SOURCE)) {
            NodeDeclaration declaration = declaration(step);
            List<String> ids = (input ? declaration.inputs() : declaration.outputs()).stream().map(Port::id).toList();
            port += ids.indexOf(end.port());
        }
        return List.of(numbers.get(end.step()), port);
    }

    /** Returns what the platform's nodes show, those that are not executed or have an error. */
    List<String> unfinished(Platform platform) {
        return numbers.entrySet().stream().map(entry -> entry.getKey() + ": " + platform.state(entry.getValue()))
                .filter(state -> !state.contains("word=executed") || state.contains("kind=error")).toList();
    }

    /** Returns the lines of every table of our nodes by {@code step.port}. */
    Map<String, List<String>> tables(Platform platform, Path folder) throws IOException {
        Map<String, List<String>> tables = new LinkedHashMap<>();
        for (Step step : workflow.steps()) {
            if (step.node().equals(HostRun.SOURCE)) {
                continue;
            }
            for (Port output : declaration(step).outputs()) {
                if (output.type() == PortType.TABLE) {
                    tables.put(step.id() + "." + output.id(), table(platform, step.id(), output.id(), folder));
                }
            }
        }
        return tables;
    }

    /** Returns the lines of one table. */
    List<String> table(Platform platform, String step, String port, Path folder) throws IOException {
        Path file = folder.resolve(step + "." + port);
        List<Object> end = end(new Link.End(step, port), false);
        platform.ask("table", end, file);
        return Files.readAllLines(file);
    }
}
