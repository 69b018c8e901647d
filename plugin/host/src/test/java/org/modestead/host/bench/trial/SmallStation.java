package org.modestead.host.bench.trial;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import org.modestead.host.TestWorkflows;

/** A workflow that runs within seconds and has every kind of look: an invented station, its modes, their verdict, a forecast. */
final class SmallStation {

    private SmallStation() {}

    /** Writes it. */
    static Path write(Path folder) throws IOException {
        String text = TestWorkflows.text(List.of(
                "station:signal-generator:{\"runs\": 6, \"duration\": 20, \"rate\": 10, \"noise\": 0.001, \"dropouts\": 0, \"gaps\": 0, \"jitter\": 0, \"unstable-runs\": 0}",
                "snapshots:snapshot-builder:{\"time-column\": \"time\", \"time-unit\": \"s\", \"run-column\": \"run\", \"resampling\": \"uniform\", \"step\": 0.1, "
                        + "\"detrend\": \"mean\", \"scaling\": \"std\", \"delay-depth\": 4, \"holdout\": \"run-share\", \"holdout-run-share\": 0.2}",
                "fit:operator-fitter:{\"estimator\": \"linear\", \"rank-rule\": \"fixed\", \"rank\": 5}", "spectrum:spectrum-extractor"),
                List.of("station.table>snapshots.table", "snapshots.snapshots>fit.snapshots", "fit.operator>spectrum.operator"));
        return Files.writeString(folder.resolve("workflow.json"), text.replace("\"name\": \"test\"", "\"name\": \"Small station\""));
    }
}
