package org.modestead.nodes.modelfile;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Collectors;
import org.junit.jupiter.api.Test;
import org.modestead.engine.Doubt;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.data.SignalGenerator;
import org.modestead.nodes.document.ReportDocument;
import org.modestead.nodes.figure.Figure;
import org.modestead.nodes.render.FigureRenderer;
import org.modestead.nodes.table.Column;
import org.modestead.nodes.table.MemoryTable;
import org.modestead.nodes.table.TableSchema;
import org.modestead.nodes.testing.Steps;

/** What a node showed is shown again after it was read back. */
class ResultFileTest {

    private static final Figure.Axis TIME = new Figure.Axis("date", false, List.of(), "date");
    private static final Figure ALL_LAYERS = new Figure("all", Figure.Kind.TIME_SERIES, "Prüfstand \"A\"", "Every kind of layer.",
            TIME, Figure.Axis.log("p [bar]"), Optional.of(Figure.Axis.linear("q")), List.of(
                    new Figure.Line("a", "mode:1", new double[] {0, 1, Double.NaN}, new double[] {1, 2, 3}, Figure.Emphasis.STRONG),
                    new Figure.Backdrop("b", "", new double[] {0}, new double[] {-0.0}),
                    new Figure.Band("c", "", new double[] {0, 1}, new double[] {1, 1}, new double[] {2, Double.POSITIVE_INFINITY}),
                    new Figure.Points("d", "", new double[] {0}, new double[] {1}, List.of("one"), Figure.Emphasis.FAINT, Figure.Mark.RING),
                    new Figure.Bars("e", "", new double[] {1, 2}), new Figure.Rule("f", "", true, 0.1)));
    private static final ReportDocument ALL_BLOCKS = new ReportDocument("Report", "", List.of(new ReportDocument.Section("s", "Section",
            List.of(new ReportDocument.Heading("h"), new ReportDocument.Paragraph("p <&> \u2028 \ud83d\ude00"),
                    new ReportDocument.Points(List.of("1", "2")), new ReportDocument.Callout(ReportDocument.Tone.STOP, "t", List.of("s")),
                    new ReportDocument.KeyValues("k", List.of(new ReportDocument.Entry("n", "v"))),
                    new ReportDocument.Grid("g", List.of(new ReportDocument.Head("x [m]", true)), List.of(List.of("1"), List.of("2")), ""),
                    new ReportDocument.Picture(ALL_LAYERS)))));

    private static byte[] written(ResultFile result) throws IOException {
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        ResultFile.write(result, out);
        return out.toByteArray();
    }

    private static ResultFile again(ResultFile result) throws IOException {
        byte[] bytes = written(result);
        ResultFile out = ResultFile.read(new ByteArrayInputStream(bytes));
        assertArrayEquals(bytes, written(out));
        assertEquals(result.summary(), out.summary());
        assertEquals(result.doubts(), out.doubts());
        return out;
    }

    @Test
    void everyKindOfLayerAndOfBlockComesBack() throws IOException {
        ResultFile out = again(new ResultFile(List.of(ALL_LAYERS), List.of("A sentence."), List.of(new Doubt("code", "Sentence.")),
                Optional.of(ALL_BLOCKS)));
        assertEquals(texts(ALL_BLOCKS), texts(out.document().orElseThrow()));
        assertEquals(ALL_LAYERS.title(), out.figures().get(0).title());
        Figure.Line line = (Figure.Line) out.figures().get(0).layers().get(0);
        assertArrayEquals(new double[] {0, 1, Double.NaN}, line.x());
        assertEquals(ALL_LAYERS.right(), out.figures().get(0).right());
        assertEquals(ALL_LAYERS.layers().get(5), out.figures().get(0).layers().get(5));
    }

    /** Records of texts print all they hold; those that hold arrays do not, and are told by the bytes above. */
    private static String texts(ReportDocument document) {
        return document.sections().get(0).blocks().stream().filter(block -> !(block instanceof ReportDocument.Picture)).map(Object::toString)
                .collect(Collectors.joining("\n"));
    }

    @Test
    void theFiguresOfANodeAreDrawnAlike() throws IOException {
        Object snapshots = StoredFits.LINEAR.snapshots();
        ResultFile shown = ResultFile.of(Steps.run("spectrum-extractor", Map.of("operator",
                StoredFits.LINEAR.operator(snapshots).outputs().get("operator")), Map.of()));
        ResultFile out = again(shown);
        assertTrue(!shown.figures().isEmpty());
        for (int i = 0; i < shown.figures().size(); i++) {
            assertEquals(FigureRenderer.svg(shown.figures().get(i)), FigureRenderer.svg(out.figures().get(i)));
        }
    }

    @Test
    void aResultWithNothingToShowIsAFile() throws IOException {
        assertEquals(new ResultFile(List.of(), List.of(), List.of(), Optional.empty()),
                again(new ResultFile(List.of(), List.of(), List.of(), Optional.empty())));
    }

    /** Only as far as is shown: a table may be far larger than memory. */
    @Test
    void theFirstRowsOfTablesComeBack() throws IOException {
        MemoryTable.Builder rows = MemoryTable.builder(TableSchema.of(Column.text("mode"), Column.number("rate"), Column.whole("n")), "here");
        for (int i = 0; i < 25; i++) {
            rows.row("m" + i, i == 0 ? null : 1.0 / 3, (long) i);
        }
        NodeDeclaration truth = new SignalGenerator().declaration();
        ResultFile out = again(ResultFile.of(truth, new NodeResult(Map.of("truth", rows.build()), List.of(), List.of(), List.of())));
        assertEquals(1, out.tables().size());
        assertEquals("Truth", out.tables().get(0).caption());
        assertEquals(List.of("m0", "", "0"), out.tables().get(0).rows().get(0));
        assertEquals(List.of("m1", "0.33333", "1"), out.tables().get(0).rows().get(1));
        assertEquals("The first 20 rows.", out.tables().get(0).note());
        assertEquals(20, out.tables().get(0).rows().size());
    }
}
