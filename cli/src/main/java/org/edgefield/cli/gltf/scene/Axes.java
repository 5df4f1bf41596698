package org.edgefield.cli.gltf.scene;

/** From model axes (Z up, metres) to glTF axes (Y up, metres): (x, y, z) becomes (x, z, -y). */
final class Axes {
  private Axes() {}

  /** Writes the image of model vector (x, y, z) to {@code out} from {@code at}. */
  static void put(double x, double y, double z, float[] out, int at) {
    out[at] = (float) x;
    out[at + 1] = (float) z;
    // 0 - y, since -y would write a negative zero
    out[at + 2] = (float) (0 - y);
  }

  /** Image of entry {@code index} of an array of model vectors. */
  static double[] of(double[] xyz, int index) {
    return new double[] {xyz[3 * index], xyz[3 * index + 2], 0 - xyz[3 * index + 1]};
  }
}
