package org.modestead.knime.port;

import javax.swing.JComponent;
import org.knime.core.node.port.PortObject;

/** A value that travels between the nodes. Each type has a class of its own, by which the platform refuses wrong connections. */
public sealed interface StagePort extends PortObject permits SnapshotsPort, KernelPort, OperatorPort, SpectrumPort, VerdictPort,
        ModelPort {

    /** Returns what the port carries. */
    PortContent content();

    @Override
    default String getSummary() {
        return content().summary();
    }

    @Override
    default StageSpec getSpec() {
        return content().spec();
    }

    @Override
    default JComponent[] getViews() {
        return new JComponent[] {PortViews.of(content())};
    }
}
