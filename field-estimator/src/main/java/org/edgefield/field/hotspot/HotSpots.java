package org.edgefield.field.hotspot;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Comparator;
import java.util.List;
import java.util.Map;
import org.edgefield.curvature.EdgeClass;
import org.edgefield.curvature.Features;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.field.gas.PermittedField;
import org.edgefield.field.result.DutyField;
import org.edgefield.field.result.DutyResult;
import org.edgefield.field.result.HotSpot;
import org.edgefield.field.result.Law;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.mesh.SurfaceMesh;

/** Finds, ranks and explains the hot spots of a duty; serves the estimate and the solve alike. */
public final class HotSpots {
  /** Share of the peak that bounds the region shown where nothing is amber. */
  private static final double CALM_SHARE = 0.95;

  private final SurfaceMesh mesh;
  private final SurfaceNodes nodes;
  private final Features features;
  private final SharpVertices sharp;
  private final LocalLaw model;
  private final PermittedField permitted;
  private final double amber;
  private final Regions regions;
  private final int[] nodePart;
  private final double[] nodeArea;

  /**
   * Prepares for any number of duties.
   *
   * @param amber utilisation from which a region counts
   */
  public HotSpots(
      Assembly assembly,
      SurfaceMesh mesh,
      SurfaceNodes nodes,
      Features features,
      LocalLaw model,
      PermittedField permitted,
      double amber) {
    this.mesh = mesh;
    this.nodes = nodes;
    this.model = model;
    this.permitted = permitted;
    this.amber = amber;
    this.features = features;
    sharp = model.sharp();
    regions = new Regions(mesh, nodes, features, sharp, assembly.geometry().faceCount());
    nodePart = new int[nodes.count()];
    nodeArea = new double[nodes.count()];
    double[] area = MeshAreas.triangles(mesh);
    for (int t = 0; t < mesh.triangleCount(); t++) {
      double third = area[t] / 3;
      int part = assembly.geometry().facePart(mesh.triangleFace()[t]);
      for (int c = 0; c < 3; c++) {
        int n = nodes.cornerNode()[3 * t + c];
        nodePart[n] = part;
        nodeArea[n] += third;
      }
    }
  }

  /**
   * The outcome of one duty.
   *
   * @param duty index in the case
   * @param field its values on the nodes
   */
  public DutyResult of(int duty, DutyField field) {
    return of(duty, field, Map.of());
  }

  /**
   * The outcome of one duty where more is known of what some places bear.
   *
   * @param duty index in the case
   * @param field its values on the nodes
   * @param permittedAt permitted field by peak node, V/m; others keep that of the field
   */
  public DutyResult of(int duty, DutyField field, Map<Integer, Double> permittedAt) {
    double[] utilisation = new double[nodes.count()];
    int peak = 0;
    for (int n = 0; n < utilisation.length; n++) {
      utilisation[n] = field.field_V_per_m()[n] / field.permitted_V_per_m()[n];
      if (utilisation[n] > utilisation[peak]) {
        peak = n;
      }
    }
    List<HotSpot> spots = new ArrayList<>();
    for (int[] region : regions.above(utilisation, amber)) {
      spots.add(describe(duty, region, field, utilisation, permittedAt));
    }
    spots = ranked(spots);
    HotSpot highest;
    if (!spots.isEmpty()) {
      highest = spots.get(0);
    } else {
      double limit = Math.max(CALM_SHARE * utilisation[peak], Double.MIN_NORMAL);
      List<int[]> calm = regions.above(utilisation, limit);
      int[] region = calm.isEmpty() ? new int[] {peak} : calm.get(0);
      highest = describe(duty, region, field, utilisation, permittedAt);
    }
    return new DutyResult(field, highest, List.copyOf(spots));
  }

  /** By utilisation, numbered from 1. */
  private static List<HotSpot> ranked(List<HotSpot> spots) {
    List<HotSpot> out = new ArrayList<>();
    spots.stream()
        .sorted(Comparator.comparingDouble(h -> -h.utilisation()))
        .forEach(h -> out.add(h.withId(out.size() + 1)));
    return out;
  }

  private HotSpot describe(
      int duty,
      int[] region,
      DutyField field,
      double[] utilisation,
      Map<Integer, Double> permittedAt) {
    int p = region[0];
    for (int n : region) {
      if (utilisation[n] > utilisation[p]) {
        p = n;
      }
    }
    int v = nodes.nodeVertex()[p];
    boolean line = regions.isLine(p);
    double areaSum = 0;
    for (int n : region) {
      areaSum += nodeArea[n];
    }
    double gap = model.gap_m(duty, p);
    double limit = permittedAt.getOrDefault(p, field.permitted_V_per_m()[p]);
    double used = field.field_V_per_m()[p] / limit;
    return new HotSpot(
        1,
        nodePart[p],
        regions.name(p),
        Arrays.copyOfRange(mesh.xyz(), 3 * v, 3 * v + 3),
        field.field_V_per_m()[p],
        limit,
        used,
        field.uncertainty()[p],
        line ? Double.NaN : areaSum,
        line ? length(region) : Double.NaN,
        field.radius_m()[p],
        gap,
        model.opposingPart(duty, p),
        lawOf(field.law()[p]),
        region,
        new Cures(model, permitted).of(duty, p, used, field.radius_m()[p]));
  }

  @SuppressWarnings("EnumOrdinal")
  private static Law lawOf(byte code) {
    return Law.values()[code];
  }

  /** Length of the sharp edges in a region: half of each segment per end inside. */
  private double length(int[] region) {
    boolean[] inside = new boolean[mesh.vertexCount()];
    for (int n : region) {
      inside[nodes.nodeVertex()[n]] = true;
    }
    double sum = 0;
    for (int g = 0; g < mesh.segmentCount(); g++) {
      int a = mesh.segmentVertices()[2 * g];
      int b = mesh.segmentVertices()[2 * g + 1];
      if (!sharp.isSharp(a) || !sharp.isSharp(b) || smooth(mesh.segmentEdge()[g])) {
        continue;
      }
      double ends = (inside[a] ? 0.5 : 0) + (inside[b] ? 0.5 : 0);
      if (ends > 0) {
        double d2 = 0;
        for (int k = 0; k < 3; k++) {
          double d = mesh.xyz()[3 * a + k] - mesh.xyz()[3 * b + k];
          d2 += d * d;
        }
        sum += ends * Math.sqrt(d2);
      }
    }
    return sum;
  }

  private boolean smooth(int edge) {
    EdgeClass c = features.edge(edge).edgeClass();
    return c != EdgeClass.SHARP_CONVEX && c != EdgeClass.MIXED;
  }
}
