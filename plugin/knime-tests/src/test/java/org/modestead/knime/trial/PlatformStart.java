package org.modestead.knime.trial;

import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.ServiceLoader;
import org.osgi.framework.Bundle;
import org.osgi.framework.BundleException;
import org.osgi.framework.Constants;
import org.osgi.framework.launch.Framework;
import org.osgi.framework.launch.FrameworkFactory;

/** Starts Equinox in a process of its own, installs bundles and hands over to the trial inside. */
public final class PlatformStart {

    private static final String BRIDGE = "org.modestead.knime";

    private PlatformStart() {}

    /**
     * Starts.
     *
     * @param arguments folder for everything that is written, then a file with the bundles' places, one a line
     */
    public static void main(String[] arguments) {
        int code = 0;
        try {
            serve(arguments);
        } catch (Exception | LinkageError failed) {
            failed.printStackTrace();
            code = 1;
        }
        // Not stopped in order: the platform's threads would keep the process.
        Runtime.getRuntime().halt(code);
    }

    private static void serve(String[] arguments) throws Exception {
        Path area = Path.of(arguments[0]);
        Framework framework = ServiceLoader.load(FrameworkFactory.class).findFirst().orElseThrow().newFramework(settings(area));
        framework.start();
        List<Bundle> bundles = new ArrayList<>();
        for (String place : Files.readAllLines(Path.of(arguments[1]))) {
            String location = Path.of(place).toUri().toString();
            bundles.add(framework.getBundleContext().installBundle(Files.isDirectory(Path.of(place)) ? "reference:" + location : location));
        }
        for (Bundle bundle : bundles) {
            start(bundle);
        }
        Bundle bridge = bundles.stream().filter(bundle -> BRIDGE.equals(bundle.getSymbolicName())).findFirst()
                .orElseThrow(() -> new IllegalStateException("the update site holds no bundle " + BRIDGE));
        Class<?> desk = bridge.loadClass(BRIDGE + ".trial.Desk");
        desk.getMethod("main", String[].class).invoke(null, (Object) new String[0]);
    }

    private static Map<String, String> settings(Path area) {
        Map<String, String> settings = new HashMap<>();
        settings.put(Constants.FRAMEWORK_STORAGE, area.resolve("configuration").toString());
        settings.put("osgi.instance.area", area.resolve("workspace").toUri().toString());
        settings.put("osgi.user.area", area.resolve("user").toUri().toString());
        settings.put("osgi.install.area", area.resolve("install").toUri().toString());
        settings.put("osgi.noShutdown", "true");
        settings.put("eclipse.ignoreApp", "true");
        return settings;
    }

    private static void start(Bundle bundle) {
        try {
            if (bundle.getHeaders().get(Constants.FRAGMENT_HOST) == null) {
                bundle.start(Bundle.START_ACTIVATION_POLICY);
            }
        } catch (BundleException unresolved) {
            // An installation may hold bundles for other systems; what the bridge needs is told when the bridge is looked for.
            System.err.println("not started: " + bundle + ": " + unresolved.getMessage());
        }
    }
}
