package org.modestead.nodes.contract;

import java.util.Optional;
import org.modestead.nodes.table.TableSchema;

/**
 * One input or output of a node.
 *
 * @param id name in links ({@code step.port}) and output files, lower case with dashes
 * @param type what travels
 * @param title name for people
 * @param description one sentence
 * @param optional whether an input may stay unconnected; false for outputs
 * @param schema columns of an output table where they never change
 */
public record Port(String id, PortType type, String title, String description, boolean optional,
        Optional<TableSchema> schema) {

    /** A port that must be connected, of a type other than a table with known columns. */
    public static Port of(String id, PortType type, String title, String description) {
        return new Port(id, type, title, description, false, Optional.empty());
    }

    /** An input that may stay unconnected. */
    public static Port optional(String id, PortType type, String title, String description) {
        return new Port(id, type, title, description, true, Optional.empty());
    }

    /** An output table whose columns never change. */
    public static Port table(String id, String title, String description, TableSchema schema) {
        return new Port(id, PortType.TABLE, title, description, false, Optional.of(schema));
    }
}
