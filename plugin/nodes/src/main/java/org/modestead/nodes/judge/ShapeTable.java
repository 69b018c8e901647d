package org.modestead.nodes.judge;

import org.modestead.engine.recording.Preparation;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.ModeShapes;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;

/**
 * The shape table: how far, and how far out of step, each channel moves in each mode. Magnitude in recorded units,
 * phase in radians against the largest entry of the mode.
 */
final class ShapeTable {

    static final TableSchema SCHEMA = TableSchema.of(Column.whole("mode"), Column.text("channel"), Column.whole("delay"),
            Column.number("magnitude"), Column.number("phase"));

    private ShapeTable() {}

    /**
     * @param most number of modes, 0 for all
     * @param allDelays whether earlier samples of the state are told as well
     */
    static MemoryTable of(Spectrum spectrum, Preparation preparation, int most, boolean allDelays) {
        MemoryTable.Builder rows = MemoryTable.builder(SCHEMA, "shapes");
        for (Mode mode : spectrum.modes()) {
            if (most > 0 && mode.number() > most) {
                break;
            }
            for (ModeShapes.Entry entry : ModeShapes.of(spectrum, mode, preparation)) {
                if (allDelays || entry.delay() == 0) {
                    rows.row((long) mode.number(), entry.channel().name(), (long) entry.delay(), entry.magnitude(),
                            entry.phase());
                }
            }
        }
        return rows.build();
    }
}
