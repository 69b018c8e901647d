package org.knime.core.node.property.hilite;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public class HiLiteHandler {

    public HiLiteHandler() {
        // no row is marked
    }
}
