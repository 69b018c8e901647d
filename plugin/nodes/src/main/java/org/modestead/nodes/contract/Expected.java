package org.modestead.nodes.contract;

import java.util.Map;
import org.modestead.nodes.table.TableSchema;

/**
 * What is known of the values at some ports before they are there.
 *
 * @param tables columns of tables, by port id, where known
 * @param values outlook on the other values, by port id, where known
 */
public record Expected(Map<String, TableSchema> tables, Map<String, Outlook> values) {

    /** Takes immutable copies. */
    public Expected {
        tables = Map.copyOf(tables);
        values = Map.copyOf(values);
    }
}
