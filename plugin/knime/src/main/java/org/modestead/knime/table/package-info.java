/** The platform's tables as the nodes read them, and the nodes' tables as the platform keeps them. */
package org.modestead.knime.table;
