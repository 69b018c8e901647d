package org.modestead.host.output;

import java.io.IOException;
import java.nio.channels.FileChannel;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.List;
import java.util.stream.Stream;

/** Makes sure that what was written lies on the disk itself, so that not even a machine that stops loses it. */
public final class Forced {

    private Forced() {}

    /** Forces all files of a folder, and then that the folder names them. */
    public static void files(Path folder) throws IOException {
        List<Path> inside;
        try (Stream<Path> found = Files.list(folder)) {
            inside = found.toList();
        }
        for (Path file : inside) {
            try (FileChannel channel = FileChannel.open(file, StandardOpenOption.WRITE)) {
                channel.force(true);
            }
        }
        names(folder);
    }

    /** Forces that a folder names what it holds, after something was moved into it. */
    public static void names(Path folder) {
        try (FileChannel channel = FileChannel.open(folder, StandardOpenOption.READ)) {
            channel.force(true);
        } catch (IOException unknownThere) {
            // some systems open no folder; they keep names in order by themselves
        }
    }
}
