package org.modestead.host.table;

import java.util.Optional;

/**
 * What a table may cost.
 *
 * @param megabytes memory limit of DuckDB
 * @param copied whether its rows belong into the result folder
 */
record SourceLimits(int megabytes, boolean copied) {

    /** DuckDB holds some vectors of 2048 texts, 16 bytes each, of every column at once. */
    private static final double MEGABYTES_A_COLUMN = 0.2;

    /** Returns the same for a text table of so many columns, with the memory that these need at least. */
    SourceLimits holding(int columns) {
        return new SourceLimits(Math.max(megabytes, (int) Math.ceil(MEGABYTES_A_COLUMN * columns)), copied);
    }

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
