package org.modestead.host.bench.trial;

import static org.junit.jupiter.api.Assertions.assertEquals;

import com.fasterxml.jackson.databind.JsonNode;
import com.fasterxml.jackson.databind.ObjectMapper;
import java.io.IOException;
import java.io.UncheckedIOException;
import java.nio.file.Path;
import java.util.List;
import java.util.Optional;
import java.util.regex.Pattern;
import org.modestead.host.TestWorkflows;
import org.modestead.host.WaitingNode;
import org.modestead.host.bench.Bench;
import org.modestead.host.bench.desk.DeskFolder;
import org.modestead.nodes.contract.NodeCatalog;

/**
 * A bench with a browser before it.
 *
 * @param bench in this Java; empty where it runs in another
 * @param browser that shows its page
 */
record Trial(Optional<Bench> bench, Browser browser) implements AutoCloseable {

    /** The loopback address, or what is in the page itself. */
    private static final Pattern HOME = Pattern.compile("(?s)http://127\\.0\\.0\\.1:\\d+/.*|(data|blob|about|chrome):.*");
    private static final ObjectMapper JSON = new ObjectMapper();

    /** Opens a bench in this Java. */
    static Trial start(Path folder, Optional<Path> workflow) {
        Bench bench = Bench.start(nodes(), new Bench.Options(workflow, 0, new DeskFolder(folder.resolve("desk")), List.of(folder), 1L << 30, 1L << 31));
        try {
            return at(Optional.of(bench), bench.startUrl(), folder);
        } catch (RuntimeException broken) {
            bench.close();
            throw broken;
        }
    }

    /** Opens the page of a bench. */
    static Trial at(Optional<Bench> bench, String url, Path folder) {
        Browser browser = new Browser(folder);
        try {
            browser.open(url);
        } catch (RuntimeException broken) {
            browser.close();
            throw broken;
        }
        return new Trial(bench, browser);
    }

    /** The nodes that a user has; those of tests are not on the shelf. */
    private static NodeCatalog nodes() {
        return NodeCatalog.of(TestWorkflows.allNodes().nodes().stream().filter(node -> !(node instanceof WaitingNode)).toList());
    }

    /** Opens an empty bench from the start page. */
    void empty() {
        browser.click("[data-action=new-empty]");
        browser.see("[data-part=bench]");
    }

    /** Puts a node from the shelf onto something on the bench. */
    void put(String node, String where) {
        int steps = browser.all("[data-step]").size();
        browser.drag(".shelf-item[data-node=" + node + "]", where);
        browser.await("a step more after " + node, () -> browser.all("[data-step]").size() == steps + 1);
    }

    /** Puts a node onto an output of a step, so that it is fed by it. */
    void feed(String node, String output) {
        choose(output.substring(0, output.indexOf('.')));
        put(node, output(output));
    }

    /** Chooses a step by a press on its name. */
    void choose(String step) {
        browser.click("[data-card=\"" + step + "\"]");
        browser.see("[data-card=\"" + step + "\"][aria-current=true]");
    }

    static String output(String end) {
        return "[data-port=\"" + end + "\"][data-side=output]";
    }

    static String input(String end) {
        return "[data-port=\"" + end + "\"][data-side=input]";
    }

    /** Links two ports with the mouse; where the input's tab is folded, by a drop on its step and a choice. */
    void link(String from, String to) {
        choose(from.substring(0, from.indexOf('.')));
        boolean open = browser.has(input(to));
        browser.drag(output(from), open ? input(to) : "[data-step=\"" + to.substring(0, to.indexOf('.')) + "\"]");
        if (!open) {
            String pick = "dialog [data-pick=\"" + to + "\"]";
            browser.await("a link or a choice of " + to, () -> browser.has(pick) || browser.has(wire(from, to)));
            if (browser.has(pick)) {
                browser.click(pick);
            }
        }
        linked(from, to);
    }

    static String wire(String from, String to) {
        return "g[data-link=\"" + from + ">" + to + "\"]";
    }

    void linked(String from, String to) {
        browser.await("a link from " + from + " to " + to, () -> browser.has(wire(from, to)));
    }

    /** Opens the dialog of a step with a double click. */
    void settings(String step) {
        choose(step);
        browser.doubleClick("[data-card=\"" + step + "\"]");
        browser.see("dialog[data-dialog=settings] [data-setting]");
    }

    /** Keeps what the dialog says. */
    void keep() {
        browser.click("dialog [data-action=apply]");
        browser.gone("dialog");
    }

    /** Waits until a step is in one of some states. */
    void state(String step, String... kinds) {
        String css = String.join(",", List.of(kinds).stream().map(kind -> "[data-step=\"" + step + "\"][data-state=" + kind + "]").toList());
        browser.await(step + " to be " + String.join(" or ", kinds), () -> browser.has(css));
    }

    /** Waits for a verdict that tells a frequency; how many digits it has hangs on its interval, and no other mode lies within 1 % of it. */
    void verdictTells(double frequency, String unit) {
        Pattern told = Pattern.compile("(\\d+\\.\\d+) " + Pattern.quote(unit));
        browser.await("a verdict on " + frequency + " " + unit, () -> told.matcher(browser.text("[data-look] [data-verdict]")).results()
                .anyMatch(found -> Math.abs(Double.parseDouble(found.group(1)) - frequency) < 0.01 * frequency));
    }

    /** Waits until a run has ended. */
    void rest() {
        browser.see("[data-run=idle]");
    }

    /** Returns the desk as the server tells it. */
    JsonNode desk() {
        return json("/api/desk");
    }

    /** Returns what the server says to the page. */
    JsonNode json(String path) {
        try {
            return JSON.readTree(String.valueOf(browser.later("fetch(arguments[0]).then(r => r.text()).then(arguments[1])", path)));
        } catch (IOException broken) {
            throw new UncheckedIOException(broken);
        }
    }

    /** Ends both, and asserts that the page asked for nothing beyond this machine. */
    @Override
    public void close() {
        List<String> abroad;
        try {
            abroad = browser.requests().stream().filter(url -> !HOME.matcher(url).matches()).toList();
        } finally {
            browser.close();
            bench.ifPresent(Bench::close);
        }
        assertEquals(List.of(), abroad, "addresses beyond this machine that the page asked for");
    }
}
