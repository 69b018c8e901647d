/** Views of what a node found and of what its ports carry. Only {@code ResultView} knows the platform. */
package org.modestead.knime.view;
