package org.modestead.host.bench.recording;

import org.modestead.engine.Fault;

/** A recording cannot be taken as it is. */
public final class RecordingFault extends Fault {
    private static final long serialVersionUID = 1L;

    /** See {@link Fault#Fault(String, String, String)}. */
    public RecordingFault(String where, String seen, String wanted) {
        super(where, seen, wanted);
    }
}
