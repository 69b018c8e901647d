package org.modestead.nodes.contract;

import org.modestead.engine.Fault;

/** A setting is wrong: unknown, of the wrong kind, out of range, or at odds with another one or with the input. */
public final class SettingFault extends Fault {
    private static final long serialVersionUID = 1L;

    /** See {@link Fault#Fault(String, String, String)}. */
    public SettingFault(String where, String seen, String wanted) {
        super(where, seen, wanted);
    }
}
