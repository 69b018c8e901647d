package org.bytedeco.openblas.global;

/**
 * Stands in the place of the library's second form, which the loader initialises beside the first. That one would load the whole native library
 * once more under another name, and the number of threads would be set in the wrong one of the two. This one loads nothing.
 */
public final class openblas_nolapack {

    private openblas_nolapack() {}
}
