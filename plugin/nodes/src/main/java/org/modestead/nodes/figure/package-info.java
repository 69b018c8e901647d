/** Pictures as plain data, one small class a picture; drawn by {@code org.modestead.nodes.render}. */
package org.modestead.nodes.figure;
