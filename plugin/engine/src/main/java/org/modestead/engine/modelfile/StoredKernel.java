package org.modestead.engine.modelfile;

import java.util.List;
import java.util.Map;
import java.util.TreeMap;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.kernel.KernelFamilies;
import org.modestead.engine.kernel.KernelSpec;

/** A kernel: its family and parameters, from which the family makes it again. */
public final class StoredKernel {

    private StoredKernel() {}

    /** Returns the tree of a kernel. */
    public static Stored.Fields of(Kernel kernel) {
        return of(kernel.spec());
    }

    /** Returns the kernel of a tree. */
    public static Kernel read(FieldsReader in) {
        KernelSpec spec = readSpec(in);
        if (KernelFamilies.byId(spec.family()).isEmpty()) {
            throw new ModelFileFault(in.path(), "the kernel family " + spec.family() + " is not known here",
                    "install the extension that brings it");
        }
        return KernelFamilies.create(spec);
    }

    static Stored.Fields of(KernelSpec spec) {
        List<Map.Entry<String, Double>> parameters = List.copyOf(spec.parameters().entrySet());
        return new FieldsWriter().text("family", spec.family()).list("parameters", parameters, parameter ->
                new FieldsWriter().text("name", parameter.getKey()).number("value", parameter.getValue()).done()).done();
    }

    static KernelSpec readSpec(FieldsReader in) {
        Map<String, Double> parameters = new TreeMap<>();
        in.objects("parameters", one -> parameters.put(one.text("name"), one.number("value")));
        return new KernelSpec(in.text("family"), parameters);
    }
}
