/** The choice of the function space and the fit of the operator. */
package org.modestead.nodes.fit;
