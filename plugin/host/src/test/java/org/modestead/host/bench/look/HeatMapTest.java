package org.modestead.host.bench.look;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.util.List;
import java.util.stream.IntStream;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;

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
}
