/** The one renderer of figures: vector and pixel files, without a screen. */
package org.modestead.nodes.render;
