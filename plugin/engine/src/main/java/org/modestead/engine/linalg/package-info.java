/**
 * The few dense operations the engine needs, behind {@link org.modestead.engine.linalg.LinearAlgebra}: EJML by default, a faster
 * library when one is installed. Matrices are EJML's; by convention nobody writes to one that another object holds.
 */
package org.modestead.engine.linalg;
