package org.edgefield.curvature.feature;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.edgefield.importer.brep.ExactGeometry;

/**
 * Recognises fillets, whatever surface they are stored as.
 *
 * <p>From points on each tangent side of a surface group the cross-section plane is followed to the
 * opposite side. There the normals tell the angle that the section turns through; the section
 * counts as an arc where the chord, the angle and the exact curvatures at both ends agree on one
 * radius. A group is a fillet where that holds on at least half the length of its sides. The test
 * is exact for cylinders and tori, and needs no parameter lines.
 */
final class FilletFinder {
  /** Points of a side that look for an opposite, as indices into its samples. */
  private static final int[] PROBES = {1, 4, 8, 12, 15};

  /** Samples per tangent edge. */
  static final int SAMPLES = 17;

  /** Relative mismatch of the chord up to which a section counts as an arc. */
  private static final double CHORD = 0.1;

  /** Ratio of the radii at the two ends of a section up to which it counts as an arc. */
  private static final double RADII = 1.3;

  private static final double LEAST_TURN = Math.toRadians(5);
  private static final double MOST_TURN = Math.toRadians(350);

  /** Steps of the search for the opposite point: regula falsi on smooth curves. */
  private static final int STEPS = 8;

  private final ExactGeometry geometry;
  private final EdgeSamples samples;
  private final byte[] left;
  private final int[] group;

  /** A tangent edge seen from the group on one side of it. */
  private record Side(int entry, int side, double length) {}

  /** A probe point with the place where its section meets another side. */
  private record Match(
      Side from, int probe, Side to, double low, double high, double fLow, double fHigh) {}

  private FilletFinder(ExactGeometry geometry, EdgeSamples samples, byte[] left, int[] group) {
    this.geometry = geometry;
    this.samples = samples;
    this.left = left;
    this.group = group;
  }

  /**
   * Fillet per group, null where the group is none.
   *
   * @param samples {@link #SAMPLES} of every tangent edge
   * @param left left side per edge
   * @param group group per face
   */
  static Fillet[] find(
      ExactGeometry geometry, EdgeSamples samples, byte[] left, int[] group, FaceForm[] forms) {
    return new FilletFinder(geometry, samples, left, group).find(forms);
  }

  private Fillet[] find(FaceForm[] forms) {
    List<List<Side>> sides = new ArrayList<>();
    for (int f = 0; f < group.length; f++) {
      sides.add(new ArrayList<>());
    }
    for (int i = 0; i < samples.edges.length; i++) {
      int edge = samples.edges[i];
      int[] faces = geometry.edgeFaces(edge);
      if (left[edge] < 0 || group[faces[0]] == group[faces[1]]) {
        continue;
      }
      double length = length(i);
      for (int k = 0; k < 2; k++) {
        FaceForm.Kind form = forms[faces[k]].form();
        if (form == FaceForm.Kind.FLAT
            || form == FaceForm.Kind.SPHERE
            || form == FaceForm.Kind.CONE) {
          continue;
        }
        Side side = new Side(i, k, length);
        if (acrossCurved(side)) {
          sides.get(group[faces[k]]).add(side);
        }
      }
    }
    List<Match> matches = new ArrayList<>();
    for (List<Side> ofGroup : sides) {
      for (Side from : ofGroup) {
        for (Side to : ofGroup) {
          if (from.entry != to.entry || from.side != to.side) {
            crossings(from, to, matches);
          }
        }
      }
    }
    return judge(sides, matches);
  }

  private double length(int entry) {
    double sum = 0;
    for (int j = samples.start[entry] + 1; j < samples.start[entry + 1]; j++) {
      double dx = samples.curve[6 * j] - samples.curve[6 * j - 6];
      double dy = samples.curve[6 * j + 1] - samples.curve[6 * j - 5];
      double dz = samples.curve[6 * j + 2] - samples.curve[6 * j - 4];
      sum += Math.sqrt(dx * dx + dy * dy + dz * dz);
    }
    return sum;
  }

  /** Whether the surface curves away from the side, judged at the side's middle. */
  private boolean acrossCurved(Side side) {
    int j = samples.start[side.entry] + SAMPLES / 2;
    double[] c = samples.side[side.side];
    int at = EdgeSamples.STRIDE * j;
    double most = Math.max(Math.abs(c[at + 3]), Math.abs(c[at + 4]));
    double across = Math.abs(normalCurvature(c, at, inward(samples, j, side.side, isLeft(side))));
    return across > 0.3 * most && most > 0;
  }

  private boolean isLeft(Side side) {
    return left[samples.edges[side.entry]] == side.side;
  }

  /** Unit direction in a face away from its edge. */
  private static double[] inward(EdgeSamples s, int j, int side, boolean isLeft) {
    double[] n = s.side[side];
    int a = EdgeSamples.STRIDE * j;
    int t = 6 * j + 3;
    double[] x = s.curve;
    double sign = isLeft ? 1 : -1;
    return new double[] {
      sign * (n[a + 1] * x[t + 2] - n[a + 2] * x[t + 1]),
      sign * (n[a + 2] * x[t] - n[a] * x[t + 2]),
      sign * (n[a] * x[t + 1] - n[a + 1] * x[t])
    };
  }

  /** Euler's formula: curvature of the normal section along a unit tangent direction. */
  private static double normalCurvature(double[] c, int at, double[] b) {
    double along1 = b[0] * c[at + 5] + b[1] * c[at + 6] + b[2] * c[at + 7];
    double along2 = b[0] * c[at + 8] + b[1] * c[at + 9] + b[2] * c[at + 10];
    return c[at + 3] * along1 * along1 + c[at + 4] * along2 * along2;
  }

  /** Finds where the section planes of one side's probes cross another side. */
  private void crossings(Side from, Side to, List<Match> out) {
    for (int probe : PROBES) {
      int a = 6 * (samples.start[from.entry] + probe);
      double before = 0;
      for (int i = 0; i < SAMPLES; i++) {
        int j = samples.start[to.entry] + i;
        double f = height(samples.curve, a, samples.curve, 6 * j);
        if (i > 0 && (before <= 0) != (f <= 0)) {
          out.add(new Match(from, probe, to, samples.t[j - 1], samples.t[j], before, f));
        } else if (Math.abs(f) < 1e-3 * to.length && (i == 0 || i == SAMPLES - 1)) {
          // Sides that end in the plane just miss a crossing; the end itself will do.
          out.add(new Match(from, probe, to, samples.t[j], samples.t[j], f, f));
        }
        before = f;
      }
    }
  }

  /** Height of a point over the section plane of a probe. */
  private static double height(double[] probe, int a, double[] x, int b) {
    return (x[b] - probe[a]) * probe[a + 3]
        + (x[b + 1] - probe[a + 1]) * probe[a + 4]
        + (x[b + 2] - probe[a + 2]) * probe[a + 5];
  }

  /** Curve parameters at which the section planes meet the opposite sides. */
  private double[] refine(List<Match> matches, int[] edges) {
    int n = matches.size();
    double[] low = new double[n];
    double[] high = new double[n];
    double[] fLow = new double[n];
    double[] fHigh = new double[n];
    double[] t = new double[n];
    double[] x = new double[6 * n];
    for (int i = 0; i < n; i++) {
      Match m = matches.get(i);
      low[i] = m.low;
      high[i] = m.high;
      fLow[i] = m.fLow;
      fHigh[i] = m.fHigh;
    }
    for (int step = 0; step < STEPS; step++) {
      for (int i = 0; i < n; i++) {
        double span = fHigh[i] - fLow[i];
        t[i] = span == 0 ? low[i] : low[i] - fLow[i] * (high[i] - low[i]) / span;
      }
      geometry.curve(n, edges, t, x);
      for (int i = 0; i < n; i++) {
        Match m = matches.get(i);
        int a = 6 * (samples.start[m.from.entry] + m.probe);
        double f = height(samples.curve, a, x, 6 * i);
        // Illinois rule: halve the value of the end that stays, so that both ends move.
        if ((f <= 0) == (fLow[i] <= 0)) {
          low[i] = t[i];
          fLow[i] = f;
          fHigh[i] *= 0.5;
        } else {
          high[i] = t[i];
          fHigh[i] = f;
          fLow[i] *= 0.5;
        }
      }
    }
    return t;
  }

  private Fillet[] judge(List<List<Side>> sides, List<Match> matches) {
    int n = matches.size();
    int[] edges = new int[n];
    for (int i = 0; i < n; i++) {
      edges[i] = samples.edges[matches.get(i).to.entry];
    }
    EdgeSamples ends = EdgeSamples.at(geometry, edges, refine(matches, edges));
    // The matches of one probe stand together per target; keep the best arc of each probe.
    double[][] best = new double[2 * samples.edges.length * SAMPLES][];
    for (int i = 0; i < n; i++) {
      Match m = matches.get(i);
      double[] section = section(m, ends, i);
      int key = (2 * m.from.entry + m.from.side) * SAMPLES + m.probe;
      if (section != null && (best[key] == null || section[3] < best[key][3])) {
        best[key] = section;
      }
    }
    Fillet[] fillets = new Fillet[group.length];
    for (int g = 0; g < group.length; g++) {
      fillets[g] = fillet(sides.get(g), best);
    }
    return fillets;
  }

  /** Signed radii at both ends, angle and mismatch of a section; null where it is no arc. */
  private double[] section(Match m, EdgeSamples ends, int i) {
    int j = samples.start[m.from.entry] + m.probe;
    double[] na = samples.side[m.from.side];
    int a = EdgeSamples.STRIDE * j;
    double[] ba = inward(samples, j, m.from.side, isLeft(m.from));
    double ka = normalCurvature(na, a, ba);
    double[] nb = ends.side[m.to.side];
    int b = EdgeSamples.STRIDE * i;
    double[] bb = inward(ends, i, m.to.side, isLeft(m.to));
    double kb = normalCurvature(nb, b, bb);
    double out =
        nb[b] * samples.curve[6 * j + 3]
            + nb[b + 1] * samples.curve[6 * j + 4]
            + nb[b + 2] * samples.curve[6 * j + 5];
    if (!(ka * kb > 0) || ka / kb > RADII || kb / ka > RADII || Math.abs(out) > 0.2) {
      return null;
    }
    double cos = nb[b] * na[a] + nb[b + 1] * na[a + 1] + nb[b + 2] * na[a + 2];
    double sin = nb[b] * ba[0] + nb[b + 1] * ba[1] + nb[b + 2] * ba[2];
    double turn = Math.atan2(ka > 0 ? sin : -sin, cos);
    if (turn < 0) {
      turn += 2 * Math.PI;
    }
    double dx = ends.curve[6 * i] - samples.curve[6 * j];
    double dy = ends.curve[6 * i + 1] - samples.curve[6 * j + 1];
    double dz = ends.curve[6 * i + 2] - samples.curve[6 * j + 2];
    double chord = Math.sqrt(dx * dx + dy * dy + dz * dz);
    double expected = 2 * Math.sin(0.5 * turn) / Math.sqrt(ka * kb);
    double mismatch = Math.abs(chord - expected) / expected;
    if (turn < LEAST_TURN || turn > MOST_TURN || !(mismatch < CHORD)) {
      return null;
    }
    return new double[] {1 / ka, 1 / kb, turn, mismatch};
  }

  private static Fillet fillet(List<Side> sides, double[][] best) {
    double length = 0;
    double matched = 0;
    List<double[]> sections = new ArrayList<>();
    for (Side s : sides) {
      length += s.length;
      for (int probe : PROBES) {
        double[] section = best[(2 * s.entry + s.side) * SAMPLES + probe];
        if (section != null) {
          matched += s.length / PROBES.length;
          sections.add(section);
        }
      }
    }
    if (sections.isEmpty() || matched < 0.5 * length) {
      return null;
    }
    double[] radius = new double[sections.size()];
    double[] turn = new double[sections.size()];
    for (int i = 0; i < turn.length; i++) {
      double[] s = sections.get(i);
      radius[i] = 0.5 * Math.abs(s[0] + s[1]);
      turn[i] = s[2];
    }
    Arrays.sort(radius);
    Arrays.sort(turn);
    int last = turn.length - 1;
    return new Fillet(
        radius[0],
        radius[last],
        radius[turn.length / 2],
        turn[turn.length / 2],
        0.5 * matched,
        sections.get(0)[0] > 0);
  }
}
