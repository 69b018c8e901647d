package org.modestead.knime.dialog;

import java.awt.GridBagConstraints;
import java.awt.GridBagLayout;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Set;
import java.util.stream.Collectors;
import javax.swing.BorderFactory;
import javax.swing.JLabel;
import javax.swing.JPanel;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Setting;

/** The fields under one heading. */
final class Section {
    private static final int NOTE_WIDTH = 420;

    private final String title;
    private final List<FieldRow> rows;
    private final JPanel panel = new JPanel(new GridBagLayout());
    private final JLabel note = Looks.wrapping();

    Section(String title, List<FieldRow> rows, NodeDeclaration declaration) {
        this.title = title;
        this.rows = List.copyOf(rows);
        note.setForeground(Looks.quiet(Looks.panel()));
        Looks.wrap(note, "Nothing to set here. It depends on " + conditions(declaration) + ".", NOTE_WIDTH);
    }

    private String conditions(NodeDeclaration declaration) {
        Set<String> keys = rows.stream().flatMap(row -> row.setting().common().visibleWhen().stream()).map(Setting.Condition::key)
                .collect(Collectors.toCollection(LinkedHashSet::new));
        Set<String> own = rows.stream().map(row -> row.setting().key()).collect(Collectors.toSet());
        return declaration.settings().stream().filter(setting -> keys.contains(setting.key()) && !own.contains(setting.key()))
                .map(setting -> "\"" + setting.common().label() + "\" under \"" + setting.common().group() + "\"")
                .collect(Collectors.joining(" and "));
    }

    /** Lays the fields out; called once, when the rows have all their accessories. */
    JPanel lay(boolean titled) {
        panel.setBorder(titled ? BorderFactory.createCompoundBorder(BorderFactory.createTitledBorder(title),
                BorderFactory.createEmptyBorder(2, 4, 4, 4)) : BorderFactory.createEmptyBorder(6, 8, 6, 8));
        for (int i = 0; i < rows.size(); i++) {
            rows.get(i).addTo(panel, i);
        }
        GridBagConstraints end = new GridBagConstraints();
        end.gridy = 2 * rows.size();
        end.gridx = 0;
        end.weightx = 1;
        end.gridwidth = GridBagConstraints.REMAINDER;
        end.anchor = GridBagConstraints.FIRST_LINE_START;
        panel.add(note, end);
        return panel;
    }

    String title() {
        return title;
    }

    JPanel panel() {
        return panel;
    }

    List<FieldRow> rows() {
        return rows;
    }

    /** Says what it depends on while no field of it is shown. */
    void update(Set<String> shown) {
        note.setVisible(rows.stream().noneMatch(row -> shown.contains(row.setting().key())));
    }
}
