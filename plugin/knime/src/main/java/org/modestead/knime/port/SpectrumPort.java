package org.modestead.knime.port;

import java.io.IOException;
import org.knime.core.node.ExecutionMonitor;
import org.knime.core.node.port.PortObjectSpec;
import org.knime.core.node.port.PortObjectZipInputStream;
import org.knime.core.node.port.PortObjectZipOutputStream;

/** Eigenvalues, eigenfunctions and weights. */
public record SpectrumPort(PortContent content) implements StagePort {

    /** Writes and reads such ports. */
    public static final class Serializer extends PortObjectSerializer<SpectrumPort> {

        @Override
        public void savePortObject(SpectrumPort object, PortObjectZipOutputStream out, ExecutionMonitor exec) throws IOException {
            object.content().save(out);
        }

        @Override
        public SpectrumPort loadPortObject(PortObjectZipInputStream in, PortObjectSpec spec, ExecutionMonitor exec) throws IOException {
            return new SpectrumPort(PortContent.load(in, spec));
        }
    }
}
