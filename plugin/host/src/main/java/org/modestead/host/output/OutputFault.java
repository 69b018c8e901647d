package org.modestead.host.output;

import java.io.IOException;
import java.nio.file.AccessDeniedException;
import java.nio.file.FileSystemException;
import java.util.Locale;
import java.util.Optional;
import org.modestead.engine.Fault;

/** A result cannot be written: the place is wrong, not allowed, taken or full. */
public final class OutputFault extends Fault {
    private static final long serialVersionUID = 1L;

    /** See {@link Fault#Fault(String, String, String)}. */
    public OutputFault(String where, String seen, String wanted) {
        super(where, seen, wanted);
    }

    /** Tells what a failed write means for the person. */
    public static OutputFault of(String where, IOException failure) {
        String text = String.valueOf(failure.getMessage()).lines().findFirst().orElse("");
        Optional<OutputFault> noRoom = noRoom(where, text);
        if (noRoom.isPresent()) {
            return noRoom.get();
        }
        String reason = failure instanceof FileSystemException system && system.getReason() != null ? system.getReason()
                : text;
        boolean denied = failure instanceof AccessDeniedException || text.toLowerCase(Locale.ROOT)
                .contains("permission denied");
        return new OutputFault(where, denied ? "the file may not be written" : "the file cannot be written (" + reason + ")",
                denied ? "allow writing there or choose another folder" : "choose a folder that can be written");
    }

    private static Optional<OutputFault> noRoom(String where, String text) {
        String lower = text.toLowerCase(Locale.ROOT);
        String room = "make room or choose a folder on another disk; nothing half-written was left";
        if (lower.contains("no space left") || lower.contains("disk full")) {
            return Optional.of(new OutputFault(where, "the disk is full (" + text + ")", room));
        } else if (lower.contains("quota exceeded")) {
            return Optional.of(new OutputFault(where, "the share of the disk that this person may use is full (" + text + ")", room));
        } else if (lower.contains("file too large")) {
            return Optional.of(new OutputFault(where, "the file would be larger than this system allows (" + text + ")",
                    "allow larger files, or choose a folder on another disk; nothing half-written was left"));
        }
        return Optional.empty();
    }
}
