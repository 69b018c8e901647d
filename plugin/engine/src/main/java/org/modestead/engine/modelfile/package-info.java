/**
 * What a fit left behind, as a tree of named fields and arrays that any container can hold, and back again. A tree read back gives a value
 * that computes the same bits. Files made of it are written by {@code org.modestead.nodes.modelfile}.
 */
package org.modestead.engine.modelfile;
