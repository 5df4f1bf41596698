package org.edgefield.field.bem.solve;

import java.util.Arrays;
import org.edgefield.field.job.Duty;
import org.edgefield.field.job.Electrode;
import org.edgefield.field.job.FieldCase;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.CommonOps_DDRM;

/** Weights of the unit fields for a duty, floating electrodes at the potential of no net charge. */
final class Superposition {
  private final double[] real;
  private final double[] imaginary;

  private Superposition(double[] real, double[] imaginary) {
    this.real = real;
    this.imaginary = imaginary;
  }

  static Superposition of(FieldCase fieldCase, Duty duty, double[][] charge) {
    int electrodes = fieldCase.electrodes().size();
    int sets = charge[0].length;
    double[] real = Arrays.copyOf(duty.real_V(), sets);
    double[] imaginary = Arrays.copyOf(duty.imaginary_V(), sets);
    if (sets > electrodes) {
      real[electrodes] = 1;
    }
    settle(fieldCase, charge, real);
    settle(fieldCase, charge, imaginary);
    return new Superposition(real, imaginary);
  }

  // Potentials of the floating electrodes that leave them without net charge.
  private static void settle(FieldCase fieldCase, double[][] charge, double[] weight) {
    int electrodes = fieldCase.electrodes().size();
    int[] floating = new int[electrodes];
    int n = 0;
    for (int e = 0; e < electrodes; e++) {
      if (fieldCase.electrodes().get(e).kind() == Electrode.Kind.FLOATING) {
        weight[e] = 0;
        floating[n++] = e;
      }
    }
    if (n == 0) {
      return;
    }
    DMatrixRMaj a = new DMatrixRMaj(n, n);
    DMatrixRMaj b = new DMatrixRMaj(n, 1);
    for (int i = 0; i < n; i++) {
      double sum = 0;
      for (int k = 0; k < weight.length; k++) {
        sum += charge[floating[i]][k] * weight[k];
      }
      b.set(i, 0, -sum);
      for (int j = 0; j < n; j++) {
        a.set(i, j, charge[floating[i]][floating[j]]);
      }
    }
    DMatrixRMaj x = new DMatrixRMaj(n, 1);
    if (!CommonOps_DDRM.solve(a, b, x)) {
      throw new SolveException("floating electrodes: their potentials are not determined");
    }
    for (int i = 0; i < n; i++) {
      weight[floating[i]] = x.get(i, 0);
    }
  }

  /** In-phase weight of a set. */
  double real(int set) {
    return real[set];
  }

  /** Quadrature weight of a set. */
  double imaginary(int set) {
    return imaginary[set];
  }

  /** In-phase sum of the sets at one unknown. */
  double real(double[][] density, int i) {
    return sum(real, density, i);
  }

  /** Quadrature sum of the sets at one unknown. */
  double imaginary(double[][] density, int i) {
    return sum(imaginary, density, i);
  }

  private static double sum(double[] weight, double[][] density, int i) {
    double sum = 0;
    for (int k = 0; k < weight.length; k++) {
      sum += weight[k] * density[k][i];
    }
    return sum;
  }
}
