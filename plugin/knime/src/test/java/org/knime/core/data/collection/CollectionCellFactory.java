package org.knime.core.data.collection;

import java.util.Collection;
import org.knime.core.data.DataCell;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public final class CollectionCellFactory {

    private CollectionCellFactory() {}

    public static ListCell createListCell(final Collection<? extends DataCell> coll) {
        return new ListCell(coll.toArray(DataCell[]::new));
    }
}
