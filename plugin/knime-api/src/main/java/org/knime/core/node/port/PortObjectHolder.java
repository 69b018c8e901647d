package org.knime.core.node.port;

/** Signatures of the platform's public class of this name; no behaviour. */
public interface PortObjectHolder {
    PortObject[] getInternalPortObjects();

    void setInternalPortObjects(PortObject[] objects);
}
