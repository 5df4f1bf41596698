package org.edgefield.field.bem.validation;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import org.assertj.core.data.Percentage;
import org.edgefield.field.bem.solve.SolveSettings;
import org.edgefield.field.edge.RoundedCorner;
import org.edgefield.field.edge.RoundedWedge;
import org.edgefield.importer.mesh.MeshSettings;
import org.junit.jupiter.api.BeforeAll;
import org.junit.jupiter.api.Test;

/**
 * Edges and corners of a cube of side a at 1 V, drawn sharp. Reference values for a = 1 m: edge
 * coefficient in the middle of an edge K = 0.540, corner coefficient kappa = 0.7489 (both
 * recomputed with graded meshes by another program), capacitance 0.6606781541 (4 pi eps0 a)
 * (Helsing and Perfekt 2013, seen).
 */
class CubeEdgeTest {
  private static final double SIDE = 0.1;

  /** So small that the terms in r/t do not count. */
  private static final double RADIUS = 1e-6;

  private static SolvedModel cube;

  @BeforeAll
  static void solve() {
    cube =
        SolvedModel.of(
            "cube-100.step",
            "*",
            RADIUS,
            MeshSettings.defaults(),
            new SolveSettings(0.003, 60, 2L << 30, 2));
  }

  @Test
  void converges() {
    assertThat(cube.result().converged()).isTrue();
    assertThat(cube.result().errorEstimate()).isLessThan(0.003);
  }

  @Test
  void edgeCoefficientInTheMiddleOfAnEdge() {
    double peak = cube.peakIn(new double[] {-0.06, -0.06, -0.001, 0.06, 0.06, 0.001});
    RoundedWedge wedge = RoundedWedge.ofInteriorAngle(Math.PI / 2);
    double k = peak / wedge.peak_V_per_m(1, RADIUS) * Math.pow(SIDE, 1 - wedge.exponent());
    assertThat(k).isCloseTo(0.540, Percentage.withPercentage(0.5));
  }

  @Test
  void cornerCoefficient() {
    double peak = cube.result().duties().get(0).peak().field_V_per_m();
    double kappa =
        peak / RoundedCorner.peak_V_per_m(1, RADIUS) * Math.pow(SIDE, 1 - RoundedCorner.EXPONENT);
    assertThat(kappa).isCloseTo(0.7489, Percentage.withPercentage(0.5));
  }

  @Test
  void capacitance() {
    double unit = 4 * Math.PI * 8.8541878128e-12 * SIDE;
    assertThat(cube.result().capacitance_F()[0] / unit).isCloseTo(0.6606781541, within(6.6e-5));
  }
}
