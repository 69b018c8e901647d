package org.modestead.host.bench.desk;

import org.modestead.host.workflow.Workflow;
import org.modestead.nodes.contract.NodeCatalog;

/** Edits of what people write on steps and on the whole, and of where they put steps. */
public sealed interface LabelEdit extends Edit {

    /** Gives a step a title of its own; empty for the node's. */
    record Title(String step, String title) implements LabelEdit {
        @Override
        public Change apply(Workflow before, NodeCatalog catalog) {
            return Change.of(Lookup.changed(before, step, found -> found.with(found.label().titled(title.strip()))));
        }

        @Override
        public String words(Workflow before, NodeCatalog catalog) {
            return "Title of " + StepTitles.of(before, catalog, step);
        }
    }

    /** Writes a note on a step; empty for none. */
    record Note(String step, String note) implements LabelEdit {
        @Override
        public Change apply(Workflow before, NodeCatalog catalog) {
            return Change.of(Lookup.changed(before, step, found -> found.with(found.label().noted(note))));
        }

        @Override
        public String words(Workflow before, NodeCatalog catalog) {
            return "Note on " + StepTitles.of(before, catalog, step);
        }
    }

    /** Puts a step at another place in its band. */
    record Move(String step, int place) implements LabelEdit {
        @Override
        public Change apply(Workflow before, NodeCatalog catalog) {
            return Change.of(Bands.moved(before, catalog, step, place));
        }

        @Override
        public String words(Workflow before, NodeCatalog catalog) {
            return "Move " + StepTitles.of(before, catalog, step);
        }
    }

    /** Names the workflow. */
    record Name(String name) implements LabelEdit {
        @Override
        public Change apply(Workflow before, NodeCatalog catalog) {
            if (name.isBlank()) {
                throw new EditFault("name of the workflow", "nothing", "write a name");
            }
            return Change.of(new Workflow(name.strip(), before.file(), before.steps(), before.links(), before.notes()));
        }

        @Override
        public String words(Workflow before, NodeCatalog catalog) {
            return "Name of the workflow";
        }
    }

    /** Writes notes on the whole. */
    record Notes(String notes) implements LabelEdit {
        @Override
        public Change apply(Workflow before, NodeCatalog catalog) {
            return Change.of(new Workflow(before.name(), before.file(), before.steps(), before.links(), notes));
        }

        @Override
        public String words(Workflow before, NodeCatalog catalog) {
            return "Notes";
        }
    }
}
