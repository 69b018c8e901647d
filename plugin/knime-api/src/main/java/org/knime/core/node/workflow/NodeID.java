package org.knime.core.node.workflow;

import java.io.Serializable;

/** Signatures of the platform's public class of this name; no behaviour. */
public class NodeID implements Serializable, Comparable<NodeID> {
    NodeID() {
        throw new UnsupportedOperationException();
    }

    public int getIndex() {
        throw new UnsupportedOperationException();
    }

    @Override
    public int compareTo(final NodeID other) {
        throw new UnsupportedOperationException();
    }
}
