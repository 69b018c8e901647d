package org.modestead.knime.port;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.knime.core.node.InvalidSettingsException;
import org.knime.core.node.NodeSettingsRO;
import org.knime.core.node.NodeSettingsWO;
import org.modestead.engine.recording.Channel;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.nodes.contract.Outlook;
import org.modestead.nodes.contract.PortType;

/** A spec as typed keys, with a version of its own so that later releases can tell old files from new ones. */
final class SpecXml {

    private static final int VERSION = 1;
    private static final String KERNEL = "kernel";

    private SpecXml() {}

    static void write(StageSpec spec, NodeSettingsWO into) {
        into.addInt("version", VERSION);
        into.addString("type", spec.type().name());
        channels("channels", spec.outlook().channels(), into);
        channels("inputs", spec.outlook().inputs(), into);
        into.addString("time-kind", spec.outlook().time().map(axis -> axis.kind().name()).orElse(""));
        into.addString("time-unit", spec.outlook().time().map(TimeAxis::unit).orElse(""));
        spec.outlook().kernel().ifPresent(kernel -> into.addString(KERNEL, kernel)); // absent in specs of the first release, too
    }

    static StageSpec read(NodeSettingsRO from) throws InvalidSettingsException {
        int version = from.getInt("version");
        if (version > VERSION) {
            throw new InvalidSettingsException("it has version " + version + "; use a newer release, this one knows versions up to "
                    + VERSION);
        }
        String kind = from.getString("time-kind");
        try {
            Optional<TimeAxis> time = kind.isEmpty() ? Optional.empty()
                    : Optional.of(new TimeAxis(TimeAxis.Kind.valueOf(kind), from.getString("time-unit")));
            return new StageSpec(PortType.valueOf(from.getString("type")),
                    new Outlook(channels("channels", from), channels("inputs", from), time,
                            from.containsKey(KERNEL) ? Optional.of(from.getString(KERNEL)) : Optional.empty()));
        } catch (IllegalArgumentException unknown) {
            throw new InvalidSettingsException("it names an unknown type or kind of time; " + unknown.getMessage(), unknown);
        }
    }

    private static void channels(String key, List<Channel> channels, NodeSettingsWO into) {
        into.addStringArray(key, channels.stream().map(Channel::name).toArray(String[]::new));
        into.addStringArray(key + "-units", channels.stream().map(Channel::unit).toArray(String[]::new));
    }

    private static List<Channel> channels(String key, NodeSettingsRO from) throws InvalidSettingsException {
        String[] names = from.getStringArray(key);
        String[] units = from.getStringArray(key + "-units");
        if (names.length != units.length) {
            throw new InvalidSettingsException(names.length + " " + key + " have " + units.length + " units");
        }
        List<Channel> channels = new ArrayList<>();
        for (int i = 0; i < names.length; i++) {
            channels.add(new Channel(names[i], units[i]));
        }
        return channels;
    }
}
