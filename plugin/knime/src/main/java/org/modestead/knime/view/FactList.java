package org.modestead.knime.view;

import java.awt.GridBagConstraints;
import java.awt.GridBagLayout;
import java.awt.Insets;
import java.util.List;
import javax.swing.JLabel;
import javax.swing.JPanel;
import javax.swing.JTextArea;

/** Names with a value each, values of any length wrapped. */
final class FactList {

    private FactList() {}

    /** One line. */
    record Fact(String name, String value) {}

    static JPanel of(List<Fact> facts) {
        JPanel panel = new JPanel(new GridBagLayout());
        GridBagConstraints at = new GridBagConstraints();
        for (int i = 0; i < facts.size(); i++) {
            at.gridy = i;
            at.gridx = 0;
            at.weightx = 0;
            at.insets = new Insets(3, 8, 3, 8);
            at.fill = GridBagConstraints.NONE;
            at.anchor = GridBagConstraints.FIRST_LINE_START;
            JTextArea value = Texts.paragraph(facts.get(i).value(), facts.get(i).name());
            JLabel name = Texts.heading(facts.get(i).name(), false);
            name.setBorder(null);
            name.setLabelFor(value);
            panel.add(name, at);
            at.gridx = 1;
            at.weightx = 1;
            at.fill = GridBagConstraints.HORIZONTAL;
            panel.add(value, at);
        }
        return panel;
    }
}
