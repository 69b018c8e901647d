package org.modestead.site;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.time.Instant;
import java.time.LocalDateTime;
import java.time.ZoneOffset;
import java.util.HexFormat;
import java.util.Map;
import java.util.TreeMap;
import java.util.regex.MatchResult;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import java.util.zip.ZipEntry;
import java.util.zip.ZipInputStream;
import java.util.zip.ZipOutputStream;

/**
 * Takes out of the finished update site what differs from build to build: times in the feature jars, in the index and in the zip, and the order of
 * the index. The checksums in the index follow the files, so that it is also the last step after the site's jars were signed. Run as a single source file.
 */
public final class FixedSite {

    private final Path repository;
    private final Instant time;

    private FixedSite(Path repository, Instant time) {
        this.repository = repository;
        this.time = time;
    }

    /** Arguments: the repository's folder, the zip to write of it, the time that everything gets. */
    public static void main(String[] arguments) throws IOException {
        FixedSite site = new FixedSite(Path.of(arguments[0]), Instant.parse(arguments[2]));
        site.features();
        site.index("artifacts", "artifact");
        site.index("content", "unit");
        site.zip(Path.of(arguments[1]));
    }

    private void features() throws IOException {
        try (Stream<Path> jars = Files.list(repository.resolve("features"))) {
            for (Path jar : jars.sorted().toList()) {
                Files.write(jar, zipped(unzipped(Files.readAllBytes(jar))));
            }
        }
    }

    /** Writes the index anew: its entries in the order of their names, and the fixed time. */
    private void index(String name, String element) throws IOException {
        Path jar = repository.resolve(name + ".jar");
        String text = new String(unzipped(Files.readAllBytes(jar)).get(name + ".xml"), StandardCharsets.UTF_8);
        // Entries are told by their indentation: units hold artifacts of their own.
        Pattern entry = Pattern.compile("(?ms)^    <" + element + " .*?^    </" + element + ">\\R");
        Map<String, String> sorted = new TreeMap<>(entry.matcher(text).results().map(MatchResult::group)
                .collect(Collectors.toMap(found -> found.lines().findFirst().orElseThrow(), found -> ordered(summed(found)))));
        int first = text.indexOf("    <" + element + " ");
        String before = text.substring(0, first).replaceFirst("(name='p2.timestamp' value=')\\d+", "$1" + time.toEpochMilli());
        String after = entry.matcher(text.substring(first)).replaceAll("");
        Files.write(jar, zipped(Map.of(name + ".xml", (before + String.join("", sorted.values()) + after).getBytes(StandardCharsets.UTF_8))));
    }

    /** Returns the entry with what it provides in the order of the names: Tycho lists the packages of Java in an order of its own at each build. */
    private static String ordered(String entry) {
        return Pattern.compile("(?m)(?:^ +<provided [^\\n]*/>\\R)+").matcher(entry)
                .replaceAll(provided -> Matcher.quoteReplacement(provided.group().lines().sorted().map(line -> line + "\n").collect(Collectors.joining())));
    }

    /** Returns an artifact's entry with size and checksums of its file as it is now; other entries as they were. */
    private String summed(String entry) {
        Matcher artifact = Pattern.compile("^    <artifact classifier='([^']+)' id='([^']+)' version='([^']+)'").matcher(entry);
        if (!artifact.find()) {
            return entry;
        }
        try {
            String folder = artifact.group(1).equals("osgi.bundle") ? "plugins" : "features";
            byte[] bytes = Files.readAllBytes(repository.resolve(folder).resolve(artifact.group(2) + "_" + artifact.group(3) + ".jar"));
            String summed = entry;
            for (String key : new String[] {"download.size", "artifact.size"}) {
                summed = valued(summed, key, Integer.toString(bytes.length));
            }
            for (String key : new String[] {"download.md5", "download.checksum.md5"}) {
                summed = valued(summed, key, sum("MD5", bytes));
            }
            summed = valued(summed, "download.checksum.sha-256", sum("SHA-256", bytes));
            return valued(summed, "download.checksum.sha-512", sum("SHA-512", bytes));
        } catch (IOException | NoSuchAlgorithmException impossible) {
            throw new IllegalStateException(entry, impossible);
        }
    }

    private static String valued(String entry, String key, String value) {
        return entry.replaceFirst("(name='" + Pattern.quote(key) + "' value=')[^']*", "$1" + value);
    }

    private static String sum(String algorithm, byte[] bytes) throws NoSuchAlgorithmException {
        return HexFormat.of().formatHex(MessageDigest.getInstance(algorithm).digest(bytes));
    }

    private void zip(Path target) throws IOException {
        Map<String, byte[]> files = new TreeMap<>();
        try (Stream<Path> all = Files.walk(repository)) {
            for (Path file : all.filter(Files::isRegularFile).toList()) {
                files.put(repository.relativize(file).toString().replace('\\', '/'), Files.readAllBytes(file));
            }
        }
        Files.write(target, zipped(files));
    }

    private static Map<String, byte[]> unzipped(byte[] jar) throws IOException {
        Map<String, byte[]> entries = new TreeMap<>();
        try (ZipInputStream zip = new ZipInputStream(new ByteArrayInputStream(jar))) {
            for (ZipEntry entry = zip.getNextEntry(); entry != null; entry = zip.getNextEntry()) {
                if (!entry.isDirectory()) {
                    entries.put(entry.getName(), zip.readAllBytes());
                }
            }
        }
        return entries;
    }

    /** Returns a zip of the entries in their order, a manifest first, as readers of jars in one pass want it. */
    private byte[] zipped(Map<String, byte[]> entries) throws IOException {
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        try (ZipOutputStream zip = new ZipOutputStream(bytes)) {
            String manifest = "META-INF/MANIFEST.MF";
            for (String name : Stream.concat(Stream.of(manifest).filter(entries::containsKey), entries.keySet().stream().filter(any -> !any.equals(manifest))).toList()) {
                ZipEntry entry = new ZipEntry(name);
                // Without a time zone: the same bytes wherever it is built.
                entry.setTimeLocal(LocalDateTime.ofInstant(time, ZoneOffset.UTC));
                zip.putNextEntry(entry);
                zip.write(entries.get(name));
                zip.closeEntry();
            }
        }
        return bytes.toByteArray();
    }
}
