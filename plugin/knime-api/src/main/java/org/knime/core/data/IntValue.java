package org.knime.core.data;

/** Signatures of the platform's public class of this name; no behaviour. */
public interface IntValue extends DataValue {
    int getIntValue();
}
