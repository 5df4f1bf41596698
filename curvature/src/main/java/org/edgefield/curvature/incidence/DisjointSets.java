package org.edgefield.curvature.incidence;

/**
 * Disjoint sets of the numbers 0 to n - 1 with path compression. The root of a set is its smallest
 * member, so that results do not depend on the order of the unions.
 */
public final class DisjointSets {
  private int[] root;

  /** Makes n sets of one member each. */
  public DisjointSets(int n) {
    root = new int[0];
    reset(n);
  }

  /** Starts again with n sets of one member each. */
  public void reset(int n) {
    if (root.length < n) {
      root = new int[Math.max(n, 2 * root.length)];
    }
    for (int i = 0; i < n; i++) {
      root[i] = i;
    }
  }

  /** Smallest member of the set that holds i. */
  public int find(int i) {
    int r = i;
    while (root[r] != r) {
      r = root[r];
    }
    int at = i;
    while (root[at] != r) {
      int next = root[at];
      root[at] = r;
      at = next;
    }
    return r;
  }

  /** Unites the sets of a and b. */
  public void unite(int a, int b) {
    int ra = find(a);
    int rb = find(b);
    root[Math.max(ra, rb)] = Math.min(ra, rb);
  }
}
