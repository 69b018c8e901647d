package org.modestead.release;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Collections;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.regex.Matcher;
import java.util.regex.Pattern;
import java.util.stream.IntStream;
import java.util.stream.Stream;
import javax.xml.parsers.DocumentBuilderFactory;
import javax.xml.parsers.ParserConfigurationException;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.Node;
import org.w3c.dom.NodeList;
import org.xml.sax.SAXException;

/**
 * One module's pom with what it has from its parents.
 *
 * @param properties its own and inherited ones
 * @param managed version and scope of what is managed here or above, by {@code group:artifact}
 * @param named what it names itself, dependencies and plugins
 */
record Pom(Map<String, String> properties, Map<String, Named> managed, List<Named> named) {

    private static final String PLUGINS = "org.apache.maven.plugins";
    private static final Pattern PROPERTY = Pattern.compile("\\$\\{([^}]+)}");

    /**
     * A dependency or a plugin.
     *
     * @param name {@code group:artifact}
     * @param version empty where it is managed
     * @param use {@code build}, {@code compile}, {@code runtime}, {@code provided} or {@code test}; empty where it is managed
     */
    record Named(String name, String version, String use) {
    }

    Pom {
        properties = Collections.unmodifiableMap(new TreeMap<>(properties));
        managed = Collections.unmodifiableMap(new TreeMap<>(managed));
        named = List.copyOf(named);
    }

    /** Reads the pom of the folder and of all modules below it, those of profiles too. */
    static List<Pom> readAll(Path root) throws IOException {
        List<Pom> all = new ArrayList<>();
        readInto(all, root, new Pom(Map.of(), Map.of(), List.of()));
        return all;
    }

    private static void readInto(List<Pom> all, Path folder, Pom parent) throws IOException {
        Document document = parse(folder.resolve("pom.xml"));
        Pom pom = of(document, parent);
        all.add(pom);
        for (Element module : elements(document, "module")) {
            readInto(all, folder.resolve(module.getTextContent().trim()), pom);
        }
    }

    private static Document parse(Path file) throws IOException {
        try {
            DocumentBuilderFactory factory = DocumentBuilderFactory.newInstance();
            factory.setFeature("http://apache.org/xml/features/disallow-doctype-decl", true);
            return factory.newDocumentBuilder().parse(Files.newInputStream(file));
        } catch (ParserConfigurationException | SAXException broken) {
            throw new IOException(file.toString(), broken);
        }
    }

    private static Pom of(Document document, Pom parent) {
        Map<String, String> properties = new LinkedHashMap<>(parent.properties);
        elements(document, "properties").stream().filter(element -> element.getParentNode() == document.getDocumentElement())
                .flatMap(element -> children(element).stream()).forEach(property -> properties.put(property.getTagName(), property.getTextContent().trim()));
        Map<String, Named> managed = new LinkedHashMap<>(parent.managed);
        List<Named> named = new ArrayList<>();
        for (String tag : List.of("dependency", "plugin", "path")) {
            for (Element element : elements(document, tag)) {
                Named found = named(element, properties);
                boolean managesPlugin = tag.equals("plugin") && within(element, "pluginManagement");
                boolean managesLibrary = within(element, "dependencyManagement") && !child(element, "scope").equals("import");
                if ((managesPlugin || managesLibrary) && !found.version.isEmpty()) {
                    managed.put(found.name, found);
                }
                // Maven itself runs managed plugins that no pom names: to clean, to copy resources.
                if (!managesLibrary && !(managesPlugin && found.version.isEmpty())) {
                    named.add(found);
                }
            }
        }
        return new Pom(properties, managed, named);
    }

    private static Named named(Element element, Map<String, String> properties) {
        boolean plugin = element.getTagName().equals("plugin");
        String group = child(element, "groupId").isEmpty() && plugin ? PLUGINS : child(element, "groupId");
        // A plugin, what a plugin asks for, an annotation processor and an imported list of versions are of the build alone.
        boolean build = plugin || element.getTagName().equals("path") || within(element, "plugin") || child(element, "scope").equals("import");
        return new Named(group + ":" + child(element, "artifactId"), filled(child(element, "version"), properties), build ? "build" : child(element, "scope"));
    }

    private static String filled(String text, Map<String, String> properties) {
        Matcher property = PROPERTY.matcher(text);
        return property.replaceAll(match -> Matcher.quoteReplacement(properties.getOrDefault(match.group(1), match.group())));
    }

    /** Returns what it names, with version and use; what is only managed and used nowhere is not there. */
    Stream<Named> used() {
        return named.stream().map(one -> {
            Optional<Named> above = Optional.ofNullable(managed.get(one.name));
            String version = one.version.isEmpty() ? above.map(Named::version).orElse("") : one.version;
            String use = one.use.isEmpty() ? above.map(Named::use).filter(given -> !given.isEmpty()).orElse("compile") : one.use;
            return new Named(one.name, version, use);
        });
    }

    private static boolean within(Element element, String tag) {
        for (Node above = element.getParentNode(); above != null; above = above.getParentNode()) {
            if (above.getNodeName().equals(tag)) {
                return true;
            }
        }
        return false;
    }

    private static String child(Element element, String tag) {
        return children(element).stream().filter(child -> child.getTagName().equals(tag)).map(child -> child.getTextContent().trim()).findFirst().orElse("");
    }

    private static List<Element> children(Element element) {
        return elements(element.getChildNodes());
    }

    private static List<Element> elements(Document document, String tag) {
        return elements(document.getElementsByTagName(tag));
    }

    private static List<Element> elements(NodeList nodes) {
        return IntStream.range(0, nodes.getLength()).mapToObj(nodes::item).filter(Element.class::isInstance).map(Element.class::cast).toList();
    }
}
