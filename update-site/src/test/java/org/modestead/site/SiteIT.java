package org.modestead.site;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertNotNull;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.BufferedInputStream;
import java.io.ByteArrayOutputStream;
import java.io.DataInputStream;
import java.io.IOException;
import java.io.OutputStream;
import java.net.URL;
import java.nio.charset.StandardCharsets;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Collection;
import java.util.HashMap;
import java.util.HashSet;
import java.util.List;
import java.util.Map;
import java.util.ServiceLoader;
import java.util.Set;
import java.util.TreeSet;
import java.util.jar.Attributes;
import java.util.jar.JarFile;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import java.util.zip.ZipFile;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;
import org.osgi.framework.Bundle;
import org.osgi.framework.Constants;
import org.osgi.framework.Version;
import org.osgi.framework.launch.Framework;
import org.osgi.framework.launch.FrameworkFactory;
import org.osgi.framework.wiring.BundleWiring;
import org.osgi.framework.wiring.FrameworkWiring;

/** What a user installs: the zip is complete, and its bundles start in an Equinox with nothing but the platform's core. */
class SiteIT {
    private static final Path ZIP = Path.of(System.getProperty("site.zip"));
    private static final Path PLUGINS = Path.of(System.getProperty("site.repository"), "plugins");
    private static final String ENGINE = "org.modestead.engine";
    private static final String NODES = "org.modestead.nodes";
    private static final String ACCELERATOR = "org.modestead.accelerator";
    private static final String BRIDGE = "org.modestead.knime";
    /** Signatures under the name of the platform's core bundle: enough to resolve against, nothing to run. */
    private static final Path STAND_IN = Path.of(System.getProperty("platform.stand-in"));

    @TempDir
    static Path storage;
    private static Framework framework;
    private static final Map<String, Bundle> BUNDLES = new HashMap<>();

    @BeforeAll
    static void startEquinox() throws Exception {
        framework = ServiceLoader.load(FrameworkFactory.class).findFirst().orElseThrow().newFramework(Map.of(
                Constants.FRAMEWORK_STORAGE, storage.toString(),
                // A bundle sees the JDK and what it declares: nothing of this test's class path.
                "osgi.compatibility.bootdelegation", "false"));
        framework.start();
        for (Path jar : jars()) {
            Bundle bundle = framework.getBundleContext().installBundle(jar.toUri().toString());
            BUNDLES.put(bundle.getSymbolicName(), bundle);
        }
        framework.getBundleContext().installBundle(STAND_IN.toUri().toString());
        framework.adapt(FrameworkWiring.class).resolveBundles(BUNDLES.values());
        for (Bundle bundle : BUNDLES.values()) {
            if (!fragment(bundle)) {
                bundle.start(); // says what is missing if it cannot be resolved
            }
        }
    }

    @AfterAll
    static void stopEquinox() throws Exception {
        framework.stop();
        framework.waitForStop(30_000);
    }

    @Test
    void zipHoldsTheFeatureAndItsBundles() throws IOException {
        TreeSet<String> found = new TreeSet<>();
        try (ZipFile zip = new ZipFile(ZIP.toFile())) {
            zip.stream().map(entry -> entry.getName()).filter(name -> name.endsWith(".jar"))
                    .forEach(name -> found.add(name.replaceFirst("_[^_]*[.]jar$", "")));
        }
        assertEquals(new TreeSet<>(List.of("artifacts.jar", "content.jar", "features/org.modestead.feature", "features/org.modestead.accelerator.feature",
                "plugins/" + ACCELERATOR, "plugins/" + ACCELERATOR + ".linux.x86_64", "plugins/" + ACCELERATOR + ".linux.arm64",
                "plugins/" + ACCELERATOR + ".windows.x86_64", "plugins/" + ACCELERATOR + ".macosx.x86_64", "plugins/" + ACCELERATOR + ".macosx.arm64",
                "plugins/" + ENGINE, "plugins/" + NODES, "plugins/" + BRIDGE, "plugins/org.ejml.core", "plugins/org.ejml.ddense", "plugins/org.ejml.zdense",
                "plugins/org.jgrapht.core", "plugins/org.jheaps", "plugins/org.apfloat", "plugins/org.knowm.xchart", "plugins/de.erichseifert.vectorgraphics2d")), found);
    }

    @Test
    void everyBundleIsResolvedAndStarted() {
        assertFalse(BUNDLES.isEmpty());
        List<String> notStarted = new ArrayList<>();
        BUNDLES.forEach((name, bundle) -> {
            if (!fragment(bundle) && bundle.getState() != Bundle.ACTIVE) {
                notStarted.add(name + " is in state " + bundle.getState());
            }
        });
        assertEquals(List.of(), notStarted);
    }

    private static boolean fragment(Bundle bundle) {
        return bundle.getHeaders("").get(Constants.FRAGMENT_HOST) != null;
    }

    /** Of the accelerator's fragments the one for this platform joins the engine, with the common one. */
    @Test
    void theNativeLibraryOfThisPlatformJoinsTheEngineAndNoOther() {
        Set<String> joined = BUNDLES.entrySet().stream().filter(entry -> fragment(entry.getValue()) && entry.getValue().getState() == Bundle.RESOLVED)
                .map(Map.Entry::getKey).collect(Collectors.toSet());
        String os = framework.getBundleContext().getProperty("osgi.os").replace("win32", "windows");
        String arch = framework.getBundleContext().getProperty("osgi.arch").replace("aarch64", "arm64");
        assertEquals(Set.of(ACCELERATOR, ACCELERATOR + "." + os + "." + arch), joined);
    }

    /** Loads the library from the bundles and multiplies. */
    @Test
    void theEngineComputesWithTheAcceleratorWhereItIsInstalled() throws Exception {
        ClassLoader engine = loader(ENGINE);
        Class<?> type = engine.loadClass("org.modestead.engine.linalg.LinearAlgebra");
        Class<?> matrix = engine.loadClass("org.ejml.data.DMatrixRMaj");
        Object identity = engine.loadClass("org.ejml.dense.row.CommonOps_DDRM").getMethod("identity", int.class).invoke(null, 300);
        Object algebra = type.getMethod("installed").invoke(null);
        Object product = type.getMethod("multiply", matrix, matrix).invoke(algebra, identity, identity);
        assertArrayEquals((double[]) matrix.getField("data").get(identity), (double[]) matrix.getField("data").get(product));
        assertEquals(List.of(), type.getMethod("doubts").invoke(algebra));
        assertTrue(type.getMethod("name").invoke(algebra).toString().startsWith("OpenBLAS "), type.getMethod("name").invoke(algebra).toString());
    }

    /** The root pom and libraries.target both name versions. */
    @ParameterizedTest
    @ValueSource(strings = {"org.ejml.core", "org.ejml.ddense", "org.ejml.zdense", "org.jgrapht.core", "org.jheaps", "org.apfloat",
            "org.knowm.xchart", "de.erichseifert.vectorgraphics2d"})
    void librariesHaveTheVersionsThatTheTestsRanWith(String library) {
        assertEquals(new Version(System.getProperty(library)), BUNDLES.get(library).getVersion());
    }

    @ParameterizedTest
    @ValueSource(strings = {ENGINE, NODES, BRIDGE})
    void manifestAsksForJava17AndNoWorkbench(String name) throws IOException {
        Path path = jars().stream().filter(jar -> jar.getFileName().toString().startsWith(name + "_")).findFirst().orElseThrow();
        try (JarFile jar = new JarFile(path.toFile())) {
            Attributes manifest = jar.getManifest().getMainAttributes();
            assertEquals("JavaSE-17", manifest.getValue("Bundle-RequiredExecutionEnvironment"));
            assertTrue(manifest.getValue(Constants.REQUIRE_CAPABILITY).contains("(&(osgi.ee=JavaSE)(version=17))"));
            String needed = manifest.getValue(Constants.IMPORT_PACKAGE) + manifest.getValue(Constants.REQUIRE_BUNDLE);
            for (String workbench : List.of("org.eclipse.swt", "org.eclipse.jface", "org.eclipse.ui")) {
                assertFalse(needed.contains(workbench), needed);
            }
        }
    }

    /** A missing import shows only when the line that needs it runs: load now every class that any of our classes names. */
    @ParameterizedTest
    @ValueSource(strings = {ENGINE, NODES, BRIDGE})
    void everyClassFindsAllItNames(String name) throws Exception {
        BundleWiring wiring = BUNDLES.get(name).adapt(BundleWiring.class);
        Collection<String> ours = wiring.listResources("/", "*.class",
                BundleWiring.LISTRESOURCES_RECURSE | BundleWiring.LISTRESOURCES_LOCAL);
        assertFalse(ours.isEmpty());
        TreeSet<String> missing = new TreeSet<>();
        for (String path : ours) {
            if (BUNDLES.get(name).getEntry(path) == null) {
                continue; // in a jar inside the bundle: a library's
            }
            for (String named : classesNamedIn(BUNDLES.get(name).getEntry(path))) {
                try {
                    Class.forName(named, false, wiring.getClassLoader());
                } catch (ClassNotFoundException | LinkageError e) {
                    missing.add(path + " needs " + named);
                }
            }
        }
        assertEquals(new TreeSet<>(), missing);
    }

    /** Real and complex matrices share a package, which two bundles bring; the engine sees both. */
    @Test
    void engineSeesBothHalvesOfTheSharedPackage() throws Exception {
        ClassLoader engine = loader(ENGINE);
        assertNotNull(engine.loadClass("org.ejml.dense.row.CommonOps_DDRM"));
        assertNotNull(engine.loadClass("org.ejml.dense.row.CommonOps_ZDRM"));
    }

    @Test
    void nodesAreFoundAsServices() throws Exception {
        ClassLoader nodes = loader(NODES);
        Class<?> node = nodes.loadClass("org.modestead.nodes.contract.Node");
        List<?> found = ServiceLoader.load(node, nodes).stream().map(ServiceLoader.Provider::get).toList();
        assertTrue(found.size() >= 6, "six nodes do the work, found " + found);
    }

    /** Service files do not cross bundles by themselves: the bridge asks the nodes' own class loader. */
    @Test
    void theBridgeFindsTheNodesOfTheOtherBundle() throws Exception {
        Class<?> set = loader(BRIDGE).loadClass("org.modestead.knime.ModesteadNodeSet");
        Collection<?> ids = (Collection<?>) set.getMethod("getNodeFactoryIds").invoke(set.getConstructor().newInstance());
        assertTrue(ids.containsAll(List.of("snapshot-builder", "operator-fitter", "wellposedness-checker", "forecast")), ids.toString());
    }

    @Test
    void noBundleOfOursOffersALibrarysPackages() throws IOException {
        for (String name : List.of(ENGINE, NODES, BRIDGE)) {
            String exported = BUNDLES.get(name).getHeaders("").get(Constants.EXPORT_PACKAGE);
            for (String clause : exported == null ? new String[0] : exported.split(",(?=(?:[^\"]*\"[^\"]*\")*[^\"]*$)")) {
                assertTrue(clause.startsWith("org.modestead."), name + " exports " + clause);
            }
        }
    }

    /** The chart library reaches its SVG writer, which is another bundle. */
    @Test
    void chartIsDrawnAsSvg() throws Exception {
        ClassLoader nodes = loader(NODES);
        Class<?> type = nodes.loadClass("org.knowm.xchart.XYChart");
        Object chart = type.getConstructor(int.class, int.class).newInstance(200, 100);
        type.getMethod("addSeries", String.class, double[].class, double[].class)
                .invoke(chart, "line", new double[] {0, 1}, new double[] {0, 1});
        ByteArrayOutputStream out = new ByteArrayOutputStream();
        Class<?> anyChart = nodes.loadClass("org.knowm.xchart.internal.chartpart.IChart");
        nodes.loadClass("org.knowm.xchart.ChartEncoder").getMethod("saveChart", anyChart, OutputStream.class, String.class)
                .invoke(null, chart, out, "svg");
        assertTrue(out.toString(StandardCharsets.UTF_8).contains("<svg"));
    }

    /** The class entries of a class file's constant pool (Java Virtual Machine Specification, 4.4). */
    private static Set<String> classesNamedIn(URL classFile) throws IOException {
        Map<Integer, String> text = new HashMap<>();
        Set<Integer> classes = new HashSet<>();
        try (DataInputStream in = new DataInputStream(new BufferedInputStream(classFile.openStream()))) {
            in.skipNBytes(8);
            int count = in.readUnsignedShort();
            for (int i = 1; i < count; i++) {
                int tag = in.readUnsignedByte();
                switch (tag) {
                    case 1 -> text.put(i, in.readUTF());
                    case 7 -> classes.add(in.readUnsignedShort());
                    case 8, 16, 19, 20 -> in.skipNBytes(2);
                    case 15 -> in.skipNBytes(3);
                    case 5, 6 -> {
                        in.skipNBytes(8);
                        i++; // takes two places
                    }
                    default -> in.skipNBytes(4);
                }
            }
        }
        return classes.stream().map(text::get).map(name -> name.replace('/', '.'))
                // An array of objects is [Lname; and one of numbers, [D, names no class.
                .map(name -> name.startsWith("[") ? name.replaceFirst("^\\[+(L(.*);|.)$", "$2") : name)
                .filter(name -> !name.isEmpty()).collect(Collectors.toSet());
    }

    private static ClassLoader loader(String name) {
        return BUNDLES.get(name).adapt(BundleWiring.class).getClassLoader();
    }

    private static List<Path> jars() throws IOException {
        try (Stream<Path> files = Files.list(PLUGINS)) {
            return files.filter(file -> file.toString().endsWith(".jar")).toList();
        }
    }
}
