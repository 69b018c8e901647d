package org.modestead.knime.view;

import java.awt.BorderLayout;
import java.util.List;
import javax.swing.JComponent;
import javax.swing.JPanel;
import org.modestead.knime.swing.Sheet;
import org.modestead.nodes.modelfile.PortFact;

/** What a port carries, line by line. */
public final class PortPanel {

    private PortPanel() {}

    /**
     * Returns a view of a port's value.
     *
     * @param title of the port type
     * @param facts what is to be told, in order
     */
    public static JComponent of(String title, List<PortFact> facts) {
        JPanel panel = new JPanel(new BorderLayout());
        panel.setName(title);
        panel.add(Sheet.scrolled(List.of(Texts.heading(title, true), FactList.of(facts.stream().map(fact -> new FactList.Fact(fact.item(),
                fact.value())).toList()))), BorderLayout.CENTER);
        return panel;
    }
}
