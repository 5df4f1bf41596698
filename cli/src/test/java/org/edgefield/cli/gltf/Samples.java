package org.edgefield.cli.gltf;

import java.util.LinkedHashMap;
import java.util.Map;
import org.edgefield.field.job.Electrode;

/** Files that between them use everything the writer can do. */
final class Samples {
  private Samples() {}

  /** Name to file content. */
  static Map<String, byte[]> all() {
    Map<String, byte[]> out = new LinkedHashMap<>();
    out.put("lone-triangle", lone().glb());
    out.put(
        "calm-ball",
        new SampleScene()
            .ball("Ball", 0, 0, 0, 0.1, 12)
            .electrode("ball", Electrode.Kind.LIVE, 0)
            .duty("service", 0.3)
            .glb());
    out.put("one-duty", oneDuty().glb());
    out.put("three-duties", threeDuties().glb(slice(3)));
    SampleScene many = SampleScene.compartment();
    for (int d = 0; d < 10; d++) {
      many.duty("duty " + d, 0.3 + 0.1 * d, 500);
    }
    out.put("ten-duties", many.glb());
    return out;
  }

  static SampleScene lone() {
    return new SampleScene().lone("only").electrode("e", Electrode.Kind.LIVE, 0).duty("d", 0.5);
  }

  static SampleScene oneDuty() {
    return SampleScene.compartment().duty("power-frequency withstand", 1.5, 290, 250, 600, 150);
  }

  static SampleScene threeDuties() {
    return SampleScene.compartment()
        .duty("service", 0.6)
        .duty("power-frequency withstand", 1.1, 290)
        .duty("lightning impulse", 1.6, 290, 250, 600, 150);
  }

  /** A cut at y = 0.4 m. */
  static SliceLayer slice(int duties) {
    double[] xyz = {0.01, 0.4, 0.01, 0.99, 0.4, 0.01, 0.99, 0.4, 0.79, 0.01, 0.4, 0.79};
    double[][] field = new double[duties][];
    double[][] ratio = new double[duties][];
    for (int d = 0; d < duties; d++) {
      field[d] = new double[] {1e5, 2e6, 3.3e6, 1e6};
      ratio[d] = new double[] {0.03, 0.7, 1.1, 0.3};
    }
    return new SliceLayer("slice y = 400 mm", xyz, new int[] {0, 1, 2, 0, 2, 3}, field, ratio);
  }
}
