package org.modestead.engine.kernel;

import java.util.List;
import java.util.Optional;
import java.util.ServiceLoader;
import org.modestead.engine.FitFault;

/** The kernel families at hand: those of every {@link KernelLibrary} that {@link ServiceLoader} finds. */
public final class KernelFamilies {

    /** Looked for once: it opens every jar, and the class loader that is asked stays the same. */
    private static final List<KernelFamily> FOUND = ServiceLoader.load(KernelLibrary.class, KernelLibrary.class.getClassLoader()).stream()
            .flatMap(provider -> provider.get().families().stream()).toList();

    private KernelFamilies() {}

    /** Returns all families in the order of the service files, the engine's own first; ids are unique. */
    public static List<KernelFamily> all() {
        return FOUND;
    }

    /** Returns the family of an id. */
    public static Optional<KernelFamily> byId(String id) {
        return all().stream().filter(family -> family.id().equals(id)).findFirst();
    }

    /**
     * Makes a kernel.
     *
     * @throws FitFault if the family is unknown or a parameter is missing or out of range
     */
    public static Kernel create(KernelSpec spec) {
        return byId(spec.family()).orElseThrow(() -> new FitFault("kernel", "there is no family " + spec.family(),
                "use one of " + String.join(", ", all().stream().map(KernelFamily::id).toList()))).create(spec);
    }
}
