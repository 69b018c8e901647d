/** What runs inside the platform for the integration tests: it takes requests line by line and answers each of them. */
package org.modestead.knime.trial;
