package org.modestead.knime.testing;

import java.awt.Component;
import java.awt.Container;
import java.awt.Dimension;
import java.awt.Graphics2D;
import java.awt.RenderingHints;
import java.awt.image.BufferedImage;
import java.util.ArrayList;
import java.util.List;
import javax.swing.JComponent;

/** Lays out and paints Swing components without a display. */
public final class Painted {
    /** Fields of several lines know their height only once they know their width. */
    private static final int ROUNDS = 4;

    private Painted() {}

    /** Gives a component a size and lays out everything in it. */
    public static <T extends JComponent> T laidOut(T component, Dimension size) {
        component.setSize(size);
        for (int i = 0; i < ROUNDS; i++) {
            lay(component);
        }
        return component;
    }

    /** Paints a laid out component. */
    public static BufferedImage image(JComponent component) {
        BufferedImage image = new BufferedImage(component.getWidth(), component.getHeight(), BufferedImage.TYPE_INT_RGB);
        Graphics2D graphics = image.createGraphics();
        graphics.setRenderingHint(RenderingHints.KEY_TEXT_ANTIALIASING, RenderingHints.VALUE_TEXT_ANTIALIAS_ON);
        component.printAll(graphics);
        graphics.dispose();
        return image;
    }

    /** Returns a component and all below it that are shown, in the order of the containers. */
    public static List<Component> shown(Component component) {
        List<Component> all = new ArrayList<>();
        if (component.isVisible()) {
            all.add(component);
            if (component instanceof Container container) {
                for (Component child : container.getComponents()) {
                    all.addAll(shown(child));
                }
            }
        }
        return all;
    }

    private static void lay(Component component) {
        component.doLayout();
        if (component instanceof Container container) {
            for (Component child : container.getComponents()) {
                lay(child);
            }
        }
    }
}
