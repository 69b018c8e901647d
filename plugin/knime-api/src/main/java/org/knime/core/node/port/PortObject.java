package org.knime.core.node.port;

import java.io.IOException;
import javax.swing.JComponent;
import org.knime.core.node.CanceledExecutionException;
import org.knime.core.node.ExecutionMonitor;

/** Signatures of the platform's public class of this name; no behaviour. */
public interface PortObject {
    String getSummary();

    PortObjectSpec getSpec();

    JComponent[] getViews();

    /** Writes and reads objects of one class. */
    abstract class PortObjectSerializer<T extends PortObject> {

        public abstract void savePortObject(T object, PortObjectZipOutputStream out, ExecutionMonitor exec)
                throws IOException, CanceledExecutionException;

        public abstract T loadPortObject(PortObjectZipInputStream in, PortObjectSpec spec, ExecutionMonitor exec)
                throws IOException, CanceledExecutionException;
    }
}
