/** The open node contract: what a node declares, what a host gives it and what it gives back. */
package org.modestead.nodes.contract;
