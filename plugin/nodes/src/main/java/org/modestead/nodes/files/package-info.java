/** How files come to their places whole or not at all. */
package org.modestead.nodes.files;
