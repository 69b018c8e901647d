package org.knime.core.util;

/** Signatures of the platform's public class of this name; no behaviour. */
public class LockFailedException extends Exception {
    LockFailedException() {
        throw new UnsupportedOperationException();
    }
}
