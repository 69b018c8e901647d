package org.modestead.knime.swing;

import java.awt.Dimension;
import java.awt.GridBagConstraints;
import java.awt.GridBagLayout;
import java.awt.Rectangle;
import java.util.List;
import javax.swing.BorderFactory;
import javax.swing.Box;
import javax.swing.JComponent;
import javax.swing.JPanel;
import javax.swing.JScrollPane;
import javax.swing.Scrollable;

/** Things below each other, as wide as the window, scrolled up and down only. */
public final class Sheet extends JPanel implements Scrollable {
    private static final long serialVersionUID = 1L;
    private static final int STEP = 24;

    private Sheet(List<? extends JComponent> parts) {
        super(new GridBagLayout());
        GridBagConstraints at = new GridBagConstraints();
        at.gridx = 0;
        at.weightx = 1;
        at.fill = GridBagConstraints.HORIZONTAL;
        parts.forEach(part -> add(part, at));
        at.weighty = 1;
        add(Box.createVerticalGlue(), at);
    }

    /** Returns a pane that keeps the parts at the top and scrolls where they are more than fit. */
    public static JScrollPane scrolled(List<? extends JComponent> parts) {
        JScrollPane pane = new JScrollPane(new Sheet(parts), JScrollPane.VERTICAL_SCROLLBAR_AS_NEEDED,
                JScrollPane.HORIZONTAL_SCROLLBAR_NEVER);
        pane.setBorder(BorderFactory.createEmptyBorder());
        pane.getVerticalScrollBar().setUnitIncrement(STEP);
        return pane;
    }

    @Override
    public Dimension getPreferredScrollableViewportSize() {
        return getPreferredSize();
    }

    @Override
    public int getScrollableUnitIncrement(Rectangle visible, int orientation, int direction) {
        return STEP;
    }

    @Override
    public int getScrollableBlockIncrement(Rectangle visible, int orientation, int direction) {
        return visible.height;
    }

    @Override
    public boolean getScrollableTracksViewportWidth() {
        return true;
    }

    @Override
    public boolean getScrollableTracksViewportHeight() {
        return getParent() != null && getParent().getHeight() > getPreferredSize().height;
    }
}
