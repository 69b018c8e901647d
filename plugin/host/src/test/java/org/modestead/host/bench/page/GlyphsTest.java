package org.modestead.host.bench.page;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.modestead.host.bench.run.StepState;

/** How a step stands is told by an outline of its own beside its words, not by a colour. */
class GlyphsTest {

    private static final Path GLYPHS = Path.of("src/main/resources/org/modestead/host/bench/page/js/glyphs.js");

    @Test
    void everyStateHasAnOutlineOfItsOwn() throws IOException {
        Map<String, String> outlines = Pattern.compile("(?m)^  (\\w+): '([^']+)',").matcher(Files.readString(GLYPHS)).results()
                .collect(Collectors.toMap(found -> found.group(1), found -> found.group(2)));
        // a result with doubts is a state of its own on the page
        List<String> states = Stream.concat(Stream.of("doubts"), Stream.of(StepState.Kind.values()).map(StepState.Kind::word)).toList();
        states.forEach(state -> assertTrue(outlines.containsKey(state), state));
        assertEquals(states.size(), new HashSet<>(states.stream().map(outlines::get).toList()).size(), outlines.toString());
    }
}
