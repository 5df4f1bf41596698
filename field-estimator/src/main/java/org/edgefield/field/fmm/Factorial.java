package org.edgefield.field.fmm;

/** Factorials as doubles, to 170!. */
final class Factorial {
  private static final double[] TABLE = new double[171];

  static {
    TABLE[0] = 1;
    for (int i = 1; i < TABLE.length; i++) {
      TABLE[i] = TABLE[i - 1] * i;
    }
  }

  private Factorial() {}

  static double of(int n) {
    return TABLE[n];
  }

  /** N_lm = sqrt((l-m)! (l+m)!). */
  static double norm(int l, int m) {
    return Math.sqrt(TABLE[l - m]) * Math.sqrt(TABLE[l + m]);
  }
}
