package org.modestead.host.bench.look;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.awt.image.BufferedImage;
import java.io.ByteArrayInputStream;
import java.io.StringReader;
import java.util.List;
import java.util.stream.IntStream;
import javax.imageio.ImageIO;
import javax.xml.parsers.DocumentBuilderFactory;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.nodes.render.MapRenderer;
import org.modestead.nodes.table.RowCursor;
import org.modestead.nodes.table.Table;
import org.w3c.dom.Document;
import org.xml.sax.InputSource;

/** A thinned matrix hides no peak and tells the whole range. */
class HeatMapTest {

    private static HeatMap map(DMatrixRMaj values) {
        return new HeatMap("m", "Matrix", "Caption.", HeatMap.Side.numbered("function"), HeatMap.Side.numbered("function"), true, values);
    }

    @Test
    void aSmallMatrixIsWholeWithNothingSaidOfThinning() {
        JsonNode json = map(new DMatrixRMaj(new double[][] {{1, -2}, {Double.NaN, 4}})).json();
        assertEquals("[[1.0,-2.0],[null,4.0]]", json.get("values").toString());
        assertEquals("Caption.", json.get("caption").asText());
        assertEquals(-2, json.get("low").doubleValue());
        assertEquals(4, json.get("high").doubleValue());
    }

    @Test
    void aPeakInALargeMatrixIsStillSeenWithItsSign() {
        DMatrixRMaj values = new DMatrixRMaj(600, 1000);
        values.set(599, 999, -7);
        values.set(0, 1, 3);
        JsonNode json = map(values).json();
        assertEquals(200, json.get("shownRows").intValue());
        assertEquals(250, json.get("shownColumns").intValue());
        assertEquals(-7, json.at("/values/199/249").doubleValue());
        assertEquals(3, json.at("/values/0/0").doubleValue());
        assertEquals(-7, json.get("low").doubleValue());
        assertTrue(json.get("caption").asText().contains("Of every 3 by 4 entries the largest one is shown"), json.get("caption").asText());
    }

    @Test
    void labelsAreThinnedWithTheirRows() {
        List<String> names = IntStream.range(0, 300).mapToObj(i -> "r" + i).toList();
        HeatMap map = new HeatMap("m", "", "", new HeatMap.Side("rows", names, List.of()), HeatMap.Side.numbered("columns"), false,
                new DMatrixRMaj(300, 2));
        assertEquals("r2", map.json().at("/rowLabels/1").asText());
        assertTrue(map.json().get("columnLabels").isNull());
        assertTrue(map.json().get("rowSelections").isNull());
    }

    @Test
    void aMatrixOfNothingFiniteHasNoRange() {
        JsonNode json = map(new DMatrixRMaj(new double[][] {{Double.NaN, Double.POSITIVE_INFINITY}})).json();
        assertTrue(json.get("low").isNull() && json.get("high").isNull());
        assertEquals("[[null,null]]", json.get("values").toString());
    }

    @Test
    void namesThatDoNotFitAreRefused() {
        assertThrows(IllegalArgumentException.class, () -> new HeatMap("m", "", "", new HeatMap.Side("rows", List.of("a"), List.of()),
                HeatMap.Side.numbered("columns"), false, new DMatrixRMaj(2, 2)));
    }

    @Test
    void aMapIsAPictureFileWithOneShapeAColourAndItsCaption() throws Exception {
        DMatrixRMaj values = new DMatrixRMaj(600, 1000);
        values.set(599, 999, -7);
        HeatMap map = new HeatMap("m", "Matrix", "Shows it.", HeatMap.Side.numbered("function"), HeatMap.Side.numbered("place"), true, values);
        String svg = MapRenderer.svg(map.picture());
        Document read = DocumentBuilderFactory.newInstance().newDocumentBuilder().parse(new InputSource(new StringReader(svg)));
        assertTrue(read.getDocumentElement().getAttribute("aria-label").startsWith("Matrix. Shows it. Of every 3 by 4 entries"), svg.substring(0, 300));
        assertTrue(svg.length() < 1_000_000, svg.length() + " letters");
        assertTrue(svg.toLowerCase(java.util.Locale.ROOT).contains("8a4b00") || svg.contains("rgb(138,75,0)"), "the lowest entry has the lowest colour");
        BufferedImage png = ImageIO.read(new ByteArrayInputStream(MapRenderer.png(map.picture(), 2)));
        int lowest = 0;
        for (int x = 0; x < png.getWidth(); x++) {
            for (int y = 0; y < 2 * (44 + 369); y++) {
                lowest += (png.getRGB(x, y) & 0xffffff) == 0x8a4b00 ? 1 : 0;
            }
        }
        assertTrue(lowest >= 4 && lowest <= 25, lowest + " pixels of the one entry, whose side is 460 / 250 units of 2 pixels, less the frame");
    }

    @Test
    void everyEntryOfALargeMatrixIsInItsTable() {
        DMatrixRMaj values = new DMatrixRMaj(300, 3);
        values.set(299, 2, 5);
        Table table = new HeatMap("m", "", "", HeatMap.Side.numbered("row"), new HeatMap.Side("column", List.of("a", "a", "row"), List.of()), true, values).table();
        assertEquals(List.of("row", "a", "a (2)", "row (3)"), table.schema().names());
        double last = Double.NaN;
        long count = 0;
        try (RowCursor cursor = table.open()) {
            while (cursor.next()) {
                count++;
                last = cursor.number(3);
            }
        }
        assertEquals(300, count);
        assertEquals(5, last);
    }
}
