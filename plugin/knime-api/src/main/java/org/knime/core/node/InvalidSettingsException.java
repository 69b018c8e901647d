package org.knime.core.node;

/** Signatures of the platform's public exception of this name. */
public class InvalidSettingsException extends Exception {
    private static final long serialVersionUID = 1L;

    public InvalidSettingsException(final String message) {
        super(message);
    }

    public InvalidSettingsException(final String message, final Throwable cause) {
        super(message, cause);
    }
}
