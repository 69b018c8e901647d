package org.knime.core.node.property.hilite;

/** Signatures of the platform's public class of this name; no behaviour. */
public class HiLiteHandler {

    public HiLiteHandler() {
        throw new UnsupportedOperationException();
    }
}
