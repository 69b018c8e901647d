package org.modestead.knime.dialog;

import java.awt.BorderLayout;
import java.util.List;
import javax.swing.JButton;
import javax.swing.JComponent;
import javax.swing.JFileChooser;
import javax.swing.JPanel;
import javax.swing.filechooser.FileNameExtensionFilter;
import javax.swing.text.JTextComponent;
import org.modestead.nodes.contract.Setting;

/** A file by name, which can also be looked for. */
final class FileEditor implements Editor {
    private final Setting.File setting;
    private final TypedEditor line;
    private final JPanel panel = new JPanel(new BorderLayout(6, 0));
    private final JButton browse = new JButton("Browse...");

    FileEditor(Setting.File setting, Edits edits) {
        this.setting = setting;
        this.line = TypedEditor.line(setting, edits);
        panel.setOpaque(false);
        panel.add(line.component(), BorderLayout.CENTER);
        panel.add(browse, BorderLayout.LINE_END);
        browse.getAccessibleContext().setAccessibleName("Browse for " + setting.common().label());
        browse.addActionListener(event -> browse());
    }

    @Override
    public JComponent component() {
        return panel;
    }

    @Override
    public List<JComponent> parts() {
        return List.of(line.parts().get(0), browse);
    }

    @Override
    public void show(Draft draft) {
        line.show(draft);
    }

    @Override
    public void allow(boolean allowed) {
        line.allow(allowed);
        browse.setEnabled(allowed);
    }

    private void browse() {
        JFileChooser chooser = new JFileChooser();
        chooser.setDialogTitle(setting.common().label());
        if (!setting.extensions().isEmpty()) {
            chooser.setFileFilter(new FileNameExtensionFilter(String.join(", ", setting.extensions()),
                    setting.extensions().toArray(String[]::new)));
        }
        int answer = setting.reading() ? chooser.showOpenDialog(panel) : chooser.showSaveDialog(panel);
        if (answer == JFileChooser.APPROVE_OPTION) {
            ((JTextComponent) line.parts().get(0)).setText(chooser.getSelectedFile().getPath());
        }
    }
}
