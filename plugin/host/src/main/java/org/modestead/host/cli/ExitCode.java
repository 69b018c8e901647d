package org.modestead.host.cli;

/** What the process tells the shell. */
final class ExitCode {

    /** Everything was done. */
    static final int DONE = 0;

    /** A step failed, or the results could not be written. */
    static final int FAILED = 1;

    /** The command or the workflow is wrong; nothing was run. */
    static final int WRONG = 2;

    /** The person stopped it: 128 + SIGINT, as shells expect. */
    static final int STOPPED = 130;

    private ExitCode() {}
}
