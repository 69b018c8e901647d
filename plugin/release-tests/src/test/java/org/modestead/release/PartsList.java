package org.modestead.release;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.util.ArrayList;
import java.util.Collections;
import java.util.List;
import java.util.Map;
import java.util.TreeMap;

/**
 * A list of parts (SBOM) in CycloneDX JSON.
 *
 * @param version the version of the format
 * @param subject what it is the list of
 * @param parts the libraries of other authors by {@code group:artifact}
 */
record PartsList(String version, String subject, Map<String, Part> parts) {

    /**
     * A library.
     *
     * @param version its version
     * @param purl the name that scanners know it by
     * @param licences names or SPDX identifiers
     */
    record Part(String version, String purl, List<String> licences) {
    }

    PartsList {
        parts = Collections.unmodifiableMap(new TreeMap<>(parts));
    }

    static PartsList read(String text) {
        try {
            JsonNode json = new ObjectMapper().readTree(text);
            if (!json.path("bomFormat").asText().equals("CycloneDX")) {
                throw new IllegalArgumentException("not CycloneDX: " + text.lines().findFirst().orElse(""));
            }
            Map<String, Part> parts = new TreeMap<>();
            for (JsonNode component : json.path("components")) {
                if (!component.path("group").asText().equals("org.modestead")) {
                    parts.put(component.path("group").asText() + ":" + component.path("name").asText(),
                            new Part(component.path("version").asText(), component.path("purl").asText(), licences(component.path("licenses"))));
                }
            }
            return new PartsList(json.path("specVersion").asText(), json.path("metadata").path("component").path("name").asText(), parts);
        } catch (JsonProcessingException broken) {
            throw new IllegalArgumentException(broken);
        }
    }

    private static List<String> licences(JsonNode choices) {
        List<String> licences = new ArrayList<>();
        for (JsonNode choice : choices) {
            for (JsonNode name : List.of(choice.path("license").path("id"), choice.path("license").path("name"), choice.path("expression"))) {
                if (!name.asText().isEmpty()) {
                    licences.add(name.asText());
                }
            }
        }
        return licences;
    }
}
