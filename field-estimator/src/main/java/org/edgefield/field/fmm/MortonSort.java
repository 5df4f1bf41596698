package org.edgefield.field.fmm;

/** Morton (Z-order) keys of 20 bits a coordinate, and their radix sort. */
final class MortonSort {
  private static final int DIGIT = 12;

  private MortonSort() {}

  /** Spreads the lower 20 bits of a coordinate to every third bit. */
  static long spread(int c) {
    long x = c & 0xfffff;
    x = (x | x << 32) & 0x1f00000000ffffL;
    x = (x | x << 16) & 0x1f0000ff0000ffL;
    x = (x | x << 8) & 0x100f00f00f00f00fL;
    x = (x | x << 4) & 0x10c30c30c30c30c3L;
    return (x | x << 2) & 0x1249249249249249L;
  }

  /**
   * Sorts keys in place (stable).
   *
   * @return original index of each sorted key
   */
  static int[] sort(long[] key) {
    int n = key.length;
    long[] from = key;
    long[] to = new long[n];
    int[] index = new int[n];
    int[] other = new int[n];
    for (int i = 0; i < n; i++) {
      index[i] = i;
    }
    int[] start = new int[1 << DIGIT];
    for (int shift = 0; shift < 60; shift += DIGIT) {
      java.util.Arrays.fill(start, 0);
      for (int i = 0; i < n; i++) {
        start[(int) (from[i] >>> shift) & (1 << DIGIT) - 1]++;
      }
      int sum = 0;
      for (int d = 0; d < start.length; d++) {
        int c = start[d];
        start[d] = sum;
        sum += c;
      }
      for (int i = 0; i < n; i++) {
        int at = start[(int) (from[i] >>> shift) & (1 << DIGIT) - 1]++;
        to[at] = from[i];
        other[at] = index[i];
      }
      long[] k = from;
      from = to;
      to = k;
      int[] x = index;
      index = other;
      other = x;
    }
    // Five passes: the sorted keys stand in the second buffer.
    System.arraycopy(from, 0, key, 0, n);
    return index;
  }
}
