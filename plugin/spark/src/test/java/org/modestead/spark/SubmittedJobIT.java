package org.modestead.spark;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.IOException;
import java.io.InputStream;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.concurrent.TimeUnit;
import java.util.jar.JarFile;
import java.util.stream.Collectors;
import java.util.stream.Stream;
import org.apache.spark.sql.Row;
import org.apache.spark.sql.RowFactory;
import org.apache.spark.sql.SparkSession;
import org.apache.spark.sql.types.DataTypes;
import org.apache.spark.sql.types.StructType;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.modestead.engine.Progress;
import org.modestead.engine.moments.MomentFit;
import org.modestead.engine.moments.Moments;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.RankRule;
import org.modestead.nodes.modelfile.MomentFiles;

/** The finished jar, handed to spark-submit in a Java of its own, writes a file from which the nodes fit the operator. */
class SubmittedJobIT {

    private static final Path JAR = Path.of(System.getProperty("spark.jar"));
    private static final long PATIENCE_SECONDS = 300;

    @TempDir
    Path folder;

    @Test
    void theJarHoldsTheEngineAndNotSpark() throws IOException {
        try (JarFile jar = new JarFile(JAR.toFile())) {
            List<String> names = jar.stream().map(entry -> entry.getName()).toList();
            assertTrue(names.contains("org/modestead/engine/moments/Moments.class"));
            assertTrue(names.contains("META-INF/services/org.modestead.engine.kernel.KernelLibrary"));
            assertTrue(names.stream().noneMatch(name -> name.startsWith("org/apache/") || name.startsWith("scala/")
                    || name.startsWith("org/modestead/nodes/")));
        }
        // the engine and its libraries: a few megabytes, quickly sent to the machines
        assertTrue(Files.size(JAR) < 8_000_000, "bytes: " + Files.size(JAR));
    }

    @Test
    void sparkSubmitRunsIt() throws Exception {
        write(folder.resolve("table").toString());
        Process process = submit("--input", folder.resolve("table").toString(), "--output", folder.resolve("sums.zip").toString(), "--time-column",
                "time", "--time-unit", "s", "--run-column", "run", "--delay-depth", "4", "--functions", "landmarks", "--landmarks", "20",
                "--scaling", "std", "--stretch", "200");
        assertTrue(process.waitFor(PATIENCE_SECONDS, TimeUnit.SECONDS), "the job did not end");
        assertEquals(0, process.exitValue(), said());
        try (InputStream in = Files.newInputStream(folder.resolve("sums.zip"))) {
            Moments moments = MomentFiles.read(in);
            assertEquals(Swings.rows().size(), moments.counts().rows());
            assertEquals(6, moments.counts().runs());
            FittedOperator operator = MomentFit.fit(moments, new RankRule.Fixed(10), 0, Progress.NONE);
            assertEquals(10, operator.rank());
        }
    }

    private String said() throws IOException {
        List<String> lines = Files.readAllLines(folder.resolve("said.txt"));
        return lines.stream().skip(Math.max(0, lines.size() - 30)).collect(Collectors.joining("\n"));
    }

    private static void write(String path) {
        try (SparkSession session = SparkSession.builder().master("local[1]").config("spark.ui.enabled", false)
                .config("spark.driver.host", "127.0.0.1").config("spark.driver.bindAddress", "127.0.0.1").getOrCreate()) {
            List<Row> rows = new ArrayList<>();
            Swings.rows().forEach(row -> rows.add(RowFactory.create(row.run(), row.time(), row.level(), row.flow())));
            session.createDataFrame(rows, new StructType().add("run", DataTypes.StringType).add("time", DataTypes.DoubleType)
                    .add("level [m]", DataTypes.DoubleType).add("flow", DataTypes.DoubleType)).coalesce(2).write().parquet(path);
        }
    }

    /** What the script spark-submit starts, with Spark as Maven has it and nothing of this project but the jar. */
    private Process submit(String... arguments) throws IOException {
        String spark = Stream.of(System.getProperty("surefire.test.class.path", System.getProperty("java.class.path")).split(java.io.File.pathSeparator))
                .filter(part -> part.endsWith(".jar") && !part.contains("modestead")).collect(Collectors.joining(java.io.File.pathSeparator));
        List<String> command = new ArrayList<>(List.of(Path.of(System.getProperty("java.home"), "bin", "java").toString(), "-Xmx1g"));
        command.addAll(List.of(System.getProperty("spark.jvm.args").trim().split("\\s+")));
        command.addAll(List.of("-cp", spark, "org.apache.spark.deploy.SparkSubmit", "--master", "local[2]", "--conf", "spark.ui.enabled=false",
                "--conf", "spark.driver.host=127.0.0.1", "--conf", "spark.driver.bindAddress=127.0.0.1", "--conf",
                "spark.sql.shuffle.partitions=2", "--class", "org.modestead.spark.MomentsJob", JAR.toString()));
        command.addAll(List.of(arguments));
        return new ProcessBuilder(command).directory(folder.toFile()).redirectErrorStream(true).redirectOutput(folder.resolve("said.txt").toFile())
                .start();
    }
}
