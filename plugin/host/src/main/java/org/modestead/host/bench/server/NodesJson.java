package org.modestead.host.bench.server;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.node.ArrayNode;
import com.fasterxml.jackson.databind.node.JsonNodeFactory;
import com.fasterxml.jackson.databind.node.ObjectNode;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.TreeSet;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.SettingText;
import org.modestead.nodes.table.CellType;

/** The declarations of all nodes as JSON: shelf, ports and dialogs of the page are made from it. */
final class NodesJson {

    private static final JsonNodeFactory JSON = JsonNodeFactory.instance;

    private NodesJson() {}

    static ObjectNode of(NodeCatalog catalog) {
        ObjectNode root = JSON.objectNode();
        ArrayNode stages = root.putArray("stages");
        for (NodeDeclaration.Stage stage : NodeDeclaration.Stage.values()) {
            stages.addObject().put("id", word(stage)).put("title", stage.title());
        }
        ArrayNode types = root.putArray("types");
        for (PortType type : PortType.values()) {
            types.addObject().put("id", word(type)).put("title", type.title());
        }
        ArrayNode nodes = root.putArray("nodes");
        catalog.nodes().stream().map(Node::declaration).forEach(node -> nodes.add(node(node)));
        return root;
    }

    /** Returns a constant's name as the page knows it. */
    static String word(Enum<?> constant) {
        return constant.name().toLowerCase(Locale.ROOT).replace('_', '-');
    }

    private static ObjectNode node(NodeDeclaration node) {
        ObjectNode json = JSON.objectNode().put("id", node.id()).put("title", node.title()).put("stage", word(node.stage()))
                .put("purpose", node.purpose()).put("description", node.description());
        json.set("references", texts(node.references()));
        json.set("keywords", texts(node.keywords()));
        ArrayNode inputs = json.putArray("inputs");
        node.inputs().forEach(port -> inputs.add(port(port).put("optional", port.optional())));
        ArrayNode outputs = json.putArray("outputs");
        node.outputs().forEach(port -> outputs.add(port(port)));
        ArrayNode settings = json.putArray("settings");
        node.settings().forEach(setting -> settings.add(setting(setting)));
        return json;
    }

    private static ObjectNode port(Port port) {
        return JSON.objectNode().put("id", port.id()).put("type", word(port.type())).put("typeTitle", port.type().title()).put("title", port.title())
                .put("description", port.description());
    }

    private static ObjectNode setting(Setting setting) {
        Setting.Common common = setting.common();
        ObjectNode json = JSON.objectNode().put("key", common.key()).put("label", common.label()).put("group", common.group())
                .put("help", common.help()).put("kindWords", SettingText.kind(setting)).put("unit", SettingText.unit(setting))
                .put("range", SettingText.range(setting)).put("required", SettingText.isRequired(setting));
        json.set("when", common.visibleWhen().<JsonNode>map(when -> {
            ObjectNode condition = JSON.objectNode().put("key", when.key());
            condition.set("values", texts(List.copyOf(new TreeSet<>(when.values()))));
            return condition;
        }).orElse(JSON.nullNode()));
        kind(setting, json);
        return json;
    }

    private static void kind(Setting setting, ObjectNode json) {
        if (setting instanceof Setting.Number number) {
            json.put("kind", "number").put("minExclusive", number.minExclusive());
            json.set("min", bound(number.min()));
            json.set("max", bound(number.max()));
            json.set("initial", number.initial().isPresent() ? JSON.numberNode(number.initial().getAsDouble()) : JSON.nullNode());
        } else if (setting instanceof Setting.Whole whole) {
            json.put("kind", "whole").put("min", whole.min()).put("max", whole.max());
            json.set("initial", whole.initial().isPresent() ? JSON.numberNode(whole.initial().getAsLong()) : JSON.nullNode());
        } else if (setting instanceof Setting.Choice choice) {
            json.put("kind", "choice").put("initial", choice.initial());
            ArrayNode options = json.putArray("options");
            choice.options().forEach(option -> options.addObject().put("id", option.id()).put("label", option.label()).put("help", option.help()));
        } else if (setting instanceof Setting.Text text) {
            json.put("kind", "text").put("multiline", text.multiline()).put("initial", text.initial());
        } else if (setting instanceof Setting.Flag flag) {
            json.put("kind", "flag").put("initial", flag.initial());
        } else {
            chosen(setting, json);
        }
    }

    private static void chosen(Setting setting, ObjectNode json) {
        if (setting instanceof Setting.File file) {
            json.put("kind", "file").put("reading", file.reading()).set("extensions", texts(file.extensions()));
            json.putNull("initial");
        } else if (setting instanceof Setting.OneColumn one) {
            json.put("kind", "column").put("port", one.port()).set("types", cells(one.types()));
            json.putNull("initial");
        } else if (setting instanceof Setting.Columns columns) {
            json.put("kind", "columns").put("port", columns.port()).put("minimum", columns.minimum()).set("types", cells(columns.types()));
            json.set("maximum", columns.maximum().isPresent() ? JSON.numberNode(columns.maximum().getAsInt()) : JSON.nullNode());
            json.putNull("initial");
        } else if (setting instanceof Setting.Texts list) {
            json.put("kind", "texts").set("initial", texts(list.initial()));
        } else if (setting instanceof Setting.Numbers numbers) {
            json.put("kind", "numbers").set("min", bound(numbers.min()));
            json.set("max", bound(numbers.max()));
            ArrayNode initial = json.putArray("initial");
            numbers.initial().forEach(initial::add);
        }
    }

    private static ArrayNode cells(java.util.Set<CellType> types) {
        ArrayNode array = JSON.arrayNode();
        List.of(CellType.values()).stream().filter(types::contains).forEach(type -> array.add(type.name()));
        return array;
    }

    private static JsonNode bound(double value) {
        return Optional.of(value).filter(bound -> Math.abs(bound) < Double.MAX_VALUE).<JsonNode>map(JSON::numberNode).orElse(JSON.nullNode());
    }

    static ArrayNode texts(List<String> list) {
        ArrayNode array = JSON.arrayNode();
        list.forEach(array::add);
        return array;
    }
}
