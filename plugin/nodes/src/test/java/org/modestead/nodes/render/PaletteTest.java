package org.modestead.nodes.render;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.Color;
import java.util.List;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.EnumSource;

class PaletteTest {

    @ParameterizedTest
    @EnumSource(ColourVision.class)
    void anyTwoLineColoursStayApartForEverySight(ColourVision sight) {
        List<Color> lines = Palette.LINES;
        for (int i = 0; i < lines.size(); i++) {
            for (int j = 0; j < i; j++) {
                // ΔE of 10 is told apart at a glance side by side; 25 also for thin lines apart from each other.
                assertTrue(sight.distance(lines.get(i), lines.get(j)) > 25, sight + " " + i + " " + j + ": "
                        + sight.distance(lines.get(i), lines.get(j)));
            }
        }
    }

    @Test
    void linesAndMarksStandOutFromPaperAndTextMoreSo() {
        Palette.LINES.forEach(line -> assertTrue(ColourVision.contrast(line, Palette.PAPER) >= 3));
        assertTrue(ColourVision.contrast(Palette.CONTEXT, Palette.PAPER) >= 3);
        assertTrue(ColourVision.contrast(Palette.FAINT, Palette.PAPER) >= 3);
        assertTrue(ColourVision.contrast(Palette.INK, Palette.PAPER) >= 4.5);
        assertTrue(ColourVision.contrast(Palette.QUIET_INK, Palette.PAPER) >= 4.5);
    }

    @Test
    void theContrastOfBlackOnWhiteIsTwentyOne() {
        // WCAG 2.2, definition of contrast ratio.
        assertEquals(21, ColourVision.contrast(Color.BLACK, Color.WHITE), 1e-12);
    }
}
