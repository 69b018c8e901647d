package org.modestead.host.run;

import java.io.IOException;
import java.io.PrintWriter;
import java.nio.file.Files;
import java.nio.file.Path;

/** Writes what a programmer needs of an error to a file, so that a person need not see it. */
public final class DefectLog {

    private DefectLog() {}

    /** Writes the log; returns how to find it. */
    public static String write(Throwable defect) {
        try {
            Path file = Files.createTempFile("modestead-error", ".log");
            try (PrintWriter writer = new PrintWriter(Files.newBufferedWriter(file))) {
                writer.println("Modestead " + Versions.modestead() + ", Java " + System.getProperty("java.version"));
                defect.printStackTrace(writer);
            }
            return "the log " + file;
        } catch (IOException unwritable) {
            return "this sentence (no log could be written: " + unwritable.getMessage() + ")";
        }
    }
}
