package org.modestead.knime.port;

import org.knime.core.node.BufferedDataTable;
import org.knime.core.node.port.PortObject;
import org.knime.core.node.port.PortTypeRegistry;
import org.modestead.nodes.contract.Port;
import org.modestead.nodes.contract.PortType;

/** Which class of the platform stands for which of the declared port types. */
public final class StagePorts {

    private StagePorts() {}

    /** Returns the platform's type of a declared port. */
    public static org.knime.core.node.port.PortType type(Port port) {
        return PortTypeRegistry.getInstance().getPortType(objectClass(port.type()), port.optional());
    }

    /** Returns a value as port object; not for tables, which the platform keeps itself. */
    public static StagePort object(StageSpec spec, Object value) {
        PortContent content = new PortContent(spec, value);
        return switch (spec.type()) {
            case SNAPSHOTS -> new SnapshotsPort(content);
            case KERNEL -> new KernelPort(content);
            case OPERATOR -> new OperatorPort(content);
            case SPECTRUM -> new SpectrumPort(content);
            case VERDICT -> new VerdictPort(content);
            case MODEL -> new ModelPort(content);
            case TABLE -> throw new IllegalArgumentException("tables are the platform's own");
        };
    }

    /** Returns the class whose objects travel. */
    public static Class<? extends PortObject> objectClass(PortType type) {
        return switch (type) {
            case TABLE -> BufferedDataTable.class;
            case SNAPSHOTS -> SnapshotsPort.class;
            case KERNEL -> KernelPort.class;
            case OPERATOR -> OperatorPort.class;
            case SPECTRUM -> SpectrumPort.class;
            case VERDICT -> VerdictPort.class;
            case MODEL -> ModelPort.class;
        };
    }
}
