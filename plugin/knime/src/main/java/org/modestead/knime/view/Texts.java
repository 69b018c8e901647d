package org.modestead.knime.view;

import java.awt.Font;
import java.awt.KeyboardFocusManager;
import javax.swing.BorderFactory;
import javax.swing.JLabel;
import javax.swing.JTextArea;

/** Texts to be read, marked and copied, not changed; reached by the keyboard. */
final class Texts {
    private static final float LARGER = 1.25f;

    private Texts() {}

    /** Returns running text, wrapped. */
    static JTextArea paragraph(String text, String name) {
        JTextArea area = new JTextArea(text);
        area.setEditable(false);
        area.setLineWrap(true);
        area.setWrapStyleWord(true);
        area.setFont(new JLabel().getFont().deriveFont(Font.PLAIN));
        area.setBorder(BorderFactory.createEmptyBorder(2, 8, 6, 8));
        area.setFocusTraversalKeys(KeyboardFocusManager.FORWARD_TRAVERSAL_KEYS, null);
        area.setFocusTraversalKeys(KeyboardFocusManager.BACKWARD_TRAVERSAL_KEYS, null);
        area.getAccessibleContext().setAccessibleName(name);
        return area;
    }

    /** Returns a heading. */
    static JLabel heading(String text, boolean large) {
        JLabel label = new JLabel();
        label.putClientProperty("html.disable", Boolean.TRUE);
        label.setText(text);
        Font font = label.getFont().deriveFont(Font.BOLD);
        label.setFont(large ? font.deriveFont(font.getSize2D() * LARGER) : font);
        label.setBorder(BorderFactory.createEmptyBorder(large ? 14 : 6, 8, 2, 8));
        return label;
    }
}
