package org.knime.core.node;

/** Signatures of the platform's public class of this name; no behaviour. */
public interface ParameterizedNodeFactory {
    String getFactoryIdUniquifier();
}
