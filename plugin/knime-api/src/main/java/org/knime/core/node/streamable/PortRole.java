package org.knime.core.node.streamable;

/** Signatures of the platform's public class of this name; no behaviour. */
public class PortRole {
    PortRole() {
        throw new UnsupportedOperationException();
    }

    public final boolean isDistributable() {
        throw new UnsupportedOperationException();
    }
}
