/** Node descriptions of the platform, made from the declarations. */
package org.modestead.knime.describe;
