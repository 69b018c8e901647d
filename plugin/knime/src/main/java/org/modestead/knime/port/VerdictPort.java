package org.modestead.knime.port;

import java.io.IOException;
import org.knime.core.node.ExecutionMonitor;
import org.knime.core.node.port.PortObjectSpec;
import org.knime.core.node.port.PortObjectZipInputStream;
import org.knime.core.node.port.PortObjectZipOutputStream;

/** Whether the modes exist. */
public record VerdictPort(PortContent content) implements StagePort {

    /** Writes and reads such ports. */
    public static final class Serializer extends PortObjectSerializer<VerdictPort> {

        @Override
        public void savePortObject(VerdictPort object, PortObjectZipOutputStream out, ExecutionMonitor exec) throws IOException {
            object.content().save(out);
        }

        @Override
        public VerdictPort loadPortObject(PortObjectZipInputStream in, PortObjectSpec spec, ExecutionMonitor exec) throws IOException {
            return new VerdictPort(PortContent.load(in, spec));
        }
    }
}
