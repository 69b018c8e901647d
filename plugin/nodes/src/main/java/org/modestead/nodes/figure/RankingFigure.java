package org.modestead.nodes.figure;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.DoubleStream;
import org.modestead.engine.choose.RankedKernel;
import org.modestead.engine.kernel.KernelFamilies;
import org.modestead.engine.kernel.KernelFamily;
import org.modestead.engine.wellposed.Grade;

/**
 * Kernels compared: held-out error over the length scale, a line a family, the verdict told by the shape of the mark and by word.
 *
 * @param rows best first, those that could be fitted
 * @param steps sampling steps ahead
 */
public record RankingFigure(List<RankedKernel> rows, int steps) {
    private static final double WIDE = 30;
    private static final double MARGIN = 2;
    private static final String NOT_JUDGED = "not judged";

    /** Takes an immutable copy. */
    public RankingFigure {
        rows = List.copyOf(rows);
    }

    /**
     * Draws the kernels that could be fitted; a family without a length scale is a level line. Nothing when fewer than two could be.
     *
     * @param ranked best first
     * @param steps sampling steps over which predictions reached
     * @return kind {@link Figure.Kind#MARKS}, or {@link Figure.Kind#BARS} when no kernel has a length scale; selection keys
     *     {@code kernel:<label>}
     */
    public static Optional<Figure> of(List<RankedKernel> ranked, int steps) {
        RankingFigure figure = new RankingFigure(ranked.stream().filter(RankedKernel::fitted).toList(), steps);
        if (figure.rows.size() < 2) {
            return Optional.empty();
        }
        return Optional.of(figure.scales().length == 0 ? figure.bars() : figure.marks());
    }

    private double[] scales() {
        return rows.stream().filter(row -> row.kernel().scale().isPresent()).mapToDouble(row -> row.kernel().scale().getAsDouble()).sorted()
                .toArray();
    }

    private Figure marks() {
        double[] scales = scales();
        double low = scales[0] / MARGIN;
        double high = scales[scales.length - 1] * MARGIN;
        List<Figure.Layer> layers = new ArrayList<>();
        series().forEach((name, own) -> layers.add(line(name, own, low, high)));
        layers.add(new Figure.Rule("persistence", "", false, rows.get(0).persistenceError()));
        for (int i = 0; i < rows.size(); i++) {
            layers.add(point(i, Math.sqrt(low * high)));
        }
        return new Figure("kernel-ranking", Figure.Kind.MARKS, "Held-out error by kernel and scale", "Error of predictions " + ahead()
                + " on training data that the fit did not see, relative to the spread of the signal, over the length on which the kernel varies."
                + " A family without a length is a level line. Shape and filling of a mark tell whether modes in that space exist, as far as"
                + " it was judged; the verdict decides before the error.",
                Figure.Axis.log("length scale [prepared units]"), errors(), layers);
    }

    private String ahead() {
        return steps == 1 ? "one step ahead" : steps + " steps ahead";
    }

    private Figure.Axis errors() {
        double[] sorted = rows.stream().flatMapToDouble(row -> DoubleStream.of(row.heldOutError(), row.persistenceError()))
                .filter(Double::isFinite).sorted().toArray();
        String label = "error " + ahead() + " / spread";
        return sorted[0] > 0 && sorted[sorted.length - 1] > WIDE * sorted[0] ? Figure.Axis.log(label) : Figure.Axis.linear(label);
    }

    private Map<String, List<RankedKernel>> series() {
        Map<String, List<RankedKernel>> series = new LinkedHashMap<>();
        rows.forEach(row -> series.computeIfAbsent(name(row), unused -> new ArrayList<>()).add(row));
        return series;
    }

    private static String name(RankedKernel row) {
        return row.kernel().scale().isPresent() ? title(row) : title(row) + (row.kernel().parameters().containsKey("degree")
                ? " of degree " + row.kernel().parameters().get("degree").intValue() : "");
    }

    private static String title(RankedKernel row) {
        return KernelFamilies.byId(row.kernel().family()).map(KernelFamily::title).orElse(row.kernel().family());
    }

    private static Figure.Line line(String name, List<RankedKernel> own, double low, double high) {
        List<RankedKernel> rising = own.stream().sorted(Comparator.comparingDouble(row -> row.kernel().scale().orElse(0))).toList();
        double[] errors = rising.stream().mapToDouble(RankedKernel::heldOutError).toArray();
        double[] scales = rising.stream().mapToDouble(row -> row.kernel().scale().orElse(0)).toArray();
        return own.get(0).kernel().scale().isPresent() ? new Figure.Line(name, "", scales, errors, Figure.Emphasis.NORMAL)
                : new Figure.Line(name, "", new double[] {low, high}, new double[] {errors[0], errors[0]}, Figure.Emphasis.NORMAL);
    }

    /** The first kernel is labelled as the chosen one, the best of every other series with its name. */
    private Figure.Points point(int i, double middle) {
        RankedKernel row = rows.get(i);
        boolean first = rows.subList(0, i).stream().noneMatch(earlier -> name(earlier).equals(name(row)));
        Optional<Grade> grade = row.verdict().map(given -> given.grade());
        String label = i == 0 ? "chosen: " + name(row) + grade.map(given -> ", " + given.word()).orElse("") : first ? name(row) : "";
        return new Figure.Points(grade.map(Grade::word).orElse(NOT_JUDGED), "kernel:" + row.kernel().label(),
                new double[] {row.kernel().scale().orElse(middle)}, new double[] {row.heldOutError()}, List.of(label),
                grade.isEmpty() ? Figure.Emphasis.FAINT : i == 0 ? Figure.Emphasis.STRONG : Figure.Emphasis.NORMAL,
                grade.map(VerdictMarks::mark).orElse(Figure.Mark.DISC));
    }

    private Figure bars() {
        double[] own = rows.stream().mapToDouble(RankedKernel::heldOutError).toArray();
        double[] naive = new double[own.length];
        Arrays.fill(naive, rows.get(0).persistenceError());
        List<String> names = rows.stream().map(row -> row.kernel().label() + row.verdict().map(given -> ", " + given.grade().word()).orElse(""))
                .toList();
        return new Figure("kernel-ranking", Figure.Kind.BARS, "Held-out error by kernel", "Error of predictions " + ahead()
                + " on training data that the fit did not see, best kernel first, against that of persistence. The verdict decides before the"
                + " error.", Figure.Axis.categories("kernel", names), Figure.Axis.linear("error " + ahead() + " / spread"),
                List.of(new Figure.Bars("fitted", "", own), new Figure.Bars("persistence", "", naive)));
    }
}
