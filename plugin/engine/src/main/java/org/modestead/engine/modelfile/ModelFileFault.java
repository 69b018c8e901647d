package org.modestead.engine.modelfile;

import org.modestead.engine.Fault;

/** A model file cannot be read, or a value cannot be put into one. */
public final class ModelFileFault extends Fault {
    private static final long serialVersionUID = 1L;

    /** See {@link Fault#Fault(String, String, String)}. */
    public ModelFileFault(String where, String seen, String wanted) {
        super(where, seen, wanted);
    }
}
