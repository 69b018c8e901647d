package org.modestead.knime.trial;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.nio.file.Path;
import java.util.ArrayList;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.host.workflow.Step;
import org.modestead.nodes.contract.Node;
import org.modestead.nodes.contract.Setting;
import org.modestead.nodes.contract.SettingsReader;

/** A flow variable of the platform can take the place of every setting of every node, in the real engine. */
class FlowVariablesTest {

    private static final Pattern ENTRY = Pattern.compile("<entry key=\"([^\"]*)\" type=\"[^\"]*\" value=\"([^\"]*)\"/>");

    @TempDir
    Path folder;

    @Test
    void everySettingOfEveryNodeTakesTheValueOfItsVariable() throws Exception {
        PlatformHome home = PlatformHome.givenOrSkipped();
        HostRun host = HostRun.of(NodesTest.everyNode(folder), folder.resolve("host"));
        try (Platform platform = Platform.start(home, folder.resolve("platform"))) {
            PlatformWorkflow built = PlatformWorkflow.build(platform, host.workflow(), folder.resolve("varied"));
            int settings = 0;
            int nodes = 0;
            for (Step step : host.workflow().steps()) {
                Node node = HostRun.NODES.find(step.node()).orElseThrow();
                Map<String, Object> values = new LinkedHashMap<>();
                node.declaration().settings().forEach(setting -> values.put(setting.key(), other(node, setting)));
                if (values.isEmpty()) {
                    continue;
                }
                String used = platform.ask("vary", PlatformWorkflow.settings(built.numbers().get(step.id()), node.declaration(), values)).get(0);
                values.forEach((key, value) -> assertTrue(shows(used, key, value), step.node() + ", " + key + " should be " + value + " in " + used));
                assertEquals("configured", platform.state(built.numbers().get(step.id())).word(), "as before the variables");
                settings += values.size();
                nodes++;
            }
            assertTrue(settings > 100, settings + " settings");
            assertEquals(List.of(), platform.problemsLogged());
            System.out.println("Flow variables took the place of " + settings + " settings of " + nodes + " nodes in the platform's engine.");
        }
    }

    /** Returns a value that fits and is not the default. */
    private static Object other(Node node, Setting setting) {
        List<Object> tried = new ArrayList<>();
        if (setting instanceof Setting.Number number) {
            tried.addAll(List.of(0.625, number.min() + 0.625, (number.min() + number.max()) / 2));
        } else if (setting instanceof Setting.Whole whole) {
            tried.addAll(List.of(whole.min() + 2L, whole.min() + 1L, 3L));
        } else if (setting instanceof Setting.Choice choice) {
            choice.options().stream().map(Setting.Option::id).filter(id -> !id.equals(choice.initial())).forEach(tried::add);
        } else if (setting instanceof Setting.Flag flag) {
            tried.add(!flag.initial());
        } else if (setting instanceof Setting.Numbers numbers) {
            tried.addAll(List.of(List.of(numbers.min() + 1, numbers.min() + 2), List.of(0.25, 0.5)));
        } else {
            tried.add(setting instanceof Setting.Columns || setting instanceof Setting.Texts ? List.of("a 1", "b 2") : "other-text");
        }
        return tried.stream().filter(value -> SettingsReader.read(node, Map.of(setting.key(), value)).problems().stream()
                .noneMatch(problem -> problem.key().equals(setting.key()))).findFirst()
                .orElseThrow(() -> new AssertionError("no other value for " + setting.key()));
    }

    /** Looks for a value in settings as the platform writes them out; lists are folders with an entry a part. */
    private static boolean shows(String xml, String key, Object value) {
        if (value instanceof List<?> list) {
            Matcher config = Pattern.compile("<config key=\"" + Pattern.quote(key) + "\">(.*?)</config>", Pattern.DOTALL).matcher(xml);
            return config.find() && entries(config.group(1)).filter(entry -> !entry.getKey().equals("array-size")).map(Map.Entry::getValue)
                    .collect(Collectors.joining("|")).equals(list.stream().map(Object::toString).collect(Collectors.joining("|")));
        }
        return entries(xml).anyMatch(entry -> entry.getKey().equals(key) && entry.getValue().equals(value.toString()));
    }

    private static Stream<Map.Entry<String, String>> entries(String xml) {
        return ENTRY.matcher(xml).results().map(entry -> Map.entry(entry.group(1), entry.group(2)));
    }
}
