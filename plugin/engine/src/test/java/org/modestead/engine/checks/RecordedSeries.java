package org.modestead.engine.checks;

import java.util.Map;
import java.util.stream.IntStream;
import org.modestead.engine.recording.Run;

/** The recorded series of CHECKS section 5; see {@code checks/SOURCES.md} for where each comes from. */
final class RecordedSeries {

    /** Years whose figure in the edition that ends in 1988, on which the derived values rest, is not that of the file. */
    private static final Map<Integer, Double> EDITION_OF_1988 = Map.of(1962, 37.5, 1980, 154.7, 1981, 140.5, 1987, 29.2);
    private static final int FIRST_YEAR = 1700;

    private RecordedSeries() {}

    /** Monthly means at Mauna Loa, 1959 to 1997. */
    static double[] carbonDioxide() {
        return column("co2_mauna_loa_monthly_1959_1997.csv", 3);
    }

    /** Yearly means, 1700 to 2008. */
    static double[] sunspots() {
        return column("sunspot_year_1700_2008.csv", 1);
    }

    /** Yearly means of some years in the edition that ends in 1988. */
    static double[] sunspots(int from, int to) {
        double[] all = sunspots();
        return IntStream.rangeClosed(from, to).mapToDouble(year -> EDITION_OF_1988.getOrDefault(year, all[year - FIRST_YEAR]))
                .toArray();
    }

    /** Animals trapped a year, 1821 to 1934. */
    static double[] lynx() {
        return column("lynx_1821_1934.csv", 1);
    }

    /** Flow a year, 1871 to 1970. */
    static double[] nile() {
        return column("nile_1871_1970.csv", 1);
    }

    private static double[] column(String file, int column) {
        ReferenceTable table = ReferenceTable.read(file);
        return IntStream.range(0, table.rows().size()).mapToDouble(k -> table.number(k, column)).toArray();
    }

    /** One run of unit steps. */
    static Run run(double[] y) {
        return new Run("series", IntStream.range(0, y.length).asDoubleStream().toArray(), Fits.column(y));
    }
}
