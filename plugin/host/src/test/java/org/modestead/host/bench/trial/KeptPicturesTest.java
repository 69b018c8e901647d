package org.modestead.host.bench.trial;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.TreeSet;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** The pictures of the bench that are kept are those of the README, each told in words, and small. */
class KeptPicturesTest {

    private static final int LARGEST_BYTES = 250_000;

    @Test
    void theReadmeShowsThePicturesThatAreKept() throws IOException {
        List<Path> kept;
        try (Stream<Path> files = Files.list(KeptPictures.FOLDER)) {
            kept = files.toList();
        }
        for (Path file : kept) {
            assertTrue(Files.size(file) < LARGEST_BYTES, file + " has " + Files.size(file) + " bytes");
        }
        TreeSet<String> names = kept.stream().map(file -> file.getFileName().toString().replace(".png", "")).collect(Collectors.toCollection(TreeSet::new));
        assertEquals(new TreeSet<>(KeptPictures.NAMES), names, "write them anew with -Dpictures=write");
        TreeSet<String> shown = Pattern.compile("<img src=\"plugin/host/pictures/([a-z-]+)\\.png\" width=\"\\d+\" alt=\"[^\"]{10,}\">")
                .matcher(Files.readString(Path.of("..", "..", "README.md"))).results().map(found -> found.group(1))
                .collect(Collectors.toCollection(TreeSet::new));
        assertEquals(names, shown);
    }
}
