package org.edgefield.field.fmm;

import org.edgefield.field.parallel.Workers;

/**
 * Who acts on whom in an octree: near source ranges of leaves (summed directly), same-size boxes at
 * a distance (multipole to local), smaller boxes at a distance from a large leaf (multipole
 * evaluated at its targets) and large leaves at a distance from a small box (sources straight into
 * its local expansion). The four together cover every source exactly once for every target.
 *
 * <p>Reference for the lists: Carrier, Greengard and Rokhlin, SIAM J. Sci. Stat. Comput. 9 (1988)
 * 669 (memory). Where a box holds fewer points than an expansion has coefficients, direct summation
 * is cheaper and exact and takes its place.
 */
final class InteractionLists {
  private static final int BOXES_PER_BLOCK = 512;

  /** Near source ranges {begin, end} per box; empty but at leaves with targets. */
  final int[][] near;

  /** Boxes whose multipole is evaluated at the targets of a leaf, or null. */
  final int[][] multipoleAtTargets;

  /** Source leaves that go straight into the local expansion of a box, or null. */
  final int[][] sourcesIntoLocal;

  /** Blocks of boxes for parallel work: first box of each, plus the end. */
  final int[] blockStart;

  /** Level of each block. */
  final int[] blockLevel;

  /**
   * Multipole-to-local pairs of each block, sorted by direction then target: {target, source,
   * direction} thrice per pair.
   */
  final int[][] pairs;

  InteractionLists(Octree tree, int order, Workers workers) {
    int n = tree.size();
    near = new int[n][];
    multipoleAtTargets = new int[n][];
    sourcesIntoLocal = new int[n][];
    IntList starts = new IntList(64);
    IntList levels = new IntList(64);
    for (int l = 0; l < tree.levels(); l++) {
      for (int b = tree.levelStart[l]; b < tree.levelStart[l + 1]; b += BOXES_PER_BLOCK) {
        starts.add(b);
        levels.add(l);
      }
    }
    starts.add(n);
    blockStart = starts.toArray();
    blockLevel = levels.toArray();
    pairs = new int[blockLevel.length][];
    int coefficients = SolidHarmonics.count(order);

    int[][] adjacent = new int[n][];
    adjacent[0] = new int[] {0};
    for (int first = 0; first < blockLevel.length; ) {
      int last = first;
      while (last < blockLevel.length && blockLevel[last] == blockLevel[first]) {
        last++;
      }
      int from = first;
      workers.run(
          last - first,
          w -> {
            Builder builder = new Builder(tree, coefficients, adjacent);
            return k -> builder.block(this, from + k);
          });
      first = last;
    }
  }

  /** Lists of one block at a time, with scratch memory. */
  private static final class Builder {
    private final Octree tree;
    private final int coefficients;
    private final int[][] adjacent;
    private final IntList keep = new IntList(64);
    private final IntList ranges = new IntList(256);
    private final IntList multipoles = new IntList(16);
    private final IntList direct = new IntList(16);
    private final IntList across = new IntList(1 << 14);

    Builder(Octree tree, int coefficients, int[][] adjacent) {
      this.tree = tree;
      this.coefficients = coefficients;
      this.adjacent = adjacent;
    }

    void block(InteractionLists lists, int block) {
      across.clear();
      for (int b = lists.blockStart[block]; b < lists.blockStart[block + 1]; b++) {
        if (tree.targets(b) > 0) {
          box(lists, b);
        }
      }
      lists.pairs[block] = byDirection(across);
    }

    private void box(InteractionLists lists, int b) {
      ranges.clear();
      multipoles.clear();
      direct.clear();
      if (b > 0) {
        keep.clear();
        // Fewer than an expansion's worth of targets: sources are summed at them directly.
        boolean small = tree.isLeaf(b) && tree.targets(b) <= coefficients;
        for (int s : adjacent[tree.parent[b]]) {
          if (tree.isLeaf(s)) {
            if (tree.adjacent(b, s)) {
              keep.add(s);
            } else if (small) {
              range(s);
            } else {
              direct.add(s);
            }
            continue;
          }
          for (int c = tree.firstChild[s]; c < tree.firstChild[s] + tree.childCount[s]; c++) {
            if (tree.sources(c) == 0) {
              continue;
            }
            if (tree.adjacent(b, c)) {
              keep.add(c);
            } else {
              across.add(b);
              across.add(c);
              across.add(
                  Translations.direction(
                      tree.cell[3 * b] - tree.cell[3 * c],
                      tree.cell[3 * b + 1] - tree.cell[3 * c + 1],
                      tree.cell[3 * b + 2] - tree.cell[3 * c + 2]));
            }
          }
        }
        adjacent[b] = keep.toArray();
      }
      if (tree.isLeaf(b)) {
        for (int s : adjacent[b]) {
          descend(b, s);
        }
        lists.near[b] = joined(ranges);
      } else if (ranges.size() > 0) {
        throw new IllegalStateException("direct ranges at an inner box");
      }
      lists.multipoleAtTargets[b] = multipoles.size() == 0 ? null : multipoles.toArray();
      lists.sourcesIntoLocal[b] = direct.size() == 0 ? null : direct.toArray();
    }

    // Sources below an adjacent box as seen from a leaf.
    private void descend(int leaf, int s) {
      if (tree.isLeaf(s)) {
        range(s);
        return;
      }
      for (int c = tree.firstChild[s]; c < tree.firstChild[s] + tree.childCount[s]; c++) {
        if (tree.sources(c) == 0) {
          continue;
        }
        if (tree.adjacent(leaf, c)) {
          descend(leaf, c);
        } else if (tree.sources(c) <= coefficients) {
          range(c);
        } else {
          multipoles.add(c);
        }
      }
    }

    private void range(int box) {
      if (tree.sources(box) > 0) {
        ranges.add(tree.sourceStart[box]);
        ranges.add(tree.sourceEnd[box]);
      }
    }

    // Ranges in rising order, neighbours joined: long runs make the direct loop efficient.
    private static int[] joined(IntList ranges) {
      int n = ranges.size() / 2;
      long[] sorted = new long[n];
      for (int i = 0; i < n; i++) {
        sorted[i] = (long) ranges.get(2 * i) << 32 | ranges.get(2 * i + 1);
      }
      java.util.Arrays.sort(sorted);
      IntList out = new IntList(2 * n);
      for (long r : sorted) {
        int begin = (int) (r >>> 32);
        int end = (int) r;
        int last = out.size() - 1;
        if (last > 0 && out.get(last) == begin) {
          out.set(last, end);
        } else {
          out.add(begin);
          out.add(end);
        }
      }
      return out.toArray();
    }

    private static int[] byDirection(IntList triples) {
      int n = triples.size() / 3;
      int[] start = new int[Translations.DIRECTIONS + 1];
      for (int i = 0; i < n; i++) {
        start[triples.get(3 * i + 2) + 1]++;
      }
      for (int d = 0; d < Translations.DIRECTIONS; d++) {
        start[d + 1] += start[d];
      }
      int[] out = new int[3 * n];
      for (int i = 0; i < n; i++) {
        int at = 3 * start[triples.get(3 * i + 2)]++;
        out[at] = triples.get(3 * i);
        out[at + 1] = triples.get(3 * i + 1);
        out[at + 2] = triples.get(3 * i + 2);
      }
      return out;
    }
  }
}
