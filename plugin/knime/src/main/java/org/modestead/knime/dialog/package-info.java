/** The configuration dialog, made from a node's declaration. Only {@code DeclaredDialog} knows the platform. */
package org.modestead.knime.dialog;
