package org.modestead.host.cli;

import java.io.PrintStream;
import java.nio.file.Files;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Optional;
import java.util.OptionalInt;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.host.run.RunResult;
import org.modestead.host.run.StepOutcome;
import org.modestead.host.run.WorkflowRunner;
import org.modestead.host.workflow.PlannedStep;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.table.CellType;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;
import org.modestead.nodes.words.Digits;
import org.modestead.nodes.words.TimeUnit;

/** The few lines that tell a person what came out: verdict, leading modes, doubts, where to read on. */
final class RunSummary {

    private static final int MODES_SHOWN = 8;
    private static final String INDENT = "  ";

    private static final String NO_OSCILLATION = "–";

    private final PrintStream out;

    RunSummary(PrintStream out) {
        this.out = out;
    }

    /** A column of the mode table that is shown, and the kind of its unit. */
    private enum Shown {
        MODE("mode"), FREQUENCY("frequency"), PERIOD("period"), LAMBDA_REAL("lambda_real"), DAMPING_RATIO("damping_ratio"),
        AMPLITUDE("amplitude"), ENERGY_SHARE("energy_share"), VERDICT("verdict");

        private final String column;

        Shown(String column) {
            this.column = column;
        }

        String head(TimeUnit unit) {
            return switch (this) {
                case MODE, VERDICT -> column;
                case FREQUENCY -> "frequency [" + unit.frequency() + "]";
                case PERIOD -> "period [" + unit.name() + "]";
                case LAMBDA_REAL -> "growth [" + unit.rate() + "]";
                case DAMPING_RATIO -> "damping";
                case AMPLITUDE -> "amplitude";
                case ENERGY_SHARE -> "energy share";
            };
        }

        String cell(RowCursor cursor, int column, CellType type) {
            if (type != CellType.DOUBLE) {
                return cursor.text(column);
            }
            double value = cursor.number(column);
            return this == DAMPING_RATIO || this == ENERGY_SHARE ? Digits.percent(value) : Digits.figure(value);
        }
    }

    void print(RunResult result) {
        TimeUnit unit = unit(result);
        boolean judged = false;
        for (PlannedStep step : result.plan().order()) {
            if (result.outcomes().get(step.id()) instanceof StepOutcome.Done done && verdict(step.id(), done.result())) {
                judged = true;
                table(done.result()).ifPresent(modes -> modes(step.id(), modes, unit));
            }
        }
        if (!judged) {
            lastModes(result, unit);
        }
        long doubts = result.outcomes().values().stream().filter(StepOutcome.Done.class::isInstance)
                .mapToLong(outcome -> ((StepOutcome.Done) outcome).result().doubts().size()).sum();
        if (doubts > 0) {
            out.println(doubts == 1 ? "1 doubt is told in the report." : doubts + " doubts are told in the report.");
        }
        if (Files.exists(result.folder().resolve(WorkflowRunner.REPORT))) {
            out.println("Report: " + result.folder().resolve(WorkflowRunner.REPORT));
        }
    }

    /** Tells the verdict of a step that judges; returns whether it is one. */
    private boolean verdict(String step, NodeResult result) {
        Optional<Verdict> verdict = result.outputs().values().stream().filter(Verdict.class::isInstance)
                .map(Verdict.class::cast).findFirst();
        verdict.ifPresent(found -> Paragraphs.hanging("Verdict (" + step + "): ", found.overall().sentence())
                .forEach(out::println));
        return verdict.isPresent();
    }

    /** Shows the last mode table of a run in which nothing was judged. */
    private void lastModes(RunResult result, TimeUnit unit) {
        List<PlannedStep> order = new ArrayList<>(result.plan().order());
        Collections.reverse(order);
        for (PlannedStep step : order) {
            Optional<Table> modes = result.outcomes().get(step.id()) instanceof StepOutcome.Done done ? table(done.result())
                    : Optional.empty();
            if (modes.isPresent()) {
                modes(step.id(), modes.get(), unit);
                return;
            }
        }
    }

    private static Optional<Table> table(NodeResult result) {
        return result.outputs().get("modes") instanceof Table modes ? Optional.of(modes) : Optional.empty();
    }

    private void modes(String step, Table modes, TimeUnit unit) {
        TableSchema schema = modes.schema();
        List<Shown> columns = new ArrayList<>();
        for (Shown shown : Shown.values()) {
            if (schema.indexOf(shown.column).isPresent()) {
                columns.add(shown);
            }
        }
        if (columns.isEmpty()) {
            return;
        }
        TextGrid grid = new TextGrid();
        grid.row(columns.stream().map(shown -> shown.head(unit)).toList());
        long rows = 0;
        try (RowCursor cursor = modes.open()) {
            while (cursor.next()) {
                if (++rows <= MODES_SHOWN) {
                    grid.row(columns.stream().map(shown -> cell(schema, cursor, shown)).toList());
                }
            }
        }
        out.println("Modes (" + step + ")" + (rows > MODES_SHOWN ? ", the first " + MODES_SHOWN + " of " + rows : "") + ":");
        grid.lines(INDENT).forEach(out::println);
    }

    private static String cell(TableSchema schema, RowCursor cursor, Shown shown) {
        OptionalInt index = schema.indexOf(shown.column);
        OptionalInt frequency = schema.indexOf(Shown.FREQUENCY.column);
        if (shown == Shown.DAMPING_RATIO && frequency.isPresent() && cursor.number(frequency.getAsInt()) == 0) {
            return NO_OSCILLATION;
        }
        return shown.cell(cursor, index.getAsInt(), schema.columns().get(index.getAsInt()).type());
    }

    private static TimeUnit unit(RunResult result) {
        Optional<Spectrum> spectrum = result.outcomes().values().stream().filter(StepOutcome.Done.class::isInstance)
                .flatMap(outcome -> ((StepOutcome.Done) outcome).result().outputs().values().stream())
                .filter(Spectrum.class::isInstance).map(Spectrum.class::cast).findFirst();
        return new TimeUnit(spectrum.map(Spectrum::timeUnit).orElse(""));
    }
}
