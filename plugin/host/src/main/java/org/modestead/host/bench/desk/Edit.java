package org.modestead.host.bench.desk;

import org.modestead.host.workflow.Workflow;
import org.modestead.nodes.contract.NodeCatalog;

/** One thing a person does to the document. */
public sealed interface Edit permits StepEdit, LinkEdit, SettingEdit, LabelEdit {

    /**
     * Does it.
     *
     * @param before not changed
     * @param catalog the nodes that are there
     * @throws EditFault if it cannot be done
     */
    Change apply(Workflow before, NodeCatalog catalog);

    /** Returns what was done in a few words, for undo; told from the document before. */
    String words(Workflow before, NodeCatalog catalog);
}
