/** What dialog and views share of Swing. */
package org.modestead.knime.swing;
