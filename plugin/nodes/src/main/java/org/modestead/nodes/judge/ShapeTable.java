package org.modestead.nodes.judge;

import java.util.Iterator;
import java.util.List;
import java.util.Optional;
import java.util.OptionalLong;
import java.util.stream.Stream;
import org.modestead.engine.recording.Preparation;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.ModeShapes;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;
import org.modestead.nodes.table.TableSchema;

/**
 * The shape table: how far, and how far out of step, each channel moves in each mode. Magnitude in recorded units,
 * phase in radians against the largest entry of the mode. Its rows, of which there are as many as modes times channels, are worked out by
 * whoever reads them.
 *
 * @param spectrum with the modes
 * @param preparation of the snapshots
 * @param modes those whose shapes are told
 * @param delays number of samples of a state that are told, newest first
 */
record ShapeTable(Spectrum spectrum, Preparation preparation, List<Mode> modes, int delays) implements Table {

    static final TableSchema SCHEMA = TableSchema.of(Column.whole("mode"), Column.text("channel"), Column.whole("delay"),
            Column.number("magnitude"), Column.number("phase"));

    /**
     * @param most number of modes, 0 for all
     * @param allDelays whether earlier samples of the state are told as well
     */
    static ShapeTable of(Spectrum spectrum, Preparation preparation, int most, boolean allDelays) {
        List<Mode> modes = most == 0 ? spectrum.modes() : spectrum.modes().stream().filter(mode -> mode.number() <= most).toList();
        return new ShapeTable(spectrum, preparation, modes, allDelays ? spectrum.delay().depth() : 1);
    }

    @Override
    public TableSchema schema() {
        return SCHEMA;
    }

    @Override
    public String origin() {
        return "shapes";
    }

    @Override
    public OptionalLong rowCount() {
        return OptionalLong.of((long) modes.size() * delays * spectrum.channels().size());
    }

    @Override
    public RowCursor open() {
        return new Cursor(modes.stream().flatMap(this::rows).iterator());
    }

    private record Row(Mode mode, ModeShapes.Entry entry) {

        Object cell(int column) {
            return switch (column) {
                case 0 -> (long) mode.number();
                case 1 -> entry.channel().name();
                case 2 -> (long) entry.delay();
                case 3 -> entry.magnitude();
                default -> entry.phase();
            };
        }
    }

    private Stream<Row> rows(Mode mode) {
        return ModeShapes.of(spectrum, mode, preparation).stream().filter(entry -> entry.delay() < delays).map(entry -> new Row(mode, entry));
    }

    private static final class Cursor implements RowCursor {
        private final Iterator<Row> rows;
        private Optional<Row> current = Optional.empty();
        private long number;

        Cursor(Iterator<Row> rows) {
            this.rows = rows;
        }

        @Override
        public boolean next() {
            current = rows.hasNext() ? Optional.of(rows.next()) : Optional.empty();
            number++;
            return current.isPresent();
        }

        @Override
        public long row() {
            return number;
        }

        @Override
        public double number(int column) {
            return cell(column).map(cell -> ((Number) cell).doubleValue()).orElse(Double.NaN);
        }

        @Override
        public Optional<Object> cell(int column) {
            return Optional.of(current.orElseThrow().cell(column)).filter(cell -> !(cell instanceof Double figure && figure.isNaN()));
        }

        @Override
        public void close() {
            // holds nothing open
        }
    }
}
