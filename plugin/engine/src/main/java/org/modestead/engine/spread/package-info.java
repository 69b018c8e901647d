/** How far rates, damping and forecasts would have come out otherwise with other recordings of the same kind: the bootstrap. */
package org.modestead.engine.spread;
