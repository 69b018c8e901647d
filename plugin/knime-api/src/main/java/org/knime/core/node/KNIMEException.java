package org.knime.core.node;

/** Signatures of the platform's public exception of this name. */
public final class KNIMEException extends Exception {
    private static final long serialVersionUID = 1L;

    public KNIMEException(final String message) {
        super(message);
    }

    public KNIMEException(final String message, final Throwable cause) {
        super(message, cause);
    }
}
