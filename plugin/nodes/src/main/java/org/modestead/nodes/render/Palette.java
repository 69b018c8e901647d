package org.modestead.nodes.render;

import java.awt.Color;
import java.util.List;

/**
 * Colours of figures on white paper.
 *
 * <p>Six line colours, each with a contrast of at least 3 against white (WCAG 2.2, 1.4.11) and chosen so that any two
 * stay more than 25 apart in CIE L*a*b* (1976) for full colour vision and for simulated protanopia, deuteranopia and
 * tritanopia (Machado, Oliveira, Fernandes, IEEE TVCG 15:1291, 2009); their lightness spreads from 18 to 60, so they
 * also differ in a grey print. Nothing is told by colour alone: lines differ in dashes or marks too.
 */
final class Palette {
    static final List<Color> LINES = List.of(new Color(0x17508f), new Color(0xcf7f00), new Color(0x521632),
            new Color(0x00a373),
            new Color(0x8a35d9), new Color(0x454400));
    static final Color PAPER = Color.WHITE;
    static final Color INK = new Color(0x1d2530);
    static final Color QUIET_INK = new Color(0x4a5563);
    static final Color CONTEXT = new Color(0x8a94a0);
    static final Color FAINT = new Color(0x8a94a0);
    static final Color GRID = new Color(0xe3e7ec);
    static final Color FRAME = new Color(0xb8c0ca);
    private static final int BAND_ALPHA = 56;

    private Palette() {}

    static Color line(int index) {
        return LINES.get(Math.floorMod(index, LINES.size()));
    }

    static Color band(Color line) {
        return new Color(line.getRed(), line.getGreen(), line.getBlue(), BAND_ALPHA);
    }
}
