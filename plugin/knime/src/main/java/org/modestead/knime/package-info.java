/** The bridge: shows the nodes, as declared, to the KNIME platform. */
package org.modestead.knime;
