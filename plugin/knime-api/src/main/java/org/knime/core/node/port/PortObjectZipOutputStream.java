package org.knime.core.node.port;

import java.io.OutputStream;
import java.util.zip.ZipOutputStream;

/** Signatures of the platform's public class of this name; no behaviour. */
public class PortObjectZipOutputStream extends ZipOutputStream {
    PortObjectZipOutputStream(final OutputStream out) {
        super(out);
    }
}
