/** Reports as plain data. */
package org.modestead.nodes.document;
