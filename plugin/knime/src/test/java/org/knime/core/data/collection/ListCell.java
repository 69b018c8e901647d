package org.knime.core.data.collection;

import java.util.Iterator;
import java.util.List;
import org.knime.core.data.DataCell;
import org.knime.core.data.DataType;

/** Stand-in for tests with just enough behaviour; the platform's own class is met in the integration tests. */
public class ListCell extends DataCell implements ListDataValue {
    private static final long serialVersionUID = 1L;
    private final transient List<DataCell> cells;

    public ListCell(final DataCell... cells) {
        super();
        this.cells = List.of(cells);
    }

    public static DataType getCollectionType(final DataType elementType) {
        return DataType.getType(ListCell.class, elementType);
    }

    @Override
    public DataType getType() {
        return getCollectionType(getElementType());
    }

    @Override
    public DataType getElementType() {
        return cells.stream().filter(cell -> !cell.isMissing()).findFirst().orElseThrow().getType();
    }

    @Override
    public int size() {
        return cells.size();
    }

    @Override
    public DataCell get(final int index) {
        return cells.get(index);
    }

    @Override
    public Iterator<DataCell> iterator() {
        return cells.iterator();
    }

    @Override
    public String toString() {
        return cells.toString();
    }
}
