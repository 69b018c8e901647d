package org.knime.core.node.workflow;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class NodeUIInformation {
    private NodeUIInformation() {
        throw new UnsupportedOperationException();
    }

    public static Builder builder() {
        throw new UnsupportedOperationException();
    }

    /** Makes one. */
    public static final class Builder {
        private Builder() {
            throw new UnsupportedOperationException();
        }

        public Builder setNodeLocation(final int x, final int y, final int width, final int height) {
            throw new UnsupportedOperationException();
        }

        public NodeUIInformation build() {
            throw new UnsupportedOperationException();
        }
    }
}
