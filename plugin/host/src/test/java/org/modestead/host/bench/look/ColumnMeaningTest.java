package org.modestead.host.bench.look;

import static org.junit.jupiter.api.Assertions.assertEquals;

import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.CsvSource;
import org.modestead.nodes.words.TimeUnit;

/** Columns of nodes' tables get the unit of the recording's time. */
class ColumnMeaningTest {

    @ParameterizedTest
    @CsvSource({"frequency,Hz,frequency", "frequency_low,Hz,frequency", "frequency_a,Hz,frequency", "frequency_spread,Hz,frequency",
        "lambda_real,1/s,rate", "lambda_imag_high,1/s,rate", "doubling_time,s,time", "period_high,s,time", "damping_ratio_b,'',share",
        "damping_spread,'',share", "energy_share,'',share", "frequency_change,'',share", "phase,rad,angle", "amplitude,'',''", "mode,'',''",
        "discharge_pressure,'',''"})
    void secondsGiveHertz(String column, String unit, String kind) {
        assertEquals(new ColumnMeaning(unit, kind), ColumnMeaning.of(column, new TimeUnit("s")));
    }

    @Test
    void daysGiveCyclesADay() {
        assertEquals("cycles/d", ColumnMeaning.of("frequency", new TimeUnit("d")).unit());
    }
}
