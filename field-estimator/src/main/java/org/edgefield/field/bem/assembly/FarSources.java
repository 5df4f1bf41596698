package org.edgefield.field.bem.assembly;

import org.edgefield.field.bem.quadrature.TriangleRule;
import org.edgefield.field.bem.surface.CurvedTriangles;

/**
 * Point charges that stand for the triangles at a distance: the three-point rule of each.
 *
 * @param cornerNode unknown per triangle corner, 3 per triangle
 * @param xyz positions, 9 per triangle
 * @param weight rule weights times surface element, 3 per triangle
 */
record FarSources(int[] cornerNode, double[] xyz, double[] weight) {

  static FarSources of(CurvedTriangles triangles, int[] cornerNode) {
    int n = triangles.count();
    TriangleRule rule = TriangleRule.THREE;
    double[] xyz = new double[9 * n];
    double[] weight = new double[3 * n];
    double[] p = new double[9];
    for (int t = 0; t < n; t++) {
      for (int g = 0; g < 3; g++) {
        triangles.evaluate(t, rule.u()[g], rule.v()[g], p);
        System.arraycopy(p, 0, xyz, 9 * t + 3 * g, 3);
        weight[3 * t + g] = rule.weight()[g] * CurvedTriangles.cross(p);
      }
    }
    return new FarSources(cornerNode, xyz, weight);
  }

  /** Number of sources. */
  int count() {
    return weight.length;
  }

  /** Strengths for a density on the unknowns. */
  void strengths(double[] density, double[] out) {
    TriangleRule rule = TriangleRule.THREE;
    for (int t = 0; t < out.length / 3; t++) {
      double s0 = density[cornerNode[3 * t]];
      double s1 = density[cornerNode[3 * t + 1]];
      double s2 = density[cornerNode[3 * t + 2]];
      for (int g = 0; g < 3; g++) {
        double u = rule.u()[g];
        double v = rule.v()[g];
        out[3 * t + g] = weight[3 * t + g] * ((1 - u - v) * s0 + u * s1 + v * s2);
      }
    }
  }
}
