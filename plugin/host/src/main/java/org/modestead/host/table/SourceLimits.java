package org.modestead.host.table;

import java.util.Optional;

/**
 * What a table may cost.
 *
 * @param megabytes memory limit of DuckDB
 * @param copied whether its rows belong into the result folder
 */
record SourceLimits(int megabytes, boolean copied) {

    /** Returns the fault when DuckDB ran out of memory or disk, empty when it is about something else. */
    Optional<TableFault> explain(String shown, DuckDbMessage message) {
        if (message.isAbout("no space left") || message.isAbout("max_temp_directory_size")) {
            return Optional.of(new TableFault(shown, "the disk of the temporary folder "
                    + System.getProperty("java.io.tmpdir")
                    + " is full", "make room there, or start Java with -Djava.io.tmpdir=FOLDER on a larger disk"));
        }
        if (message.isAbout("out of memory")) {
            return Optional.of(new TableFault(shown, megabytes + " MB are too little memory for it",
                    "raise the setting memory"));
        }
        return Optional.empty();
    }
}
