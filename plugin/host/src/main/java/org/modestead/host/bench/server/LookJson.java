package org.modestead.host.bench.server;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import java.util.Optional;
import java.util.TreeMap;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.modestead.engine.modelfile.Model;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.host.bench.look.ColumnMeaning;
import org.modestead.host.bench.look.FigureJson;
import org.modestead.host.bench.look.Matrices;
import org.modestead.host.bench.look.PortFigures;
import org.modestead.host.bench.look.VerdictJson;
import org.modestead.host.bench.work.Looks;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.SettingText;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.contract.SettingsReader;
import org.modestead.nodes.contract.Visibility;
import org.modestead.nodes.modelfile.PortFiles;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.words.Cautions;
import org.modestead.nodes.words.TimeUnit;

/** What can be seen of a result, as JSON; pictures, rows and matrices are asked for one by one. */
final class LookJson {

    private static final JsonNodeFactory JSON = JsonNodeFactory.instance;
    /** Units that are nouns in the plural, such as samples; MB and 1/s are none. */
    private static final Pattern NOUN = Pattern.compile("[a-z]{3,}s");

    private final Looks looks;
    private final Looks.Looked looked;
    private final NodeDeclaration declaration;
    private final NodeResult result;
    private final TimeUnit time;

    private LookJson(Looks looks, Looks.Looked looked) {
        this.looks = looks;
        this.looked = looked;
        this.declaration = looked.node().declaration();
        this.result = looked.result();
        this.time = timeUnit(looks, looked);
    }

    static ObjectNode of(Looks looks, Looks.Looked looked) {
        return new LookJson(looks, looked).json();
    }

    private ObjectNode json() {
        String own = looked.step().label().title();
        ObjectNode json = JSON.objectNode().put("step", looked.step().id()).put("node", declaration.id())
                .put("title", own.isEmpty() ? declaration.title() : own).put("stale", looked.stale()).put("resultId", looked.id());
        json.set("sentences", NodesJson.texts(result.summary()));
        ArrayNode doubts = json.putArray("doubts");
        result.doubts().forEach(doubt -> doubts.addObject().put("code", doubt.code()).put("sentence", doubt.sentence()));
        Optional<Verdict> verdict = verdict();
        boolean forecast = declaration.stage() == NodeDeclaration.Stage.FORECAST;
        json.put("caution", verdict.isPresent() || forecast ? String.join(" ", Cautions.STANDING) : "");
        json.set("settings", settings());
        json.putObject("timeUnit").put("name", time.name()).put("rate", time.rate()).put("frequency", time.frequency());
        ArrayNode figures = json.putArray("figures");
        result.figures().forEach(figure -> figures.add(FigureJson.headline(figure)));
        ArrayNode ports = json.putArray("ports");
        declaration.outputs().forEach(port -> ports.add(port(port)));
        json.set("verdict", verdict.<JsonNode>map(found -> VerdictJson.of(found, spectrum())).orElse(JSON.nullNode()));
        return json.put("report", result.document().isPresent()).put("document", result.document().isPresent());
    }

    private Optional<Verdict> verdict() {
        return result.outputs().values().stream().flatMap(value -> value instanceof Verdict found ? Stream.of(found)
                : value instanceof Model model ? Stream.of(model.verdict()) : Stream.empty()).findFirst();
    }

    /** Returns the modes that were judged: the result's own, or those that feed the step. */
    private Optional<Spectrum> spectrum() {
        return spectrum(result).or(() -> looks.upstream(looked.step().id(), LookJson::spectrum));
    }

    private static Optional<Spectrum> spectrum(NodeResult result) {
        return new TreeMap<>(result.outputs()).values().stream().flatMap(value -> value instanceof Spectrum found ? Stream.of(found)
                : value instanceof Model model ? Stream.of(model.spectrum()) : Stream.empty()).findFirst();
    }

    private ArrayNode settings() {
        ArrayNode array = JSON.arrayNode();
        Optional<Settings> read = SettingsReader.read(looked.node(), looked.step().settings()).settings();
        for (Setting setting : read.map(settings -> Visibility.shown(declaration, settings)).orElse(List.of())) {
            Object value = read.get().values().get(setting.key());
            String words = words(setting, value);
            array.addObject().put("key", setting.key()).put("label", setting.common().label()).put("group", setting.common().group())
                    .put("value", words).put("unit", unit(SettingText.unit(setting), words))
                    .put("initial", !looked.step().settings().containsKey(setting.key()));
        }
        return array;
    }

    /** Returns the unit of a value as it is said: in the time unit of the recording, of one thing in the singular, of nothing none. */
    private String unit(String declared, String value) {
        if (value.isEmpty() || declared.equals("time")) {
            return value.isEmpty() ? "" : time.name();
        }
        return declared.equals("1/time") ? time.rate() : value.equals("1") && NOUN.matcher(declared).matches() ? declared.substring(0, declared.length() - 1) : declared;
    }

    private static String words(Setting setting, Object value) {
        if (value == null) {
            return "";
        }
        if (setting instanceof Setting.Choice choice) {
            return choice.options().stream().filter(option -> option.id().equals(value)).map(Setting.Option::label).findFirst().orElse(value.toString());
        }
        return value instanceof Boolean flag ? (flag ? "yes" : "no") : value instanceof Double number ? SettingText.plain(number)
                : value instanceof List<?> list ? list.stream().map(entry -> words(setting, entry)).collect(Collectors.joining(", ")) : value.toString();
    }

    private ObjectNode port(Port port) {
        Object value = result.outputs().get(port.id());
        ObjectNode json = JSON.objectNode().put("id", port.id()).put("title", port.title()).put("type", NodesJson.word(port.type()))
                .put("typeTitle", port.type().title());
        ArrayNode facts = json.putArray("facts");
        ArrayNode matrices = json.putArray("matrices");
        ArrayNode figures = json.putArray("figures");
        if (value instanceof Table table) {
            ObjectNode columns = json.putObject("table");
            columns.set("columns", columns(table, time, declaration));
            columns.set("rows", table.rowCount().isPresent() ? JSON.numberNode(table.rowCount().getAsLong()) : JSON.nullNode());
        } else {
            json.putNull("table");
            PortFiles.describe(port.type(), value).forEach(fact -> facts.addObject().put("item", fact.item()).put("value", fact.value()));
            Matrices.of(value).forEach(matrix -> matrices.add(matrix.headline()));
            PortFigures.of(value).forEach(figure -> figures.add(FigureJson.headline(figure)));
        }
        return json;
    }

    /** Returns the columns of a table with their meaning; those of recorded tables mean what their names say. */
    static ArrayNode columns(Table table, TimeUnit time, NodeDeclaration declaration) {
        ArrayNode array = JSON.arrayNode();
        boolean recorded = declaration.stage() == NodeDeclaration.Stage.DATA;
        table.schema().columns().forEach(column -> {
            ColumnMeaning meaning = recorded ? new ColumnMeaning(StepRoutes.unit(column.name()), "") : ColumnMeaning.of(column.name(), time);
            array.addObject().put("name", column.name()).put("type", column.type().title()).put("cell", column.type().name())
                    .put("unit", meaning.unit()).put("kind", meaning.kind());
        });
        return array;
    }

    /** Returns the time unit that a result is told in: as its own values tell, or those that feed the step. */
    static TimeUnit timeUnit(Looks looks, Looks.Looked looked) {
        return timeUnit(looked.result()).or(() -> looks.upstream(looked.step().id(), LookJson::timeUnit)).orElseGet(() -> new TimeUnit(""));
    }

    private static Optional<TimeUnit> timeUnit(NodeResult result) {
        for (Object value : new TreeMap<>(result.outputs()).values()) {
            if (value instanceof Spectrum spectrum) {
                return Optional.of(new TimeUnit(spectrum.timeUnit()));
            } else if (value instanceof Snapshots snapshots) {
                return Optional.of(new TimeUnit(snapshots.time().unit()));
            } else if (value instanceof FittedOperator operator) {
                return Optional.of(new TimeUnit(operator.snapshots().time().unit()));
            } else if (value instanceof Model model) {
                return Optional.of(new TimeUnit(model.spectrum().timeUnit()));
            }
        }
        return Optional.empty();
    }
}
