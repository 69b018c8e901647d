package org.modestead.release;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.time.Instant;
import java.time.LocalDateTime;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.HexFormat;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import java.util.zip.ZipEntry;
import java.util.zip.ZipFile;
import org.junit.jupiter.api.Test;

/** Nothing that is shipped bears the time of its build: the cheap half of what {@code reproduce.sh} proves with two builds. */
class FixedTimesIT {

    private static final Path SITE = Path.of(System.getProperty("site.plugins")).getParent();
    private static final LocalDateTime FIXED = LocalDateTime.ofInstant(Instant.parse(System.getProperty("fixed.time")), ZoneOffset.UTC);

    /** Entries of libraries keep the times of their own jars, which do not change either. */
    @Test
    void noEntryOfWhatIsShippedIsYoungerThanTheFixedTime() throws IOException {
        List<Path> archives = new ArrayList<>(List.of(Path.of(System.getProperty("runnable.jar")), Path.of(System.getProperty("spark.jar"))));
        try (Stream<Path> site = Files.walk(SITE); Stream<Path> zips = Files.list(SITE.getParent())) {
            site.filter(file -> file.toString().endsWith(".jar")).sorted().forEach(archives::add);
            zips.filter(file -> file.toString().endsWith(".zip")).forEach(archives::add);
        }
        assertTrue(archives.size() > 20, archives.toString());
        for (Path archive : archives) {
            try (ZipFile zip = new ZipFile(archive.toFile())) {
                List<String> younger = zip.stream().filter(entry -> entry.getTimeLocal().isAfter(FIXED)).map(ZipEntry::getName).limit(5).toList();
                assertEquals(List.of(), younger, archive + " has entries younger than " + FIXED);
            }
        }
    }

    @Test
    void theIndexOfTheSiteBearsTheFixedTimeAndTheSumsOfItsFiles() throws IOException, NoSuchAlgorithmException {
        for (String name : List.of("content", "artifacts")) {
            Matcher time = Pattern.compile("name='p2.timestamp' value='(\\d+)'").matcher(text(name));
            assertTrue(time.find(), name);
            assertEquals(FIXED.toInstant(ZoneOffset.UTC).toEpochMilli(), Long.parseLong(time.group(1)), name);
        }
        Matcher artifact = Pattern.compile("(?s)<artifact classifier='([^']+)' id='([^']+)' version='([^']+)'>.*?download.checksum.sha-256' value='([^']+)'").matcher(text("artifacts"));
        int sums = 0;
        while (artifact.find()) {
            String folder = artifact.group(1).equals("osgi.bundle") ? "plugins" : "features";
            byte[] bytes = Files.readAllBytes(SITE.resolve(folder).resolve(artifact.group(2) + "_" + artifact.group(3) + ".jar"));
            assertEquals(HexFormat.of().formatHex(MessageDigest.getInstance("SHA-256").digest(bytes)), artifact.group(4), artifact.group(2));
            sums++;
        }
        try (Stream<Path> plugins = Files.list(SITE.resolve("plugins")); Stream<Path> features = Files.list(SITE.resolve("features"))) {
            assertEquals(plugins.count() + features.count(), sums, "files whose sums are in the index");
        }
    }

    private static String text(String name) throws IOException {
        try (ZipFile zip = new ZipFile(SITE.resolve(name + ".jar").toFile())) {
            return new String(zip.getInputStream(zip.getEntry(name + ".xml")).readAllBytes(), StandardCharsets.UTF_8);
        }
    }
}
