package org.knime.core.node;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class NodeLogger {
    private NodeLogger() {
        throw new UnsupportedOperationException();
    }

    public static NodeLogger getLogger(final Class<?> source) {
        throw new UnsupportedOperationException();
    }

    public void debug(final Object message) {
        throw new UnsupportedOperationException();
    }

    public void warn(final Object message) {
        throw new UnsupportedOperationException();
    }

    public void error(final Object message, final Throwable cause) {
        throw new UnsupportedOperationException();
    }
}
