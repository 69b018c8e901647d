package org.modestead.release;

import static org.junit.jupiter.api.Assertions.assertEquals;

import java.io.IOException;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.EnabledIfSystemProperty;

/** Two builds of the committed state give the same bytes; {@code -Dreproduce=full}, for it takes as long as two builds. */
class SameBytesIT {

    @Test
    @EnabledIfSystemProperty(named = "reproduce", matches = "full", disabledReason = "two whole builds: -Dreproduce=full")
    void twoBuildsOfTheCommittedStateGiveTheSameFiles() throws IOException, InterruptedException {
        Process script = new ProcessBuilder("bash", System.getProperty("project.root") + "/plugin/release-tests/reproduce.sh").inheritIO().start();
        assertEquals(0, script.waitFor(), "exit code of reproduce.sh, which names the files that differ");
    }
}
