package org.knime.core.node.port;

import java.io.IOException;
import javax.swing.JComponent;

/** Signatures of the platform's public class of this name; no behaviour. */
public interface PortObjectSpec {
    JComponent[] getViews();

    /** Writes and reads specs of one class. */
    abstract class PortObjectSpecSerializer<T extends PortObjectSpec> {

        public abstract void savePortObjectSpec(T spec, PortObjectSpecZipOutputStream out) throws IOException;

        public abstract T loadPortObjectSpec(PortObjectSpecZipInputStream in) throws IOException;
    }
}
