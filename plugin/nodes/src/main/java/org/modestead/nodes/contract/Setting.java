package org.modestead.nodes.contract;

import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.OptionalLong;
import java.util.Set;
import org.modestead.nodes.table.CellType;

/**
 * One thing a user can set on a node. From this declaration come the dialog, the check of a workflow file, the
 * reference page and the node description, so every text is written for a reader who has never seen the code.
 */
public sealed interface Setting {

    /** Returns what all kinds share, never null. */
    Common common();

    /** Returns the name in workflow files, lower case with dashes. */
    default String key() {
        return common().key();
    }

    /**
     * What all kinds share.
     *
     * @param key name in workflow files, lower case with dashes; never changed once shipped
     * @param label name in the dialog
     * @param group heading under which the dialog shows it
     * @param help one or two sentences: what it does, when to change it
     * @param visibleWhen shown only when another setting has one of some values; empty = always
     */
    record Common(String key, String label, String group, String help, Optional<Condition> visibleWhen) {

        /** A setting that is always shown. */
        public Common(String key, String label, String group, String help) {
            this(key, label, group, help, Optional.empty());
        }

        /** The same setting, shown only when {@code otherKey} has one of {@code values}. */
        public Common when(String otherKey, String... values) {
            return new Common(key, label, group, help, Optional.of(new Condition(otherKey, Set.of(values))));
        }
    }

    /**
     * @param key of a {@link Choice} or {@link Flag} of the same node
     * @param values texts ({@code "true"}/{@code "false"} for a flag) under which the dependent setting is shown
     */
    record Condition(String key, Set<String> values) {}

    /**
     * A real number.
     *
     * @param unit shown beside the field, empty when none; {@code time} means the recording's time unit
     * @param min smallest allowed, inclusive unless {@code minExclusive}
     * @param max largest allowed, inclusive
     * @param initial default; empty = not set, the node then decides as its help says
     */
    record Number(Common common, String unit, double min, boolean minExclusive, double max, OptionalDouble initial)
            implements Setting {}

    /**
     * A whole number.
     *
     * @param unit shown beside the field, empty when none
     * @param initial default; empty = not set, the node then decides as its help says
     */
    record Whole(Common common, String unit, long min, long max, OptionalLong initial) implements Setting {}

    /** One of several named options; {@code initial} is one of them. */
    record Choice(Common common, List<Option> options, String initial) implements Setting {}

    /**
     * @param id in workflow files
     * @param label in the dialog
     * @param help one sentence
     */
    record Option(String id, String label, String help) {}

    /** Free text; {@code multiline} for SQL and notes. */
    record Text(Common common, String initial, boolean multiline, boolean required) implements Setting {}

    /** True or false. */
    record Flag(Common common, boolean initial) implements Setting {}

    /** A file to read ({@code reading}) or write. Relative to the workflow file's folder. */
    record File(Common common, boolean reading, List<String> extensions, boolean required) implements Setting {}

    /**
     * One column of an input table.
     *
     * @param port input port whose table is meant
     * @param types allowed types
     * @param required whether it must be set
     */
    record OneColumn(Common common, String port, Set<CellType> types, boolean required) implements Setting {}

    /**
     * Several columns of an input table, in order.
     *
     * @param port input port whose table is meant
     * @param types allowed types
     * @param minimum fewest allowed; with 0 an empty list means what the help says
     * @param maximum most allowed, empty when unlimited
     */
    record Columns(Common common, String port, Set<CellType> types, int minimum, OptionalInt maximum) implements Setting {}

    /** A list of texts such as run names, one a line in a dialog. */
    record Texts(Common common, List<String> initial) implements Setting {}

    /** A list of numbers such as horizons. */
    record Numbers(Common common, String unit, double min, double max, List<Double> initial) implements Setting {}
}
