package org.edgefield.field.bem.edge;

import java.util.ArrayDeque;
import java.util.Arrays;
import java.util.Deque;
import java.util.HashMap;
import java.util.Map;
import java.util.function.IntToDoubleFunction;
import org.edgefield.curvature.Features;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.field.bem.evaluate.FieldEvaluator;
import org.edgefield.field.edge.RoundedCorner;
import org.edgefield.field.edge.RoundedWedge;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * Peak fields on edges and corners that are drawn sharp and made with a radius r:
 *
 * <pre>
 * edge:   E = C(beta) K r^(-s) (1 + 0.6 (r/t)^(2 pi/beta))
 * right-angled corner:  E = 1.470 kappa r^(-0.5458) (1 + 0.6 (r/t)^1.45)
 * other corners:        E = 1.7 kappa r^(lambda - 1)
 * </pre>
 *
 * with K and kappa from the solved potential and t the distance to the next edge across a face. The
 * terms in r/t make up for bodies that are not large against r (fitted on directly rounded bodies,
 * from the safe side); above r/t = 0.1 the rounding must be modelled. The coefficient for other
 * corners lies 16 % above the right-angled corner's and 46 % above an edge's, on the safe side.
 */
public final class AsMadeField {
  /** Radius over thickness above which the rounding must be modelled. */
  public static final double LARGEST_SHARE = 0.1;

  private static final double EDGE_BIAS = 0.6;
  private static final double CORNER_BIAS = 0.6;
  private static final double CORNER_BIAS_POWER = 1.45;
  private static final double OTHER_CORNER = 1.7;

  /** Smallest exponent taken at a corner: a needle's. */
  private static final double LEAST_LAMBDA = 0.05;

  /** Share of the extrapolation that may be wrong. */
  private static final double DOUBT = 0.5;

  /** A station this much nearer to an end than the reach sees elements too large for its arcs. */
  private static final double LEAST_REACH = 0.5;

  private final SharpEdges edges;
  private final SurfaceMesh mesh;
  private final EdgeStations stations;
  private final EdgeCoefficients edge;
  private final CornerStations corners;
  private final CornerCoefficients corner;
  private final int[] partOfTriangle;

  /**
   * Values of one duty.
   *
   * @param field_V_per_m per mesh vertex, NaN where none
   * @param uncertainty relative, per mesh vertex, of the coefficients; that of the laws not counted
   */
  public record Values(double[] field_V_per_m, double[] uncertainty) {}

  /** Magnitude over the cycle of a weighted sum over the solved sets. */
  public interface Combination {
    /** Magnitude of the sum of {@code perSet[k][i]} over k, by the weights of a duty. */
    double magnitude(double[][] perSet, int i);
  }

  /** Potential of the conductor that a mesh triangle belongs to. */
  public interface Potentials {
    /** Volts of a triangle's conductor in a solved set. */
    double of(int triangle, int set);
  }

  private AsMadeField(
      SharpEdges edges,
      SurfaceMesh mesh,
      EdgeStations stations,
      EdgeCoefficients edge,
      CornerStations corners,
      CornerCoefficients corner,
      int[] partOfTriangle) {
    this.edges = edges;
    this.mesh = mesh;
    this.stations = stations;
    this.edge = edge;
    this.corners = corners;
    this.corner = corner;
    this.partOfTriangle = partOfTriangle;
  }

  /**
   * Evaluates the solved potential around edges and corners.
   *
   * @param geometry exact geometry
   * @param features edge classes and corners
   * @param edges the sharp edges
   * @param mesh the solved mesh
   * @param nodes its nodes
   * @param charged per mesh triangle, whether it carries charge
   * @param evaluator potentials of the solved sets
   * @param potentials potentials of the conductors
   * @param sets number of sets
   */
  public static AsMadeField of(
      ExactGeometry geometry,
      Features features,
      SharpEdges edges,
      SurfaceMesh mesh,
      SurfaceNodes nodes,
      boolean[] charged,
      FieldEvaluator evaluator,
      Potentials potentials,
      int sets) {
    EdgeStations stations = EdgeStations.of(geometry, edges, mesh, charged);
    CornerStations corners = CornerStations.of(features, edges, mesh, nodes, charged);
    double[] arcs = EdgeCoefficients.arcs(stations);
    double[] outward = CornerCoefficients.points(corners);
    double[] points = Arrays.copyOf(arcs, arcs.length + outward.length);
    System.arraycopy(outward, 0, points, arcs.length, outward.length);
    FieldEvaluator.Values values =
        points.length == 0
            ? new FieldEvaluator.Values(new double[sets][0], new double[sets][0])
            : evaluator.at(points);
    int[] part = new int[mesh.triangleCount()];
    for (int t = 0; t < part.length; t++) {
      part[t] = geometry.facePart(mesh.triangleFace()[t]);
    }
    return new AsMadeField(
        edges,
        mesh,
        stations,
        EdgeCoefficients.of(stations, values, conductors(stations.triangle(), potentials, sets)),
        corners,
        CornerCoefficients.of(
            corners, values, arcs.length / 3, conductors(corners.triangle(), potentials, sets)),
        part);
  }

  private static double[][] conductors(int[] triangle, Potentials potentials, int sets) {
    double[][] out = new double[sets][triangle.length];
    for (int k = 0; k < sets; k++) {
      for (int i = 0; i < triangle.length; i++) {
        out[k][i] = potentials.of(triangle[i], k);
      }
    }
    return out;
  }

  /**
   * Peak fields of a duty on all sharp edges and corners.
   *
   * @param duty weights
   * @param radiusOfPart_m edge radius as made per part
   */
  public Values of(Combination duty, IntToDoubleFunction radiusOfPart_m) {
    int n = mesh.vertexCount();
    double[] sum = new double[n];
    double[] doubt = new double[n];
    int[] count = new int[n];
    Map<Integer, RoundedWedge> wedges = new HashMap<>();
    for (int i = 0; i < stations.count(); i++) {
      int e = stations.number()[i];
      if (stations.reach_m()[i] < LEAST_REACH * edges.reach_m(e)) {
        continue;
      }
      double angle = stations.interiorAngle_rad()[i];
      RoundedWedge wedge =
          wedges.computeIfAbsent(
              (int) Math.round(1e6 * angle), k -> RoundedWedge.ofInteriorAngle(angle));
      double radius = radiusOfPart_m.applyAsDouble(partOfTriangle[stations.triangle()[i]]);
      double share = radius / edges.thickness_m(e);
      double bias = 1 + EDGE_BIAS * Math.pow(share, 2 * Math.PI / (2 * Math.PI - angle));
      double value = bias * wedge.peak_V_per_m(duty.magnitude(edge.k(), i), radius);
      double off = bias * wedge.peak_V_per_m(duty.magnitude(edge.correction(), i), radius);
      for (int end = 0; end < 2; end++) {
        int v = mesh.segmentVertices()[2 * stations.segment()[i] + end];
        sum[v] += value;
        doubt[v] += DOUBT * off;
        count[v]++;
      }
    }
    double[] field = new double[n];
    double[] uncertainty = new double[n];
    for (int v = 0; v < n; v++) {
      field[v] = count[v] == 0 ? Double.NaN : sum[v] / count[v];
      uncertainty[v] = sum[v] > 0 ? doubt[v] / sum[v] : 0;
    }
    spread(field, uncertainty);
    corners(duty, radiusOfPart_m, field, uncertainty);
    return new Values(field, uncertainty);
  }

  /**
   * Highest value on each edge, by number; 0 where there is none.
   *
   * @param values of a duty
   */
  public double[] highest(Values values) {
    double[] out = new double[edges.count()];
    for (int i = 0; i < stations.count(); i++) {
      for (int end = 0; end < 2; end++) {
        double v = values.field_V_per_m[mesh.segmentVertices()[2 * stations.segment()[i] + end]];
        int e = stations.number()[i];
        out[e] = v > out[e] ? v : out[e];
      }
    }
    return out;
  }

  /** Vertices near the ends of an edge take the value of the nearest that has one. */
  private void spread(double[] field, double[] uncertainty) {
    Map<Integer, int[]> next = new HashMap<>();
    for (int i = 0; i < stations.count(); i++) {
      int a = mesh.segmentVertices()[2 * stations.segment()[i]];
      int b = mesh.segmentVertices()[2 * stations.segment()[i] + 1];
      next.merge(a, new int[] {b}, AsMadeField::joined);
      next.merge(b, new int[] {a}, AsMadeField::joined);
    }
    Deque<Integer> front = new ArrayDeque<>();
    next.keySet().stream().sorted().filter(v -> !Double.isNaN(field[v])).forEach(front::add);
    while (!front.isEmpty()) {
      int v = front.remove();
      for (int w : next.get(v)) {
        if (Double.isNaN(field[w])) {
          field[w] = field[v];
          uncertainty[w] = uncertainty[v];
          front.add(w);
        }
      }
    }
  }

  private static int[] joined(int[] a, int[] b) {
    int[] out = Arrays.copyOf(a, a.length + b.length);
    System.arraycopy(b, 0, out, a.length, b.length);
    return out;
  }

  private void corners(
      Combination duty, IntToDoubleFunction radiusOfPart_m, double[] field, double[] uncertainty) {
    for (int i = 0; i < corners.count(); i++) {
      double radius = radiusOfPart_m.applyAsDouble(partOfTriangle[corners.triangle()[i]]);
      int v = corners.vertex()[i];
      if (corners.rightAngled()[i]) {
        double kappa = duty.magnitude(corner.kappa(), i);
        double share = radius / corners.thickness_m()[i];
        double bias = 1 + CORNER_BIAS * Math.pow(share, CORNER_BIAS_POWER);
        field[v] = bias * RoundedCorner.peak_V_per_m(kappa, radius);
        uncertainty[v] = kappa > 0 ? DOUBT * duty.magnitude(corner.correction(), i) / kappa : 0;
      } else {
        double near = duty.magnitude(corner.near_V(), i);
        double ratio = near > 0 ? duty.magnitude(corner.far_V(), i) / near : 2;
        double lambda = Math.max(LEAST_LAMBDA, Math.min(1, Math.log(ratio) / Math.log(2)));
        double distance = 0.5 * corners.reach_m()[i];
        field[v] = OTHER_CORNER * near / distance * Math.pow(radius / distance, lambda - 1);
        uncertainty[v] = 0;
      }
    }
  }
}
