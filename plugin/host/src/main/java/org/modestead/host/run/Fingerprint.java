package org.modestead.host.run;

import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.nio.file.Path;
import java.security.MessageDigest;
import java.security.NoSuchAlgorithmException;
import java.util.HexFormat;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import org.modestead.host.workflow.PlannedStep;
import org.modestead.nodes.contract.NodeDeclaration;
import org.modestead.nodes.contract.Setting;

/**
 * What a step's result depends on, as one SHA-256 digest: node, settings, the files they name, and the fingerprints of
 * the steps it takes input from. Nodes give the same result for the same fingerprint.
 */
public final class Fingerprint {

    private Fingerprint() {}

    /**
     * @param step whose result is meant
     * @param inputs fingerprints by id of the steps that it takes input from
     * @param baseFolder against which file settings are resolved
     * @return empty when the step has effects besides its result and must run every time
     */
    static Optional<String> of(PlannedStep step, Map<String, String> inputs, Path baseFolder) throws IOException {
        return hasEffects(step) ? Optional.empty() : identity(step, inputs, baseFolder, new FileMarks());
    }

    /** Returns whether a step does more than give a result: it writes a file, or gives none at all. */
    public static boolean hasEffects(PlannedStep step) {
        boolean writes = step.declaration().settings().stream().anyMatch(setting -> setting instanceof Setting.File file
                && !file.reading());
        return writes || step.declaration().outputs().isEmpty();
    }

    /**
     * The same digest for steps with effects too: it tells whether a step has been done as it stands, not whether it may be left out.
     *
     * @param step whose result is meant
     * @param inputs fingerprints by id of the steps that it takes input from
     * @param baseFolder against which file settings are resolved
     * @param marks of the files that settings name
     * @return empty when the fingerprint of an input is not known
     */
    public static Optional<String> identity(PlannedStep step, Map<String, String> inputs, Path baseFolder, FileMarks marks) throws IOException {
        NodeDeclaration declaration = step.declaration();
        if (!step.inputs().values().stream().allMatch(source -> inputs.containsKey(source.step()))) {
            return Optional.empty();
        }
        MessageDigest digest = sha256();
        line(digest, "node", declaration.id() + " " + declaration.settingsVersion() + " " + step.node().getClass()
                .getName());
        Map<String, Object> settings = new TreeMap<>(step.settings().values());
        for (Setting setting : declaration.settings()) {
            if (setting instanceof Setting.File file && !step.settings().text(setting.key()).isEmpty()) {
                // a file counts as what it is, however the workflow names it from its own folder
                settings.remove(setting.key());
                Path meant = baseFolder.resolve(step.settings().text(setting.key())).toAbsolutePath().normalize();
                line(digest, "file " + setting.key(), file.reading() ? marks.of(meant) : meant.toString());
            }
        }
        settings.forEach((key, value) -> line(digest, "setting " + key, value.getClass().getSimpleName() + " " + value));
        step.inputs().forEach((port, source) -> line(digest, "input " + port, inputs.get(source.step())
                + "." + source.port()));
        return Optional.of(HexFormat.of().formatHex(digest.digest()));
    }

    private static void line(MessageDigest digest, String key, String value) {
        byte[] bytes = (key + "=" + value).getBytes(StandardCharsets.UTF_8);
        digest.update((bytes.length + ":").getBytes(StandardCharsets.UTF_8));
        digest.update(bytes);
    }

    static MessageDigest sha256() {
        try {
            return MessageDigest.getInstance("SHA-256");
        } catch (NoSuchAlgorithmException impossible) {
            throw new IllegalStateException("every Java has SHA-256", impossible);
        }
    }
}
