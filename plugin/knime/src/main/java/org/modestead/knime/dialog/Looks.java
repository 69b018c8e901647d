package org.modestead.knime.dialog;

import java.awt.Color;
import java.awt.Font;
import javax.swing.JComponent;
import javax.swing.JLabel;
import javax.swing.UIManager;

/**
 * Colours and texts that are readable on whatever look and feel the platform runs: of each colour the variant with the larger
 * contrast to the background is taken (WCAG 2.2, 1.4.3 asks for 4.5).
 */
final class Looks {
    private static final Color ERROR_DARK = new Color(0x8f1414);
    private static final Color ERROR_LIGHT = new Color(0xffa8a8);
    private static final Color QUIET_DARK = new Color(0x474f59);
    private static final Color QUIET_LIGHT = new Color(0xc9ced4);

    private Looks() {}

    /** Returns the colour of messages on a background. */
    static Color error(Color background) {
        return better(ERROR_DARK, ERROR_LIGHT, background);
    }

    /** Returns the colour of hints on a background. */
    static Color quiet(Color background) {
        return better(QUIET_DARK, QUIET_LIGHT, background);
    }

    /** Returns the contrast ratio of WCAG 2.2, between 1 and 21. */
    static double contrast(Color a, Color b) {
        double first = luminance(a) + 0.05;
        double second = luminance(b) + 0.05;
        return Math.max(first, second) / Math.min(first, second);
    }

    /** Returns the background on which labels stand. */
    static Color panel() {
        Color known = UIManager.getColor("Panel.background");
        return known == null ? Color.LIGHT_GRAY : known;
    }

    /** Returns the background of fields. */
    static Color field() {
        Color known = UIManager.getColor("TextField.background");
        return known == null ? Color.WHITE : known;
    }

    /** Makes a label show its text as it is, also where it begins like a web page. */
    static <T extends JComponent> T plain(T component) {
        component.putClientProperty("html.disable", Boolean.TRUE);
        return component;
    }

    /** Returns a label of several lines, so wide that it fits beside the names of the fields. */
    static JLabel wrapping() {
        JLabel label = new JLabel();
        label.setFont(label.getFont().deriveFont(Font.PLAIN));
        return label;
    }

    /** Sets the text of a {@link #wrapping()} label, to be read aloud without markup. */
    static void wrap(JLabel label, String text, int width) {
        if (text.equals(label.getAccessibleContext().getAccessibleName())) {
            return;
        }
        label.setText("<html><body style='width:" + width + "px'>" + escaped(text) + "</body></html>");
        label.getAccessibleContext().setAccessibleName(text);
    }

    /** Returns a tooltip of several lines. */
    static String tooltip(String text) {
        return "<html><body style='width:320px'>" + escaped(text) + "</body></html>";
    }

    private static String escaped(String text) {
        return text.replace("&", "&amp;").replace("<", "&lt;").replace(">", "&gt;").replace("\n", "<br>");
    }

    private static Color better(Color dark, Color light, Color background) {
        return contrast(dark, background) >= contrast(light, background) ? dark : light;
    }

    private static double luminance(Color colour) {
        return 0.2126 * linear(colour.getRed()) + 0.7152 * linear(colour.getGreen()) + 0.0722 * linear(colour.getBlue());
    }

    private static double linear(int channel) {
        double share = channel / 255.0;
        return share <= 0.04045 ? share / 12.92 : Math.pow((share + 0.055) / 1.055, 2.4);
    }
}
