package org.modestead.knime.dialog;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.awt.Color;
import org.junit.jupiter.api.Test;

/** Contrast of what the dialog writes, on bright and on dark looks. */
class LooksTest {

    /** WCAG 2.2 names 21 for black on white and 4.54 for the grey 767676. */
    @Test
    void contrastIsThatOfTheGuideline() {
        assertEquals(21, Looks.contrast(Color.BLACK, Color.WHITE), 1e-9);
        assertEquals(4.54, Looks.contrast(new Color(0x767676), Color.WHITE), 0.005);
    }

    @Test
    void messagesAndHintsReachFourAndAHalfOnUsualBackgrounds() {
        for (int background : new int[] {0xffffff, 0xf0f0f0, 0xeeeeee, 0xd6d9df, 0xd4d0c8, 0x3c3f41, 0x2b2b2b, 0x000000}) {
            Color paper = new Color(background);
            assertTrue(Looks.contrast(Looks.error(paper), paper) >= 4.5, Integer.toHexString(background));
            assertTrue(Looks.contrast(Looks.quiet(paper), paper) >= 4.5, Integer.toHexString(background));
        }
    }
}
