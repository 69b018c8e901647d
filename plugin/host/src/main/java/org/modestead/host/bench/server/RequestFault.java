package org.modestead.host.bench.server;

import org.modestead.engine.Fault;

/** A request that is refused, with the status of HTTP that says of what kind the refusal is. */
public final class RequestFault extends Fault {
    private static final long serialVersionUID = 1L;

    private final int status;

    /** See {@link Fault#Fault(String, String, String)}. */
    public RequestFault(int status, String where, String seen, String wanted) {
        super(where, seen, wanted);
        this.status = status;
    }

    /** Returns the status of HTTP, 400 to 499. */
    public int status() {
        return status;
    }
}
