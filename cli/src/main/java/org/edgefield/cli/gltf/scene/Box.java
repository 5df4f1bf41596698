package org.edgefield.cli.gltf.scene;

/** Axis-aligned bounding box in glTF axes that grows with what is put in. */
final class Box {
  final double[] low = {
    Double.POSITIVE_INFINITY, Double.POSITIVE_INFINITY, Double.POSITIVE_INFINITY
  };
  final double[] high = {
    Double.NEGATIVE_INFINITY, Double.NEGATIVE_INFINITY, Double.NEGATIVE_INFINITY
  };

  void add(double x, double y, double z) {
    low[0] = Math.min(low[0], x);
    low[1] = Math.min(low[1], y);
    low[2] = Math.min(low[2], z);
    high[0] = Math.max(high[0], x);
    high[1] = Math.max(high[1], y);
    high[2] = Math.max(high[2], z);
  }

  void add(Box other) {
    if (!other.isEmpty()) {
      add(other.low[0], other.low[1], other.low[2]);
      add(other.high[0], other.high[1], other.high[2]);
    }
  }

  boolean isEmpty() {
    return low[0] > high[0];
  }

  double size(int axis) {
    return high[axis] - low[axis];
  }

  double centre(int axis) {
    return (low[axis] + high[axis]) / 2;
  }

  double diagonal() {
    return Math.sqrt(size(0) * size(0) + size(1) * size(1) + size(2) * size(2));
  }
}
