package org.modestead.knime.port;

import java.io.IOException;
import org.knime.core.node.ExecutionMonitor;
import org.knime.core.node.port.PortObjectSpec;
import org.knime.core.node.port.PortObjectZipInputStream;
import org.knime.core.node.port.PortObjectZipOutputStream;

/** Prepared states. */
public record SnapshotsPort(PortContent content) implements StagePort {

    /** Writes and reads such ports. */
    public static final class Serializer extends PortObjectSerializer<SnapshotsPort> {

        @Override
        public void savePortObject(SnapshotsPort object, PortObjectZipOutputStream out, ExecutionMonitor exec) throws IOException {
            object.content().save(out);
        }

        @Override
        public SnapshotsPort loadPortObject(PortObjectZipInputStream in, PortObjectSpec spec, ExecutionMonitor exec) throws IOException {
            return new SnapshotsPort(PortContent.load(in, spec));
        }
    }
}
