package org.modestead.host.workflow;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.core.StreamReadFeature;
import com.fasterxml.jackson.databind.DeserializationFeature;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.json.JsonMapper;
import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;

/**
 * Reads workflow files of format {@value #FORMAT}.
 *
 * <p>Strict: an unknown field, a field given twice and a step id used twice are problems, because each of them means
 * that the person's intent would silently be dropped.
 */
public final class WorkflowFile {

    /** Name and version of the format, as written in the file. */
    public static final String FORMAT = "modestead-workflow/1";

    /** File looked for when a folder is given. */
    public static final String DEFAULT_NAME = "workflow.json";

    /** What is told of a workflow that has no step. */
    static final String NO_STEP = "no step";

    /** Megabytes of the largest file that is read: thousands of times a usual one. */
    private static final int MOST_MEGABYTES = 16;

    private static final JsonMapper MAPPER = JsonMapper.builder()
            .enable(StreamReadFeature.STRICT_DUPLICATE_DETECTION)
            .enable(DeserializationFeature.FAIL_ON_TRAILING_TOKENS)
            .build();

    private WorkflowFile() {}

    /**
     * What reading gives.
     *
     * @param workflow what could be read, as far as it could; empty when the file is not JSON of the format at all
     * @param problems everything wrong with the file itself
     */
    public record Reading(Optional<Workflow> workflow, List<Problem> problems) {

        /** Takes an immutable copy. */
        public Reading {
            problems = List.copyOf(problems);
        }

        /**
         * Returns the first thing wrong besides having no step yet, which harms nothing until the workflow is to run; where there is
         * none, the workflow was read whole.
         */
        public Optional<Problem> broken() {
            return problems.stream().filter(problem -> !problem.seen().equals(NO_STEP)).findFirst();
        }

        static Reading failed(String file, String key, String seen, String wanted) {
            return new Reading(Optional.empty(), List.of(new Problem(file, "", key, seen, wanted)));
        }
    }

    /**
     * Reads a workflow.
     *
     * @param given the file, or a folder that holds {@value #DEFAULT_NAME}
     */
    public static Reading read(Path given) {
        Path file = (Files.isDirectory(given) ? given.resolve(DEFAULT_NAME) : given).toAbsolutePath().normalize();
        if (!Files.isRegularFile(file)) {
            String seen = Files.isDirectory(given) ? "the folder holds no " + DEFAULT_NAME : "there is no such file";
            return Reading.failed(given.toString(), "", seen, "give a workflow file or a folder with a " + DEFAULT_NAME);
        }
        try (InputStream in = Files.newInputStream(file)) {
            byte[] json = in.readNBytes((MOST_MEGABYTES << 20) + 1);
            return json.length > MOST_MEGABYTES << 20 ? Reading.failed(given.toString(), "", "the file is larger than " + MOST_MEGABYTES + " MB",
                    "give a workflow file") : parse(file, json);
        } catch (IOException unreadable) {
            return Reading.failed(given.toString(), "", "the file cannot be read (" + unreadable.getMessage() + ")",
                    "allow reading it");
        }
    }

    /**
     * Reads a workflow that is not, or not yet, in its file.
     *
     * @param file where it belongs, absolute
     * @param json its bytes
     */
    public static Reading parse(Path file, byte[] json) {
        String name = file.getFileName().toString();
        try {
            JsonNode root = MAPPER.readTree(json);
            return root.isObject() ? new WorkflowTree(file, root).read()
                    : Reading.failed(name, "", "the file holds " + JsonKind.of(root) + ", not an object",
                            "begin it with {\"format\": \"" + FORMAT + "\"");
        } catch (JsonProcessingException broken) {
            return Reading.failed(name, place(broken), JsonWords.of(broken), "correct the JSON there");
        } catch (IOException impossible) {
            throw new IllegalStateException("bytes in memory could not be read", impossible);
        }
    }

    private static String place(JsonProcessingException broken) {
        return broken.getLocation() == null ? ""
                : "line " + broken.getLocation().getLineNr() + ", column " + broken.getLocation().getColumnNr();
    }
}
