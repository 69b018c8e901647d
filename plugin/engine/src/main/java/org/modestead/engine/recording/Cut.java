package org.modestead.engine.recording;

/**
 * Which rows of a run belong to which part: training, then calibration, then holdout.
 *
 * @param trainingEnd one past the last training row; 0 when the run does not train
 * @param calibrationEnd one past the last calibration row, at least {@code trainingEnd}
 */
record Cut(int trainingEnd, int calibrationEnd) {}
