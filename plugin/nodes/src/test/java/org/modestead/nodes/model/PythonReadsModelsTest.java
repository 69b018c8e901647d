package org.modestead.nodes.model;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;
import static org.junit.jupiter.api.Assumptions.assumeTrue;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.List;
import java.util.concurrent.TimeUnit;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.engine.modelfile.Model;
import org.modestead.engine.spectrum.Mode;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.modelfile.PortFiles;

/** The ten lines of the README read a model file in Python; skipped, and said so, where python3 or its NumPy is missing. */
class PythonReadsModelsTest {

    private static final Path README = Path.of("..", "..", "README.md");
    private static final String KEPT = "/org/modestead/nodes/modelfile/v1-linear.zip";
    private static final int SECONDS = 120;

    @TempDir
    Path folder;

    private static List<String> lines() throws IOException {
        Matcher block = Pattern.compile("```python\n(.*?)```", Pattern.DOTALL).matcher(Files.readString(README));
        assertTrue(block.find(), "the README shows no Python");
        return block.group(1).lines().filter(line -> !line.isBlank()).toList();
    }

    private List<String> python(String script) throws IOException, InterruptedException {
        Path said = folder.resolve("said.txt");
        Process process = new ProcessBuilder("python3", "-c", script).directory(folder.toFile()).redirectErrorStream(true)
                .redirectOutput(said.toFile()).start();
        assertTrue(process.waitFor(SECONDS, TimeUnit.SECONDS), "python3 does not end");
        assertEquals(0, process.exitValue(), () -> {
            try {
                return Files.readString(said);
            } catch (IOException unreadable) {
                return unreadable.getMessage();
            }
        });
        return Files.readAllLines(said);
    }

    private void assumePython() {
        boolean there = false;
        try {
            there = new ProcessBuilder("python3", "-c", "import numpy").redirectErrorStream(true).start().waitFor() == 0;
        } catch (IOException | InterruptedException missing) {
            there = false;
        }
        assumeTrue(there, "no python3 with NumPy here (packages python3 and python3-numpy)");
    }

    @Test
    void theReadmeNeedsTenLines() throws IOException {
        assertEquals(10, lines().size());
    }

    @Test
    void pythonReadsRatesGradesAndRunsAsJavaDoes() throws Exception {
        assumePython();
        Path file = folder.resolve("model.zip");
        Model model;
        try (InputStream kept = PythonReadsModelsTest.class.getResourceAsStream(KEPT)) {
            Files.write(file, kept.readAllBytes());
            model = (Model) PortFiles.read(PortType.MODEL, Files.newInputStream(file));
        }
        List<String> said = python(String.join("\n", lines()) + "\nprint(len(runs), [len(run) for run in runs], repr(float(runs[0][3][0])))\n");
        assertEquals(model.spectrum().modes().size() + 1, said.size(), said.toString());
        for (int k = 0; k < model.spectrum().modes().size(); k++) {
            Mode mode = model.spectrum().modes().get(k);
            String[] words = said.get(k).split(" ");
            assertEquals(mode.number(), Integer.parseInt(words[0]));
            Matcher complex = Pattern.compile("\\(?([-+]?[0-9.e]+(?:e-?\\d+)?)([-+][0-9.]+(?:e-?\\d+)?)j\\)?").matcher(words[1]);
            assertTrue(complex.matches(), words[1]);
            assertEquals(mode.rate().re(), Double.parseDouble(complex.group(1)));
            assertEquals(mode.rate().im(), Double.parseDouble(complex.group(2)));
            assertEquals(model.verdict().of(mode.number()).orElseThrow().grade().name().toLowerCase(java.util.Locale.ROOT), words[2]);
        }
        var training = model.operator().snapshots().training();
        assertEquals(training.size() + " " + training.stream().map(run -> run.samples()).toList() + " "
                + training.get(0).values().get(3, 0), said.get(said.size() - 1));
    }

    @Test
    void theWholeFileOpensAsAnNpz() throws Exception {
        assumePython();
        try (InputStream kept = PythonReadsModelsTest.class.getResourceAsStream(KEPT)) {
            Files.write(folder.resolve("model.zip"), kept.readAllBytes());
        }
        assertEquals(List.of("True"), python("import numpy as np\nz = np.load('model.zip')\nprint(len(z.files) > 5)\n"));
    }
}
