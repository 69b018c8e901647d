package org.modestead.nodes.fit;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalLong;
import java.util.TreeMap;
import java.util.stream.Collectors;
import org.modestead.engine.choose.RankingPlan;
import org.modestead.engine.kernel.KernelFamilies;
import org.modestead.engine.kernel.KernelFamily;
import org.modestead.engine.kernel.KernelFamily.Parameter;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.Setting.Common;
import org.modestead.nodes.contract.Setting.Option;
import org.modestead.nodes.contract.Settings;

/**
 * Settings of the Kernel Chooser. Families and their parameters come from the engine, so a family that an extension
 * adds appears here without a change.
 */
final class KernelSettings {

    static final String CHOOSE = "choose";
    static final String FAMILY = "family";
    static final String SCALE = "scale";
    static final String SCALE_MODE = "scale-mode";
    static final String CANDIDATES = "candidates";
    static final String RANK = "rank";
    static final String STEPS = "steps-ahead";

    private static final String JUDGE = "judge";
    private static final String JUDGED = "judged-per-family";

    private static final String FACTOR = "scale-factor";
    private static final String MULTIPLES = "scale-multiples";
    private static final String DEGREES = "degrees";
    private static final String DEGREE = "degree";
    private static final String RATE = "rate";
    private static final double LARGEST = 1e300;
    private static final double TINY = 1e-100;

    private KernelSettings() {}

    /** Returns the settings in dialog order. */
    static List<Setting> declared() {
        List<Setting> all = new ArrayList<>();
        all.add(new Setting.Choice(new Common(CHOOSE, "Choose", "Kernel", "Whether the kernel is given here or the best"
                + " of several, by verdict and on held-out data, is taken."), List.of(
                new Option(FAMILY, "By family", "One family with the parameters given here."),
                new Option(RANK, "By ranking", "Several kernels are fitted and compared on training data kept"
                        + " away from those fits: first by whether modes exist in their space, then by the error of"
                        + " predictions.")), FAMILY));
        all.add(new Setting.Choice(new Common(FAMILY, "Family", "Kernel", "The functions through which the signal is"
                + " looked at. What modes can exist depends on it.").when(CHOOSE, FAMILY),
                KernelFamilies.all().stream().map(KernelSettings::option).toList(), "exponential"));
        parameters().values().stream().filter(parameter -> !parameter.name().equals(SCALE))
                .forEach(parameter -> all.add(parameterSetting(parameter)));
        all.addAll(scaleSettings());
        all.addAll(rankingSettings());
        return all;
    }

    private static Option option(KernelFamily family) {
        return new Option(family.id(), family.title(), family.formula() + ".");
    }

    private static Map<String, Parameter> parameters() {
        Map<String, Parameter> byName = new LinkedHashMap<>();
        KernelFamilies.all().forEach(family -> family.parameters().forEach(p -> byName.putIfAbsent(p.name(), p)));
        return byName;
    }

    private static Setting parameterSetting(Parameter parameter) {
        boolean positive = parameter.min() > 0 && parameter.min() < TINY;
        return new Setting.Number(new Common(parameter.name(), parameter.label(), "Kernel", parameter.help())
                .when(FAMILY, familiesWith(parameter.name())), "", positive ? 0 : parameter.min(), positive, LARGEST,
                OptionalDouble.of(parameter.initial()));
    }

    private static String[] familiesWith(String parameter) {
        return KernelFamilies.all().stream()
                .filter(family -> family.parameters().stream().anyMatch(p -> p.name().equals(parameter)))
                .map(KernelFamily::id).toArray(String[]::new);
    }

    private static List<Setting> scaleSettings() {
        return List.of(
                new Setting.Choice(new Common(SCALE_MODE, "Length scale", "Kernel", "Where the length over which the"
                        + " kernel falls comes from.").when(FAMILY, familiesWith(SCALE)), List.of(
                        new Option("median", "From the data", "The median distance between training states, times a"
                                + " factor."),
                        new Option("explicit", "Given", "The number given here.")), "median"),
                new Setting.Number(new Common(FACTOR, "Factor", "Kernel", "Multiple of the median distance. Larger"
                        + " smooths more and makes the functions more alike.").when(SCALE_MODE, "median"), "", 0, true,
                        LARGEST, OptionalDouble.of(1)),
                new Setting.Number(new Common(SCALE, "Scale", "Kernel", "Length over which the kernel falls, in the"
                        + " unit of the prepared states.").when(SCALE_MODE, "explicit"), "", 0, true, LARGEST,
                        OptionalDouble.of(1)));
    }

    private static List<Setting> rankingSettings() {
        String group = "Ranking";
        return List.of(
                new Setting.Texts(new Common(CANDIDATES, "Candidate families", group, "Ids of the families to compare,"
                        + " one a line: "
                        + KernelFamilies.all().stream().map(KernelFamily::id).collect(Collectors.joining(", ")) + ".")
                        .when(CHOOSE, RANK), KernelFamilies.all().stream().map(KernelFamily::id).toList()),
                new Setting.Numbers(new Common(MULTIPLES, "Multiples of the scale", group, "Each family with a length"
                        + " scale is tried at these multiples of the median distance; a family with a rate at the rate"
                        + " 1/scale².")
                        .when(CHOOSE, RANK), "", 1e-6, 1e6, List.of(0.5, 1.0, 2.0, 4.0)),
                new Setting.Numbers(new Common(DEGREES, "Degrees", group, "Families with a degree are tried at these.")
                        .when(CHOOSE, RANK), "", 1, 20, List.of(2.0, 3.0)),
                new Setting.Whole(new Common(RANK, "Largest rank", group, "Largest number of functions tried for each"
                        + " candidate; the smallest one that predicts as well as the best within noise counts.")
                        .when(CHOOSE, RANK), "functions", 1, 10_000,
                        OptionalLong.of(20)),
                new Setting.Whole(new Common(STEPS, "Steps ahead", group, "Sampling steps over which the compared"
                        + " predictions reach. More steps tell kernels apart that all predict one step well.")
                        .when(CHOOSE, RANK), "steps", 1, 10_000, OptionalLong.of(1)),
                new Setting.Flag(new Common(JUDGE, "Judge candidates", group, "Whether the best kernels of each family"
                        + " are also judged, so that a space in which modes exist comes before one that only predicts"
                        + " well. Switch it off to save time.").when(CHOOSE, RANK), true),
                new Setting.Whole(new Common(JUDGED, "Judged of each family", group, "How many kernels of each family,"
                        + " those that predict best, are judged; the others follow them in the ranking.")
                        .when(JUDGE, "true"), "kernels", 1, 1000, OptionalLong.of(2)));
    }

    /** Returns how candidates are compared. */
    static RankingPlan plan(Settings settings) {
        return new RankingPlan(settings.whole(RANK), settings.whole(STEPS), settings.flag(JUDGE) ? settings.whole(JUDGED) : 0);
    }

    /** Returns whether the kernel's length scale is to be taken from the data. */
    static boolean needsMedian(Settings settings) {
        return settings.text(CHOOSE).equals(RANK)
                || hasScale(settings.text(FAMILY)) && settings.text(SCALE_MODE).equals("median");
    }

    /**
     * Returns the kernel asked for by family.
     *
     * @param median distance between states; read only where {@link #needsMedian}
     */
    static KernelSpec fixed(Settings settings, double median) {
        KernelFamily family = KernelFamilies.byId(settings.text(FAMILY)).orElseThrow();
        Map<String, Double> values = new TreeMap<>();
        for (Parameter parameter : family.parameters()) {
            boolean fromData = parameter.name().equals(SCALE) && settings.text(SCALE_MODE).equals("median");
            values.put(parameter.name(), fromData ? settings.number(FACTOR) * median : settings.number(parameter.name()));
        }
        return new KernelSpec(family.id(), values);
    }

    /** Returns the kernel in words as far as the settings tell it, empty when it is chosen from the data. */
    static Optional<String> foreseen(Settings settings) {
        if (settings.text(CHOOSE).equals(RANK)) {
            return Optional.empty();
        }
        return Optional.of(needsMedian(settings) ? KernelFamilies.byId(settings.text(FAMILY)).orElseThrow().title() + ", its length scale from the data" : fixed(settings, Double.NaN).label());
    }

    /** Returns the kernels to be compared, in the order of the settings. */
    static List<KernelSpec> candidates(Settings settings, double median) {
        List<KernelSpec> specs = new ArrayList<>();
        List<Double> multiples = settings.numbers(MULTIPLES).stream().sorted(Comparator.naturalOrder()).toList();
        for (String id : settings.texts(CANDIDATES)) {
            KernelFamily family = KernelFamilies.byId(id).orElseThrow();
            if (has(family, SCALE)) {
                multiples.forEach(multiple -> specs.add(with(family, SCALE, multiple * median)));
            } else if (has(family, RATE)) {
                multiples.forEach(multiple -> specs.add(with(family, RATE, 1 / (multiple * multiple * median * median))));
            } else if (has(family, DEGREE)) {
                settings.numbers(DEGREES).forEach(degree -> specs.add(with(family, DEGREE, degree)));
            } else {
                specs.add(new KernelSpec(family.id(), initial(family)));
            }
        }
        return specs;
    }

    private static KernelSpec with(KernelFamily family, String parameter, double value) {
        Map<String, Double> values = initial(family);
        values.put(parameter, value);
        return new KernelSpec(family.id(), values);
    }

    private static Map<String, Double> initial(KernelFamily family) {
        Map<String, Double> values = new TreeMap<>();
        family.parameters().forEach(parameter -> values.put(parameter.name(), parameter.initial()));
        return values;
    }

    private static boolean hasScale(String family) {
        return KernelFamilies.byId(family).map(KernelFamily::hasScale).orElse(false);
    }

    private static boolean has(KernelFamily family, String parameter) {
        return family.parameters().stream().anyMatch(p -> p.name().equals(parameter));
    }
}
