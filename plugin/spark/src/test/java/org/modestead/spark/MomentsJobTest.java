package org.modestead.spark;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.io.ByteArrayInputStream;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.stream.Stream;
import org.apache.spark.sql.Row;
import org.apache.spark.sql.RowFactory;
import org.apache.spark.sql.SparkSession;
import org.apache.spark.sql.types.DataTypes;
import org.apache.spark.sql.types.StructType;
import org.ejml.data.DMatrixRMaj;
import org.junit.jupiter.api.AfterAll;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.api.io.TempDir;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.MethodSource;
import org.modestead.engine.Fault;
import org.modestead.engine.Progress;
import org.modestead.engine.linalg.Matrices;
import org.modestead.engine.moments.KeptStretch;
import org.modestead.engine.moments.KeptStretches;
import org.modestead.engine.moments.MomentFit;
import org.modestead.engine.moments.Moments;
import org.modestead.engine.moments.Pilot;
import org.modestead.engine.moments.StreamPass;
import org.modestead.engine.moments.StreamPlan;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.engine.operator.OrthonormalCompression;
import org.modestead.engine.operator.RankRule;
import org.modestead.nodes.modelfile.MomentFiles;

/** The job in Spark's local mode, with rows dealt to tasks at random, gives the sums of one pass over the rows in order. */
class MomentsJobTest {

    private static final double STEP = 0.05;
    private static final double SAME = 1e-10;
    private static SparkSession session;
    private static Path table;

    @TempDir
    static Path folder;

    @BeforeAll
    static void startsWithAShuffledTable() {
        session = SparkSession.builder().master("local[2]").appName("test").config("spark.ui.enabled", false)
                .config("spark.sql.shuffle.partitions", 3).config("spark.driver.host", "127.0.0.1")
                .config("spark.driver.bindAddress", "127.0.0.1").getOrCreate();
        List<Row> rows = new ArrayList<>();
        Swings.rows().forEach(row -> rows.add(RowFactory.create(row.run(), row.time(), row.level(), row.flow())));
        java.util.Collections.shuffle(rows, new java.util.Random(2));
        StructType columns = new StructType().add("run", DataTypes.StringType).add("time", DataTypes.DoubleType)
                .add("level [m]", DataTypes.DoubleType).add("flow", DataTypes.DoubleType);
        table = folder.resolve("table");
        session.createDataFrame(rows, columns).repartition(5).write().parquet(table.toString());
    }

    @AfterAll
    static void stops() {
        session.stop();
    }

    static Stream<List<String>> fits() {
        return Stream.of(
                List.of("--functions", "linear", "--delay-depth", "6", "--scaling", "std", "--detrend", "mean"),
                List.of("--functions", "linear", "--delay-depth", "3", "--delay-spacing", "2", "--stride", "2", "--noise-correction",
                        "total-least-squares", "--holdout", "run-share", "--holdout-share", "0.3"),
                List.of("--functions", "monomials", "--degree", "2", "--scaling", "std", "--holdout", "none"),
                List.of("--functions", "random-waves", "--waves", "10", "--scale", "1.5", "--scaling", "unit-group", "--detrend", "mean"),
                List.of("--functions", "landmarks", "--landmarks", "12", "--scale", "2", "--scaling", "std"));
    }

    @ParameterizedTest
    @MethodSource("fits")
    void theSumsAreThoseOfOnePass(List<String> asked) {
        JobOptions options = options(asked);
        Moments there = onePass(JobPlan.of(options, List.of("level [m]", "flow"), new org.modestead.engine.recording.TimeAxis(
                org.modestead.engine.recording.TimeAxis.Kind.NUMBER, "s"), 1));
        Moments here = MomentsJob.moments(session, options);
        assertEquals(there.counts(), here.counts());
        assertEquals(there.pairs().pairs(), here.pairs().pairs());
        requireSameKept(there.training(), here.training());
        requireSameKept(there.holdout(), here.holdout());
        requireSame(MomentFit.fit(there, new RankRule.Fixed(4), 0, Progress.NONE), MomentFit.fit(here, new RankRule.Fixed(4), 0, Progress.NONE));
    }

    private static JobOptions options(List<String> more) {
        List<String> all = new ArrayList<>(List.of("--input", table.toString(), "--time-column", "time", "--time-unit", "s", "--run-column", "run",
                "--step", Double.toString(STEP), "--stretch", "100", "--kept-samples", "2000", "--slice", "400", "--partitions", "4", "--seed", "9"));
        all.addAll(more);
        return JobOptions.of(all.toArray(String[]::new));
    }

    private static Moments onePass(StreamPlan plan) {
        Moments survey = pass(StreamPass.survey(plan, STEP));
        return pass(StreamPass.summing(plan, Pilot.of(plan, survey, Progress.NONE)));
    }

    private static Moments pass(StreamPass pass) {
        String run = "";
        for (Swings.Sample row : Swings.rows()) {
            if (!row.run().equals(run)) {
                run = row.run();
                pass.begin(run, row.time(), true);
            }
            pass.row(row.time(), new double[] {row.level(), row.flow()}, true);
        }
        return pass.finish();
    }

    private static void requireSameKept(KeptStretches there, KeptStretches here) {
        assertEquals(there.samples(), here.samples());
        assertEquals(there.kept().stream().map(KeptStretch::draw).toList(), here.kept().stream().map(KeptStretch::draw).toList());
        for (int i = 0; i < there.kept().size(); i++) {
            assertEquals(there.kept().get(i).times()[0], here.kept().get(i).times()[0], 0);
            assertEquals(there.kept().get(i).samples(), here.kept().get(i).samples());
        }
    }

    /** What is compared does not depend on the signs of the orthonormal functions. */
    private static void requireSame(FittedOperator there, FittedOperator here) {
        assertEquals(1, here.compression().singular()[3] / there.compression().singular()[3], SAME);
        double[] expected = next(there.chosen()).data;
        double[] found = next(here.chosen()).data;
        double size = Math.sqrt(java.util.Arrays.stream(expected).map(value -> value * value).sum());
        for (int i = 0; i < expected.length; i++) {
            assertEquals(expected[i], found[i], SAME * size, "entry " + i);
        }
    }

    private static DMatrixRMaj next(OrthonormalCompression c) {
        return Matrices.product(c.map(), Matrices.product(c.action(), c.observable()));
    }

    /** The file that the job writes is one that the nodes read, and every sum comes back. */
    @Test
    void theNodesReadItsFile() throws IOException {
        Moments moments = MomentsJob.moments(session, options(List.of("--delay-depth", "4")));
        ByteArrayOutputStream bytes = new ByteArrayOutputStream();
        MomentsFile.write(moments, bytes);
        Moments back = MomentFiles.read(new ByteArrayInputStream(bytes.toByteArray()));
        assertEquals(moments.counts(), back.counts());
        assertEquals(moments.plan().channels(), back.plan().channels());
        assertEquals(moments.training().kept().size(), back.training().kept().size());
        FittedOperator there = MomentFit.fit(moments, new RankRule.Fixed(4), 0, Progress.NONE);
        FittedOperator here = MomentFit.fit(back, new RankRule.Fixed(4), 0, Progress.NONE);
        assertEquals(Map.of(0, there.compression().singular()[0]), Map.of(0, here.compression().singular()[0]), "to the last bit");
    }

    @Test
    void wrongOptionsAreToldInASentence() {
        assertTrue(told("--fucntions", "linear").contains("it is not known"));
        assertTrue(told("--delay-depth", "two").contains("a number with a decimal point"));
        assertTrue(told("--delay-depth").contains("it has no value"));
        assertTrue(told("--holdout", "some").contains("stretches, run-share, runs, none"));
        assertTrue(told("--channels", "level").contains("there is no column level"));
    }

    private static String told(String... more) {
        return assertThrows(Fault.class, () -> MomentsJob.moments(session, options(List.of(more)))).getMessage();
    }
}
