package org.modestead.host.output;

import java.io.IOException;
import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import org.modestead.nodes.files.InOneStep;

/** Writes a file beside its place and moves it there in one step when it is complete. */
public final class WholeFile {

    private WholeFile() {}

    /** Writes the bytes of a file. */
    @FunctionalInterface
    public interface Content {
        /** Writes all bytes; need not close. */
        void write(OutputStream out) throws IOException;
    }

    /**
     * Writes a file whole or not at all; one of that name stays until the new one is complete.
     *
     * @param disk where the bytes go
     * @param target absolute
     * @param content writes the bytes
     */
    public static void write(Disk disk, Path target, Content content) throws IOException {
        InOneStep.make(target, part -> {
            try (OutputStream out = disk.create(part)) {
                content.write(out);
            }
        });
    }

    /**
     * Checks that a file may be made, as far as can be told beforehand.
     *
     * @param target absolute
     * @param shown the name as the person wrote it
     * @throws OutputFault if it is a folder, a device or a pipe, or its folder is a file or may not be written
     */
    public static void checkTarget(Path target, String shown) {
        if (Files.isDirectory(target)) {
            throw new OutputFault(shown, "this is a folder, not a file", "name a file in it");
        }
        if (InOneStep.isNoFile(target)) {
            throw new OutputFault(shown, "this is a device or a pipe, not an ordinary file", "choose another name");
        }
        Path folder = target.getParent();
        while (folder != null && !Files.exists(folder)) {
            folder = folder.getParent();
        }
        if (folder == null || !Files.isDirectory(folder)) {
            throw new OutputFault(shown, folder + " is not a folder", "choose a file in a folder");
        }
        if (!Files.isWritable(folder)) {
            throw new OutputFault(shown, "the folder " + folder + " may not be written",
                    "allow writing there or choose another folder");
        }
    }
}
