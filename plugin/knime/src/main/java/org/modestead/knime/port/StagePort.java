package org.modestead.knime.port;

import org.knime.core.node.port.PortObject;

/** A value that travels between the nodes. Each type has a class of its own, by which the platform refuses wrong connections. */
public sealed interface StagePort extends PortObject permits SnapshotsPort, KernelPort, OperatorPort, SpectrumPort, VerdictPort,
        ModelPort {

    /** Returns what the port carries. */
    PortContent content();
}
