/** Forecasts by modes or by the projected operator, with bands, naive baselines and scores. */
package org.modestead.engine.forecast;
