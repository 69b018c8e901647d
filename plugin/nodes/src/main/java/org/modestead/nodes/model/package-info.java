/** Nodes that hand a fitted model on to another session and take it up there. */
package org.modestead.nodes.model;
