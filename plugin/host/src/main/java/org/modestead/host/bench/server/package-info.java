/** The bench over HTTP: who may ask, which requests there are, and the JSON of each answer. */
package org.modestead.host.bench.server;
