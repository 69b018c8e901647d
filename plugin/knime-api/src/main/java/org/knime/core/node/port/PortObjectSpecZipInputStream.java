package org.knime.core.node.port;

import java.io.InputStream;
import java.util.zip.ZipInputStream;

/** Signatures of the platform's public class of this name; no behaviour. */
public class PortObjectSpecZipInputStream extends ZipInputStream {
    PortObjectSpecZipInputStream(final InputStream in) {
        super(in);
    }
}
