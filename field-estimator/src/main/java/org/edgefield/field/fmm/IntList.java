package org.edgefield.field.fmm;

import java.util.Arrays;

/** A growing array of ints. */
final class IntList {
  private int[] values;
  private int size;

  IntList(int room) {
    values = new int[Math.max(16, room)];
  }

  void add(int value) {
    if (size == values.length) {
      values = Arrays.copyOf(values, 2 * size);
    }
    values[size++] = value;
  }

  int get(int i) {
    return values[i];
  }

  void set(int i, int value) {
    values[i] = value;
  }

  int size() {
    return size;
  }

  void clear() {
    size = 0;
  }

  int[] toArray() {
    return Arrays.copyOf(values, size);
  }
}
