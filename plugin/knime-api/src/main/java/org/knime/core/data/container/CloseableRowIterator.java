package org.knime.core.data.container;

import java.io.Closeable;
import org.knime.core.data.RowIterator;

/** Signatures of the platform's public class of this name; no behaviour. */
public abstract class CloseableRowIterator extends RowIterator implements Closeable {
    @Override
    public abstract void close();
}
