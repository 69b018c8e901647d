package org.modestead.knime.port;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.Collectors;
import javax.swing.JComponent;
import org.modestead.engine.recording.Channel;
import org.modestead.knime.view.PortPanel;
import org.modestead.nodes.contract.Outlook;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.modelfile.PortFact;

/** What the platform shows of a port when a person asks for it; made only then. */
final class PortViews {

    private PortViews() {}

    static JComponent of(PortContent content) {
        return PortPanel.of(content.spec().type().title(), content.facts());
    }

    static JComponent of(StageSpec spec) {
        return PortPanel.of("Made of", facts(spec));
    }

    static List<PortFact> facts(StageSpec spec) {
        Outlook outlook = spec.outlook();
        List<PortFact> facts = new ArrayList<>();
        if (spec.type() == PortType.KERNEL) {
            facts.add(new PortFact("kernel", outlook.kernel().orElse("chosen from the data when the node runs")));
        }
        facts.add(new PortFact("channels", labels(outlook.channels())));
        facts.add(new PortFact("inputs", labels(outlook.inputs())));
        facts.add(new PortFact("time unit", outlook.time().map(axis -> axis.unit().isEmpty() ? "none" : axis.unit())
                .orElse("known when the data are read")));
        return facts;
    }

    private static String labels(List<Channel> channels) {
        return channels.isEmpty() ? "none known" : channels.stream().map(Channel::label).collect(Collectors.joining(", "));
    }
}
