package org.edgefield.cli.gltf.scene;

import java.util.Arrays;

/** A growing array of integers. */
final class Ints {
  private int[] data = new int[64];
  private int size;

  void add(int... values) {
    if (size + values.length > data.length) {
      data = Arrays.copyOf(data, Math.max(2 * data.length, size + values.length));
    }
    System.arraycopy(values, 0, data, size, values.length);
    size += values.length;
  }

  int size() {
    return size;
  }

  int[] toArray() {
    return Arrays.copyOf(data, size);
  }
}
