package org.modestead.host.bench.look;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Progress;
import org.modestead.host.output.CsvWriter;
import org.modestead.nodes.figure.Figure;

/** Every mark of a picture is a row of its table. */
class FigureTableTest {

    private static String csv(Figure figure) throws IOException {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        CsvWriter.write(FigureTable.of(figure), out, Progress.NONE);
        return out.toString(StandardCharsets.UTF_8);
    }

    @Test
    void linesBandsPointsAndRulesOverATimeAxis() throws IOException {
        Figure figure = new Figure("f", Figure.Kind.TIME_SERIES, "Title", "Caption.", new Figure.Axis("day", false, List.of(), "date"),
                Figure.Axis.linear("level [m]"), Optional.of(Figure.Axis.linear("noise")), List.of(
                        new Figure.Line("seen", "", new double[] {0, 1}, new double[] {2, Double.NaN}, Figure.Emphasis.NORMAL),
                        new Figure.Band("band", "mode:2", new double[] {1}, new double[] {-1}, new double[] {3}),
                        new Figure.Points("marks", "mode:3", new double[] {31}, new double[] {5}, List.of("here"), Figure.Emphasis.STRONG),
                        new Figure.Rule("now", "", true, 2), new Figure.Rule("zero", "", false, 0)));
        assertEquals("""
                drawn as,selects,day,level [m],low,high,label
                seen,,1970-01-01,2.0,,,
                seen,,1970-01-02,,,,
                band,mode:2,1970-01-02,,-1.0,3.0,
                marks,mode:3,1970-02-01,5.0,,,here
                now,,1970-01-03,,,,
                zero,,,0.0,,,
                """, csv(figure));
    }

    @Test
    void barsStandByTheNamesOfTheirCategories() throws IOException {
        Figure figure = new Figure("f", Figure.Kind.BARS, "Title", "Caption.", Figure.Axis.categories("", List.of("flow, in", "level")),
                Figure.Axis.linear("share"), List.of(new Figure.Bars("mode 1", "mode:1", new double[] {0.25, 0.75})));
        assertEquals("""
                drawn as,selects,category,share,low,high,label
                mode 1,mode:1,"flow, in",0.25,,,
                mode 1,mode:1,level,0.75,,,
                """, csv(figure));
    }
}
