package org.knime.core.node.streamable;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class InputPortRole extends PortRole {
    public boolean isStreamable() {
        throw new UnsupportedOperationException();
    }
}
