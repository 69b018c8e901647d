package org.modestead.spark;

import org.modestead.engine.Fault;

/** The job was asked for what it cannot do. */
public final class JobFault extends Fault {
    private static final long serialVersionUID = 1L;

    JobFault(String where, String seen, String wanted) {
        super(where, seen, wanted);
    }
}
