package org.edgefield.field.fmm;

import java.util.HashMap;
import java.util.Map;

/** All translations an octree needs at one order: 8 octants up and down, 316 directions across. */
final class Translations {
  /** Number of direction codes; those of adjacent boxes stay unused. */
  static final int DIRECTIONS = 343;

  private final Rotation[] octantTurn = new Rotation[8];
  private final AxialShift up;
  private final AxialShift down;
  private final Rotation[] turn = new Rotation[DIRECTIONS];
  private final AxialShift[] across = new AxialShift[DIRECTIONS];

  /** Prepares the tables for one order. */
  Translations(int order) {
    double d = Math.sqrt(3) / 4;
    up = AxialShift.multipoleToParent(order, d);
    down = AxialShift.localToChild(order, d);
    Map<Double, Rotation> turns = new HashMap<>();
    Map<Integer, AxialShift> shifts = new HashMap<>();
    for (int octant = 0; octant < 8; octant++) {
      octantTurn[octant] =
          turn(
              turns, order, 2 * (octant & 1) - 1, 2 * (octant >> 1 & 1) - 1, 2 * (octant >> 2) - 1);
    }
    for (int x = -3; x <= 3; x++) {
      for (int y = -3; y <= 3; y++) {
        for (int z = -3; z <= 3; z++) {
          if (Math.max(Math.abs(x), Math.max(Math.abs(y), Math.abs(z))) < 2) {
            continue;
          }
          int code = direction(x, y, z);
          turn[code] = turn(turns, order, x, y, z);
          int square = x * x + y * y + z * z;
          across[code] =
              shifts.computeIfAbsent(square, s -> AxialShift.multipoleToLocal(order, Math.sqrt(s)));
        }
      }
    }
  }

  private static Rotation turn(Map<Double, Rotation> known, int order, int x, int y, int z) {
    double cosine = z / Math.sqrt(x * x + y * y + z * z);
    Rotation rotation = known.computeIfAbsent(cosine, c -> new Rotation(order, x, y, z));
    return rotation.atAzimuth(x, y);
  }

  /** Code of the offset from a source box to a target box of the same size, each -3 .. 3. */
  static int direction(int x, int y, int z) {
    return (x + 3) * 49 + (y + 3) * 7 + z + 3;
  }

  /** Multipoles of children in one octant into their parents; result in {@code b}. */
  void toParent(int octant, int lanes, int stride, double[] a, double[] b) {
    shift(octantTurn[octant], up, lanes, stride, a, b);
  }

  /** Local expansions of parents into their children of one octant; result in {@code b}. */
  void toChild(int octant, int lanes, int stride, double[] a, double[] b) {
    shift(octantTurn[octant], down, lanes, stride, a, b);
  }

  /** Multipoles into local expansions along one direction; result in {@code b}. */
  void across(int direction, int lanes, int stride, double[] a, double[] b) {
    shift(turn[direction], across[direction], lanes, stride, a, b);
  }

  private static void shift(
      Rotation turn, AxialShift shift, int lanes, int stride, double[] a, double[] b) {
    turn.toAxis(lanes, stride, a, b);
    shift.apply(lanes, stride, b, a);
    turn.fromAxis(lanes, stride, a, b);
  }
}
