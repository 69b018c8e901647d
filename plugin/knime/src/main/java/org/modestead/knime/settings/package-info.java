/** The declared settings in the platform's native form: one typed key a setting, so that a flow variable can replace each. */
package org.modestead.knime.settings;
