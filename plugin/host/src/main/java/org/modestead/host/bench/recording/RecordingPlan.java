package org.modestead.host.bench.recording;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import org.modestead.host.workflow.Link;
import org.modestead.host.workflow.Step;
import org.modestead.host.workflow.Workflow;

/**
 * The steps for a recording, ready to run: read it, where it has one row a reading bring it to one row a time, prepare it, fit, extract modes, judge them, forecast, and a report of all.
 *
 * <p>States stack as many samples as the strongest oscillation takes, so that few channels show it too; the rank is where the singular
 * values drop clearly, so that no noise is fitted and slow modes are not split, or else the one that predicts best; a quarter of the runs, or the end of each where there are few, is held out to judge by.
 */
public final class RecordingPlan {

    private static final int ENOUGH_RUNS = 4;
    private static final int MANY_RUNS = 6;
    private static final int LARGEST_STATE = 160;
    private static final int LEAST_DEPTH = 8;
    private static final int PART_OF_RUN = 5;
    private static final int LONG_PERIOD = 60;
    private static final int ENOUGH_ROWS = 200;

    private final RecordingGuess guess;

    private RecordingPlan(RecordingGuess guess) {
        this.guess = guess;
    }

    /**
     * Lays out the steps.
     *
     * @param guess without problems
     * @param name of the workflow
     * @param data the file as the workflow names it
     * @param file of the workflow
     */
    public static Workflow workflow(RecordingGuess guess, String name, String data, Path file) {
        RecordingPlan plan = new RecordingPlan(guess);
        List<Step> steps = new ArrayList<>(List.of(new Step("source", "table-source", plan.source(data))));
        guess.longForm().ifPresent(form -> steps.add(new Step("wide", "table-query", Map.of("sql", form.sql()))));
        steps.addAll(List.of(new Step("snapshots", "snapshot-builder", plan.snapshots()),
                new Step("fit", "operator-fitter", plan.fit()), new Step("spectrum", "spectrum-extractor", Map.of()),
                new Step("check", "wellposedness-checker", Map.of()), new Step("forecast", "forecast", Map.of("origin", "before-holdout")),
                new Step("report", "mode-report", Map.of("title", name))));
        return new Workflow(name, file, steps, plan.links());
    }

    private List<Link> links() {
        List<Link> links = new ArrayList<>();
        if (guess.longForm().isPresent()) {
            link(links, "source.table", "wide.input");
        }
        link(links, guess.longForm().isPresent() ? "wide.table" : "source.table", "snapshots.table");
        link(links, "snapshots.snapshots", "fit.snapshots", "check.snapshots", "forecast.snapshots", "report.snapshots");
        link(links, "fit.operator", "spectrum.operator", "check.operator", "forecast.operator", "report.operator");
        link(links, "spectrum.spectrum", "check.spectrum", "forecast.spectrum", "report.spectrum");
        link(links, "check.verdict", "forecast.verdict", "report.verdict");
        link(links, "forecast.forecast", "report.forecast");
        link(links, "forecast.reconstruction", "report.reconstruction");
        link(links, "forecast.scores", "report.scores");
        return links;
    }

    private static void link(List<Link> links, String from, String... targets) {
        for (String to : targets) {
            links.add(new Link(Link.End.read(from).orElseThrow(), Link.End.read(to).orElseThrow()));
        }
    }

    private Map<String, Object> source(String data) {
        Map<String, Object> settings = new LinkedHashMap<>();
        settings.put("path", data);
        Map<String, Object> usual = Map.of("format", "csv", "decimal", "point", "header", true, "encoding", "utf-8", "skip-lines", 0, "time-format", "",
                "delimiter", "auto");
        guess.reading().forEach((key, value) -> {
            boolean told = value instanceof Number number && usual.get(key) instanceof Number standard ? number.intValue() != standard.intValue()
                    : !value.equals(usual.get(key)) && !("delimiter".equals(key) && "comma".equals(value));
            if (told) {
                settings.put(key, value);
            }
        });
        return settings;
    }

    private Map<String, Object> snapshots() {
        RecordingWish.Roles roles = guess.roles();
        Map<String, Object> settings = new LinkedHashMap<>();
        if (!roles.time().isEmpty()) {
            settings.put("time-column", roles.time());
        }
        if (!roles.timeUnit().isEmpty()) {
            settings.put("time-unit", roles.timeUnit());
        }
        if (!roles.run().isEmpty()) {
            settings.put("run-column", roles.run());
        }
        settings.put("channels", roles.channels());
        if (!roles.inputs().isEmpty()) {
            settings.put("inputs", roles.inputs());
        }
        List<String> units = guess.columns().stream().filter(facts -> !facts.isBracketed() && !facts.unit().isEmpty())
                .filter(facts -> roles.channels().contains(facts.column().name())).map(facts -> facts.column().name() + "=" + facts.unit()).toList();
        if (!units.isEmpty()) {
            settings.put("units", units);
        }
        if (!roles.time().isEmpty()) {
            settings.put("resampling", "uniform");
        }
        settings.put("detrend", "mean");
        settings.put("scaling", "std");
        settings.put("delay-depth", depth());
        parts(settings);
        return settings;
    }

    /** Samples stacked into a state: about the strongest period, no more than the shortest run or the size of a state allows. */
    private int depth() {
        double period = Rhythm.samples(guess.runs());
        int wanted = (int) Math.round(period < LONG_PERIOD ? 1.5 * period : period);
        int most = Math.min(LARGEST_STATE / guess.roles().channels().size(), Math.max(2, longest() / PART_OF_RUN));
        return Math.max(1, Math.min(Math.max(LEAST_DEPTH, wanted), most));
    }

    private int longest() {
        return guess.runs().runs().size() >= ENOUGH_RUNS ? Math.max(guess.runs().shortest(), guess.runs().longest() / 4) : guess.runs().longest();
    }

    private void parts(Map<String, Object> settings) {
        int runs = guess.runs().runs().size();
        if (runs >= ENOUGH_RUNS) {
            settings.put("holdout", "run-share");
            settings.put("holdout-run-share", 0.25);
        } else {
            settings.put("holdout", "tail-share");
            settings.put("holdout-tail-share", 0.2);
        }
        if (runs >= MANY_RUNS) {
            settings.put("calibration", "run-share");
            settings.put("calibration-run-share", 0.15);
        } else if (guess.runs().longest() >= ENOUGH_ROWS && runs < ENOUGH_RUNS) {
            settings.put("calibration", "tail-share");
            settings.put("calibration-tail-share", 0.15);
        }
    }

    /** Functions are the state's components and, where no input brings it along, the constant: the level at which motion rests is a mode. */
    private Map<String, Object> fit() {
        Map<String, Object> settings = new LinkedHashMap<>();
        if (guess.roles().inputs().isEmpty()) {
            settings.put("estimator", "dictionary");
            settings.put("dictionary", "monomials");
            settings.put("degree", 1);
        } else {
            settings.put("estimator", "linear");
        }
        settings.put("rank-rule", "drop");
        return settings;
    }
}
