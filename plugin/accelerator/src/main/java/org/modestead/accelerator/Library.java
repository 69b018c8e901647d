package org.modestead.accelerator;

import java.util.List;
import java.util.Optional;
import java.util.concurrent.atomic.AtomicBoolean;
import org.bytedeco.javacpp.Loader;
import org.bytedeco.javacpp.Pointer;
import org.bytedeco.javacpp.PointerPointer;
import org.bytedeco.openblas.global.openblas;
import org.ejml.data.DMatrixRMaj;
import org.modestead.engine.Doubt;

/** The native library, looked for once, when it is first asked for. */
final class Library {

    private static final String SWITCH = "modestead.accelerator";
    private static final AtomicBoolean ASKED = new AtomicBoolean();

    private Library() {}

    /** Holds what came of the attempt. */
    private static final class Attempt {
        private static final Attempt MADE = new Attempt();

        private final Optional<OpenBlas> found;
        private final Optional<String> failure;

        private Attempt() {
            Optional<OpenBlas> library = Optional.empty();
            Optional<String> why = Optional.empty();
            if (!"off".equals(System.getProperty(SWITCH))) {
                try {
                    library = Optional.of(loaded());
                } catch (LinkageError | RuntimeException impossible) {
                    why = Optional.of(rootOf(impossible).toString());
                }
            }
            found = library;
            failure = why;
        }

        /** Loads the library and has it do a product whose result is known, so that a library that does not work is not used. */
        private static OpenBlas loaded() {
            Loader.load(openblas.class);
            oneThread();
            OpenBlas library = new OpenBlas();
            double product = library.multiply(new DMatrixRMaj(new double[][] {{2, 3}}), new DMatrixRMaj(new double[][] {{5}, {7}})).get(0, 0);
            if (product != 31) {
                throw new IllegalStateException("2·5 + 3·7 came out as " + product);
            }
            return library;
        }

        /**
         * Cutting work for several cores is done here, in an order that does not depend on their number. The library's own call for that is not
         * among the functions that its Java side knows; it is called through the type of a function that takes a number first, and reads no more.
         */
        private static void oneThread() {
            Pointer setter = Loader.addressof("openblas_set_num_threads");
            if (setter == null) {
                throw new IllegalStateException("the number of its threads cannot be set");
            }
            // A function of the Java side is a cell that holds the address of the native one.
            try (PointerPointer<Pointer> cell = new PointerPointer<>(1L)) {
                cell.put(setter);
                new openblas.openblas_dojob_callback(cell).call(1, null, 0);
            }
        }

        private static Throwable rootOf(Throwable thrown) {
            Throwable root = thrown;
            while (root.getCause() != null) {
                root = root.getCause();
            }
            return root;
        }
    }

    /** Returns the library, loaded now if need be; empty where it cannot be loaded or is switched off. */
    static Optional<OpenBlas> get() {
        ASKED.set(true);
        return Attempt.MADE.found;
    }

    /** Returns whether it was ever asked for. */
    static boolean used() {
        return ASKED.get();
    }

    /** Returns why it could not be loaded, if so. */
    static List<Doubt> doubts() {
        return Attempt.MADE.failure.map(why -> new Doubt("accelerator-not-loaded", "The fast linear algebra library could not be loaded on this system ("
                + why + "); everything was computed in Java, which gives the same figures to rounding but takes longer.")).stream().toList();
    }
}
