package org.modestead.knime.dialog;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import javax.swing.BoxLayout;
import javax.swing.ButtonGroup;
import javax.swing.JComboBox;
import javax.swing.JComponent;
import javax.swing.JLabel;
import javax.swing.JPanel;
import javax.swing.JRadioButton;
import org.modestead.nodes.contract.Setting;

/** One of several named options: side by side where they are few, in a list otherwise; below them what the chosen one means. */
final class ChoiceEditor implements Editor {
    private static final int FEW = 3;
    private static final int WIDTH = 290;

    private final Setting.Choice setting;
    private final Edits edits;
    private final JPanel panel = new JPanel();
    private final JLabel meaning = Looks.wrapping();
    private final Map<String, JRadioButton> buttons = new LinkedHashMap<>();
    private final ButtonGroup group = new ButtonGroup();
    private final JComboBox<Item> list = Looks.plain(new JComboBox<>());
    private boolean showing;

    /** One line of the list. */
    record Item(String id, String label) {
        @Override
        public String toString() {
            return label;
        }
    }

    ChoiceEditor(Setting.Choice setting, Edits edits) {
        this.setting = setting;
        this.edits = edits;
        panel.setLayout(new BoxLayout(panel, BoxLayout.Y_AXIS));
        panel.setOpaque(false);
        if (setting.options().size() <= FEW) {
            setting.options().forEach(this::addButton);
        } else {
            list.addActionListener(event -> listed());
            list.setAlignmentX(0);
            panel.add(list);
        }
        meaning.setAlignmentX(0);
        meaning.setForeground(Looks.quiet(Looks.panel()));
        panel.add(meaning);
    }

    private void addButton(Setting.Option option) {
        JRadioButton button = Looks.plain(new JRadioButton(option.label()));
        button.setOpaque(false);
        button.setAlignmentX(0);
        button.getAccessibleContext().setAccessibleDescription(option.help());
        button.addActionListener(event -> chosen(option.id()));
        buttons.put(option.id(), button);
        group.add(button);
        panel.add(button);
    }

    @Override
    public JComponent component() {
        return panel;
    }

    @Override
    public List<JComponent> parts() {
        return buttons.isEmpty() ? List.of(list) : List.copyOf(buttons.values());
    }

    @Override
    public void show(Draft draft) {
        String id = draft.value(setting.key()).map(String::valueOf).orElse(setting.initial());
        showing = true;
        if (buttons.isEmpty()) {
            fill(id);
        } else {
            group.clearSelection();
            Optional.ofNullable(buttons.get(id)).ifPresent(button -> button.setSelected(true));
        }
        showing = false;
        explain(id);
    }

    private void fill(String id) {
        List<Item> items = new ArrayList<>(setting.options().stream().map(option -> new Item(option.id(), option.label())).toList());
        if (items.stream().noneMatch(item -> item.id().equals(id))) {
            items.add(new Item(id, id + " (unknown)"));
        }
        list.removeAllItems();
        items.forEach(list::addItem);
        items.stream().filter(item -> item.id().equals(id)).findFirst().ifPresent(list::setSelectedItem);
    }

    @Override
    public void allow(boolean allowed) {
        parts().forEach(part -> part.setEnabled(allowed));
    }

    private void listed() {
        if (!showing && list.getSelectedItem() instanceof Item item) {
            chosen(item.id());
        }
    }

    private void chosen(String id) {
        explain(id);
        edits.edited(setting.key(), Optional.of(id));
    }

    private void explain(String id) {
        String help = setting.options().stream().filter(option -> option.id().equals(id)).map(Setting.Option::help).findFirst().orElse("");
        Looks.wrap(meaning, help, WIDTH);
        list.getAccessibleContext().setAccessibleDescription(help);
    }
}
