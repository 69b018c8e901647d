package org.knime.core.node.workflow;

/** Signatures of the platform's public class of this name; no behaviour. */
public interface NodeExecutionJobManager {
}
