package org.modestead.site;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.InputStream;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashSet;
import java.util.List;
import java.util.Set;
import java.util.TreeSet;
import java.util.stream.Collectors;
import java.util.zip.ZipFile;
import javax.xml.parsers.DocumentBuilderFactory;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.osgi.framework.Version;
import org.osgi.framework.VersionRange;
import org.w3c.dom.Document;
import org.w3c.dom.Element;
import org.w3c.dom.NodeList;

/** What an installer reads of the site: which requirements the site does not meet itself. */
class MetadataIT {
    private static Document content;

    @BeforeAll
    static void readMetadata() throws Exception {
        try (ZipFile zip = new ZipFile(Path.of(System.getProperty("site.repository"), "content.jar").toFile());
                InputStream in = zip.getInputStream(zip.getEntry("content.xml"))) {
            content = DocumentBuilderFactory.newDefaultInstance().newDocumentBuilder().parse(in);
        }
    }

    private record Capability(String namespace, String name, Version version) {}

    @Test
    void onlyPackagesOfThePlatformsCoreAreAskedOfTheInstallation() {
        Set<String> unmet = unmet();
        assertFalse(unmet.isEmpty(), "the bridge needs the platform");
        assertEquals(Set.of(), unmet.stream().filter(name -> !name.startsWith("java.package org.knime.core.")).collect(Collectors.toSet()));
        assertTrue(unmet.contains("java.package org.knime.core.node"), unmet.toString());
    }

    @Test
    void neitherTheEmbeddedHostNorTheSignaturesAreOffered() {
        for (Element unit : elements("unit")) {
            String id = unit.getAttribute("id");
            assertFalse(id.contains("knime-api") || id.startsWith("org.modestead.host") || id.startsWith("org.knime"), id);
        }
    }

    /** Installing Modestead does not install the accelerator, and installing that asks for the engine. */
    @Test
    void theAcceleratorIsAFeatureOfItsOwn() {
        Element main = unit("org.modestead.feature.feature.group");
        Element accelerator = unit("org.modestead.accelerator.feature.feature.group");
        assertTrue(required(main).stream().noneMatch(name -> name.startsWith("org.modestead.accelerator")), required(main).toString());
        assertTrue(required(accelerator).containsAll(Set.of("org.modestead.engine", "org.modestead.accelerator", "org.modestead.accelerator.linux.x86_64",
                "org.modestead.accelerator.windows.x86_64", "org.modestead.accelerator.macosx.arm64")), required(accelerator).toString());
    }

    private static Element unit(String id) {
        return elements("unit").stream().filter(unit -> unit.getAttribute("id").equals(id)).findFirst().orElseThrow();
    }

    private static Set<String> required(Element unit) {
        Set<String> names = new TreeSet<>();
        NodeList found = unit.getElementsByTagName("required");
        for (int i = 0; i < found.getLength(); i++) {
            names.add(((Element) found.item(i)).getAttribute("name"));
        }
        return names;
    }

    /** Requirements that neither the site nor a Java runtime meets. */
    private static Set<String> unmet() {
        List<Capability> provided = new ArrayList<>();
        for (Element element : elements("provided")) {
            provided.add(new Capability(element.getAttribute("namespace"), element.getAttribute("name"),
                    new Version(element.getAttribute("version"))));
        }
        Set<String> runtime = new HashSet<>();
        ModuleLayer.boot().modules().forEach(module -> runtime.addAll(module.getPackages()));
        Set<String> unmet = new TreeSet<>();
        for (Element element : elements("required")) {
            String namespace = element.getAttribute("namespace");
            String name = element.getAttribute("name");
            VersionRange range = new VersionRange(element.getAttribute("range").isEmpty() ? "0.0.0" : element.getAttribute("range"));
            boolean here = provided.stream().anyMatch(found -> found.namespace().equals(namespace) && found.name().equals(name)
                    && range.includes(found.version()));
            boolean java = namespace.equals("java.package") && runtime.contains(name) && range.includes(Version.emptyVersion);
            if (!here && !java && !"true".equals(element.getAttribute("optional"))) {
                unmet.add(namespace + " " + name);
            }
        }
        return unmet;
    }

    private static List<Element> elements(String tag) {
        NodeList found = content.getElementsByTagName(tag);
        List<Element> all = new ArrayList<>();
        for (int i = 0; i < found.getLength(); i++) {
            all.add((Element) found.item(i));
        }
        return all;
    }
}
