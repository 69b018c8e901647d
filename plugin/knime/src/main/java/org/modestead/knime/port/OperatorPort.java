package org.modestead.knime.port;

import java.io.IOException;
import org.knime.core.node.ExecutionMonitor;
import org.knime.core.node.port.PortObjectSpec;
import org.knime.core.node.port.PortObjectZipInputStream;
import org.knime.core.node.port.PortObjectZipOutputStream;

/** The fitted operator. */
public record OperatorPort(PortContent content) implements StagePort {

    /** Writes and reads such ports. */
    public static final class Serializer extends PortObjectSerializer<OperatorPort> {

        @Override
        public void savePortObject(OperatorPort object, PortObjectZipOutputStream out, ExecutionMonitor exec) throws IOException {
            object.content().save(out);
        }

        @Override
        public OperatorPort loadPortObject(PortObjectZipInputStream in, PortObjectSpec spec, ExecutionMonitor exec) throws IOException {
            return new OperatorPort(PortContent.load(in, spec));
        }
    }
}
