package org.modestead.knime.dialog;

import java.awt.GridBagConstraints;
import java.awt.Insets;
import java.awt.Rectangle;
import java.awt.event.FocusAdapter;
import java.awt.event.FocusEvent;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Consumer;
import javax.swing.AbstractButton;
import javax.swing.JButton;
import javax.swing.JComponent;
import javax.swing.JLabel;
import javax.swing.JPanel;
import javax.swing.JRadioButton;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.SettingProblem;

/** One setting of the form: its name, the field, the way back to the default, and below it what is wrong. */
final class FieldRow {
    private static final int MESSAGE_WIDTH = 330;

    private final Setting setting;
    private final Editor editor;
    private final JLabel label;
    private final JButton reset = new JButton("Default");
    private final JLabel message = Looks.wrapping();
    private final List<JComponent> accessories = new ArrayList<>();
    private Optional<String> locked = Optional.empty();

    /**
     * @param setting what is shown
     * @param editor shows it
     * @param back sets it back
     */
    FieldRow(Setting setting, Editor editor, Runnable back) {
        this.setting = setting;
        this.editor = editor;
        label = Looks.plain(new JLabel(FieldWords.label(setting)));
        label.setLabelFor(editor.parts().get(0));
        label.setToolTipText(Looks.tooltip(FieldWords.help(setting)));
        reset.getAccessibleContext().setAccessibleName("Back to default: " + setting.common().label());
        reset.setToolTipText(reset.getAccessibleContext().getAccessibleName());
        reset.setMargin(new Insets(1, 4, 1, 4));
        reset.addActionListener(event -> {
            back.run();
            editor.parts().get(0).requestFocusInWindow();
        });
        message.setForeground(Looks.error(Looks.panel()));
        editor.parts().forEach(this::name);
    }

    private void name(JComponent part) {
        part.setToolTipText(Looks.tooltip(FieldWords.help(setting)));
        boolean button = part instanceof AbstractButton && !(setting instanceof Setting.Flag);
        String own = part instanceof AbstractButton text ? text.getText() : part.getAccessibleContext().getAccessibleName();
        if (setting instanceof Setting.Flag || !button && (own == null || !own.startsWith(setting.common().label()))) {
            part.getAccessibleContext().setAccessibleName(FieldWords.label(setting));
        } else if (button && (part.getAccessibleContext().getAccessibleName() == null
                || part.getAccessibleContext().getAccessibleName().equals(own))) {
            part.getAccessibleContext().setAccessibleName(setting.common().label() + ": " + own);
        }
    }

    Setting setting() {
        return setting;
    }

    Editor editor() {
        return editor;
    }

    /** Tells when the keyboard arrives at the field. */
    void onFocus(Consumer<Setting> arrived) {
        List<JComponent> parts = new ArrayList<>(editor.parts());
        parts.add(reset);
        parts.forEach(part -> part.addFocusListener(new FocusAdapter() {
            @Override
            public void focusGained(FocusEvent event) {
                arrived.accept(setting);
                part.scrollRectToVisible(new Rectangle(0, 0, part.getWidth(), part.getHeight()));
            }
        }));
    }

    /** Puts something of the host's at the end of the row, such as its button for flow variables. Call before {@link #addTo}. */
    void accessory(JComponent extra) {
        accessories.add(extra);
    }

    /** Adds the parts to a grid, in two lines. */
    void addTo(JPanel page, int line) {
        GridBagConstraints at = new GridBagConstraints();
        at.gridy = 2 * line;
        at.insets = new Insets(3, 4, 3, 4);
        at.anchor = GridBagConstraints.FIRST_LINE_START;
        at.insets.top = 6;
        page.add(label, at);
        at.insets.top = 3;
        at.weightx = 1;
        at.fill = GridBagConstraints.HORIZONTAL;
        page.add(editor.component(), at);
        at.weightx = 0;
        at.fill = GridBagConstraints.NONE;
        page.add(reset, at);
        accessories.forEach(extra -> page.add(extra, at));
        at.gridy = 2 * line + 1;
        at.gridx = 1;
        at.gridwidth = GridBagConstraints.REMAINDER;
        at.insets = new Insets(0, 4, 4, 4);
        page.add(message, at);
    }

    /** Forbids changes, because something else sets the value; empty allows them again. */
    void lock(Optional<String> reason) {
        locked = reason;
    }

    /**
     * Shows the state of the setting around the field.
     *
     * @param shown whether it takes part
     * @param isDefault whether the value is the default
     * @param problems of this setting
     */
    void update(boolean shown, boolean isDefault, List<SettingProblem> problems) {
        String said = locked.orElse(problems.isEmpty() ? "" : "To correct: " + FieldWords.sentences(problems));
        label.setVisible(shown);
        editor.component().setVisible(shown);
        reset.setVisible(shown);
        reset.setEnabled(!isDefault && locked.isEmpty());
        accessories.forEach(extra -> extra.setVisible(shown));
        editor.allow(locked.isEmpty());
        message.setVisible(shown && !said.isEmpty());
        message.setForeground(locked.isPresent() ? Looks.quiet(Looks.panel()) : Looks.error(Looks.panel()));
        Looks.wrap(message, said, MESSAGE_WIDTH);
        String description = FieldWords.help(setting) + (said.isEmpty() ? "" : " " + said);
        editor.parts().forEach(part -> describe(part, description));
    }

    private void describe(JComponent part, String description) {
        if (!(part instanceof JRadioButton)) {
            part.getAccessibleContext().setAccessibleDescription(description);
        }
    }

    /** Returns the message below the field, empty when none is shown. */
    String message() {
        return message.isVisible() ? message.getAccessibleContext().getAccessibleName() : "";
    }

    JLabel label() {
        return label;
    }

    JButton reset() {
        return reset;
    }
}
