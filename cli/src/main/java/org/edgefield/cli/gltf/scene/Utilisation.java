package org.edgefield.cli.gltf.scene;

import java.util.List;
import org.edgefield.field.result.DutyField;
import org.edgefield.field.result.DutyResult;
import org.edgefield.field.result.Law;

/**
 * Utilisation per duty and node, and what of it a face may show. On a drawn sharp edge the nodes
 * hold the field of the edge as made, which reigns over a few edge radii only; painted on the
 * triangles beside the edge it would fill a whole row of them. So faces show the mean of the
 * neighbouring face nodes there, and the edge's own value is drawn as a band along the edge.
 */
final class Utilisation {
  /** Utilisation beyond which nothing is told apart; keeps values finite. */
  private static final double MOST = 1e4;

  private static final Law[] LAWS = Law.values();

  private final double[][] onNode;
  private final double[][] onFace;
  private final boolean[] edgeNode;

  /**
   * Prepares the values.
   *
   * @param results the duties to show
   * @param cornerNode node per triangle corner
   */
  Utilisation(List<DutyResult> results, int[] cornerNode) {
    int duties = results.size();
    int nodes = results.get(0).field().field_V_per_m().length;
    onNode = new double[duties][nodes];
    onFace = new double[duties][];
    edgeNode = new boolean[nodes];
    for (int d = 0; d < duties; d++) {
      DutyField field = results.get(d).field();
      for (int n = 0; n < nodes; n++) {
        onNode[d][n] = ratio(field.field_V_per_m()[n], field.permitted_V_per_m()[n]);
        edgeNode[n] |= isEdgeLaw(field.law()[n]);
      }
    }
    for (int d = 0; d < duties; d++) {
      onFace[d] = withoutEdges(onNode[d], cornerNode);
    }
  }

  private static boolean isEdgeLaw(byte law) {
    return LAWS[law] == Law.EDGE_AS_MADE || LAWS[law] == Law.CORNER_AS_MADE;
  }

  static double ratio(double field, double permitted) {
    if (!(field > 0)) {
      return 0;
    }
    return permitted > 0 ? Math.min(MOST, field / permitted) : MOST;
  }

  /** Value of a node itself: on sharp edges that of the edge as made. */
  double onNode(int duty, int node) {
    return onNode[duty][node];
  }

  /** Value that the face around a node shows. */
  double onFace(int duty, int node) {
    return onFace[duty][node];
  }

  /** Whether a node holds the value of a sharp edge or corner as made. */
  boolean isEdgeNode(int node) {
    return edgeNode[node];
  }

  int duties() {
    return onNode.length;
  }

  /** Largest value that the face around a node shows in any duty. */
  double mostOnFace(int node) {
    double most = 0;
    for (double[] duty : onFace) {
      most = Math.max(most, duty[node]);
    }
    return most;
  }

  /**
   * Edge nodes take the mean of their face neighbours, row by row inwards from the first; strips
   * too slim to hold a face node keep their value.
   */
  private double[] withoutEdges(double[] value, int[] cornerNode) {
    double[] shown = value.clone();
    boolean[] open = edgeNode.clone();
    boolean again = true;
    while (again) {
      again = false;
      double[] sum = new double[value.length];
      int[] count = new int[value.length];
      for (int t = 0; t < cornerNode.length; t++) {
        int node = cornerNode[t];
        for (int o = 1; o < 3 && open[node]; o++) {
          int other = cornerNode[t - t % 3 + (t + o) % 3];
          if (!open[other]) {
            sum[node] += shown[other];
            count[node]++;
          }
        }
      }
      for (int n = 0; n < value.length; n++) {
        if (count[n] > 0) {
          shown[n] = sum[n] / count[n];
          open[n] = false;
          again = true;
        }
      }
    }
    return shown;
  }
}
