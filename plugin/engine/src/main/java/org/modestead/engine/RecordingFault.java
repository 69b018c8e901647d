package org.modestead.engine;

/** The recorded data cannot be used as they are: times that fall, a run too short, a channel without a number. */
public final class RecordingFault extends Fault {
    private static final long serialVersionUID = 1L;

    /** See {@link Fault#Fault(String, String, String)}. */
    public RecordingFault(String where, String seen, String wanted) {
        super(where, seen, wanted);
    }
}
