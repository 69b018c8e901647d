/** What trades that measure modes ask for beyond the mode table: stabilisation over the model order, likeness of shapes. */
package org.modestead.nodes.modal;
