package org.modestead.nodes.render;

/** Draws matrices as maps of colours, as {@link FigureRenderer} draws figures. */
public final class MapRenderer {

    private MapRenderer() {}

    /** Draws as SVG 1.1: one {@code svg} element without XML declaration, with the caption as text alternative. */
    public static String svg(ColourMap map) {
        return Canvas.svg(new MapPicture(map), new SvgText.Described(map.id(), map.title(), map.caption()));
    }

    /**
     * Draws as PNG.
     *
     * @param scale pixels per picture unit, positive
     * @return the file's bytes
     */
    public static byte[] png(ColourMap map, double scale) {
        return Canvas.png(new MapPicture(map), scale);
    }
}
