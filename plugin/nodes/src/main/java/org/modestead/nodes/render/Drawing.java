package org.modestead.nodes.render;

import java.awt.Graphics2D;
import java.awt.geom.AffineTransform;
import java.util.Objects;

/** A figure that is ready to be painted, into a file or a window, as often as asked and in any size. */
public final class Drawing {
    private final Picture picture;

    Drawing(Picture picture) {
        this.picture = Objects.requireNonNull(picture);
    }

    /** Returns the width at scale 1, in pixels of a plain screen. */
    public int width() {
        return picture.getWidth();
    }

    /** Returns the height at scale 1, in pixels of a plain screen. */
    public int height() {
        return picture.getHeight();
    }

    /**
     * Paints the whole picture with its upper left corner at the origin.
     *
     * @param graphics given back as it was, but for rendering hints
     * @param scale pixels per picture unit, positive
     */
    public void paint(Graphics2D graphics, double scale) {
        AffineTransform before = graphics.getTransform();
        graphics.scale(scale, scale);
        picture.paint(graphics, width(), height());
        graphics.setTransform(before);
    }
}
