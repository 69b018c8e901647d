/**
 * A job for Apache Spark that does the one pass of {@code org.modestead.engine.moments} on many machines. Knows the engine and Spark, nothing
 * of nodes or hosts.
 */
package org.modestead.spark;
