package org.edgefield.cli.gltf.scene;

import com.fasterxml.jackson.databind.node.ObjectNode;
import org.edgefield.cli.gltf.file.GlbBuilder;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * Sharp edges of a part: a fine line along each, and a slim band in the scale's colours where the
 * edge holds the field of its radius as made.
 */
final class EdgeNodes {
  private static final int LINE = 0x39454c;

  /** Band width on each side of the edge, as a share of the scene's diagonal. */
  private static final double WIDTH = 0.0035;

  /** Largest band width as a share of the part's mean thickness. */
  private static final double WIDTH_OF_THICKNESS = 0.25;

  private static final double LIFT_OF_WIDTH = 0.12;

  /** Keeps the lift finite where two faces nearly fold back. */
  private static final double LEAST_MITRE = 0.2;

  private final SceneTree tree;
  private final Materials materials;
  private final SurfaceMesh mesh;
  private final SharpEdges edges;
  private final Utilisation utilisation;
  private final double diagonal;

  EdgeNodes(
      SceneTree tree,
      Materials materials,
      SurfaceMesh mesh,
      SharpEdges edges,
      Utilisation utilisation,
      double diagonal) {
    this.tree = tree;
    this.materials = materials;
    this.mesh = mesh;
    this.edges = edges;
    this.utilisation = utilisation;
    this.diagonal = diagonal;
  }

  /**
   * Adds the edges of a part.
   *
   * @param segments segments of the part
   */
  void add(Part part, int[] segments) {
    double thickness = 2 * part.volume_m3() / part.area_m2();
    double width = Math.min(WIDTH * diagonal, WIDTH_OF_THICKNESS * thickness);
    Floats lines = new Floats();
    Band band = new Band();
    for (int s : segments) {
      double[] lift = lift(s, LIFT_OF_WIDTH * width);
      for (int end = 0; end < 2; end++) {
        double[] p = end(s, end);
        addPoint(lines, p, lift, 1.5);
      }
      if (isAsMade(s)) {
        addBand(band, s, width, lift);
      }
    }
    if (lines.size() == 0) {
      return;
    }
    SceneTree.Leaf leaf = tree.leaf("sharp edges", "sharp edges of " + part.name());
    GlbBuilder glb = tree.glb();
    int[] index = new int[lines.size() / 3];
    for (int i = 0; i < index.length; i++) {
      index[i] = i;
    }
    ObjectNode line =
        leaf.primitive(glb.positions(lines.toArray()), glb.indices(index)).put("mode", 1);
    materials.plain(line, "edge line", LINE);
    if (band.index.size() > 0) {
      ObjectNode primitive =
          leaf.primitive(glb.positions(band.xyz.toArray()), glb.indices(band.index.toArray()));
      ScaledAttributes.add(glb, primitive.withObject("/attributes"), band.ratio());
      materials.scaled(primitive, false);
    }
  }

  /** Vertices of the band, with the utilisation per duty. */
  private final class Band {
    final Floats xyz = new Floats();
    final Ints index = new Ints();
    final Floats[] duty = new Floats[utilisation.duties()];

    Band() {
      for (int d = 0; d < duty.length; d++) {
        duty[d] = new Floats();
      }
    }

    float[][] ratio() {
      float[][] out = new float[duty.length][];
      for (int d = 0; d < duty.length; d++) {
        out[d] = duty[d].toArray();
      }
      return out;
    }
  }

  private boolean isAsMade(int s) {
    return edges.corner(s, 1) >= 0
        && utilisation.isEdgeNode(edges.node(s, 0, 0))
        && utilisation.isEdgeNode(edges.node(s, 0, 1));
  }

  private double[] end(int segment, int end) {
    int v = 3 * mesh.segmentVertices()[2 * segment + end];
    return new double[] {mesh.xyz()[v], mesh.xyz()[v + 1], mesh.xyz()[v + 2]};
  }

  private static void addPoint(Floats into, double[] p, double[] shift, double share) {
    into.add(p[0] + share * shift[0], p[2] + share * shift[2], 0 - p[1] - share * shift[1]);
  }

  private double[] normal(int segment, int side) {
    int corner = edges.corner(segment, side);
    return Triangles.unit(Triangles.areaVector(mesh, corner / 3));
  }

  /** Shift of the edge that lies {@code height} above both faces. */
  private double[] lift(int segment, double height) {
    double[] a = normal(segment, 0);
    double[] b = edges.corner(segment, 1) < 0 ? a : normal(segment, 1);
    double mitre = Math.max(LEAST_MITRE, 1 + a[0] * b[0] + a[1] * b[1] + a[2] * b[2]);
    double k = height / mitre;
    return new double[] {k * (a[0] + b[0]), k * (a[1] + b[1]), k * (a[2] + b[2])};
  }

  private void addBand(Band band, int s, double width, double[] lift) {
    for (int side = 0; side < 2; side++) {
      double[] n = normal(s, side);
      double[] p0 = end(s, 0);
      double[] p1 = end(s, 1);
      boolean forward = mesh.triangles()[edges.corner(s, side)] == mesh.segmentVertices()[2 * s];
      // In the triangle, inwards from the edge: normal x direction of its boundary.
      double[] along = {p1[0] - p0[0], p1[1] - p0[1], p1[2] - p0[2]};
      double sign = forward ? 1 : -1;
      double[] inward =
          Triangles.unit(
              new double[] {
                sign * (n[1] * along[2] - n[2] * along[1]),
                sign * (n[2] * along[0] - n[0] * along[2]),
                sign * (n[0] * along[1] - n[1] * along[0])
              });
      double[] shift = new double[3];
      for (int c = 0; c < 3; c++) {
        shift[c] = LIFT_OF_WIDTH * width * n[c] + width * inward[c];
      }
      int first = band.xyz.size() / 3;
      addPoint(band.xyz, p0, lift, 1);
      addPoint(band.xyz, p1, lift, 1);
      addPoint(band.xyz, p1, shift, 1);
      addPoint(band.xyz, p0, shift, 1);
      for (int d = 0; d < band.duty.length; d++) {
        double u0 = value(d, s, 0);
        double u1 = value(d, s, 1);
        band.duty[d].add(u0, u1, u1, u0);
      }
      if (forward) {
        band.index.add(first, first + 1, first + 2, first, first + 2, first + 3);
      } else {
        band.index.add(first, first + 2, first + 1, first, first + 3, first + 2);
      }
    }
  }

  private double value(int duty, int segment, int end) {
    return Math.max(
        utilisation.onNode(duty, edges.node(segment, 0, end)),
        utilisation.onNode(duty, edges.node(segment, 1, end)));
  }
}
