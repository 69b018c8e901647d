/** Reconstruction and forecast. */
package org.modestead.nodes.forecast;
