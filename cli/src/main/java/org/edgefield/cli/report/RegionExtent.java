package org.edgefield.cli.report;

import org.edgefield.cli.report.Report.Extent;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * Picks points that stand for a region: the peak first, then always the node farthest from those
 * already picked, so that few points cover it evenly.
 */
final class RegionExtent {
  private static final int MOST_POINTS = 32;

  private RegionExtent() {}

  static Extent of(double[] peak_m, int[] regionNodes, SurfaceNodes nodes, SurfaceMesh mesh) {
    int n = regionNodes.length;
    double[] points = new double[3 * (MOST_POINTS + 1)];
    System.arraycopy(peak_m, 0, points, 0, 3);
    double[] distance2 = new double[n];
    java.util.Arrays.fill(distance2, Double.POSITIVE_INFINITY);
    int count = 1;
    while (true) {
      int farthest = -1;
      double most = 0;
      for (int i = 0; i < n; i++) {
        int v = 3 * nodes.nodeVertex()[regionNodes[i]];
        double dx = mesh.xyz()[v] - points[3 * count - 3];
        double dy = mesh.xyz()[v + 1] - points[3 * count - 2];
        double dz = mesh.xyz()[v + 2] - points[3 * count - 1];
        distance2[i] = Math.min(distance2[i], dx * dx + dy * dy + dz * dz);
        if (distance2[i] > most) {
          most = distance2[i];
          farthest = i;
        }
      }
      if (farthest < 0 || count == MOST_POINTS) {
        return new Extent(java.util.Arrays.copyOf(points, 3 * count), Math.sqrt(most));
      }
      System.arraycopy(
          mesh.xyz(), 3 * nodes.nodeVertex()[regionNodes[farthest]], points, 3 * count, 3);
      count++;
    }
  }
}
