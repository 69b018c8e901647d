package org.knime.core.node.workflow;

/** Signatures of the platform's public interface of this name; no behaviour. */
public interface NodePort {
}
