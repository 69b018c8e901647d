package org.modestead.host.output;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import com.fasterxml.jackson.databind.SerializationFeature;
import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.stream.Stream;

/**
 * The mark {@code unfinished-run.json}, which stands in a result folder while a run moves its files there over those of an earlier one. Where it
 * stays, the run was killed meanwhile, and whole files of two runs may lie beside each other.
 *
 * @param begun when the run began, as {@code run.json} writes it; empty where the mark does not tell
 * @param files that were to be moved, relative to the folder
 */
public record UnfinishedRun(String begun, List<String> files) {

    /** Name of the mark in the result folder. */
    public static final String NAME = "unfinished-run.json";

    private static final String FORMAT = "modestead-unfinished-run/1";
    private static final ObjectMapper MAPPER = new ObjectMapper();
    /** That of a run of 100 000 files; what is larger is not read. */
    private static final long LARGEST = 16L << 20;

    /** Takes an immutable copy. */
    public UnfinishedRun {
        files = List.copyOf(files);
    }

    /** Returns the mark of a result folder; empty when there is none. */
    public static Optional<UnfinishedRun> in(Path folder) {
        Path mark = folder.resolve(NAME);
        try {
            if (!Files.isRegularFile(mark) || Files.size(mark) > LARGEST) {
                return Optional.empty();
            }
            JsonNode root = MAPPER.readTree(mark.toFile());
            List<String> files = new ArrayList<>();
            root.path("files").forEach(file -> files.add(file.asText()));
            return root.path("format").asText().equals(FORMAT) ? Optional.of(new UnfinishedRun(root.path("begun").asText(), files)) : Optional.empty();
        } catch (IOException foreign) {
            // the mark is moved to its place whole: this is a file of somebody else
            return Optional.empty();
        }
    }

    /**
     * Returns what a reader must know of a file: a sentence when its result folder, which holds it or the folder of its step, bears the mark.
     *
     * @param file absolute
     */
    public static Optional<String> doubtOf(Path file) {
        return Stream.iterate(file.getParent(), folder -> folder != null, Path::getParent).limit(2)
                .flatMap(folder -> in(folder).map(run -> run.sentence(folder.toString())).stream()).findFirst();
    }

    /**
     * Says what happened and what to do.
     *
     * @param shown name of the folder as the person knows it
     */
    public String sentence(String shown) {
        return shown + ": a run" + (begun.isEmpty() ? "" : " begun at " + begun) + " did not come to the end of moving its files here, so that files of two runs may lie "
                + "beside each other; run the workflow again.";
    }

    byte[] write() throws JsonProcessingException {
        Map<String, Object> root = new LinkedHashMap<>();
        root.put("format", FORMAT);
        root.put("sentence", sentence("this folder"));
        root.put("begun", begun);
        root.put("files", files);
        return MAPPER.writer().with(SerializationFeature.INDENT_OUTPUT).writeValueAsBytes(root);
    }
}
