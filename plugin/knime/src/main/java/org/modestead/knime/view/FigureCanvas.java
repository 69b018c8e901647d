package org.modestead.knime.view;

import java.awt.Color;
import java.awt.Dimension;
import java.awt.Graphics;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.util.Optional;
import javax.accessibility.AccessibleContext;
import javax.accessibility.AccessibleRole;
import javax.swing.JComponent;
import org.modestead.nodes.figure.Figure;
import org.modestead.nodes.render.Drawing;
import org.modestead.nodes.render.FigureRenderer;

/** Paints one figure as large as fits, by the renderer that also writes the report's pictures. */
final class FigureCanvas extends JComponent {
    private static final long serialVersionUID = 1L;

    private transient Optional<Drawing> drawing = Optional.empty();

    FigureCanvas() {
        setOpaque(true);
        setBackground(Color.WHITE);
        setFocusable(true);
    }

    /** Shows another figure; its caption is the text alternative. */
    void show(Figure figure) {
        drawing = Optional.of(FigureRenderer.drawing(figure));
        getAccessibleContext().setAccessibleName(figure.title());
        getAccessibleContext().setAccessibleDescription(figure.caption());
        setPreferredSize(new Dimension(drawing.get().width(), drawing.get().height()));
        revalidate();
        repaint();
    }

    /** Returns the factor by which the figure is enlarged now. */
    double scale() {
        return drawing.map(shown -> Math.min(getWidth() / (double) shown.width(), getHeight() / (double) shown.height())).orElse(0.0);
    }

    @Override
    protected void paintComponent(Graphics graphics) {
        Graphics2D copy = (Graphics2D) graphics.create();
        copy.setColor(getBackground());
        copy.fillRect(0, 0, getWidth(), getHeight());
        copy.setRenderingHint(RenderingHints.KEY_RENDERING, RenderingHints.VALUE_RENDER_QUALITY);
        double scale = scale();
        if (scale > 0) {
            Drawing shown = drawing.orElseThrow();
            copy.translate((getWidth() - shown.width() * scale) / 2, (getHeight() - shown.height() * scale) / 2);
            shown.paint(copy, scale);
        }
        copy.dispose();
    }

    @Override
    public AccessibleContext getAccessibleContext() {
        if (accessibleContext == null) {
            accessibleContext = new Described();
        }
        return accessibleContext;
    }

    /** Tells a reader of screens that this is a picture. */
    private final class Described extends AccessibleJComponent {
        private static final long serialVersionUID = 1L;

        @Override
        public AccessibleRole getAccessibleRole() {
            return AccessibleRole.ICON;
        }
    }
}
