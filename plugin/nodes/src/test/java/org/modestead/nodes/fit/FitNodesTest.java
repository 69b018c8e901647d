package org.modestead.nodes.fit;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertFalse;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.junit.jupiter.params.provider.ValueSource;
import org.modestead.engine.FitFault;
import org.modestead.engine.kernel.Kernel;
import org.modestead.engine.kernel.KernelSpec;
import org.modestead.engine.operator.Evolution;
import org.modestead.engine.operator.FittedOperator;
import org.modestead.nodes.contract.NodeResult;
import org.modestead.nodes.contract.SettingFault;
import org.modestead.nodes.figure.Figure;
import org.modestead.nodes.testing.Ringing;
import org.modestead.nodes.testing.Steps;

class FitNodesTest {

    // double precision on noise-free samples
    private static final double CLEAN = 1e-9;

    private static final Object SNAPSHOTS = Steps.run("snapshot-builder", Map.of("table", Ringing.numbers(5)),
            Map.of("time-column", "time", "run-column", "run", "holdout", "run-share")).outputs().get("snapshots");

    private static NodeResult choose(Map<String, Object> raw) {
        return Steps.run("kernel-chooser", Map.of("snapshots", SNAPSHOTS), raw);
    }

    private static KernelSpec chosen(Map<String, Object> raw) {
        return ((Kernel) choose(raw).outputs().get("kernel")).spec();
    }

    private static NodeResult fit(Map<String, Object> raw, boolean withKernel) {
        Map<String, Object> inputs = withKernel ? Map.of("snapshots", SNAPSHOTS, "kernel",
                choose(Map.of("family", "exponential", "rate", 0.5)).outputs().get("kernel")) : Map.of("snapshots",
                        SNAPSHOTS);
        return Steps.run("operator-fitter", inputs, raw);
    }

    private static FittedOperator operator(Map<String, Object> raw, boolean withKernel) {
        return (FittedOperator) fit(raw, withKernel).outputs().get("operator");
    }

    @Test
    void parametersGoToTheFamilyChosenAndOthersDoNot() {
        assertEquals(new KernelSpec("polynomial", Map.of("degree", 4.0, "offset", 0.5)),
                chosen(Map.of("family", "polynomial", "degree", 4, "offset", 0.5, "rate", 9)));
        assertEquals(new KernelSpec("gaussian", Map.of("scale", 0.7)),
                chosen(Map.of("family", "gaussian", "scale-mode", "explicit", "scale", 0.7)));
    }

    @Test
    void aScaleFromTheDataIsAMultipleOfTheMedianDistance() {
        double once = chosen(Map.of("family", "gaussian")).parameters().get("scale");
        double twice = chosen(Map.of("family", "gaussian", "scale-factor", 2)).parameters().get("scale");
        assertTrue(once > 0 && once < 4, "both channels stay within 2 of zero, so distances within some 4");
        assertEquals(2 * once, twice, 1e-15);
    }

    @Test
    void aParameterThatTheFamilyRefusesIsToldBeforeRunning() {
        assertEquals("degree is 2.5", Steps.check("kernel-chooser", Map.of("family", "polynomial", "degree",
                2.5)).get(0).seen());
        assertEquals(List.of(), Steps.check("kernel-chooser", Map.of("family", "gaussian")));
    }

    @Test
    void rankingWithoutVerdictsPutsTheSmallestErrorFirstAndHandsOnItsKernel() {
        NodeResult ranked = choose(Map.of("choose", "rank", "judge", false, "candidates", List.of("gaussian", "linear"),
                "scale-multiples", List.of(1, 4)));
        List<Double> errors = IntStream.range(0, 3).mapToObj(i -> Steps.number(ranked, "ranking", "holdout_error",
                i)).toList();
        List<Double> sorted = new ArrayList<>(errors);
        sorted.sort(null);
        assertEquals(sorted, errors);
        assertEquals(List.of("1", "2", "3"), Steps.column(ranked, "ranking", "place"));
        assertEquals("Linear", Steps.column(ranked, "ranking", "kernel").get(0), "ringing is linear motion");
        assertEquals("linear", ((Kernel) ranked.outputs().get("kernel")).spec().family());
        assertEquals("kernel-ranking", ranked.figures().get(0).id());
        assertEquals(List.of("", "", ""), Steps.column(ranked, "ranking", "verdict"));
    }

    @Test
    void rankingByVerdictTellsEachKernelsVerdictAndWhatItsSpaceHolds() {
        NodeResult ranked = choose(Map.of("choose", "rank", "candidates", List.of("gaussian", "linear"),
                "scale-multiples", List.of(1, 4), "judged-per-family", 1));
        assertEquals(List.of("Linear", "Gaussian", "Gaussian"), Steps.column(ranked, "ranking", "kernel").stream()
                .map(label -> label.split(" ")[0]).toList());
        List<String> verdicts = Steps.column(ranked, "ranking", "verdict");
        // x' = Ax in the space of linear functions, whose two modes take in all there is
        assertTrue(List.of("stands", "settles").contains(verdicts.get(0)), verdicts.toString());
        assertEquals("", verdicts.get(2), "one of each family is judged");
        assertTrue(Steps.number(ranked, "ranking", "captured_share", 0) > 0.999);
        assertTrue(Steps.number(ranked, "ranking", "holdout_residual", 0) < CLEAN);
        List<String> holds = Steps.column(ranked, "ranking", "holds");
        assertTrue(holds.get(0).startsWith("modes of linear motion about zero only"), holds.get(0));
        assertTrue(holds.get(1).startsWith("no mode that grows or decays"), holds.get(1));
        assertTrue(ranked.summary().get(0).startsWith("Of 3 kernels, Linear comes first"), ranked.summary().get(0));
        assertTrue(ranked.summary().get(1).contains("modes of linear motion about zero"), ranked.summary().toString());
        assertEquals(Figure.Kind.MARKS, ranked.figures().get(0).kind());
    }

    @Test
    void aSpaceThatCannotHoldTheModeFoundIsDoubtedByName() {
        // ringing down is decay, which no function of a fading space can follow
        NodeResult ranked = choose(Map.of("choose", "rank", "candidates", List.of("gaussian"), "scale-multiples", List.of(4)));
        String told = ranked.doubts().stream().filter(doubt -> doubt.code().equals("no-room-for-the-mode")).findFirst()
                .orElseThrow().sentence();
        assertTrue(told.contains("None of the spaces compared has room for it") && told.contains("1.50 cycles"), told);
    }

    @Test
    void unknownFamiliesAreToldWithTheNearestKnownOne() {
        assertEquals("there is no family gausian, perhaps you meant gaussian",
                Steps.check("kernel-chooser", Map.of("choose", "rank", "candidates", List.of("gausian"))).get(0).seen());
        assertEquals("no family is named", Steps.check("kernel-chooser", Map.of("choose", "rank", "candidates",
                List.of())).get(0).seen());
    }

    @ParameterizedTest
    @ValueSource(strings = {"linear", "dictionary", "kernel-step", "generator", "scaled-generator"})
    void eachOperatorIsFittedAndDescribed(String estimator) {
        NodeResult fitted = fit(Map.of("estimator", estimator), true);
        FittedOperator operator = (FittedOperator) fitted.outputs().get("operator");
        assertEquals(estimator, operator.estimator().id());
        assertEquals(estimator, Steps.column(fitted, "fit", "value").get(0));
        boolean map = operator.evolution() instanceof Evolution.StepMap;
        assertEquals(!estimator.endsWith("generator"), map);
        assertEquals("singular-values", fitted.figures().get(0).id());
    }

    @ParameterizedTest
    @ValueSource(strings = {"kernel-step", "generator", "scaled-generator"})
    void anOperatorThatNeedsAKernelSaysSoWhenNoneIsConnected(String estimator) {
        SettingFault fault = assertThrows(SettingFault.class, () -> fit(Map.of("estimator", estimator), false));
        assertEquals("the operator " + estimator + " without a kernel", fault.seen());
    }

    @Test
    void aKernelThatIsConnectedButNotUsedIsADoubt() {
        assertTrue(fit(Map.of(), true).doubts().stream().anyMatch(doubt -> doubt.code().equals("kernel-unused")));
        assertFalse(fit(Map.of(), false).doubts().stream().anyMatch(doubt -> doubt.code().equals("kernel-unused")));
    }

    @Test
    void rankRulesAndRidgeReachTheFit() {
        assertEquals(1, operator(Map.of("rank-rule", "fixed", "rank", 1), false).rank());
        assertEquals(2, operator(Map.of("rank-rule", "energy", "energy", 0.999999), false).rank());
        assertTrue(operator(Map.of("rank-rule", "holdout", "largest-rank", 2), false).rank() <= 2);
        assertThrows(FitFault.class, () -> operator(Map.of("rank-rule", "fixed", "rank", 3), false), "two channels hold"
                + " rank 2");
        double plain = operator(Map.of(), false).chosen().action().get(0, 0);
        // the largest direction shrinks by s²/(s² + 0.5 s²)
        assertEquals(plain / 1.5, operator(Map.of("ridge", 0.5), false).chosen().action().get(0, 0), 1e-12);
    }

    @Test
    void choicesByLeftOutSamplesWorkOnOneRunAsWell() {
        Object single = Steps.run("snapshot-builder", Map.of("table", Ringing.numbers(1)),
                Map.of("time-column", "time", "run-column", "run")).outputs().get("snapshots");
        NodeResult fitted = Steps.run("operator-fitter", Map.of("snapshots", single), Map.of("rank-rule", "holdout"));
        assertEquals(2, ((FittedOperator) fitted.outputs().get("operator")).rank(), "a ringing pair needs both directions");
        NodeResult ranked = Steps.run("kernel-chooser", Map.of("snapshots", single), Map.of("choose", "rank"));
        assertEquals("1", Steps.column(ranked, "ranking", "place").get(0));
    }

    @Test
    void aDictionaryHasAsManyFunctionsAsItsDegreeGives() {
        // (2 + 3)! / (2! 3!) monomials of two channels up to degree 3
        assertEquals(10, operator(Map.of("estimator", "dictionary", "degree", 3), false).compression().basis().size());
        // the constant, and sine and cosine of 2 harmonics of 2 channels
        assertEquals(9, operator(Map.of("estimator", "dictionary", "dictionary", "fourier", "order", 2, "periods",
                List.of(9)), false)
                .compression().basis().size());
    }

    @Test
    void piecesOfOneStepAreToldBeforeRunningAndOnlyWhereTheyCount() {
        assertEquals("segment-samples", Steps.check("operator-fitter", Map.of("estimator", "generator", "segment-samples",
                1)).get(0).key());
        assertEquals(List.of(), Steps.check("operator-fitter", Map.of("segment-samples", 1)));
    }

    @ParameterizedTest
    @CsvSource({"none, linear least squares in delay coordinates",
        "total-least-squares, linear total least squares in delay coordinates",
        "forward-backward, linear least squares forward and backward in delay coordinates",
        "extrapolation, 'linear least squares in delay coordinates, extrapolated to no noise'"})
    void theNoiseCorrectionReachesTheFitAndItsDescription(String correction, String method) {
        NodeResult fitted = fit(Map.of("noise-correction", correction), false);
        assertEquals(method, Steps.column(fitted, "fit", "value").get(1));
        assertEquals("Fitted: " + method + ".", fitted.summary().get(0));
    }

    @Test
    void aRidgeBesideANoiseCorrectionIsToldBeforeRunningAndOnlyWhereItCounts() {
        Map<String, Object> both = Map.of("noise-correction", "total-least-squares", "ridge", 0.1);
        assertEquals("ridge", Steps.check("operator-fitter", both).get(0).key());
        assertEquals(List.of(), Steps.check("operator-fitter", Map.of("ridge", 0.1, "estimator", "dictionary")));
    }

    @Test
    void onlyTheExtrapolationSuitsEveryOperator() {
        for (String correction : List.of("total-least-squares", "forward-backward")) {
            assertEquals("noise-correction", Steps.check("operator-fitter", Map.of("noise-correction", correction, "estimator",
                    "dictionary")).get(0).key());
        }
        for (String estimator : List.of("dictionary", "kernel-step", "generator")) {
            NodeResult fitted = fit(Map.of("noise-correction", "extrapolation", "estimator", estimator), true);
            assertTrue(((FittedOperator) fitted.outputs().get("operator")).method().endsWith(", extrapolated to no noise"));
        }
    }

    @ParameterizedTest
    @CsvSource({"linear, self-adjoint, self-adjoint", "linear, unitary, unitary", "dictionary, stable, stable",
        "kernel-step, unitary, unitary", "generator, skew, skew-adjoint", "scaled-generator, stable, stable"})
    void aStructureReachesTheFitAndItsTable(String estimator, String structure, String words) {
        NodeResult fitted = fit(Map.of("estimator", estimator, "structure", structure), true);
        assertTrue(((FittedOperator) fitted.outputs().get("operator")).method().endsWith(", made " + words));
        String row = Steps.texts(fitted, "fit").stream().filter(cells -> cells.get(0).equals("structure")).findFirst().orElseThrow().get(1);
        assertTrue(row.startsWith(words + ", changes the operator by "), row);
    }

    @ParameterizedTest
    @CsvSource({"linear, skew, none, 0, structure", "generator, unitary, none, 0, structure", "scaled-generator, skew, none, 0, structure",
        "linear, unitary, total-least-squares, 0, structure", "linear, stable, none, 0.1, ridge"})
    void structuresThatDoNotGoTogetherWithTheRestAreToldBeforeRunning(String estimator, String structure, String correction, double ridge,
            String key) {
        Map<String, Object> raw = Map.of("estimator", estimator, "structure", structure, "noise-correction", correction, "ridge", ridge);
        assertEquals(List.of(key), Steps.check("operator-fitter", raw).stream().map(problem -> problem.key()).toList());
    }

    @Test
    void stabilityAndANoiseCorrectionGoTogether() {
        assertEquals(List.of(), Steps.check("operator-fitter", Map.of("structure", "stable", "noise-correction", "total-least-squares")));
    }
}
