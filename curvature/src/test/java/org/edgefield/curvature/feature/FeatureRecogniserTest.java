package org.edgefield.curvature.feature;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.stream.Stream;
import org.edgefield.curvature.EdgeClass;
import org.edgefield.curvature.Features;
import org.edgefield.curvature.Revolved;
import org.edgefield.curvature.RevolvedSolid;
import org.edgefield.importer.brep.SurfaceKind;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.Arguments;
import org.junit.jupiter.params.provider.MethodSource;

class FeatureRecogniserTest {
  private static Features of(RevolvedSolid solid) {
    return FeatureRecogniser.of(solid, solid.mesh(24, 4));
  }

  /** Names of all faces, in the order of the profile. Invented bodies; names follow from them. */
  static Stream<Arguments> bodies() {
    SurfaceKind nurbs = SurfaceKind.NURBS;
    return Stream.of(
        Arguments.of(Revolved.sphere(0.01), new String[] {"sphere R10"}),
        Arguments.of(
            Revolved.cone(0.01, 0.01 / Math.tan(Math.toRadians(30))),
            new String[] {"flat face", "cone, half-angle 30 deg"}),
        Arguments.of(
            Revolved.cylinder(0.025, 0.1), new String[] {"flat face", "cylinder R25", "flat face"}),
        Arguments.of(
            Revolved.tube(0.005, 0.0125, 0.1),
            new String[] {"flat face", "cylinder R12.5", "flat face", "bore R5"}),
        Arguments.of(
            Revolved.roundedDisc(0.05, 0.02, 0.002, SurfaceKind.TORUS),
            new String[] {
              "flat face", "rounded edge R2", "cylinder R50", "rounded edge R2", "flat face"
            }),
        Arguments.of(
            Revolved.roundedDisc(0.05, 0.02, 0.0003, nurbs),
            new String[] {
              "flat face", "rounded edge R0.3", "cylinder R50", "rounded edge R0.3", "flat face"
            }),
        Arguments.of(
            Revolved.stud(0.002, 0.005, SurfaceKind.TORUS),
            new String[] {
              "flat face",
              "cylinder R20",
              "flat face",
              "inside fillet R5",
              "cylinder R2",
              "flat face"
            }),
        Arguments.of(
            Revolved.rod(0.01, 0.1), new String[] {"flat face", "cylinder R10", "rounded end R10"}),
        Arguments.of(
            Revolved.torus(0.05, 0.01, SurfaceKind.TORUS),
            new String[] {"torus, section R10", "torus, section R10"}),
        Arguments.of(
            Revolved.torus(0.05, 0.01, nurbs),
            new String[] {"round section R10", "round section R10"}));
  }

  @ParameterizedTest
  @MethodSource("bodies")
  void facesAreNamedForWhatTheyAre(RevolvedSolid solid, String[] names) {
    Features f = of(solid);
    String[] found = new String[names.length];
    for (int i = 0; i < names.length; i++) {
      found[i] = f.faceName(i);
    }
    assertThat(found).containsExactly(names);
  }

  @Test
  void aFullRoundRimTurnsThroughHalfACircle() {
    // A disc whose rim is one half torus between two flat faces.
    RevolvedSolid solid =
        new RevolvedSolid(0, 0)
            .line(0.045, 0)
            .arc(0.045, 0.01, Math.PI, SurfaceKind.TORUS)
            .line(0, 0.01);
    Features f = of(solid);
    Features.RoundedEdge rim = f.roundedEdge(1);
    assertThat(rim.radius_m()).isCloseTo(0.005, within(1e-12));
    assertThat(rim.turning_rad()).isCloseTo(Math.PI, within(1e-9));
    assertThat(rim.convex()).isTrue();
    assertThat(f.faceName(1)).isEqualTo("rounded edge R5");
  }

  @Test
  void aRoundedEdgeHasItsRadiusAndTurningAngle() {
    for (SurfaceKind kind : new SurfaceKind[] {SurfaceKind.TORUS, SurfaceKind.NURBS}) {
      Features f = of(Revolved.roundedDisc(0.05, 0.02, 0.002, kind));
      Features.RoundedEdge rim = f.roundedEdge(1);
      assertThat(rim.radius_m()).isCloseTo(0.002, within(1e-12));
      assertThat(rim.turning_rad()).isCloseTo(Math.PI / 2, within(1e-9));
      assertThat(rim.convex()).isTrue();
      assertThat(f.roundedEdge(0)).isNull();
      assertThat(f.roundedEdge(2)).isNull();
      Features.RoundedEdge foot = of(Revolved.stud(0.002, 0.005, kind)).roundedEdge(3);
      assertThat(foot.radius_m()).isCloseTo(0.005, within(1e-12));
      assertThat(foot.turning_rad()).isCloseTo(Math.PI / 2, within(1e-9));
      assertThat(foot.convex()).isFalse();
    }
  }

  @Test
  void aRimRoundedOnOneSideOnlyIsNoRoundedEdge() {
    // The arc meets the top at 45 degrees instead of tangentially.
    double r = 0.002;
    double c = r * Math.sqrt(0.5);
    RevolvedSolid solid =
        new RevolvedSolid(0, 0)
            .line(0.05, 0)
            .line(0.05, 0.02)
            .arc(0.05 - r + c, 0.02 + c, Math.PI / 4, SurfaceKind.TORUS)
            .line(0, 0.02 + c);
    Features f = of(solid);
    assertThat(f.roundedEdge(2)).isNull();
    assertThat(f.faceName(2)).isEqualTo("torus, section R2");
    assertThat(f.edge(3).edgeClass()).isEqualTo(EdgeClass.SHARP_CONVEX);
    assertThat(f.edgeName(3)).isEqualTo("sharp edge 135 deg");
  }

  @Test
  void edgesHaveTheirClassesAndAngles() {
    Features f = of(Revolved.cone(0.01, 0.01));
    assertThat(f.edge(0).edgeClass()).isEqualTo(EdgeClass.DEGENERATE);
    assertThat(f.edge(1).edgeClass()).isEqualTo(EdgeClass.SHARP_CONVEX);
    assertThat(f.edge(1).sharpest_rad()).isCloseTo(Math.PI / 4, within(1e-12));
    assertThat(f.edge(1).t().length).isGreaterThanOrEqualTo(5);
    assertThat(f.edgeName(1)).isEqualTo("sharp edge 45 deg");
    assertThat(f.edge(2).edgeClass()).isEqualTo(EdgeClass.DEGENERATE);
    assertThat(f.edge(3).edgeClass()).isEqualTo(EdgeClass.SEAM);
    assertThat(f.edgeName(4)).isEqualTo("cone, half-angle 45 deg");
    assertThat(f.vertexName(2)).isEqualTo("cone tip");
    assertThat(f.vertexName(1)).isEqualTo("sharp edge 45 deg");
    assertThat(f.isCorner(2)).isFalse();

    Features stud = of(Revolved.stud(0.002, 0.0005, SurfaceKind.TORUS));
    assertThat(stud.edge(3).edgeClass()).isEqualTo(EdgeClass.TANGENT);
    Features step =
        of(
            new RevolvedSolid(0, 0)
                .line(0.02, 0)
                .line(0.02, 0.01)
                .line(0.01, 0.01)
                .line(0.01, 0.02)
                .line(0, 0.02));
    assertThat(step.edge(3).edgeClass()).isEqualTo(EdgeClass.SHARP_CONCAVE);
    assertThat(step.edge(3).sharpest_rad()).isCloseTo(1.5 * Math.PI, within(1e-12));
    assertThat(step.edgeName(3)).isEqualTo("concave edge 270 deg");
  }

  @Test
  void aTangentEdgeTakesTheNameOfItsTighterSide() {
    Features f = of(Revolved.roundedDisc(0.05, 0.02, 0.002, SurfaceKind.TORUS));
    assertThat(f.edgeName(1)).isEqualTo("rounded edge R2");
    assertThat(f.edgeName(2)).isEqualTo("rounded edge R2");
    assertThat(f.vertexName(1)).isEqualTo("rounded edge R2");
  }

  @Test
  void angleClassesTurnOverAtOneDegree() {
    for (double degrees : new double[] {0.5, 0.99, 1.01, 2}) {
      double slope = Math.tan(Math.toRadians(degrees));
      RevolvedSolid solid =
          new RevolvedSolid(0, 0)
              .line(0.02, 0)
              .line(0.02, 0.01)
              .line(0.02 - 0.01 * slope, 0.02)
              .line(0, 0.02);
      assertThat(of(solid).edge(2).edgeClass())
          .isEqualTo(degrees < 1 ? EdgeClass.TANGENT : EdgeClass.SHARP_CONVEX);
    }
  }
}
