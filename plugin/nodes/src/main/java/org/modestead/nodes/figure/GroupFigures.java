package org.modestead.nodes.figure;

import java.util.ArrayList;
import java.util.List;
import java.util.stream.IntStream;
import org.modestead.engine.spectrum.ChannelGroup;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.nodes.words.ModeWords;
import org.modestead.nodes.words.TimeUnit;

/** Mode shapes by groups of channels. */
public final class GroupFigures {

    private GroupFigures() {}

    /**
     * Draws the share of each group in the strongest modes that are not the constant, and for each of them how far every channel moves,
     * group by group.
     *
     * @param spectrum the modes
     * @param groups of its channels; none gives no figure
     * @param modes at most how many
     * @return kinds {@link Figure.Kind#BARS} and {@link Figure.Kind#SHAPES}, selection keys {@code group:<name>}
     */
    public static List<Figure> figures(Spectrum spectrum, List<ChannelGroup> groups, int modes) {
        List<Mode> drawn = spectrum.modes().stream().filter(mode -> !mode.constant()).limit(modes).toList();
        List<Figure> figures = new ArrayList<>();
        if (!groups.isEmpty() && !drawn.isEmpty()) {
            figures.add(shares(spectrum, groups, drawn));
            drawn.forEach(mode -> figures.add(shape(spectrum, groups, mode)));
        }
        return figures;
    }

    private static Figure shares(Spectrum spectrum, List<ChannelGroup> groups, List<Mode> modes) {
        List<List<ChannelGroup.Share>> shares = modes.stream().map(mode -> ChannelGroup.shares(spectrum, mode, groups)).toList();
        List<Figure.Layer> bars = new ArrayList<>();
        for (int g = 0; g < groups.size(); g++) {
            int group = g;
            bars.add(new Figure.Bars(groups.get(g).name(), "group:" + groups.get(g).name(),
                    shares.stream().mapToDouble(one -> one.get(group).energyShare()).toArray()));
        }
        return new Figure("group-shares", Figure.Kind.BARS, "Share of each group in the strongest modes",
                "Share of each group of channels in the squared magnitudes of a mode, in prepared units, so that channels of different"
                        + " quantities can be added up. The shares of a mode add up to 1.",
                Figure.Axis.categories("mode", modes.stream().map(mode -> title(spectrum, mode)).toList()),
                Figure.Axis.linear("share of the mode"), bars);
    }

    private static String title(Spectrum spectrum, Mode mode) {
        return mode.number() + ": " + (mode.oscillates() ? ModeWords.cycle(mode, new TimeUnit(spectrum.timeUnit())) : "no oscillation");
    }

    /** Channels stand in the order of their groups; each group is a series of its own. */
    private static Figure shape(Spectrum spectrum, List<ChannelGroup> groups, Mode mode) {
        List<Integer> order = groups.stream().flatMap(group -> group.channels().stream()).toList();
        double largest = order.stream().mapToDouble(k -> mode.weights().get(k).abs()).max().orElse(0);
        List<Figure.Layer> bars = new ArrayList<>();
        for (ChannelGroup group : groups) {
            double[] heights = IntStream.range(0, order.size()).mapToDouble(i -> group.channels().contains(order.get(i)) && largest > 0
                    ? mode.weights().get(order.get(i)).abs() / largest : Double.NaN).toArray();
            bars.add(new Figure.Bars(group.name(), "group:" + group.name(), heights));
        }
        return new Figure("group-shape-" + mode.number(), Figure.Kind.SHAPES, "Mode " + title(spectrum, mode) + ", by group",
                "How far each channel moves in this mode, in prepared units relative to the one that moves most, group by group: "
                        + String.join(", ", groups.stream().map(ChannelGroup::name).toList()) + ".",
                Figure.Axis.categories("channel", order.stream().map(k -> spectrum.channels().get(k).name()).toList()),
                Figure.Axis.linear("relative magnitude"), bars);
    }
}
