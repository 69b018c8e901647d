package org.modestead.nodes.modelfile;

import java.io.OutputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.HashMap;
import java.util.List;
import java.util.Locale;
import java.util.Map;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.condition.EnabledIfSystemProperty;
import org.modestead.engine.modelfile.Model;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.spectrum.Spectrum;
import org.modestead.engine.wellposed.Verdict;
import org.modestead.nodes.contract.PortType;
import org.modestead.nodes.testing.Steps;

/** Writes the files that {@link KeptFilesTest} keeps, once a version of the format: {@code -Dmodel.fixtures=<folder>}. */
@EnabledIfSystemProperty(named = "model.fixtures", matches = ".+")
class WriteFixtureFilesTest {

    @Test
    void aModelOfEveryKindIsWritten() throws Exception {
        for (StoredFits fit : List.of(StoredFits.LINEAR, StoredFits.STABLE, StoredFits.EXTRAPOLATED, StoredFits.FOURIER, StoredFits.SECTIONS,
                StoredFits.LANDMARKS, StoredFits.GENERATOR, StoredFits.DRIVEN)) {
            Map<String, Object> parts = new HashMap<>(Map.of("snapshots", fit.snapshots()));
            parts.put("operator", fit.operator(parts.get("snapshots")).outputs().get("operator"));
            parts.put("spectrum", Steps.run("spectrum-extractor", Map.of("operator", parts.get("operator")), Map.of("replicates", 20)).outputs()
                    .get("spectrum"));
            parts.put("verdict", Steps.run("wellposedness-checker", parts, Map.of()).outputs().get("verdict"));
            Model model = new Model(fit.name(), "Kept so that later versions read it.", (FittedOperator) parts.get("operator"),
                    (Spectrum) parts.get("spectrum"), (Verdict) parts.get("verdict"));
            Path folder = Files.createDirectories(Path.of(System.getProperty("model.fixtures")));
            String name = "v1-" + fit.name().toLowerCase(Locale.ROOT);
            try (OutputStream out = Files.newOutputStream(folder.resolve(name + ".zip"))) {
                PortFiles.write(PortType.MODEL, model, out);
            }
            Files.write(folder.resolve(name + ".txt"), KeptFilesTest.lines(model));
        }
    }
}
