package org.modestead.engine.checks;

import java.util.List;

/**
 * A value found for a row of the table of checks.
 *
 * @param value found
 * @param how in words
 * @param kind which of the row's tolerances it has to meet, empty for its only one
 * @param engine whether code of the engine found it, not only a formula that the tests use as a fixture
 */
record Found(double value, String how, String kind, boolean engine) {

    static List<Found> by(String how, double value) {
        return List.of(new Found(value, how, "", true));
    }

    /** For a row with tolerances of several kinds. */
    static Found of(String kind, String how, double value) {
        return new Found(value, how, kind, true);
    }

    /** A formula of the tests, checked because other tests lean on it. */
    static Found fixture(String kind, String how, double value) {
        return new Found(value, how, kind, false);
    }
}
