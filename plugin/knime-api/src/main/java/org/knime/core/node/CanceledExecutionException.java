package org.knime.core.node;

/** Signatures of the platform's public exception of this name. */
public class CanceledExecutionException extends Exception {
    private static final long serialVersionUID = 1L;

    public CanceledExecutionException() {
        super();
    }

    public CanceledExecutionException(final String message) {
        super(message);
    }
}
