package org.modestead.host;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Stream;
import java.util.zip.ZipEntry;
import java.util.zip.ZipFile;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;

/** Every library in the runnable jar is listed with its licence, and the jar holds the licence's text. */
class ThirdPartyIT {

    private static final String FOLDER = "META-INF/third-party/";
    private static final String WEBJARS = "META-INF/resources/webjars/";

    private static ZipFile jar;

    @BeforeAll
    static void open() throws IOException {
        jar = new ZipFile(Path.of(System.getProperty("runnable.jar")).toFile());
    }

    @AfterAll
    static void close() throws IOException {
        jar.close();
    }

    /** Returns the licence files of every package prefix that is listed. */
    private static Map<String, List<String>> listed() throws IOException {
        Map<String, List<String>> listed = new LinkedHashMap<>();
        for (String list : List.of("nodes-libraries.txt", "host-libraries.txt", "accelerator-libraries.txt")) {
            for (String line : text(FOLDER + list).lines().skip(2).toList()) {
                String[] cells = line.split("\\s*[|]\\s*");
                assertEquals(4, cells.length, line);
                Stream.of(cells[3].split(",\\s*")).forEach(prefix -> listed.put(prefix, List.of(cells[2].split(",\\s*"))));
            }
        }
        return listed;
    }

    private static String text(String name) throws IOException {
        ZipEntry entry = jar.getEntry(name);
        assertTrue(entry != null, "no " + name);
        return new String(jar.getInputStream(entry).readAllBytes(), StandardCharsets.UTF_8);
    }

    private static List<String> names() {
        return jar.stream().map(ZipEntry::getName).filter(name -> !name.endsWith("/")).toList();
    }

    @Test
    void everyClassIsOursOrOfAListedLibraryAndEveryListedLibraryIsThere() throws IOException {
        Map<String, List<String>> listed = listed();
        Set<String> unused = new TreeSet<>(listed.keySet());
        List<String> unlisted = new ArrayList<>();
        for (String name : names()) {
            String type = name.replaceFirst("^META-INF/versions/\\d+/", "");
            if (type.endsWith(".class") && !type.startsWith("org/modestead/")) {
                List<String> prefixes = listed.keySet().stream().filter(type::startsWith).toList();
                unused.removeAll(prefixes);
                if (prefixes.isEmpty()) {
                    unlisted.add(name);
                }
            }
        }
        assertEquals(List.of(), unlisted.stream().limit(10).toList(), "classes of libraries that are not listed");
        assertEquals(Set.of(), unused, "listed, but not in the jar");
    }

    @Test
    void theTextOfEveryLicenceIsThere() throws IOException {
        for (List<String> files : listed().values()) {
            for (String file : files) {
                String text = text(FOLDER + "licences/" + file);
                assertTrue(text.length() > 1000 && text.matches("(?s).*(Licen[sc]e|LICENSE|Permission is hereby granted|Redistribution and use).*"), file);
            }
        }
        assertTrue(text(FOLDER + "licences/LGPL-3.0.txt").contains("GNU LESSER GENERAL PUBLIC LICENSE"));
        assertTrue(text("META-INF/LICENSE").contains("Apache License"), "our own");
    }

    /** What the bench's page loads brings its licence along. */
    @Test
    void everyLibraryOfThePageHasItsLicenceBesideIt() {
        Set<String> folders = new TreeSet<>();
        names().stream().filter(name -> name.startsWith(WEBJARS))
                .forEach(name -> folders.add(name.substring(0, name.indexOf('/', name.indexOf('/', WEBJARS.length()) + 1) + 1)));
        folders.forEach(folder -> assertTrue(names().contains(folder + "LICENSE"), folder));
    }

    /** The fast linear algebra library of every platform is there, and of the released files only those that are loaded. */
    @Test
    void theNativeLibrariesOfEveryPlatformAreThere() {
        Set<String> found = new TreeSet<>();
        names().stream().filter(name -> name.startsWith("org/bytedeco/") && !name.endsWith(".class") && !name.endsWith(".properties"))
                .forEach(name -> found.add(name.replaceFirst("^org/bytedeco/", "").replaceFirst("[.](so|dylib|dll)[.0-9]*$|([.][0-9.]+)?[.]dylib$", "")));
        for (String platform : List.of("linux-arm64", "linux-x86_64", "macosx-arm64", "macosx-x86_64", "windows-x86_64")) {
            assertTrue(found.contains("openblas/" + platform + "/libopenblas"), platform + " of " + found);
            assertTrue(found.stream().anyMatch(name -> name.matches("openblas/" + platform + "/(lib)?jniopenblas")), platform + " of " + found);
            assertTrue(found.stream().anyMatch(name -> name.matches("javacpp/" + platform + "/(lib)?jnijavacpp")), platform + " of " + found);
        }
        assertTrue(found.stream().noneMatch(name -> name.matches(".*(_full|_nolapack|[.]obj|[.]lib|[.]h)$")), found.toString());
    }
}
