package org.edgefield.importer.mesh.spatial;

import static org.assertj.core.api.Assertions.assertThat;
import static org.assertj.core.api.Assertions.assertThatThrownBy;
import static org.assertj.core.api.Assertions.within;

import java.util.Random;
import java.util.stream.IntStream;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class TriangleTreeTest {
  private static final double INF = Double.POSITIVE_INFINITY;

  /** One unit right triangle in the plane z = 0, normal +z. */
  private static final double[] UNIT = {0, 0, 0, 1, 0, 0, 0, 1, 0};

  @Test
  void anEmptyTreeFindsNothing() {
    TriangleCursor c = TriangleTree.build(new double[0], new int[0]).cursor();
    assertThat(c.nearest(0, 0, 0, INF)).isFalse();
    assertThat(c.ray(0, 0, 0, 1, 0, 0, 0, INF, TriangleCursor.Side.ANY)).isFalse();
    assertThat(c.triangle()).isEqualTo(-1);
    assertThat(c.distance()).isInfinite();
  }

  @Test
  void coordinatesThatAreNotFiniteAreRefused() {
    for (double bad : new double[] {Double.NaN, INF, -INF}) {
      assertThatThrownBy(
              () ->
                  TriangleTree.build(
                      new double[] {0, 0, 0, bad, 0, 0, 0, 1, 0}, new int[] {0, 1, 2}))
          .isInstanceOf(IllegalArgumentException.class)
          .hasMessageContaining("triangle 0");
    }
  }

  @Test
  void aTriangleWithoutAreaIsASegmentForPointsAndNothingForRays() {
    double[][] flat = {
      {0, 0, 0, 1, 0, 0, 2, 0, 0}, // three points on a line
      {0, 0, 0, 2, 0, 0, 1, 0, 0}, // the middle one last
      {0, 0, 0, 2, 0, 0, 2, 0, 0}, // two equal points
    };
    for (double[] xyz : flat) {
      TriangleCursor c = TriangleTree.build(xyz, new int[] {0, 1, 2}).cursor();
      assertThat(c.nearest(1.5, 3, 4, INF)).isTrue();
      assertThat(c.distance()).isEqualTo(5);
      double[] p = new double[3];
      c.point(p, 0);
      assertThat(p).containsExactly(1.5, 0, 0);
      assertThat(c.weight(0) + c.weight(1) + c.weight(2)).isCloseTo(1, within(1e-15));
      assertThat(c.ray(1.5, 0, 1, 0, 0, -1, 0, INF, TriangleCursor.Side.ANY)).isFalse();
    }
    TriangleCursor point =
        TriangleTree.build(new double[] {1, 2, 3, 1, 2, 3, 1, 2, 3}, new int[] {0, 1, 2}).cursor();
    assertThat(point.nearest(1, 2, 0, INF)).isTrue();
    assertThat(point.distance()).isEqualTo(3);
  }

  @Test
  void manyCopiesOfOneTriangleStillMakeATree() {
    int n = 5000;
    int[] t = new int[3 * n];
    for (int i = 0; i < n; i++) {
      t[3 * i + 1] = 1;
      t[3 * i + 2] = 2;
    }
    TriangleTree tree = TriangleTree.build(UNIT, t);
    assertThat(tree.depth).isLessThan(75);
    assertThat(tree.cursor().nearest(0.25, 0.25, 2, INF)).isTrue();
  }

  @Test
  void sizesThatSpanThirtyDecadesStillMakeABoundedTree() {
    int n = 400;
    double[] xyz = new double[9 * n];
    int[] t = new int[3 * n];
    for (int i = 0; i < n; i++) {
      double s = Math.pow(10, -15 + 30.0 * i / n);
      xyz[9 * i] = s;
      xyz[9 * i + 4] = s;
      xyz[9 * i + 8] = s;
      t[3 * i] = 3 * i;
      t[3 * i + 1] = 3 * i + 1;
      t[3 * i + 2] = 3 * i + 2;
    }
    TriangleTree tree = TriangleTree.build(xyz, t);
    assertThat(tree.depth).isLessThan(75);
    TriangleCursor c = tree.cursor();
    // The plane x + y + z = s lies s / sqrt 3 from the origin.
    assertThat(c.nearest(0, 0, 0, INF)).isTrue();
    assertThat(c.distance()).isCloseTo(1e-15 / Math.sqrt(3), within(1e-27));
  }

  @Test
  void nearestPointOfOneTriangleInEveryRegion() {
    // point, expected foot
    double[][] cases = {
      {0.2, 0.3, 5, 0.2, 0.3, 0},
      {-1, -1, 0, 0, 0, 0},
      {3, -1, 0, 1, 0, 0},
      {-1, 4, 0, 0, 1, 0},
      {0.4, -2, 1, 0.4, 0, 0},
      {-2, 0.6, 1, 0, 0.6, 0},
      {1, 1, 1, 0.5, 0.5, 0},
      {0, 0, 0, 0, 0, 0},
      {0.5, 0.5, 0, 0.5, 0.5, 0},
    };
    TriangleCursor c = TriangleTree.build(UNIT, new int[] {0, 1, 2}).cursor();
    double[] p = new double[3];
    for (double[] q : cases) {
      assertThat(c.nearest(q[0], q[1], q[2], INF)).isTrue();
      c.point(p, 0);
      assertThat(p[0]).isCloseTo(q[3], within(1e-15));
      assertThat(p[1]).isCloseTo(q[4], within(1e-15));
      assertThat(p[2]).isCloseTo(q[5], within(1e-15));
      assertThat(c.distance())
          .isCloseTo(
              Math.sqrt(
                  (q[0] - q[3]) * (q[0] - q[3])
                      + (q[1] - q[4]) * (q[1] - q[4])
                      + (q[2] - q[5]) * (q[2] - q[5])),
              within(1e-14));
      assertThat(c.weight(1)).isCloseTo(q[3], within(1e-15));
      assertThat(c.weight(2)).isCloseTo(q[4], within(1e-15));
    }
  }

  @Test
  void theLimitOfANearestQueryIsInclusive() {
    TriangleCursor c = TriangleTree.build(UNIT, new int[] {0, 1, 2}).cursor();
    assertThat(c.nearest(0.25, 0.25, 2, 2)).isTrue();
    assertThat(c.nearest(0.25, 0.25, 2, 1.999)).isFalse();
    assertThat(c.distance()).isInfinite();
  }

  @Test
  void raysTellTheSideTheyHit() {
    TriangleCursor c = TriangleTree.build(UNIT, new int[] {0, 1, 2}).cursor();
    // down onto the front (+z) side, then up onto the back, for all three main axes
    for (int turn = 0; turn < 3; turn++) {
      double[] xyz = new double[9];
      for (int i = 0; i < 9; i++) {
        xyz[i / 3 * 3 + (i % 3 + turn) % 3] = UNIT[i];
      }
      TriangleCursor r = TriangleTree.build(xyz, new int[] {0, 1, 2}).cursor();
      for (int sign = -1; sign <= 1; sign += 2) {
        double[] o = turned(turn, 0.25, 0.25, 2 * sign);
        double[] d = turned(turn, 0, 0, -7 * sign);
        assertThat(hits(r, o, d, TriangleCursor.Side.ANY)).isTrue();
        assertThat(r.distance()).isEqualTo(2);
        assertThat(hits(r, o, d, TriangleCursor.Side.ENTERING)).isEqualTo(sign > 0);
        assertThat(hits(r, o, d, TriangleCursor.Side.LEAVING)).isEqualTo(sign < 0);
      }
    }
    assertThat(c.ray(0.25, 0.5, 2, 0, 0, -1, 0, 1.99, TriangleCursor.Side.ANY)).isFalse();
    assertThat(c.ray(0.25, 0.5, 2, 0, 0, -1, 2.01, INF, TriangleCursor.Side.ANY)).isFalse();
    assertThat(c.ray(0.25, 0.5, 2, 0, 0, -1, 0, 2, TriangleCursor.Side.ANY)).isTrue();
    assertThat(c.weight(0)).isEqualTo(0.25);
    assertThat(c.weight(1)).isEqualTo(0.25);
    assertThat(c.weight(2)).isEqualTo(0.5);
    assertThat(c.ray(0, 0, 2, 0, 0, 0, 0, INF, TriangleCursor.Side.ANY)).isFalse();
  }

  private static double[] turned(int turn, double x, double y, double z) {
    double[] p = {x, y, z};
    double[] q = new double[3];
    for (int i = 0; i < 3; i++) {
      q[(i + turn) % 3] = p[i];
    }
    return q;
  }

  private static boolean hits(TriangleCursor c, double[] o, double[] d, TriangleCursor.Side side) {
    return c.ray(o[0], o[1], o[2], d[0], d[1], d[2], 0, INF, side);
  }

  @Test
  void noRaySlipsThroughSharedEdgesAndCorners() {
    // A closed box of 12 triangles; rays from inside to its corners, edge middles, and beyond.
    TriangleCursor c = TriangleTree.build(BOX, BOX_TRIANGLES).cursor();
    double[] inside = {0.31, 0.47, 0.59};
    for (int i = 0; i <= 8; i++) {
      for (int j = 0; j <= 8; j++) {
        for (int k = 0; k <= 8; k++) {
          double dx = i / 8.0 - inside[0];
          double dy = j / 8.0 - inside[1];
          double dz = k / 8.0 - inside[2];
          assertThat(
                  c.ray(
                      inside[0],
                      inside[1],
                      inside[2],
                      dx,
                      dy,
                      dz,
                      0,
                      INF,
                      TriangleCursor.Side.LEAVING))
              .isTrue();
        }
      }
    }
    // A ray in the plane of a wall still meets the wall opposite.
    assertThat(c.ray(0, 0.3, 1, 0, 0, -1, 1e-9, INF, TriangleCursor.Side.LEAVING)).isTrue();
    assertThat(c.distance()).isEqualTo(1);
  }

  @ParameterizedTest
  @ValueSource(ints = {1, 4, 5, 63, 64, 65, 200})
  void agreesWithBruteForceForAnyNumberOfGroups(int groups) {
    Random random = new Random(20260101);
    int n = 700;
    double[] xyz = new double[9 * n];
    int[] t = IntStream.range(0, 3 * n).toArray();
    int[] group = new int[n];
    for (int i = 0; i < n; i++) {
      group[i] = random.nextInt(groups + 1) - 1;
      double size = Math.pow(10, -4 + 4 * random.nextDouble());
      for (int k = 0; k < 9; k++) {
        double base = k < 3 ? random.nextDouble() : xyz[9 * i + k % 3];
        xyz[9 * i + k] = k < 3 ? base : base + size * (random.nextDouble() - 0.5);
      }
      if (i % 50 == 0) {
        System.arraycopy(xyz, 9 * i, xyz, 9 * i + 3, 3); // degenerate
      }
    }
    TriangleCursor c = TriangleTree.build(xyz, t, group).cursor();
    boolean[] some = new boolean[groups];
    for (int g = 0; g < groups; g++) {
      some[g] = random.nextBoolean();
    }
    for (int q = 0; q < 300; q++) {
      double[] p = {random.nextDouble(), random.nextDouble(), random.nextDouble()};
      double[] d = {random.nextGaussian(), random.nextGaussian(), random.nextGaussian()};
      int one = random.nextInt(groups);
      for (int mode = 0; mode < 4; mode++) {
        int m = mode;
        switch (mode) {
          case 0 -> c.allowAll();
          case 1 -> c.allowOnly(one);
          case 2 -> c.allowAllBut(one);
          default -> c.allow(some);
        }
        double nearest = INF;
        double hit = INF;
        for (int i = 0; i < n; i++) {
          int g = group[i];
          boolean in = g >= 0 && (m == 0 || (m == 1 ? g == one : m == 2 ? g != one : some[g]));
          if (in) {
            nearest = Math.min(nearest, BruteForce.distance(xyz, 9 * i, p));
            hit = Math.min(hit, BruteForce.hit(xyz, 9 * i, p, d));
          }
        }
        assertThat(c.nearest(p[0], p[1], p[2], INF)).isEqualTo(nearest < INF);
        if (nearest < INF) {
          assertThat(c.distance()).isCloseTo(nearest, within(1e-10));
          assertThat(BruteForce.distance(xyz, 9 * c.triangle(), p))
              .isCloseTo(nearest, within(1e-10));
          double[] foot = new double[3];
          c.point(foot, 0);
          assertThat(BruteForce.length(foot, p)).isCloseTo(nearest, within(1e-10));
        }
        boolean found = hits(c, p, d, TriangleCursor.Side.ANY);
        assertThat(found).isEqualTo(hit < INF);
        if (found) {
          assertThat(c.distance()).isCloseTo(hit, within(1e-9));
          assertThat(c.group()).isEqualTo(group[c.triangle()]);
        }
      }
    }
  }

  private static final double[] BOX = {
    0, 0, 0, 1, 0, 0, 1, 1, 0, 0, 1, 0, 0, 0, 1, 1, 0, 1, 1, 1, 1, 0, 1, 1
  };

  private static final int[] BOX_TRIANGLES = {
    0, 2, 1, 0, 3, 2, 4, 5, 6, 4, 6, 7, 0, 1, 5, 0, 5, 4, 1, 2, 6, 1, 6, 5, 2, 3, 7, 2, 7, 6, 3, 0,
    4, 3, 4, 7
  };
}
