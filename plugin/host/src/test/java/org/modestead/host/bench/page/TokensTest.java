package org.modestead.host.bench.page;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.IntStream;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

/** The colours of the page can be read and told apart in both themes (WCAG 2.2, 1.4.3 and 1.4.11). */
class TokensTest {

    private static final Pattern TOKEN = Pattern.compile("--([a-z0-9-]+):\\s*#([0-9a-f]{6});");
    private static final List<String> GROUNDS = List.of("sunk", "ground", "paper", "stripe", "hover", "chosen", "stop-ground", "caution-ground",
            "note-ground");

    @ParameterizedTest
    @ValueSource(booleans = {false, true})
    void everyInkCanBeReadOnEveryGround(boolean dark) throws IOException {
        Map<String, double[]> tokens = tokens(dark);
        for (String ink : List.of("ink", "quiet", "accent", "accent-strong", "firm", "caution", "stop")) {
            for (String ground : GROUNDS) {
                atLeast(4.5, tokens, ink, ground);
            }
        }
        atLeast(4.5, tokens, "on-accent", "accent");
        atLeast(4.5, tokens, "on-accent", "accent-strong");
    }

    @ParameterizedTest
    @ValueSource(booleans = {false, true})
    void edgesFocusAndMarksStandOutFromWhatTheyLieOn(boolean dark) throws IOException {
        Map<String, double[]> tokens = tokens(dark);
        for (String ground : List.of("ground", "paper", "sunk")) {
            atLeast(3, tokens, "edge", ground);
            atLeast(3, tokens, "focus", ground);
        }
        // Pictures lie on paper.
        for (String mark : List.of("data-context", "data-1", "data-2", "data-3", "data-4", "data-5", "data-6")) {
            atLeast(3, tokens, mark, "paper");
        }
    }

    @ParameterizedTest
    @ValueSource(booleans = {false, true})
    void dataColoursStayApartForEverySight(boolean dark) throws IOException {
        Map<String, double[]> tokens = tokens(dark);
        List<double[]> data = IntStream.rangeClosed(1, 6).mapToObj(i -> tokens.get("data-" + i)).toList();
        for (Sight sight : Sight.values()) {
            for (int i = 0; i < data.size(); i++) {
                for (int j = 0; j < i; j++) {
                    // ΔE of 10 is told apart at a glance side by side; 25 also for thin lines apart from each other.
                    assertTrue(sight.distance(data.get(i), data.get(j)) > 25, sight + " " + (i + 1) + " " + (j + 1));
                }
            }
        }
    }

    private static void atLeast(double ratio, Map<String, double[]> tokens, String front, String ground) {
        double seen = Sight.contrast(tokens.get(front), tokens.get(ground));
        assertTrue(seen >= ratio, front + " on " + ground + " has only " + seen);
    }

    /** Returns the colours of a theme, linear red, green and blue in [0, 1]; the dark theme takes over what it does not say. */
    private static Map<String, double[]> tokens(boolean dark) throws IOException {
        String[] themes = PageTest.text("css/tokens.css").split(Pattern.quote(":root[data-theme=\"dark\"]"));
        assertEquals(2, themes.length);
        Map<String, double[]> tokens = new LinkedHashMap<>();
        for (int i = 0; i <= (dark ? 1 : 0); i++) {
            Matcher found = TOKEN.matcher(themes[i]);
            while (found.find()) {
                tokens.put(found.group(1), Sight.linear(Integer.parseInt(found.group(2), 16)));
            }
        }
        return tokens;
    }
}
