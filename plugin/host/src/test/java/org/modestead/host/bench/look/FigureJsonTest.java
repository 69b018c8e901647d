package org.modestead.host.bench.look;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.modestead.nodes.figure.Figure;

/** Nothing of a figure is lost on its way to the page. */
class FigureJsonTest {

    private static JsonNode json(Figure.Layer... layers) throws JsonProcessingException {
        Figure figure = new Figure("one", Figure.Kind.MARKS, "Title", "Caption.", Figure.Axis.log("rank [1]"),
                Figure.Axis.categories("channel", List.of("a", "b")), Optional.of(new Figure.Axis("date", false, List.of(), "date")), List.of(layers));
        return new ObjectMapper().readTree(FigureJson.of(figure).toString());
    }

    @Test
    void textsAndAxesAreThoseOfTheFigure() throws JsonProcessingException {
        JsonNode json = json();
        assertEquals("one/MARKS/Title/Caption.", json.get("id").asText() + "/" + json.get("kind").asText() + "/" + json.get("title").asText()
                + "/" + json.get("caption").asText());
        assertTrue(json.at("/x/logarithmic").asBoolean());
        assertEquals("b", json.at("/y/categories/1").asText());
        assertEquals("date", json.at("/right/time").asText());
    }

    @Test
    void aFigureWithoutARightAxisSaysSo() {
        assertTrue(FigureJson.of(new Figure("one", Figure.Kind.CURVES, "", "", Figure.Axis.linear(""), Figure.Axis.linear(""), List.of()))
                .get("right").isNull());
    }

    @Test
    void everyNumberKeepsAllItsDigitsAndWhatIsNotFiniteIsNull() throws JsonProcessingException {
        double odd = 0.1 + 0.2;
        JsonNode line = json(new Figure.Line("name", "mode:3", new double[] {odd, 2, 3}, new double[] {Double.NaN, Double.POSITIVE_INFINITY, -1e-300},
                Figure.Emphasis.FAINT)).at("/layers/0");
        assertEquals(odd, line.at("/x/0").doubleValue());
        assertTrue(line.at("/y/0").isNull() && line.at("/y/1").isNull());
        assertEquals(-1e-300, line.at("/y/2").doubleValue());
        assertEquals("line/name/mode:3/FAINT", line.get("type").asText() + "/" + line.get("name").asText() + "/" + line.get("selection").asText()
                + "/" + line.get("emphasis").asText());
    }

    @Test
    void everyKindOfLayerIsWritten() throws JsonProcessingException {
        double[] one = {1};
        JsonNode layers = json(new Figure.Band("band", "", one, one, new double[] {2}), new Figure.Backdrop("back", "", one, one),
                new Figure.Points("points", "mode:1", one, one, List.of("label"), Figure.Emphasis.STRONG, Figure.Mark.TRIANGLE),
                new Figure.Bars("bars", "group:x", one), new Figure.Rule("rule", "", true, 7)).get("layers");
        assertEquals(List.of("band", "backdrop", "points", "bars", "rule"), layers.findValuesAsText("type"));
        assertEquals(2, layers.at("/0/high/0").doubleValue());
        assertEquals("label/TRIANGLE", layers.at("/2/labels/0").asText() + "/" + layers.at("/2/mark").asText());
        assertEquals(1, layers.at("/3/heights/0").doubleValue());
        assertEquals(7, layers.at("/4/at").doubleValue());
    }
}
