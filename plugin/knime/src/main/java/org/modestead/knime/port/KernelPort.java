package org.modestead.knime.port;

import java.io.IOException;
import org.knime.core.node.ExecutionMonitor;
import org.knime.core.node.port.PortObjectSpec;
import org.knime.core.node.port.PortObjectZipInputStream;
import org.knime.core.node.port.PortObjectZipOutputStream;

/** The function space. */
public record KernelPort(PortContent content) implements StagePort {

    /** Writes and reads such ports. */
    public static final class Serializer extends PortObjectSerializer<KernelPort> {

        @Override
        public void savePortObject(KernelPort object, PortObjectZipOutputStream out, ExecutionMonitor exec) throws IOException {
            object.content().save(out);
        }

        @Override
        public KernelPort loadPortObject(PortObjectZipInputStream in, PortObjectSpec spec, ExecutionMonitor exec) throws IOException {
            return new KernelPort(PortContent.load(in, spec));
        }
    }
}
