package org.modestead.host.bench.trial;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import com.fasterxml.jackson.databind.JsonNode;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;

/** Every output of every step that was laid out for an own recording can be looked at, each with the picture that it is known by. */
@NeedsBrowser
class EveryPortTrialTest {

    /** Most rows that the page may ask for at once. */
    private static final int MOST_ROWS = 500;

    @TempDir
    Path folder;

    @Test
    void everyPortCanBeLookedAtAndNoTableIsSentWhole() throws IOException {
        try (Trial trial = Trial.start(folder, Optional.empty())) {
            Browser browser = trial.browser();
            browser.see("[data-action=choose-recording]");
            browser.type("#recording-file", TankRecording.write(folder.resolve("tank.csv")).toString());
            browser.click("[data-action=lay-out-run]");
            browser.see("[data-look] [data-verdict]");
            trial.rest();
            int ports = 0;
            for (JsonNode step : trial.desk().path("steps")) {
                String id = step.path("id").asText();
                trial.choose(id);
                for (JsonNode port : trial.json("/api/steps/" + id + "/look").path("ports")) {
                    String output = "[data-look=\"" + id + "\"] [data-output=\"" + port.path("id").asText() + "\"]";
                    browser.see(output + (port.path("table").isObject() ? " [data-table][data-ready=true]" : " h3"));
                    ports++;
                }
            }
            assertTrue(ports > 10, ports + " ports");
            picture(trial, "spectrum", ".lk-complex-plane", "interval");
            picture(trial, "check", "[aria-label=Pictures]", "Frequency over the ladder");
            picture(trial, "forecast", ".lk-time-series", "forecast band");
            assertPages(browser.requests());
        }
    }

    private static void picture(Trial trial, String step, String css, String words) {
        trial.choose(step);
        String place = "[data-look=" + step + "] " + css;
        trial.browser().see(place);
        trial.browser().js("document.querySelector(arguments[0]).scrollIntoView()", place); // drawn when it is first in sight
        trial.browser().see(place + " [data-drawn=true]");
        trial.browser().reads(place, words);
    }

    /** What the page asks for of a table names how many rows it wants; only a press on CSV brings all. */
    private static void assertPages(List<String> requests) {
        List<String> pages = requests.stream().filter(url -> url.contains("/tables/")).toList();
        assertTrue(pages.size() > 5, "tables were looked at: " + pages);
        List<String> whole = new ArrayList<>();
        for (String url : pages) {
            String limit = url.replaceFirst(".*[?&]limit=(\\d+).*", "$1");
            if (!limit.matches("\\d{1,6}") || Integer.parseInt(limit) > MOST_ROWS) {
                whole.add(url);
            }
        }
        assertEquals(List.of(), whole, "tables that were asked for whole");
    }
}
