package org.modestead.nodes.files;

import java.nio.file.Path;
import java.time.Instant;

/** What a process left that was killed; its number is part of the name. */
public final class GoneProcess {

    private GoneProcess() {}

    /**
     * Returns whether a process that is gone left a file or folder.
     *
     * @param process its number
     * @param late what was changed since then may be of a process of another machine or container, which has numbers of its own
     */
    public static boolean left(Path path, long process, Instant late) {
        return path.toFile().lastModified() < late.toEpochMilli() && ProcessHandle.of(process).filter(ProcessHandle::isAlive).isEmpty();
    }
}
