package org.modestead.engine.kernel;

import java.util.OptionalDouble;

/**
 * What is known about a kernel's space without any data.
 *
 * @param holdsConstants whether the constant function belongs to it
 * @param holdsCoordinates whether the coordinate functions x_k belong to it
 * @param coordinateNormSquared ‖x_k‖² in the space where it is known and the same for every k; empty otherwise
 * @param room which modes it has room for, whatever the data
 * @param sentence what follows for modes, in plain words; empty when nothing does
 */
public record SpaceFacts(boolean holdsConstants, boolean holdsCoordinates, OptionalDouble coordinateNormSquared, ModeRoom room,
        String sentence) {}
