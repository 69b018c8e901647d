package org.modestead.nodes.contract;

import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.modelfile.Model;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.nodes.table.Table;

/** What travels along a link. A link joins two ports of the same type only. */
public enum PortType {
    /** Rows and columns. */
    TABLE("Table", Table.class),
    /** Prepared states. */
    SNAPSHOTS("Snapshots", Snapshots.class),
    /** The function space. */
    KERNEL("Kernel", Kernel.class),
    /** The fitted operator. */
    OPERATOR("Operator", FittedOperator.class),
    /** Eigenvalues, eigenfunctions and weights. */
    SPECTRUM("Spectrum", Spectrum.class),
    /** Whether the modes exist. */
    VERDICT("Verdict", Verdict.class),
    /** Operator, spectrum and verdict together, to go on elsewhere. */
    MODEL("Model", Model.class);

    private final String title;
    private final Class<?> valueClass;

    PortType(String title, Class<?> valueClass) {
        this.title = title;
        this.valueClass = valueClass;
    }

    /** Returns the name for people. */
    public String title() {
        return title;
    }

    /** Returns the class of the values that travel. */
    public Class<?> valueClass() {
        return valueClass;
    }
}
