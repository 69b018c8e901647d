package org.modestead.host.bench.check;

import java.util.ArrayList;
import java.util.HashMap;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;
import org.modestead.engine.Fault;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.host.bench.desk.TypedSettings;
import org.modestead.host.workflow.Link;
import org.modestead.host.workflow.Problem;
import org.modestead.host.workflow.Step;
import org.modestead.host.workflow.Survey;
import org.modestead.nodes.contract.ColumnChecks;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.contract.SettingsReader;
import org.modestead.nodes.contract.Visibility;
import org.modestead.nodes.table.TableSchema;

/**
 * What a dialog shows of one step: settings stored or typed, what is wrong with them in the words of a workflow's check, which of them
 * take part, and the columns to choose from.
 *
 * @param stored settings as the file holds them, or would
 * @param values with defaults; a wrong value counts as its default
 * @param visible keys of settings that take part, in dialog order
 * @param problems everything wrong
 * @param timeUnit of the recording, empty where it is not known
 * @param columns by input port, where known
 * @param columnsWords where the columns of each input table come from, or why they are not known
 */
public record DialogData(Map<String, Object> stored, Map<String, Object> values, List<String> visible, List<Problem> problems, String timeUnit,
        Map<String, TableSchema> columns, Map<String, String> columnsWords) {

    /** Takes immutable copies. */
    public DialogData {
        values = Map.copyOf(values);
        visible = List.copyOf(visible);
        problems = List.copyOf(problems);
        columns = Map.copyOf(columns);
        columnsWords = Map.copyOf(columnsWords);
    }

    /**
     * Judges the settings of a step.
     *
     * @param step as it stands
     * @param node of the step
     * @param typed in the dialog so far, by key; what is not typed stays as stored
     * @param survey of the workflow
     * @param files tells what is wrong with the files that settings name
     */
    public static DialogData of(Step step, Node node, Map<String, Object> typed, Survey survey, FileRule files) {
        NodeDeclaration declaration = node.declaration();
        Map<String, Object> stored = TypedSettings.stored(node, step.settings(), typed);
        Map<String, TableSchema> columns = columns(step.id(), declaration, survey);
        SettingsReader.Reading reading = SettingsReader.read(declaration, stored, declaration.settingsVersion());
        Map<String, Object> good = new HashMap<>(stored);
        reading.problems().forEach(problem -> good.remove(problem.key()));
        Optional<Settings> settings = reading.settings().or(() -> SettingsReader.read(declaration, good, declaration.settingsVersion()).settings());
        List<SettingProblem> problems = new ArrayList<>(reading.problems());
        problems.addAll(files.problems(step.with(stored)));
        settings.ifPresent(found -> problems.addAll(ColumnChecks.check(declaration, found, columns)));
        if (problems.isEmpty()) {
            reading.settings().ifPresent(found -> problems.addAll(own(node, columns, found)));
        }
        return new DialogData(stored, settings.map(Settings::values).orElse(Map.of()), visible(declaration, good),
                problems.stream().map(found -> new Problem("", step.id(), "setting " + found.key(), found.seen(), found.wanted())).toList(),
                timeUnit(step.id(), settings, survey), columns, words(step.id(), declaration, survey, columns));
    }

    /** Tells what is wrong with the files that the settings of a step name. */
    @FunctionalInterface
    public interface FileRule {
        /** Returns one problem a setting. */
        List<SettingProblem> problems(Step step);
    }

    private static List<SettingProblem> own(Node node, Map<String, TableSchema> columns, Settings settings) {
        try {
            return node.check(columns, settings);
        } catch (Fault fault) {
            String key = fault.where().startsWith("setting ") ? fault.where().substring("setting ".length()) : "";
            return List.of(new SettingProblem(key, fault.seen(), fault.wanted()));
        }
    }

    private static List<String> visible(NodeDeclaration declaration, Map<String, Object> good) {
        return declaration.settings().stream().filter(setting -> Visibility.isShown(declaration, good, setting)).map(Setting::key).toList();
    }

    private static Map<String, TableSchema> columns(String step, NodeDeclaration declaration, Survey survey) {
        Map<String, TableSchema> columns = new LinkedHashMap<>();
        survey.inputs().getOrDefault(step, Map.of()).forEach((port, source) -> Optional.ofNullable(survey.schemas().get(source))
                .filter(schema -> declaration.inputs().stream().anyMatch(input -> input.id().equals(port) && input.type() == PortType.TABLE))
                .ifPresent(schema -> columns.put(port, schema)));
        return columns;
    }

    private static Map<String, String> words(String step, NodeDeclaration declaration, Survey survey, Map<String, TableSchema> columns) {
        Map<String, String> words = new LinkedHashMap<>();
        for (Port port : declaration.inputs()) {
            if (port.type() == PortType.TABLE) {
                Link.End source = survey.inputs().getOrDefault(step, Map.of()).get(port.id());
                words.put(port.id(), source == null ? "No table is linked to " + port.title() + ": link one, then its columns can be chosen."
                        : columns.containsKey(port.id()) ? columns.get(port.id()).columns().size() + " columns of " + source
                                : "The columns of " + source + " are not known yet: set up that step first.");
            }
        }
        return words;
    }

    private static String timeUnit(String step, Optional<Settings> settings, Survey survey) {
        Stream<Link.End> ends = Stream.concat(survey.inputs().getOrDefault(step, Map.of()).values().stream(),
                survey.outlooks().keySet().stream().filter(end -> end.step().equals(step)));
        return ends.map(survey.outlooks()::get).filter(java.util.Objects::nonNull).flatMap(outlook -> outlook.time().stream()).map(TimeAxis::unit)
                .filter(unit -> !unit.isEmpty()).findFirst()
                .orElseGet(() -> settings.filter(found -> found.values().get("time-unit") instanceof String).map(found -> found.text("time-unit")).orElse(""));
    }
}
