package org.modestead.host.bench.server;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import org.modestead.host.bench.desk.Bands;
import org.modestead.host.bench.look.Numbers;
import org.modestead.host.bench.run.StepState;
import org.modestead.host.bench.work.DeskView;
import org.modestead.host.run.Versions;
import org.modestead.host.workflow.Link;
import org.modestead.host.workflow.Problem;
import org.modestead.host.workflow.Step;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Port;

/** The desk as JSON. */
final class DeskJson {

    private static final JsonNodeFactory JSON = JsonNodeFactory.instance;
    private static final ObjectMapper MAPPER = new ObjectMapper();
    private static final String SETTING = "setting ";
    private static final String INPUT = "input ";

    private final NodeCatalog catalog;

    DeskJson(NodeCatalog catalog) {
        this.catalog = catalog;
    }

    ObjectNode of(DeskView view) {
        ObjectNode json = JSON.objectNode().put("revision", view.revision()).put("open", view.desk().isPresent()).put("release", Versions.modestead());
        view.desk().ifPresent(desk -> desk(desk, json));
        return json;
    }

    private void desk(DeskView.Open desk, ObjectNode json) {
        json.put("desk", desk.id()).put("name", desk.workflow().name()).put("notes", desk.workflow().notes())
                .put("file", desk.file().toString()).put("folder", desk.workflow().baseFolder().toString())
                .put("saved", desk.saved()).put("savedWords", desk.savedWords()).put("recovered", desk.recovered())
                .put("undo", desk.undo().orElse(null)).put("redo", desk.redo().orElse(null));
        ArrayNode steps = json.putArray("steps");
        int place = 0;
        String band = "";
        for (Step step : desk.ordered()) {
            String stage = NodesJson.word(Bands.stage(step, catalog));
            place = stage.equals(band) ? place + 1 : 0;
            band = stage;
            steps.add(step(desk, step, stage, place));
        }
        ArrayNode links = json.putArray("links");
        desk.workflow().links().forEach(link -> links.addObject().put("from", link.from().toString()).put("to", link.to().toString()));
        ArrayNode problems = json.putArray("problems");
        desk.ordered().forEach(step -> desk.inspection().byStep().get(step.id()).forEach(problem -> problems.add(problem(step.id(), problem))));
        desk.inspection().general().forEach(problem -> problems.add(problem("", problem)));
        json.set("run", run(desk.run()));
    }

    static ObjectNode run(DeskView.RunView run) {
        ObjectNode json = JSON.objectNode().put("running", run.running()).put("words", run.words()).put("fraction", run.fraction());
        number(json, "secondsLeft", run.secondsLeft());
        return json.put("stopping", run.stopping()).put("last", run.last());
    }

    private ObjectNode step(DeskView.Open desk, Step step, String stage, int place) {
        Optional<NodeDeclaration> node = catalog.find(step.node()).map(Node::declaration);
        String own = step.label().title();
        DeskView.Standing standing = desk.standing().get(step.id());
        ObjectNode json = JSON.objectNode().put("id", step.id()).put("node", step.node()).put("stage", stage)
                .put("title", own.isEmpty() ? node.map(NodeDeclaration::title).orElse(step.node()) : own).put("named", !own.isEmpty())
                .put("note", step.label().note()).put("place", place);
        json.set("settings", settings(step.settings()));
        json.set("state", state(standing.state()));
        json.put("look", standing.result().isPresent()).put("resultId", standing.result().orElse(null));
        ArrayNode problems = json.putArray("problems");
        desk.inspection().byStep().get(step.id()).forEach(problem -> problems.add(problem(step.id(), problem)));
        ArrayNode inputs = json.putArray("inputs");
        for (Port port : node.map(NodeDeclaration::inputs).orElse(List.of())) {
            Link.End end = new Link.End(step.id(), port.id());
            inputs.addObject().put("id", port.id()).put("from", desk.workflow().links().stream().filter(link -> link.to().equals(end))
                    .map(link -> link.from().toString()).findFirst().orElse(null));
        }
        return json;
    }

    static ObjectNode state(StepState state) {
        ObjectNode json = JSON.objectNode().put("kind", state.kind().word()).put("words", state.words());
        number(json, "fraction", state.fraction());
        json.put("message", state.message());
        number(json, "secondsLeft", state.secondsLeft());
        json.put("sentence", state.sentence()).put("doubts", state.doubts());
        number(json, "seconds", state.seconds());
        return json;
    }

    static ObjectNode problem(String step, Problem problem) {
        String key = problem.key();
        String where = List.of(step.isEmpty() ? "" : "step " + step, key).stream().filter(part -> !part.isEmpty())
                .reduce((a, b) -> a + ", " + b).orElse(problem.file());
        return JSON.objectNode().put("step", step).put("key", key)
                .put("setting", key.startsWith(SETTING) ? key.substring(SETTING.length()) : "")
                .put("port", key.startsWith(INPUT) ? key.substring(INPUT.length()) : "")
                .put("seen", problem.seen()).put("wanted", problem.wanted())
                .put("sentence", where + ": " + problem.seen() + "; " + problem.wanted() + ".");
    }

    static JsonNode settings(Map<String, Object> settings) {
        return MAPPER.valueToTree(settings);
    }

    private static void number(ObjectNode json, String field, OptionalDouble value) {
        Numbers.put(json, field, value.orElse(Double.NaN));
    }
}
