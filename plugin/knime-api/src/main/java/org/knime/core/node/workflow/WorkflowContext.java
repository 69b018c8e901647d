package org.knime.core.node.workflow;

import java.io.File;

/** Signatures of the platform's public class of this name; no behaviour. */
public interface WorkflowContext {

    File getCurrentLocation();
}
