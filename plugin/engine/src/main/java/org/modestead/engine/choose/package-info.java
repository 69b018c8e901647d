/**
 * The choice of a kernel: families and scales ranked by verdict and by held-out evidence. Stands above {@code wellposed}, whose
 * verdict it uses.
 */
package org.modestead.engine.choose;
