package org.modestead.knime.dialog;

import java.awt.BorderLayout;
import java.awt.FontMetrics;
import java.awt.Graphics;
import java.awt.KeyboardFocusManager;
import java.util.List;
import java.util.Optional;
import javax.swing.JComponent;
import javax.swing.JLabel;
import javax.swing.JPanel;
import javax.swing.JScrollPane;
import javax.swing.JTextArea;
import javax.swing.JTextField;
import javax.swing.event.DocumentEvent;
import javax.swing.event.DocumentListener;
import javax.swing.text.JTextComponent;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.SettingText;
import org.modestead.nodes.contract.SettingsReader;

/**
 * A value that is typed: a number, a text, a list. What is typed becomes a raw value as on a command line
 * ({@link SettingsReader#fromText}); whether it is right is said elsewhere.
 *
 * <p>Numbers and short texts show their default in grey while they are not set. Lists show it as text, so that an entry can be
 * taken away without typing the others again.
 */
final class TypedEditor implements Editor {
    private static final int NUMBER_WIDTH = 12;
    private static final int TEXT_WIDTH = 24;
    private static final int AREA_ROWS = 4;

    private final Setting setting;
    private final Edits edits;
    private final JTextComponent field;
    private final JComponent component;
    private boolean showing;

    private TypedEditor(Setting setting, Edits edits, JTextComponent field, JComponent component) {
        this.setting = setting;
        this.edits = edits;
        this.field = field;
        this.component = component;
        field.getDocument().addDocumentListener(new DocumentListener() {
            @Override
            public void insertUpdate(DocumentEvent event) {
                typed();
            }

            @Override
            public void removeUpdate(DocumentEvent event) {
                typed();
            }

            @Override
            public void changedUpdate(DocumentEvent event) {
                typed();
            }
        });
    }

    /** Returns a field of one line, with what is allowed beside it. */
    static TypedEditor line(Setting setting, Edits edits) {
        boolean number = setting instanceof Setting.Number || setting instanceof Setting.Whole;
        JTextField field = new GreyText(isList(setting) ? "" : FieldWords.placeholder(setting), number ? NUMBER_WIDTH : TEXT_WIDTH);
        JPanel panel = new JPanel(new BorderLayout(8, 0));
        panel.setOpaque(false);
        panel.add(field, number ? BorderLayout.LINE_START : BorderLayout.CENTER);
        JLabel hint = Looks.plain(new JLabel(FieldWords.hint(setting)));
        hint.setForeground(Looks.quiet(Looks.panel()));
        hint.setToolTipText(FieldWords.hint(setting).isEmpty() ? null : FieldWords.hint(setting));
        panel.add(hint, number ? BorderLayout.CENTER : BorderLayout.LINE_END);
        return new TypedEditor(setting, edits, field, panel);
    }

    /** Returns a field of several lines; Tab leaves it. */
    static TypedEditor area(Setting setting, Edits edits) {
        JTextArea area = new JTextArea(AREA_ROWS, TEXT_WIDTH);
        area.setLineWrap(true);
        area.setWrapStyleWord(true);
        area.setFocusTraversalKeys(KeyboardFocusManager.FORWARD_TRAVERSAL_KEYS, null);
        area.setFocusTraversalKeys(KeyboardFocusManager.BACKWARD_TRAVERSAL_KEYS, null);
        return new TypedEditor(setting, edits, area, new JScrollPane(area, JScrollPane.VERTICAL_SCROLLBAR_AS_NEEDED,
                JScrollPane.HORIZONTAL_SCROLLBAR_NEVER));
    }

    @Override
    public JComponent component() {
        return component;
    }

    @Override
    public List<JComponent> parts() {
        return List.of(field);
    }

    @Override
    public void show(Draft draft) {
        Optional<Object> value = draft.value(setting.key());
        showing = true;
        field.setText(isList(setting) ? value.map(given -> FieldWords.typed(given, separator())).orElse(initialLines())
                : FieldWords.isDefault(setting, value) ? "" : FieldWords.typed(value.orElseThrow(), separator()));
        field.setCaretPosition(0);
        showing = false;
    }

    @Override
    public void allow(boolean allowed) {
        field.setEditable(allowed);
    }

    private void typed() {
        if (!showing) {
            String text = field.getText();
            boolean asAtFirst = text.isBlank() && SettingText.initial(setting).isBlank();
            edits.edited(setting.key(), asAtFirst ? Optional.empty() : SettingsReader.fromText(setting, text));
        }
    }

    private String initialLines() {
        return setting instanceof Setting.Texts texts ? String.join("\n", texts.initial()) : SettingText.initial(setting);
    }

    private String separator() {
        return setting instanceof Setting.Numbers ? ", " : "\n";
    }

    private static boolean isList(Setting setting) {
        return setting instanceof Setting.Texts || setting instanceof Setting.Numbers || setting instanceof Setting.Columns
                || setting instanceof Setting.Text text && text.multiline();
    }

    /** A text field that shows a grey text while it is empty. */
    static final class GreyText extends JTextField {
        private static final long serialVersionUID = 1L;
        private final String grey;

        GreyText(String grey, int columns) {
            super(columns);
            this.grey = grey;
        }

        @Override
        protected void paintComponent(Graphics graphics) {
            super.paintComponent(graphics);
            if (getText().isEmpty() && isEditable()) {
                FontMetrics metrics = graphics.getFontMetrics(getFont());
                graphics.setFont(getFont());
                graphics.setColor(Looks.quiet(Looks.field()));
                int room = getHeight() - getInsets().top - getInsets().bottom - metrics.getHeight();
                graphics.drawString(grey, getInsets().left + 1, getInsets().top + room / 2 + metrics.getAscent());
            }
        }

        String grey() {
            return grey;
        }
    }
}
