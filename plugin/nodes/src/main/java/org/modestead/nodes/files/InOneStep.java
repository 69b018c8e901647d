package org.modestead.nodes.files;

import java.io.IOException;
import java.nio.file.FileSystemException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardCopyOption;

/** Makes a file beside its place and moves it there in one step when it is complete: one that was there before stays until then. */
public final class InOneStep {

    private InOneStep() {}

    /** Makes a file of its own accord. */
    @FunctionalInterface
    public interface Maker {
        /** Makes the file, complete. */
        void make(Path part) throws IOException;
    }

    /**
     * Makes a file whole or not at all. What killed processes left half made of it goes.
     *
     * @param target absolute
     * @throws FileSystemException if a device or the like stands there
     */
    public static void make(Path target, Maker maker) throws IOException {
        Files.createDirectories(target.getParent());
        if (isNoFile(target)) {
            throw new FileSystemException(target.toString(), null, "not an ordinary file");
        }
        for (Path left : PartName.abandonedBeside(target)) {
            Files.deleteIfExists(left);
        }
        Path part = PartName.of(target);
        try {
            maker.make(part);
            Files.move(part, target, StandardCopyOption.ATOMIC_MOVE, StandardCopyOption.REPLACE_EXISTING);
        } finally {
            Files.deleteIfExists(part);
        }
    }

    /** Returns whether a device, a pipe or a folder stands there, which moving a file there would replace. */
    public static boolean isNoFile(Path target) {
        return Files.exists(target) && !Files.isRegularFile(target);
    }
}
