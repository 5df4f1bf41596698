package org.edgefield.field.bem.solve;

import org.edgefield.field.bem.assembly.Collocation;
import org.edgefield.field.bem.assembly.Mirror;
import org.edgefield.field.bem.assembly.SingleLayer;
import org.edgefield.field.bem.krylov.Gmres;
import org.edgefield.field.bem.surface.CurvedTriangles;
import org.edgefield.field.job.FieldCase;
import org.edgefield.field.job.Surroundings;
import org.edgefield.field.parallel.Workers;
import org.edgefield.importer.Progress;

/**
 * Solved densities: one per electrode at 1 V with all others at 0 V, and one for the ambient field
 * with all at 0 V.
 *
 * @param density per set, one value per unknown, V/m over 4 pi; the ambient set last where there is
 *     an ambient field
 * @param charge_C charge per electrode (row) and set (column)
 * @param iterations iterations of the slowest set
 * @param residual largest relative residual
 */
record UnitFields(double[][] density, double[][] charge_C, int iterations, double residual) {
  static final double EPSILON_0 = 8.8541878128e-12;
  private static final double RESIDUAL = 1e-6;
  private static final int ITERATIONS = 150;

  static UnitFields solve(
      ChargedSurface surface,
      FieldCase fieldCase,
      double farTolerance,
      Workers workers,
      Progress progress) {
    Surroundings around = fieldCase.surroundings();
    Mirror mirror = mirror(around);
    Collocation rows =
        Collocation.of(
            surface.triangles(), surface.cornerUnknown(), surface.position(), surface.seam());
    progress.report("solve", Double.NaN, "near field of " + surface.unknowns() + " unknowns");
    SingleLayer layer =
        new SingleLayer(
            surface.triangles(), surface.cornerUnknown(), rows, mirror, farTolerance, workers);
    int electrodes = fieldCase.electrodes().size();
    double[] ambient = around.ambientField_V_per_m();
    int sets = electrodes + (ambient == null ? 0 : 1);
    double[][] right = new double[sets][surface.unknowns()];
    for (int i = 0; i < surface.unknowns(); i++) {
      right[surface.electrode()[i]][i] = 1;
      if (ambient != null) {
        for (int e = rows.rowStart()[i]; e < rows.rowStart()[i + 1]; e++) {
          int p = rows.rowPoint()[e];
          for (int k = 0; k < 3; k++) {
            double x = rows.points()[3 * p + k];
            double zero = mirror != null && mirror.axis() == k ? mirror.offset_m() : 0;
            right[electrodes][i] += rows.rowWeight()[e] * ambient[k] * (x - zero);
          }
        }
      }
    }
    Gmres.Outcome out =
        Gmres.solve(
            layer::apply, layer.approximateInverse(), right, null, RESIDUAL, ITERATIONS, progress);
    double[][] charge = new double[electrodes][sets];
    for (int k = 0; k < sets; k++) {
      double[] q = charges(surface, out.solution()[k], electrodes);
      for (int e = 0; e < electrodes; e++) {
        charge[e][k] = q[e];
      }
    }
    return new UnitFields(out.solution(), charge, out.iterations(), out.residual());
  }

  /** The earth plane as a mirror, null where there is none. */
  static Mirror mirror(Surroundings around) {
    return around.earthPlane() == null
        ? null
        : new Mirror(around.earthPlane().axis(), around.earthPlane().offset_m());
  }

  private static double[] charges(ChargedSurface surface, double[] s, int electrodes) {
    double[] q = new double[electrodes];
    double[] p = new double[9];
    int[] corner = surface.cornerUnknown();
    for (int t = 0; t < surface.triangles().count(); t++) {
      double sum = 0;
      for (int k = 0; k < 3; k++) {
        double u = k == 1 ? 2 / 3.0 : 1 / 6.0;
        double v = k == 2 ? 2 / 3.0 : 1 / 6.0;
        surface.triangles().evaluate(t, u, v, p);
        sum +=
            CurvedTriangles.cross(p)
                / 6
                * ((1 - u - v) * s[corner[3 * t]]
                    + u * s[corner[3 * t + 1]]
                    + v * s[corner[3 * t + 2]]);
      }
      q[surface.electrode()[corner[3 * t]]] += 4 * Math.PI * EPSILON_0 * sum;
    }
    return q;
  }

  /** Capacitance matrix, row by row, farads. */
  double[] capacitance_F() {
    int n = charge_C.length;
    double[] c = new double[n * n];
    for (int i = 0; i < n; i++) {
      System.arraycopy(charge_C[i], 0, c, i * n, n);
    }
    return c;
  }
}
