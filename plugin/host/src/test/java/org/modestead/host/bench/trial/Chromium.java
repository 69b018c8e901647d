package org.modestead.host.bench.trial;

import java.io.File;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * The browser of the trials and its driver, both as the search path names them: nothing is ever looked for in a network.
 *
 * @param browser program
 * @param driver program
 */
record Chromium(Path browser, Path driver) {

    /** Looks for both. */
    static Optional<Chromium> find() {
        Optional<Path> browser = Stream.of("chromium", "chromium-browser", "google-chrome").flatMap(name -> program(name).stream()).findFirst();
        return browser.flatMap(found -> program("chromedriver").map(driver -> new Chromium(found, driver)));
    }

    private static Optional<Path> program(String name) {
        List<String> folders = List.of(Optional.ofNullable(System.getenv("PATH")).orElse("").split(File.pathSeparator));
        return folders.stream().filter(folder -> !folder.isBlank()).map(folder -> Path.of(folder, name)).filter(Files::isExecutable).findFirst();
    }
}
