package org.modestead.nodes.report;

import java.util.ArrayList;
import java.util.Comparator;
import java.util.List;
import org.modestead.engine.forecast.ScoreRow;
import org.modestead.nodes.document.ReportDocument.Block;
import org.modestead.nodes.document.ReportDocument.Callout;
import org.modestead.nodes.document.ReportDocument.Grid;
import org.modestead.nodes.document.ReportDocument.Head;
import org.modestead.nodes.document.ReportDocument.Paragraph;
import org.modestead.nodes.document.ReportDocument.Picture;
import org.modestead.nodes.document.ReportDocument.Section;
import org.modestead.nodes.document.ReportDocument.Tone;
import org.modestead.nodes.figure.ForecastFigures;
import org.modestead.nodes.figure.ScoreFigures;
import org.modestead.nodes.words.Digits;

/** What the fitted operator expects next, and how far that can be trusted. */
final class ForecastSection {
    private static final int MOST_ROWS = 80;

    private ForecastSection() {}

    static Section of(ReportSource source) {
        List<Block> blocks = new ArrayList<>();
        if (source.forecast().isEmpty()) {
            blocks.add(new Paragraph("No forecast was handed to this report."));
        } else {
            filled(source, blocks);
        }
        return new Section("forecast", "Forecast", blocks);
    }

    private static void filled(ReportSource source, List<Block> blocks) {
        if (!source.forecast().route().isEmpty()) {
            blocks.add(new Paragraph(route(source.forecast().route())));
        }
        ForecastSkill.sentence(source).ifPresent(skill -> blocks.add(new Paragraph(skill)));
        Extrapolation.sentence(source).ifPresent(sentence -> blocks.add(new Callout(Tone.CAUTION, "part of the forecast is extrapolation",
                List.of(sentence, "The table marks these values in its column beyond, the picture with triangles."))));
        source.snapshots().ifPresent(snapshots -> ForecastFigures.figures(snapshots, source.forecast().result(),
                source.channels())
                .forEach(figure -> blocks.add(new Picture(figure))));
        if (source.forecast().scores().isEmpty()) {
            blocks.add(new Paragraph("Nothing was held out, so the forecast could not be scored against data the fit"
                    + " never saw."));
        } else {
            blocks.add(new Picture(ScoreFigures.figure(source.forecast().result().scores(), source.unit())));
            blocks.add(scores(source));
        }
    }

    private static String route(String route) {
        return switch (route) {
            case "modal" -> "Forecast mode by mode: each mode grows, decays and turns at its own rate.";
            case "projection" -> "Forecast by projection: the fitted operator carries the state forward step by step; no"
                    + " mode has to"
                    + " exist for it.";
            default -> "Forecast by the " + route + " route.";
        };
    }

    private static Grid scores(ReportSource source) {
        List<ScoreRow> scores = source.forecast().scores();
        List<List<String>> rows = scores.stream().sorted(Comparator.comparingDouble(ScoreRow::horizon)).limit(MOST_ROWS)
                .map(row -> List.of(Digits.cell(row.horizon()), row.method().replace('-', ' '), Digits.figure(row.rmse()),
                Digits.figure(row.mae()),
                        Digits.figure(row.mase()), Double.isNaN(row.coverage()) ? "–" : Digits.percent(row.coverage()),
                        Digits.figure(row.intervalScore()))).toList();
        String rest = scores.size() > MOST_ROWS ? (scores.size() - MOST_ROWS) + " more rows are in the score table's CSV"
                + " file. " : "";
        return new Grid("Forecast scores on data the fit never saw", List.of(
                new Head("Horizon [" + source.unit().name() + "]", true), new Head("Method", false),
                new Head("Root mean square error", true), new Head("Mean absolute error", true),
                new Head("Scaled error (MASE)", true),
                new Head("Coverage of the band", true), new Head("Interval score", true)), rows,
                rest + "A scaled error below 1 beats the naive forecast on the training data. Smaller is better but for"
                + " coverage, which"
                        + " should be near the band's nominal share.");
    }
}
