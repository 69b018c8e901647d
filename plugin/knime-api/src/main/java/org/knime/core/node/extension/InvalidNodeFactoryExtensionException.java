package org.knime.core.node.extension;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class InvalidNodeFactoryExtensionException extends Exception {
    private InvalidNodeFactoryExtensionException() {
        throw new UnsupportedOperationException();
    }
}
