package org.knime.core.data.collection;

import java.util.Collection;
import org.knime.core.data.DataCell;

/** Signatures of the platform's public class of this name; no behaviour. */
public final class CollectionCellFactory {
    private CollectionCellFactory() {
        throw new UnsupportedOperationException();
    }

    public static ListCell createListCell(final Collection<? extends DataCell> coll) {
        throw new UnsupportedOperationException();
    }
}
