package org.knime.core.node.workflow.action;

import org.knime.core.node.workflow.NodeID;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class MetaNodeToSubNodeResult {
    MetaNodeToSubNodeResult() {
        throw new UnsupportedOperationException();
    }

    public NodeID getConvertedNodeID() {
        throw new UnsupportedOperationException();
    }
}
