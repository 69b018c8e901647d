package org.modestead.knime.trial;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.Stream;
import org.knime.core.node.NodeSettings;
import org.knime.core.node.workflow.FlowVariable;
import org.knime.core.node.workflow.VariableType;

/**
 * Flow variables that take the place of settings, one a setting, given as path, type and value, three texts each. A variable is called as its setting.
 */
final class Variables {

    /** Where the platform keeps which variables replace settings, and the form in which it does so since its release 4.1. */
    private static final String FOLDER = "variables";
    private static final String FORM = "V_2019_09_13";

    private Variables() {}

    static FlowVariable[] made(List<String> triples) {
        List<FlowVariable> variables = new ArrayList<>();
        for (int i = 0; i < triples.size(); i += 3) {
            variables.add(made(triples.get(i), triples.get(i + 1), triples.get(i + 2)));
        }
        return variables.toArray(FlowVariable[]::new);
    }

    private static FlowVariable made(String name, String type, String value) {
        return switch (type) {
            case "text" -> new FlowVariable(name, VariableType.StringType.INSTANCE, value);
            case "number" -> new FlowVariable(name, VariableType.DoubleType.INSTANCE, Double.valueOf(value));
            case "whole" -> new FlowVariable(name, VariableType.LongType.INSTANCE, Long.valueOf(value));
            case "flag" -> new FlowVariable(name, VariableType.BooleanType.INSTANCE, Boolean.valueOf(value));
            case "texts" -> new FlowVariable(name, VariableType.StringArrayType.INSTANCE, value.split("[|]", -1));
            case "numbers" -> new FlowVariable(name, VariableType.DoubleArrayType.INSTANCE, Stream.of(value.split("[|]", -1)).map(Double::valueOf)
                    .toArray(Double[]::new));
            default -> throw new IllegalArgumentException("no type " + type);
        };
    }

    /** Says in a node's settings which of its keys are replaced by the variables of the same names. */
    static void use(NodeSettings node, List<String> triples) {
        NodeSettings folder = (NodeSettings) node.addNodeSettings(FOLDER);
        folder.addString("version", FORM);
        NodeSettings tree = (NodeSettings) folder.addNodeSettings("tree");
        for (int i = 0; i < triples.size(); i += 3) {
            NodeSettings key = (NodeSettings) tree.addNodeSettings(triples.get(i));
            key.addString("used_variable", triples.get(i));
            key.addString("exposed_variable", null);
        }
    }
}
