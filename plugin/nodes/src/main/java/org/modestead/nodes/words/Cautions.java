package org.modestead.nodes.words;

import java.util.List;

/** What always holds of results, whatever they are: told in the report and wherever a verdict or a forecast is shown. */
public final class Cautions {

    /** In reading order, each a sentence or two. */
    public static final List<String> STANDING = List.of(
            "Results from recorded data support the judgement of a licensed engineer; they do not replace it. Where pressure, structures,"
                    + " machines or grids are concerned, local codes and the limits of the equipment come first.",
            "The operator knows only the states that were recorded. A forecast that leaves the sampled region is extrapolation.",
            "Samples of a time series are not exchangeable: a band or a score from one stretch of time holds for another only as far as the"
                    + " system, its load and its sensors stay the same.");

    private Cautions() {}
}
