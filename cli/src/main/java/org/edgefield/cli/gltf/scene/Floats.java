package org.edgefield.cli.gltf.scene;

import java.util.Arrays;

/** A growing array of floats. */
final class Floats {
  private float[] data = new float[64];
  private int size;

  void add(double... values) {
    if (size + values.length > data.length) {
      data = Arrays.copyOf(data, Math.max(2 * data.length, size + values.length));
    }
    for (double v : values) {
      data[size++] = (float) v;
    }
  }

  int size() {
    return size;
  }

  float[] toArray() {
    return Arrays.copyOf(data, size);
  }
}
