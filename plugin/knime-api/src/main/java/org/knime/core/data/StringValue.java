package org.knime.core.data;

/** Signatures of the platform's public class of this name; no behaviour. */
public interface StringValue extends DataValue {
    String getStringValue();
}
