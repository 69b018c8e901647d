package org.knime.core.data;

/** Signatures of the platform's public class of this name; no behaviour. */
public interface DataCellFactory {
    DataType getDataType();

    interface FromString extends DataCellFactory {
        DataCell createCell(String input);
    }

    interface FromSimpleString extends FromString {
    }
}
