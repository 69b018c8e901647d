package org.knime.core.data;

import java.util.Iterator;

/** Signatures of the platform's public class of this name; no behaviour. */
public abstract class RowIterator implements Iterator<DataRow> {
    @Override
    public abstract boolean hasNext();

    @Override
    public abstract DataRow next();
}
