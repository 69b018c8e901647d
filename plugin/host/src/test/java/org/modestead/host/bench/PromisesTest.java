package org.modestead.host.bench;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** The table of what the bench promises names tests that are there. */
class PromisesTest {

    private static final Pattern NAMED = Pattern.compile("`(\\w+Test)\\.(\\w+)`");

    @Test
    void everyTestThatTheTableNamesIsThere() throws IOException {
        String guide = Files.readString(Path.of("..", "..", "DEVELOPERS.md"));
        String table = guide.substring(guide.indexOf("### What the bench promises"), guide.indexOf("## The bridge to the KNIME platform"));
        List<String> rows = table.lines().filter(line -> line.startsWith("| ") && !line.startsWith("| promise")).toList();
        List<String> missing = new ArrayList<>();
        for (String row : rows) {
            Matcher named = NAMED.matcher(row);
            assertTrue(named.find(), "a promise without a test: " + row);
            do {
                if (!isTest(named.group(1), named.group(2))) {
                    missing.add(named.group());
                }
            } while (named.find());
        }
        assertEquals(List.of(), missing);
        assertTrue(rows.size() > 20, "the table is read: " + rows.size() + " rows");
    }

    /** Whether some class of that name has a test of that name; the line before its name begins with its annotations. */
    private static boolean isTest(String type, String method) throws IOException {
        Pattern test = Pattern.compile("@(Test|ParameterizedTest|Property)\\b[^;{}]*(\\{[^}]*}[^;{}]*)?void " + method + "\\(");
        try (Stream<Path> files = Files.walk(Path.of("src", "test", "java"))) {
            for (Path file : files.filter(one -> one.getFileName().toString().equals(type + ".java")).toList()) {
                if (test.matcher(Files.readString(file)).find()) {
                    return true;
                }
            }
            return false;
        }
    }
}
