package org.modestead.host.bench.trial;

import java.nio.file.Path;
import java.util.Set;

/** The pictures of the bench that the README shows, written by the trials. */
final class KeptPictures {

    static final Path FOLDER = Path.of("pictures");
    static final Set<String> NAMES = Set.of("start", "recording", "example-verdict", "mode-marked", "settings-light");

    private KeptPictures() {}
}
