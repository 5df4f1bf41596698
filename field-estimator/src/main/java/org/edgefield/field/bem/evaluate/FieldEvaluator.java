package org.edgefield.field.bem.evaluate;

import org.edgefield.field.bem.assembly.Mirror;
import org.edgefield.field.bem.quadrature.TriangleIntegrals;
import org.edgefield.field.bem.quadrature.TriangleRule;
import org.edgefield.field.bem.surface.CurvedTriangles;
import org.edgefield.field.fmm.FastMultipole;
import org.edgefield.field.parallel.Workers;

/**
 * Potential and field of solved surface densities at points off the surface:
 *
 * <pre>V(x) = sum Int s(y)/|x - y| dS (less the image's) - E0 . x,   E = -grad V</pre>
 *
 * with E0 an ambient field. Far triangles act through their three-point rules by the fast multipole
 * method, near ones through accurate integrals; the gradient of those is a central difference with
 * a step far below the distance to the triangle. Inside a conductor the field comes out as zero.
 * Limit: a point on the surface itself has a potential but no field; there the density is the
 * field.
 */
public final class FieldEvaluator {
  private static final int BLOCK = 64;
  private static final double STEP = 1e-3;
  private static final double STEP_NEAR = 0.05;

  private final CurvedTriangles triangles;
  private final int[] cornerNode;
  private final double[][] density;
  private final Mirror mirror;
  private final double[][] ambient;
  private final double tolerance;
  private final Workers workers;
  private final TriangleBalls balls;

  /**
   * Values at points.
   *
   * @param potential_V per set, one value per point
   * @param field_V_per_m per set, 3 values per point
   */
  public record Values(double[][] potential_V, double[][] field_V_per_m) {}

  /**
   * Sets up.
   *
   * @param triangles geometry
   * @param cornerNode unknown per triangle corner, 3 per triangle
   * @param density per set, values per unknown, V/m over 4 pi
   * @param mirror earth plane or null
   * @param ambient_V_per_m per set, ambient field vector, zeros where there is none
   * @param tolerance relative accuracy of the far field
   * @param workers threads; must stay open while the evaluator is used
   */
  public FieldEvaluator(
      CurvedTriangles triangles,
      int[] cornerNode,
      double[][] density,
      Mirror mirror,
      double[][] ambient_V_per_m,
      double tolerance,
      Workers workers) {
    this.triangles = triangles;
    this.cornerNode = cornerNode;
    this.density = density;
    this.mirror = mirror;
    this.ambient = ambient_V_per_m;
    this.tolerance = tolerance;
    this.workers = workers;
    balls = new TriangleBalls(triangles, TriangleIntegrals.FAR);
  }

  /**
   * Evaluates.
   *
   * @param points 3 coordinates per point, metres
   */
  public Values at(double[] points) {
    int n = points.length / 3;
    int sets = density.length;
    double[][] potential = new double[sets][n];
    double[][] field = new double[sets][3 * n];
    add(points, 1, -1, potential, field);
    if (mirror != null) {
      add(mirror.image(points), -1, mirror.axis(), potential, field);
    }
    for (int k = 0; k < sets; k++) {
      for (int i = 0; i < n; i++) {
        for (int d = 0; d < 3; d++) {
          double zero = mirror != null && mirror.axis() == d ? mirror.offset_m() : 0;
          potential[k][i] -= ambient[k][d] * (points[3 * i + d] - zero);
          field[k][3 * i + d] += ambient[k][d];
        }
      }
    }
    return new Values(potential, field);
  }

  /** Adds the charges as seen from the points, {@code sign} fold; one axis of the field flipped. */
  private void add(double[] points, int sign, int flip, double[][] potential, double[][] field) {
    int n = points.length / 3;
    int sets = density.length;
    double[][] v = new double[sets][n];
    double[][] g = new double[sets][3 * n];
    far(points, v, g);
    workers.run(
        (n + BLOCK - 1) / BLOCK,
        w -> {
          Near near = new Near();
          return b -> {
            for (int i = b * BLOCK; i < Math.min(n, (b + 1) * BLOCK); i++) {
              near.correct(points, i, v, g);
            }
          };
        });
    for (int k = 0; k < sets; k++) {
      for (int i = 0; i < n; i++) {
        potential[k][i] += sign * v[k][i];
        for (int d = 0; d < 3; d++) {
          field[k][3 * i + d] -= (d == flip ? -sign : sign) * g[k][3 * i + d];
        }
      }
    }
  }

  private void far(double[] points, double[][] v, double[][] g) {
    int nt = triangles.count();
    TriangleRule rule = TriangleRule.THREE;
    double[] sources = new double[9 * nt];
    double[][] strength = new double[density.length][3 * nt];
    double[] p = new double[9];
    for (int t = 0; t < nt; t++) {
      for (int q = 0; q < 3; q++) {
        double a = rule.u()[q];
        double b = rule.v()[q];
        triangles.evaluate(t, a, b, p);
        System.arraycopy(p, 0, sources, 9 * t + 3 * q, 3);
        double weight = rule.weight()[q] * CurvedTriangles.cross(p);
        for (int k = 0; k < density.length; k++) {
          double[] s = density[k];
          strength[k][3 * t + q] =
              weight
                  * ((1 - a - b) * s[cornerNode[3 * t]]
                      + a * s[cornerNode[3 * t + 1]]
                      + b * s[cornerNode[3 * t + 2]]);
        }
      }
    }
    new FastMultipole(sources, points, tolerance, workers).sum(strength, v, g);
  }

  /** Corrections by near triangles; owned by one thread. */
  private final class Near {
    private final TriangleBalls.Query query = balls.new Query();
    private final TriangleIntegrals integrals = new TriangleIntegrals(triangles);
    private final double[] whole = new double[3];
    private final double[] rough = new double[3];
    private final double[] x = new double[3];

    void correct(double[] points, int i, double[][] v, double[][] g) {
      System.arraycopy(points, 3 * i, x, 0, 3);
      query.at(x[0], x[1], x[2]);
      for (int q = 0; q < query.count(); q++) {
        int t = query.triangle(q);
        integrals.open(t);
        add(t, 1, v, i);
        double step =
            Math.min(
                STEP * triangles.diameter(t), STEP_NEAR * integrals.distance(x[0], x[1], x[2]));
        if (step <= 0) {
          continue;
        }
        for (int d = 0; d < 3; d++) {
          double here = x[d];
          x[d] = here + step;
          add(t, 0.5 / step, g, 3 * i + d);
          x[d] = here - step;
          add(t, -0.5 / step, g, 3 * i + d);
          x[d] = here;
        }
      }
    }

    private void add(int t, double factor, double[][] out, int at) {
      integrals.potential(x[0], x[1], x[2], whole);
      integrals.far(x[0], x[1], x[2], rough);
      for (int k = 0; k < density.length; k++) {
        double sum = 0;
        for (int c = 0; c < 3; c++) {
          sum += (whole[c] - rough[c]) * density[k][cornerNode[3 * t + c]];
        }
        out[k][at] += factor * sum;
      }
    }
  }
}
