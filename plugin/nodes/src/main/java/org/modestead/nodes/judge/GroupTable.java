package org.modestead.nodes.judge;

import java.util.List;
import org.modestead.engine.spectrum.ChannelGroup;
import org.modestead.engine.spectrum.Mode;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;

/**
 * How each group of channels moves in each mode, in prepared units: its share of the mode's squared magnitudes, the root mean square of its
 * channels relative to the channel that moves most, the phase in radians of their mean, and how far they move in step (1: alike).
 */
final class GroupTable {

    static final TableSchema SCHEMA = TableSchema.of(Column.whole("mode"), Column.text("group"), Column.whole("channels"),
            Column.number("energy_share"), Column.number("magnitude"), Column.number("phase"), Column.number("in_step"));

    private GroupTable() {}

    /** @param most number of modes, 0 for all */
    static MemoryTable of(Spectrum spectrum, List<ChannelGroup> groups, int most) {
        MemoryTable.Builder rows = MemoryTable.builder(SCHEMA, "groups");
        for (Mode mode : spectrum.modes()) {
            if (!groups.isEmpty() && (most == 0 || mode.number() <= most)) {
                ChannelGroup.shares(spectrum, mode, groups).forEach(share -> rows.row((long) mode.number(), share.group().name(),
                        (long) share.group().channels().size(), share.energyShare(), share.magnitude(), share.phase(), share.inStep()));
            }
        }
        return rows.build();
    }
}
