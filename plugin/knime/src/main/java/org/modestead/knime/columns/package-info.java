/** Lists of columns that are given by a rule instead of name by name. */
package org.modestead.knime.columns;
