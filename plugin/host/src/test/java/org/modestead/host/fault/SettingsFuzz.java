package org.modestead.host.fault;

import com.fasterxml.jackson.core.JsonProcessingException;
import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Random;
import org.modestead.host.TestWorkflows;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.NodeCatalog;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.SettingText;
import org.modestead.nodes.contract.Settings;
import org.modestead.nodes.contract.SettingsReader;

/** Stored settings of every node, as JSON: read, and where they fit, checked against each other. */
final class SettingsFuzz implements FuzzedReader {

    private static final ObjectMapper MAPPER = new ObjectMapper();
    private final List<Node> nodes = new ArrayList<>();

    SettingsFuzz() {
        NodeCatalog catalog = TestWorkflows.allNodes();
        catalog.ids().forEach(id -> nodes.add(catalog.find(id).orElseThrow()));
    }

    @Override
    public String name() {
        return "settings";
    }

    @Override
    public byte[] next(Random random) {
        Mutations mutations = new Mutations(random);
        Node node = nodes.get(random.nextInt(nodes.size()));
        List<Setting> settings = node.declaration().settings();
        StringBuilder text = new StringBuilder("{\"version\":" + (random.nextInt(6) > 0 ? String.valueOf(node.declaration().settingsVersion()) : value(random, mutations)));
        for (int k = settings.isEmpty() ? 0 : random.nextInt(6); k > 0; k--) {
            Setting setting = settings.get(random.nextInt(settings.size()));
            text.append(",\"").append(random.nextInt(30) > 0 ? setting.key() : "none").append("\":").append(sound(setting, random, mutations));
        }
        byte[] whole = (node.declaration().id() + "\n" + text + "}").getBytes(StandardCharsets.UTF_8);
        return random.nextInt(10) == 0 ? mutations.text(whole, whole) : whole;
    }

    private static String sound(Setting setting, Random random, Mutations mutations) {
        if (random.nextInt(3) == 0) {
            return value(random, mutations);
        }
        if (setting instanceof Setting.Choice choice) {
            return "\"" + choice.options().get(random.nextInt(choice.options().size())).id() + "\"";
        } else if (setting instanceof Setting.Number number) {
            return finite(random.nextBoolean() ? number.min() : random.nextInt(4) > 0 ? Math.min(number.max(), number.min() + random.nextDouble()) : number.max());
        } else if (setting instanceof Setting.Whole whole) {
            return String.valueOf(random.nextBoolean() ? whole.min() : Math.min(whole.max(), whole.min() + random.nextInt(9)));
        } else if (setting instanceof Setting.Flag) {
            return String.valueOf(random.nextBoolean());
        } else if (setting instanceof Setting.Numbers) {
            return "[" + random.nextInt(9) + ", " + random.nextDouble() + "]";
        }
        return random.nextBoolean() ? "\"x\"" : "[\"x\", \"y\"]";
    }

    private static String finite(double value) {
        return Double.isFinite(value) ? String.valueOf(value) : "1e308";
    }

    private static String value(Random random, Mutations mutations) {
        String word = mutations.word();
        return switch (random.nextInt(6)) {
            case 0 -> "[" + quoted(word) + "]";
            case 1 -> "{\"a\":" + quoted(word) + "}";
            case 2 -> "[[" + quoted(word) + "], null, 1e308]";
            case 3 -> quoted(word);
            default -> isJson(word) ? word : quoted(word);
        };
    }

    private static boolean isJson(String word) {
        try {
            return !MAPPER.readTree(word).isMissingNode();
        } catch (JsonProcessingException other) {
            return false;
        }
    }

    private static String quoted(String word) {
        try {
            return MAPPER.writeValueAsString(word);
        } catch (JsonProcessingException impossible) {
            throw new IllegalStateException(impossible);
        }
    }

    @Override
    public boolean read(byte[] input) throws IOException {
        String text = new String(input, StandardCharsets.UTF_8);
        int line = text.indexOf('\n');
        Node node = nodes.stream().filter(one -> one.declaration().id().equals(text.substring(0, Math.max(0, line)))).findFirst().orElse(nodes.get(0));
        Map<String, Object> stored = new LinkedHashMap<>();
        try {
            JsonNode tree = MAPPER.readTree(text.substring(line + 1));
            tree.properties().forEach(field -> stored.put(field.getKey(), MAPPER.convertValue(field.getValue(), Object.class)));
        } catch (JsonProcessingException broken) {
            typed(node, text);
            return false;
        }
        SettingsReader.Reading reading = SettingsReader.read(node, stored);
        if (reading.settings().isEmpty()) {
            return reading.problems().isEmpty() && refusedWithoutReason();
        }
        Settings settings = reading.settings().orElseThrow();
        return node.check(Map.of(), settings).isEmpty();
    }

    /** What is no JSON is tried as a text that a person typed. */
    private static void typed(Node node, String text) {
        for (Setting setting : node.declaration().settings()) {
            SettingText.kind(setting);
            SettingsReader.fromText(setting, text).ifPresent(value -> SettingsReader.read(node, Map.of(setting.key(), value)));
        }
    }

    private static boolean refusedWithoutReason() {
        throw new IllegalStateException("refused without a problem");
    }
}
