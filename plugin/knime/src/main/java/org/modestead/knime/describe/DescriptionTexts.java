package org.modestead.knime.describe;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.stream.Collectors;
import org.knime.core.node.NodeFactory.NodeType;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.contract.Setting;

/** The texts of a description, as markup, one method a part. */
final class DescriptionTexts {

    static final String VIEW = "Result";
    static final String VIEW_TEXT = "The figures of the result, what they say in plain words, and what a reader should doubt.";

    /** Flow variable that holds the overall verdict. */
    static final String VERDICT_VARIABLE = DeclaredDescription.VERDICT_VARIABLE;

    private final NodeDeclaration declaration;

    DescriptionTexts(NodeDeclaration declaration) {
        this.declaration = declaration;
    }

    NodeDeclaration declaration() {
        return declaration;
    }

    /** The purpose comes first, then the description, then what it rests on. */
    String intro() {
        String references = declaration.references().isEmpty() ? ""
                : "<p>" + Markup.bold("References") + "</p>" + Markup.points(declaration.references().stream().map(Markup::text).toList());
        return Markup.paragraphs(declaration.purpose()) + Markup.paragraphs(declaration.description()) + variables() + references;
    }

    private String variables() {
        boolean judges = declaration.outputs().stream().anyMatch(port -> port.type() == PortType.VERDICT);
        return judges ? "<p>The flow variable <tt>" + VERDICT_VARIABLE + "</tt> holds the overall verdict in one word, so that a workflow"
                + " can branch on it.</p>" : "";
    }

    /** Settings by the heading under which the dialog shows them, in dialog order. */
    Map<String, List<Setting>> groups() {
        return declaration.settings().stream()
                .collect(Collectors.groupingBy(setting -> setting.common().group(), LinkedHashMap::new, Collectors.toList()));
    }

    String option(Setting setting) {
        return OptionText.of(declaration, setting);
    }

    String port(Port port) {
        String columns = port.schema().map(schema -> " Columns: " + String.join(", ", schema.names()) + ".").orElse("");
        return Markup.text(port.description() + columns + (port.optional() ? " May stay unconnected." : ""));
    }

    /** From the file of the factory class to the icons at the root of the bundle. */
    String icon() {
        return "../../../icons/" + declaration.id() + ".png";
    }

    /** What a node is for, told from what it takes and gives. */
    NodeType type() {
        boolean forecasts = declaration.outputs().stream().anyMatch(port -> port.id().equals("forecast"));
        boolean writes = declaration.settings().stream().anyMatch(setting -> setting instanceof Setting.File file && !file.reading());
        if (declaration.inputs().isEmpty()) {
            return NodeType.Source;
        } else if (writes || declaration.outputs().isEmpty()) {
            return NodeType.Sink;
        }
        return switch (declaration.stage()) {
            case PREPARE, DATA -> NodeType.Manipulator;
            case FIT -> NodeType.Learner;
            case FORECAST -> forecasts ? NodeType.Predictor : NodeType.Other;
            case REPORT -> NodeType.Visualizer;
            case JUDGE -> NodeType.Other;
        };
    }
}
