package org.modestead.nodes.judge;

import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.LinkedHashSet;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import org.modestead.engine.spectrum.ChannelGroup;
import org.modestead.nodes.contract.NearestName;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.Setting.Common;
import org.modestead.nodes.contract.Setting.Option;
import org.modestead.nodes.contract.SettingFault;
import org.modestead.nodes.contract.SettingProblem;
import org.modestead.nodes.contract.Settings;

/** Which channels belong together, as the settings tell it: by the beginning of their names, or named one by one. */
final class GroupSettings {

    private static final String GROUPING = "grouping";
    private static final String SEPARATOR = "group-separator";
    private static final String NAMED = "named";
    private static final String PREFIX = "prefix";
    private static final String GROUPS = "channel-groups";
    private static final String OTHERS = "others";

    private GroupSettings() {}

    /** Returns the settings in dialog order. */
    static List<Setting> declared() {
        String group = "Channel groups";
        return List.of(
                new Setting.Choice(new Common(GROUPING, "Group channels", group, "Whether the shapes are also told by groups of channels,"
                        + " such as all those of one bearing."), List.of(
                        new Option("none", "Not", "No groups; the group table stays empty."),
                        new Option(PREFIX, "By name", "Channels whose names begin alike, up to a separator, belong together."),
                        new Option(NAMED, "As listed", "Groups are listed with their channels.")), "none"),
                new Setting.Text(new Common(SEPARATOR, "Separator", group, "Text that ends the part of a channel's name which names its"
                        + " group. A name without it is a group of its own.").when(GROUPING, PREFIX), "_", false, true),
                new Setting.Text(new Common(GROUPS, "Groups", group, "Name of a group, a colon and its channels with commas between;"
                        + " groups on lines of their own or with semicolons between, for example discharge: p1, p2; bearings: a1, a2."
                        + " Channels that are not listed form the group others.").when(GROUPING, NAMED), "", true, false));
    }

    /** Returns what is wrong with the list whatever channels there are. */
    static List<SettingProblem> problems(Settings settings) {
        if (!settings.text(GROUPING).equals(NAMED)) {
            return List.of();
        }
        List<String> entries = entries(settings);
        List<SettingProblem> problems = new ArrayList<>();
        if (entries.isEmpty()) {
            problems.add(new SettingProblem(GROUPS, "no group is listed", "list groups such as discharge: p1, p2; bearings: a1, a2"));
        }
        Set<String> names = new LinkedHashSet<>();
        Set<String> channels = new LinkedHashSet<>();
        for (String entry : entries) {
            String name = name(entry);
            if (name.isEmpty() || channels(entry).isEmpty()) {
                problems.add(new SettingProblem(GROUPS, "the entry " + entry + " names no group with channels",
                        "write the name of the group, a colon and its channels"));
            } else if (name.equals(OTHERS) || !names.add(name)) {
                problems.add(new SettingProblem(GROUPS, "the group name " + name + " is taken", name.equals(OTHERS)
                        ? "choose another name: others are the channels that are not listed" : "list its channels in one entry"));
            }
            channels(entry).stream().filter(channel -> !channels.add(channel)).forEach(twice -> problems.add(new SettingProblem(GROUPS,
                    "the channel " + twice + " is listed twice", "list it in one group only")));
        }
        return problems;
    }

    private static List<String> entries(Settings settings) {
        return Stream.of(settings.text(GROUPS).split("[;\\n]")).map(String::strip).filter(entry -> !entry.isEmpty()).toList();
    }

    private static String name(String entry) {
        int colon = entry.indexOf(':');
        return colon < 0 ? "" : entry.substring(0, colon).strip();
    }

    private static List<String> channels(String entry) {
        return Stream.of(entry.substring(entry.indexOf(':') + 1).split(",")).map(String::strip).filter(name -> !name.isEmpty()).toList();
    }

    /**
     * Returns the groups of the channels at hand; none when nothing is grouped.
     *
     * @param names of the channels
     * @throws SettingFault if a listed channel is not there
     */
    static List<ChannelGroup> read(Settings settings, List<String> names) {
        return switch (settings.text(GROUPING)) {
            case PREFIX -> groups(byPrefix(names, settings.text(SEPARATOR)), names);
            case NAMED -> groups(listed(settings, names), names);
            default -> List.of();
        };
    }

    private static Map<String, List<String>> byPrefix(List<String> names, String separator) {
        Map<String, List<String>> groups = new LinkedHashMap<>();
        for (String name : names) {
            int at = name.indexOf(separator);
            groups.computeIfAbsent(at > 0 ? name.substring(0, at) : name, unused -> new ArrayList<>()).add(name);
        }
        return groups;
    }

    private static Map<String, List<String>> listed(Settings settings, List<String> names) {
        Map<String, List<String>> groups = new LinkedHashMap<>();
        List<String> others = new ArrayList<>(names);
        for (String entry : entries(settings)) {
            for (String channel : channels(entry)) {
                if (!names.contains(channel)) {
                    throw new SettingFault("setting " + GROUPS, "the snapshots have no channel " + channel
                            + NearestName.hint(channel, names), "use the channels " + String.join(", ", names));
                }
                others.remove(channel);
            }
            groups.put(name(entry), channels(entry));
        }
        if (!others.isEmpty()) {
            groups.put(OTHERS, others);
        }
        return groups;
    }

    private static List<ChannelGroup> groups(Map<String, List<String>> members, List<String> names) {
        return members.entrySet().stream().map(entry -> new ChannelGroup(entry.getKey(), IntStream.range(0, names.size())
                .filter(k -> entry.getValue().contains(names.get(k))).boxed().toList())).toList();
    }
}
