package org.modestead.host.bench.page;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.net.URISyntaxException;
import java.net.URL;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.TreeMap;
import java.util.TreeSet;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;

/** The files of the bench's page fit together, need no network and put no data into markup. */
class PageTest {

    private static final Path PAGE = page();
    private static final Pattern IMPORT = Pattern.compile("(?:from|import)\\s*\\(?\\s*'([^'\\s]+\\.js)'");
    private static final Pattern STATIC_IMPORT = Pattern.compile("from '([^'\\s]+\\.js)'");
    private static final Pattern ADDRESS = Pattern.compile("(?:src|href)=\"([^\"]+)\"");
    private static final Pattern COLOUR = Pattern.compile("#[0-9a-fA-F]{3,8}\\b|\\brgba?\\(|\\bhsla?\\(");

    @Test
    void everythingThatThePageNamesIsThere() throws IOException {
        Matcher names = ADDRESS.matcher(text("index.html"));
        List<String> missing = new ArrayList<>();
        while (names.find()) {
            if (!names.group(1).startsWith("/lib/") && !Files.isRegularFile(PAGE.resolve(names.group(1).substring(1)))) {
                missing.add(names.group(1));
            }
        }
        assertEquals(List.of(), missing);
    }

    @Test
    void librariesThatThePageNamesAreOnTheClassPath() {
        for (String library : List.of("preact/10.24.3/dist/preact.umd.js", "preact/10.24.3/hooks/dist/hooks.umd.js")) {
            assertTrue(PageTest.class.getResource("/META-INF/resources/webjars/" + library) != null, library);
        }
    }

    @Test
    void everyModuleThatIsImportedIsThereAndEveryModuleIsImported() throws IOException {
        Set<Path> wanted = new TreeSet<>(List.of(PAGE.resolve("js/app.js"), PAGE.resolve("js/theme.js")));
        List<String> missing = new ArrayList<>();
        for (Path module : files(".js")) {
            Matcher imports = IMPORT.matcher(Files.readString(module));
            while (imports.find()) {
                Path target = module.getParent().resolve(imports.group(1)).normalize();
                wanted.add(target);
                boolean library = imports.group(1).startsWith("/lib/");
                if (!library && (!imports.group(1).startsWith(".") || !Files.isRegularFile(target))) {
                    missing.add(PAGE.relativize(module) + " imports " + imports.group(1));
                }
            }
        }
        assertEquals(List.of(), missing);
        List<Path> idle = files(".js").stream().filter(module -> !wanted.contains(module)).map(PAGE::relativize).toList();
        assertEquals(List.of(), idle, "modules that nothing imports");
    }

    @Test
    void modulesOfTheFrameAreAskedForTogether() throws IOException {
        String index = text("index.html");
        List<String> late = files(".js").stream().map(file -> PAGE.relativize(file).toString().replace('\\', '/'))
                .filter(name -> !name.startsWith("looks/") && !index.contains("\"/" + name + "\"")).toList();
        assertEquals(List.of(), late, "modules that a browser learns of only when it has read others");
    }

    @Test
    void modulesOfTheStartPageComeBeforeAllOthers() throws IOException {
        Set<String> first = new TreeSet<>();
        List<Path> read = new ArrayList<>(List.of(PAGE.resolve("js/app.js")));
        for (int at = 0; at < read.size(); at++) {
            Matcher imports = STATIC_IMPORT.matcher(Files.readString(read.get(at)));
            while (imports.find()) {
                Path target = read.get(at).getParent().resolve(imports.group(1)).normalize();
                if (first.add("/" + PAGE.relativize(target).toString().replace('\\', '/'))) {
                    read.add(target);
                }
            }
        }
        Set<String> asked = Pattern.compile("<link rel=\"modulepreload\" href=\"([^\"]+)\">").matcher(text("index.html")).results()
                .map(link -> link.group(1)).collect(Collectors.toCollection(TreeSet::new));
        assertEquals(first, asked, "all others are asked for with a low priority");
    }

    @Test
    void nothingComesFromAnotherMachine() throws IOException {
        for (Path file : files("")) {
            String text = Files.readString(file).replace("http://www.w3.org/2000/svg", "");
            assertFalse(text.contains("http:") || text.contains("https:") || text.contains("url(//"), PAGE.relativize(file) + " names an address");
        }
    }

    @Test
    void thePageHoldsNoScriptOrStyleOfItsOwnThatItsPolicyWouldRefuse() throws IOException {
        String index = text("index.html");
        assertFalse(Pattern.compile("<script(?![^>]*\\b(src=|type=\"application/json\"))").matcher(index).find(), "a script without a file that is not data");
        assertFalse(index.contains("<style") || index.contains("style=") || Pattern.compile("\\son[a-z]+=").matcher(index).find());
    }

    @Test
    void noDataBecomesMarkup() throws IOException {
        for (Path module : files(".js")) {
            String text = Files.readString(module);
            for (String way : List.of("innerHTML", "outerHTML =", "insertAdjacentHTML", "document.write", "eval(", "new Function")) {
                assertFalse(text.contains(way), PAGE.relativize(module) + " uses " + way);
            }
        }
    }

    @Test
    void onlyTheTokensNameColours() throws IOException {
        Map<String, String> found = new TreeMap<>();
        for (Path sheet : files(".css")) {
            Matcher colours = COLOUR.matcher(Files.readString(sheet));
            if (!sheet.endsWith("css/tokens.css") && colours.find()) {
                found.put(PAGE.relativize(sheet).toString(), colours.group());
            }
        }
        assertEquals(Map.of(), found);
    }

    static String text(String name) throws IOException {
        return Files.readString(PAGE.resolve(name));
    }

    private static List<Path> files(String end) throws IOException {
        try (Stream<Path> all = Files.walk(PAGE)) {
            return all.filter(file -> Files.isRegularFile(file) && file.toString().endsWith(end)).sorted().toList();
        }
    }

    private static Path page() {
        URL index = PageTest.class.getResource("/org/modestead/host/bench/page/index.html");
        try {
            return Path.of(index.toURI()).getParent();
        } catch (URISyntaxException impossible) {
            throw new IllegalStateException(impossible);
        }
    }
}
