package org.modestead.host.bench.trial;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.Locale;
import java.util.Random;

/** Five fillings of an invented tank: a swing of 0.25 Hz and 2 % damping seen by two sensors, and a slow settling. */
final class TankRecording {

    private TankRecording() {}

    static Path write(Path file) throws IOException {
        StringBuilder text = new StringBuilder("time [s],run,level [m],flow [m3/h]\n");
        Random noise = new Random(7);
        for (int run = 1; run <= 5; run++) {
            for (int k = 0; k < 240; k++) {
                double t = 0.25 * k;
                double swing = Math.exp(-0.02 * 2 * Math.PI * 0.25 * t) * Math.cos(2 * Math.PI * 0.25 * t + run);
                double settling = (1 + 0.2 * run) * Math.exp(-0.03 * t);
                text.append(String.format(Locale.ROOT, "%.2f,%d,%.5f,%.5f%n", t, run, 3 + swing + settling + 0.002 * noise.nextGaussian(),
                        40 + 6 * swing - 4 * settling + 0.01 * noise.nextGaussian()));
            }
        }
        return Files.writeString(file, text);
    }
}
