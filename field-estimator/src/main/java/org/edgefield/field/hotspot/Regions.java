package org.edgefield.field.hotspot;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import org.edgefield.curvature.Features;
import org.edgefield.curvature.Features.RoundedEdge;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * Splits the nodes above a limit into contiguous regions, one per feature.
 *
 * <p>Each node belongs to a feature: a corner, a sharp convex edge, a rounded edge, or else its
 * face. Neighbouring nodes of one feature are one region. A region on a plain face whose highest
 * node touches a higher region is that one's shoulder and joins it; so do the regions of two
 * features of one name that touch (an edge in several pieces). Regions never span parts, since
 * parts share no vertices.
 */
final class Regions {
  /** Kinds of features, in the upper bits of a key. */
  private static final long CORNER = 3L << 32;

  private static final long SHARP = 2L << 32;
  private static final long ROUNDED = 1L << 32;

  private final SurfaceMesh mesh;
  private final SurfaceNodes nodes;
  private final Features features;
  private final SharpVertices sharp;
  private final long[] key;
  private final int[] start;
  private final int[] neighbour;

  Regions(
      SurfaceMesh mesh, SurfaceNodes nodes, Features features, SharpVertices sharp, int faceCount) {
    this.mesh = mesh;
    this.nodes = nodes;
    this.features = features;
    this.sharp = sharp;
    key = keys(faceCount);
    int[] degree = new int[nodes.count() + 1];
    int[] vertexNode = new int[mesh.vertexCount()];
    // Two passes over the same links: count, then fill.
    Arrays.fill(vertexNode, -1);
    links(vertexNode, (a, b) -> degree[a + 1]++);
    for (int n = 0; n < nodes.count(); n++) {
      degree[n + 1] += degree[n];
    }
    start = degree;
    neighbour = new int[start[nodes.count()]];
    int[] fill = Arrays.copyOf(start, nodes.count());
    Arrays.fill(vertexNode, -1);
    links(vertexNode, (a, b) -> neighbour[fill[a]++] = b);
  }

  private interface Link {
    void add(int from, int to);
  }

  private void links(int[] vertexNode, Link link) {
    int[] corner = nodes.cornerNode();
    for (int t = 0; t < corner.length; t += 3) {
      for (int i = 0; i < 3; i++) {
        link.add(corner[t + i], corner[t + (i + 1) % 3]);
        link.add(corner[t + (i + 1) % 3], corner[t + i]);
      }
    }
    for (int n = 0; n < nodes.count(); n++) {
      int v = nodes.nodeVertex()[n];
      if (vertexNode[v] >= 0) {
        link.add(n, vertexNode[v]);
        link.add(vertexNode[v], n);
      }
      vertexNode[v] = n;
    }
  }

  private long[] keys(int faceCount) {
    RoundedEdge[] rounded = NodeFaces.rounded(features, faceCount);
    int[] nodeFace = NodeFaces.of(mesh, nodes, rounded);
    long[] result = new long[nodes.count()];
    for (int n = 0; n < result.length; n++) {
      int v = nodes.nodeVertex()[n];
      int f = nodeFace[n];
      if (sharp.isCorner(v)) {
        result[n] = CORNER | mesh.vertexEntity()[v];
      } else if (sharp.isSharp(v)) {
        result[n] = SHARP | mesh.segmentEdge()[sharp.segment(v)];
      } else {
        result[n] = f < 0 ? -1 : rounded[f] != null ? ROUNDED | f : f;
      }
    }
    return result;
  }

  /** Whether a node lies on a sharp edge or corner: its region is a line. */
  boolean isLine(int node) {
    return key[node] >= SHARP;
  }

  /** Name of a node's feature, without the part. */
  String name(int node) {
    int id = (int) key[node];
    long kind = key[node] & ~0xffffffffL;
    if (kind == CORNER) {
      return features.vertexName(id);
    }
    return kind == SHARP ? features.edgeName(id) : features.faceName(id);
  }

  /**
   * Regions of nodes whose value is at or above a limit.
   *
   * @param value per node
   * @param limit threshold
   * @return nodes of each region, rising; regions by falling peak, ties by the lowest node
   */
  List<int[]> above(double[] value, double limit) {
    int n = nodes.count();
    int[] component = new int[n];
    Arrays.fill(component, -1);
    List<Integer> peaks = new ArrayList<>();
    int[] stack = new int[n];
    for (int seed = 0; seed < n; seed++) {
      if (component[seed] >= 0 || !(value[seed] >= limit)) {
        continue;
      }
      int id = peaks.size();
      int top = 0;
      int peak = seed;
      stack[top++] = seed;
      component[seed] = id;
      while (top > 0) {
        int a = stack[--top];
        if (value[a] > value[peak] || (value[a] == value[peak] && a < peak)) {
          peak = a;
        }
        for (int i = start[a]; i < start[a + 1]; i++) {
          int b = neighbour[i];
          if (component[b] < 0 && value[b] >= limit && key[b] == key[a]) {
            component[b] = id;
            stack[top++] = b;
          }
        }
      }
      peaks.add(peak);
    }
    int[] root = join(value, component, peaks);
    return gather(value, component, peaks, root);
  }

  /** Joins shoulders to their summits, and touching pieces of one feature's name. */
  private int[] join(double[] value, int[] component, List<Integer> peaks) {
    int[] root = new int[peaks.size()];
    Arrays.setAll(root, i -> i);
    for (int a = 0; a < component.length; a++) {
      int ca = component[a];
      if (ca < 0) {
        continue;
      }
      for (int i = start[a]; i < start[a + 1]; i++) {
        int cb = component[neighbour[i]];
        if (cb < 0 || cb == ca) {
          continue;
        }
        boolean plain = key[a] < ROUNDED;
        boolean shoulder = plain && peaks.get(ca) == a && value[neighbour[i]] > value[a];
        boolean twin =
            key[a] >>> 32 == key[neighbour[i]] >>> 32
                && key[a] < CORNER
                && name(a).equals(name(neighbour[i]));
        if (shoulder || twin) {
          unite(root, value, peaks, ca, cb);
        }
      }
    }
    return root;
  }

  private static void unite(int[] root, double[] value, List<Integer> peaks, int a, int b) {
    int ra = find(root, a);
    int rb = find(root, b);
    if (ra == rb) {
      return;
    }
    boolean first =
        value[peaks.get(ra)] > value[peaks.get(rb)]
            || (value[peaks.get(ra)] == value[peaks.get(rb)] && ra < rb);
    root[first ? rb : ra] = first ? ra : rb;
  }

  private static int find(int[] root, int i) {
    int r = i;
    while (root[r] != r) {
      r = root[r];
    }
    return r;
  }

  private static List<int[]> gather(
      double[] value, int[] component, List<Integer> peaks, int[] root) {
    int[] size = new int[root.length];
    for (int c : component) {
      if (c >= 0) {
        size[find(root, c)]++;
      }
    }
    int[][] members = new int[root.length][];
    for (int c = 0; c < root.length; c++) {
      members[c] = new int[size[c]];
    }
    int[] fill = new int[root.length];
    for (int n = 0; n < component.length; n++) {
      if (component[n] >= 0) {
        int r = find(root, component[n]);
        members[r][fill[r]++] = n;
      }
    }
    List<Integer> order = new ArrayList<>();
    for (int c = 0; c < root.length; c++) {
      if (size[c] > 0) {
        order.add(c);
      }
    }
    order.sort(
        (a, b) -> {
          int byValue = Double.compare(value[peaks.get(b)], value[peaks.get(a)]);
          return byValue != 0 ? byValue : Integer.compare(peaks.get(a), peaks.get(b));
        });
    List<int[]> result = new ArrayList<>();
    for (int c : order) {
      result.add(members[c]);
    }
    return result;
  }
}
