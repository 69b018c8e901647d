package org.modestead.host.bench.desk;

import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.Map;
import org.modestead.host.workflow.Step;
import org.modestead.host.workflow.Workflow;
import org.modestead.nodes.contract.NodeCatalog;

/** Edits of a step's settings. */
public sealed interface SettingEdit extends Edit {

    /** Returns the step. */
    String step();

    @Override
    default String words(Workflow before, NodeCatalog catalog) {
        return "Settings of " + StepTitles.of(before, catalog, step());
    }

    /**
     * Stores settings in place of all that are there.
     *
     * @param settings as a workflow file holds them
     */
    record Replace(String step, Map<String, Object> settings) implements SettingEdit {

        /** Takes an immutable copy in the same order. */
        public Replace {
            settings = Collections.unmodifiableMap(new LinkedHashMap<>(settings));
        }

        @Override
        public Change apply(Workflow before, NodeCatalog catalog) {
            return Change.of(Lookup.changed(before, step, found -> found.with(settings)));
        }
    }

    /**
     * Stores what was typed in a dialog; other settings stay.
     *
     * @param typed texts, true or false, and lists of texts; empty texts and nulls mean not set
     */
    record Type(String step, Map<String, Object> typed) implements SettingEdit {

        /** Takes an immutable copy in the same order. */
        public Type {
            typed = Collections.unmodifiableMap(new LinkedHashMap<>(typed));
        }

        @Override
        public Change apply(Workflow before, NodeCatalog catalog) {
            Step found = Lookup.step(before, step);
            Map<String, Object> stored = TypedSettings.stored(Lookup.node(catalog, found.node()), found.settings(), typed);
            return Change.of(Lookup.changed(before, step, changed -> changed.with(stored)));
        }
    }
}
