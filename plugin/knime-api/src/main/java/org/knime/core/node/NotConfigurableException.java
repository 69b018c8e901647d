package org.knime.core.node;

/** Signatures of the platform's public exception of this name. */
public class NotConfigurableException extends Exception {
    private static final long serialVersionUID = 1L;

    public NotConfigurableException(final String message) {
        super(message);
    }
}
