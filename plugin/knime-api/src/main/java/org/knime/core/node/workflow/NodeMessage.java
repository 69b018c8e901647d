package org.knime.core.node.workflow;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class NodeMessage {
    private NodeMessage() {
        throw new UnsupportedOperationException();
    }

    /** Kinds of message. */
    public enum Type {
        RESET,
        WARNING,
        ERROR
    }

    public Type getMessageType() {
        throw new UnsupportedOperationException();
    }

    public String getMessage() {
        throw new UnsupportedOperationException();
    }
}
