package org.edgefield.field.bem.assembly;

/**
 * Accurate potentials of the near triangles alone, a sparse matrix over the unknowns.
 *
 * @param start first entry of each row, plus the end
 * @param column unknown per entry
 * @param value potential at the row per unit density, metres
 */
record NearPotentials(int[] start, int[] column, float[] value) {}
