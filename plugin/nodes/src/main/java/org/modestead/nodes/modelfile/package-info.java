/** Files in an open format that hold what travels between nodes: a zip of one JSON text and NPY arrays. */
package org.modestead.nodes.modelfile;
