package org.modestead.nodes.model;

import java.util.List;
import org.modestead.engine.Progress;
import org.modestead.engine.modelfile.Model;
import org.modestead.engine.recording.Run;
import org.modestead.engine.recording.Snapshots;
import org.modestead.engine.recording.TimeAxis;
import org.modestead.engine.spectrum.ModalCoordinates;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;
import org.modestead.nodes.table.TimeCells;

/** The table of modal coordinates: a row a run, time and mode. */
final class CoordinateTable {

    private CoordinateTable() {}

    static TableSchema columns(TimeAxis axis) {
        return TableSchema.of(Column.text("run"), TimeCells.column("time", axis), Column.whole("mode"), Column.number("real"), Column.number("imag"));
    }

    /**
     * @param snapshots prepared as those of the model
     * @param runs of them that are to be told; none for an empty table
     */
    static MemoryTable of(Model model, Snapshots snapshots, List<Run> runs, Progress progress) {
        MemoryTable.Builder rows = MemoryTable.builder(columns(snapshots.time()), "coordinates");
        for (int i = 0; i < runs.size(); i++) {
            Run run = runs.get(i);
            progress.report((double) i / runs.size(), "coordinates of run " + run.id());
            if (run.samples() > snapshots.delay().reach()) {
                ModalCoordinates.of(snapshots, run, model.operator(), model.spectrum(), progress, (time, mode, value) ->
                        rows.row(run.id(), TimeCells.cell(snapshots.time(), time), (long) mode.number(), value.re(), value.im()));
            }
        }
        return rows.build();
    }
}
