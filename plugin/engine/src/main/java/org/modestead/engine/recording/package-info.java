/**
 * From what was logged to what a fit reads: channels, runs, gaps, missing cells, resampling, detrending, scaling, delay
 * coordinates, and the split into parts that fit, calibrate and judge. Nothing of a later part reaches an earlier one.
 */
package org.modestead.engine.recording;
