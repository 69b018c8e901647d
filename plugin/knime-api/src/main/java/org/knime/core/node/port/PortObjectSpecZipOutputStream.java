package org.knime.core.node.port;

import java.io.OutputStream;
import java.util.zip.ZipOutputStream;

/** Signatures of the platform's public class of this name; no behaviour. */
public class PortObjectSpecZipOutputStream extends ZipOutputStream {
    PortObjectSpecZipOutputStream(final OutputStream out) {
        super(out);
    }
}
