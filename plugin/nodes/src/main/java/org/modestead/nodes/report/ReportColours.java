package org.modestead.nodes.report;

import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;

/**
 * Colours of the written report, once for light and once for dark surroundings.
 *
 * <p>Every text colour has a contrast of at least 4.5 against every ground it stands on (WCAG 2.2, 1.4.3); tones of
 * callouts differ in lightness and always carry a word, so none is told by colour alone.
 *
 * @param text ink by name
 * @param ground paper by name
 * @param line rules and borders by name, which carry no text
 */
record ReportColours(Map<String, String> text, Map<String, String> ground, Map<String, String> line) {
    static final ReportColours LIGHT = new ReportColours(
            ordered("ink", "#1d2530", "quiet", "#46505d", "link", "#17508f"),
            ordered("paper", "#ffffff", "panel", "#f3f5f8", "stripe", "#f8f9fb"),
            ordered("rule", "#d3d9e0", "firm", "#17508f", "note", "#6a7684", "caution", "#b06a00", "stop", "#521632"));
    static final ReportColours DARK = new ReportColours(
            ordered("ink", "#e6eaf0", "quiet", "#b3bdc9", "link", "#8fbdf0"),
            ordered("paper", "#14191f", "panel", "#1e252d", "stripe", "#191f26"),
            ordered("rule", "#3a444f", "firm", "#8fbdf0", "note", "#93a0ae", "caution", "#e6a64a", "stop", "#e39ab8"));

    /** Returns every text colour with every ground it may stand on. */
    List<List<String>> pairs() {
        return text.values().stream().flatMap(ink -> ground.values().stream().map(paper -> List.of(ink, paper))).toList();
    }

    /** Returns custom properties, one a line. */
    String css() {
        StringBuilder css = new StringBuilder();
        List.of(text, ground, line).forEach(part -> part.forEach((name, value) -> css.append("--").append(name).append(':')
                .append(value)
                .append(";")));
        return css.toString();
    }

    private static Map<String, String> ordered(String... namesAndValues) {
        Map<String, String> map = new LinkedHashMap<>();
        for (int i = 0; i < namesAndValues.length; i += 2) {
            map.put(namesAndValues[i], namesAndValues[i + 1]);
        }
        return map;
    }
}
