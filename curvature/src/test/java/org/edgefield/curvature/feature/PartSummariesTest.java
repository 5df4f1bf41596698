package org.edgefield.curvature.feature;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.within;

import java.util.List;
import org.edgefield.curvature.Features;
import org.edgefield.curvature.PartSummary;
import org.edgefield.curvature.Revolved;
import org.edgefield.curvature.RevolvedSolid;
import org.edgefield.curvature.node.NodeBuilder;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.brep.SurfaceKind;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.junit.jupiter.api.Test;

/** Expected values are the bodies' own measures. */
class PartSummariesTest {
  private static PartSummary of(RevolvedSolid solid) {
    SurfaceMesh mesh = solid.mesh(96, 4);
    Features f = FeatureRecogniser.of(solid, mesh);
    Part part = new Part(0, "body", "body", null, 0, 0, 0, 0, new double[6], 1, 1);
    return PartSummaries.of(List.of(part), solid, mesh, NodeBuilder.perFace(solid, mesh, f), f)
        .get(0);
  }

  @Test
  void aConeTipCountsAsATipNotAsARadius() {
    PartSummary s = of(Revolved.cone(0.01, 0.02));
    assertThat(s.tips()).isEqualTo(1);
    assertThat(s.smallestConvexRadius_m()).isInfinite();
    assertThat(s.smallestRadiusFace()).isEqualTo(-1);
    assertThat(s.sharpConvexEdges()).isEqualTo(1);
  }

  @Test
  void aRoundedDiscHasNoSharpEdge() {
    PartSummary s = of(Revolved.roundedDisc(0.05, 0.02, 0.002, SurfaceKind.TORUS));
    assertThat(s.smallestConvexRadius_m()).isCloseTo(0.002, within(1e-12));
    assertThat(s.smallestRadiusFace()).isEqualTo(1);
    assertThat(s.sharpConvexEdges()).isZero();
    assertThat(s.sharpConvexLength_m()).isZero();
    assertThat(s.sharpest_rad()).isEqualTo(Math.PI);
  }

  @Test
  void aStudCountsItsOuterRimsAndNotItsFoot() {
    PartSummary s = of(Revolved.stud(0.002, 0.0005, SurfaceKind.TORUS));
    assertThat(s.sharpConvexEdges()).isEqualTo(3);
    // Two rims of the plate (R20) and one of the stud (R2), along the exact circles.
    double length = 2 * Math.PI * (0.02 + 0.02 + 0.002);
    assertThat(s.sharpConvexLength_m()).isCloseTo(length, within(1e-12 * length));
    assertThat(s.sharpest_rad()).isCloseTo(Math.PI / 2, within(1e-9));
    assertThat(s.smallestConvexRadius_m()).isCloseTo(0.002, within(1e-12));
    assertThat(s.corners()).isZero();
  }

  @Test
  void aBoreIsNotConvex() {
    PartSummary s = of(Revolved.tube(0.005, 0.02, 0.1));
    assertThat(s.smallestConvexRadius_m()).isCloseTo(0.02, within(1e-12));
  }
}
