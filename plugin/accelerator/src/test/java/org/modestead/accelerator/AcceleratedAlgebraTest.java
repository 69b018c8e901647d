package org.modestead.accelerator;

import static org.junit.jupiter.api.Assertions.assertArrayEquals;
import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.File;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.util.Arrays;
import java.util.List;
import java.util.stream.Collectors;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.Test;
import org.modestead.engine.linalg.AwkwardMatrices;
import org.modestead.engine.linalg.EjmlAlgebra;
import org.modestead.engine.linalg.LinearAlgebra;
import org.modestead.engine.linalg.LinearAlgebraContract;

/** The two libraries together keep the contract, too, and each does what is its. */
class AcceleratedAlgebraTest extends LinearAlgebraContract {

    private static final DMatrixRMaj LARGE = AwkwardMatrices.random(200, 200, 1);

    @Override
    protected LinearAlgebra algebra() {
        return LinearAlgebra.installed();
    }

    @Test
    void theEngineFindsItByItself() {
        assertEquals(AcceleratedAlgebra.class, LinearAlgebra.installed().getClass());
    }

    @Test
    void smallWorkIsDoneByEjmlToTheLastBit() {
        DMatrixRMaj a = AwkwardMatrices.random(80, 30, 2);
        EjmlAlgebra ejml = new EjmlAlgebra();
        assertArrayEquals(ejml.gram(a).data, algebra().gram(a).data);
        assertArrayEquals(ejml.svd(a).u().data, algebra().svd(a).u().data);
        assertArrayEquals(ejml.eigen(ejml.gram(a)).vectors().data, algebra().eigen(ejml.gram(a)).vectors().data);
    }

    @Test
    void largeWorkIsDoneByTheLibrary() {
        assertArrayEquals(Library.get().orElseThrow().multiply(LARGE, LARGE).data, algebra().multiply(LARGE, LARGE).data);
        assertArrayEquals(Library.get().orElseThrow().eigen(LARGE).vectors().data, algebra().eigen(LARGE).vectors().data);
        assertTrue(algebra().name().contains("OpenBLAS 0.3.31") && algebra().name().contains("EJML"), algebra().name());
        assertEquals(List.of(), algebra().doubts());
    }

    @Test
    void nothingIsLoadedForSmallWork() throws Exception {
        assertEquals("EJML 0.46.1 (pure Java)|0|true", told(true, "20"));
    }

    @Test
    void whereTheNativeLibraryIsMissingEjmlDoesTheWorkAndADoubtSaysSo() throws Exception {
        String told = told(false, "200");
        assertTrue(told.startsWith("EJML 0.46.1 (pure Java)|1|true|accelerator-not-loaded The fast linear algebra library could not be loaded"), told);
        assertFalse(told.contains("\n"), told);
    }

    @Test
    void itCanBeSwitchedOffWithoutADoubt() throws Exception {
        assertEquals("EJML 0.46.1 (pure Java)|0|true", told(true, "200", "-Dmodestead.accelerator=off"));
    }

    /** Runs {@link Telling} in a fresh process. */
    private static String told(boolean natives, String size, String... options) throws IOException, InterruptedException {
        String path = Arrays.stream(System.getProperty("java.class.path").split(File.pathSeparator))
                .filter(jar -> natives || !jar.matches(".*(natives|[.](linux|windows|macosx)[.]).*")).collect(Collectors.joining(File.pathSeparator));
        List<String> command = new java.util.ArrayList<>(List.of(System.getProperty("java.home") + "/bin/java", "-cp", path));
        command.addAll(List.of(options));
        command.addAll(List.of(Telling.class.getName(), size));
        Process process = new ProcessBuilder(command).redirectErrorStream(true).start();
        String out = new String(process.getInputStream().readAllBytes(), StandardCharsets.UTF_8).strip();
        assertEquals(0, process.waitFor(), out);
        return out;
    }

    /** Multiplies two matrices of a size and tells what did it. */
    static final class Telling {
        public static void main(String[] arguments) {
            int n = Integer.parseInt(arguments[0]);
            DMatrixRMaj a = AwkwardMatrices.random(n, n, 1);
            boolean asEjml = Arrays.equals(new EjmlAlgebra().multiply(a, a).data, LinearAlgebra.installed().multiply(a, a).data);
            List<String> doubts = LinearAlgebra.installed().doubts().stream().map(doubt -> "|" + doubt.code() + " " + doubt.sentence()).toList();
            System.out.println(LinearAlgebra.installed().name() + "|" + doubts.size() + "|" + asEjml + String.join("", doubts));
        }
    }
}
