package org.modestead.knime.dialog;

import java.util.List;
import java.util.Optional;
import javax.swing.JCheckBox;
import javax.swing.JComponent;
import org.modestead.nodes.contract.Setting;

/** True or false. */
final class FlagEditor implements Editor {
    private final Setting.Flag setting;
    private final JCheckBox box = new JCheckBox("yes");

    FlagEditor(Setting.Flag setting, Edits edits) {
        this.setting = setting;
        box.setOpaque(false);
        box.addActionListener(event -> edits.edited(setting.key(), Optional.of(box.isSelected())));
    }

    @Override
    public JComponent component() {
        return box;
    }

    @Override
    public List<JComponent> parts() {
        return List.of(box);
    }

    @Override
    public void show(Draft draft) {
        box.setSelected(draft.value(setting.key()).map(value -> value.toString().equals("true")).orElse(setting.initial()));
    }

    @Override
    public void allow(boolean allowed) {
        box.setEnabled(allowed);
    }
}
