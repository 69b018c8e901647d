package org.modestead.nodes.judge;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.modestead.engine.wellposed.JudgeSettings;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.contract.SettingsReader;
import org.modestead.nodes.testing.Steps;

class CheckerSettingsTest {

    private static Settings read(Map<String, Object> raw) {
        return SettingsReader.read(new WellPosednessCheckerNode(), raw).settings().orElseThrow();
    }

    @Test
    void defaultsAreThoseOfTheEngine() {
        assertEquals(JudgeSettings.DEFAULT, JudgeNodeSettings.read(read(Map.of())));
    }

    @Test
    void everyThresholdReachesItsPlace() {
        Settings settings = read(Map.ofEntries(Map.entry("ladder-from", 3), Map.entry("ladder-to", 9),
                Map.entry("share-threshold", 0.11),
                Map.entry("residual-threshold", 0.12), Map.entry("settle-threshold", 0.13),
                        Map.entry("norm-growth-threshold", 1.4),
                Map.entry("overlap-threshold", 0.15), Map.entry("gap-threshold", 0.16), Map.entry("capture-threshold",
                        0.17),
                Map.entry("step-threshold", 0.18), Map.entry("completeness-threshold", 0.19), Map.entry("replays", 3), Map.entry("splits", 2)));
        assertEquals(new JudgeSettings(3, 9, 0.11, 0.12, 0.13, 1.4, 0.15, 0.16, 0.17, 0.18, 0.19, 3, 2),
                JudgeNodeSettings.read(settings));
    }

    @Test
    void residualsAloneAreLookedIntoWhereAskedFor() {
        assertEquals(List.of(false, false, true), Stream.of(Map.<String, Object>of(), Map.<String, Object>of("extent", "verdict"),
                Map.<String, Object>of("extent", "residuals")).map(raw -> JudgeNodeSettings.residualsOnly(read(raw))).toList());
    }

    @Test
    void aLadderUpsideDownIsTold() {
        assertEquals("the highest rank 4 is not above the lowest rank 4",
                Steps.check("wellposedness-checker", Map.of("ladder-from", 4, "ladder-to", 4)).get(0).seen());
        assertEquals(List.of(), Steps.check("wellposedness-checker", Map.of("ladder-from", 4)));
    }
}
