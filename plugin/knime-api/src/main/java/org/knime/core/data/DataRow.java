package org.knime.core.data;

/** Signatures of the platform's public class of this name; no behaviour. */
public interface DataRow extends Iterable<DataCell> {
    int getNumCells();

    RowKey getKey();

    DataCell getCell(int index);
}
