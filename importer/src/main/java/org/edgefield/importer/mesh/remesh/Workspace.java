package org.edgefield.importer.mesh.remesh;

import java.util.Arrays;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.mesh.halfedge.HalfEdgeMesh;
import org.edgefield.importer.mesh.size.Grading;
import org.edgefield.importer.mesh.size.SizeSource;
import org.edgefield.importer.mesh.size.VertexField;

/** What the remeshing operations of one part share. */
final class Workspace {
  final ExactGeometry geometry;
  final HalfEdgeMesh mesh;
  final VertexField field;
  final SizeSource sizes;
  final Grading grading = new Grading();
  final FacePoints points;

  /** Triangles that changed since the last round of flips. */
  byte[] changed;

  /** Shape per triangle where it is known, else NaN. */
  private double[] shape;

  Workspace(ExactGeometry geometry, HalfEdgeMesh mesh, VertexField field, SizeSource sizes) {
    this.geometry = geometry;
    this.mesh = mesh;
    this.field = field;
    this.sizes = sizes;
    this.points = new FacePoints(geometry);
    changed = new byte[mesh.face.length];
    shape = new double[mesh.face.length];
    Arrays.fill(shape, Double.NaN);
  }

  /** Makes room for the mesh's triangles. */
  private void ensure() {
    int old = changed.length;
    if (old < mesh.face.length) {
      changed = Arrays.copyOf(changed, mesh.face.length);
      shape = Arrays.copyOf(shape, mesh.face.length);
      Arrays.fill(shape, old, shape.length, Double.NaN);
    }
  }

  /** Shape of a triangle, evaluated where it has been forgotten. */
  double shape(int t) {
    double s = shape[t];
    if (Double.isNaN(s)) {
      s = Shape.ofTriangle(mesh, field, t);
      shape[t] = s;
    }
    return s;
  }

  /** Notes the shape of a triangle and that it changed. */
  void setShape(int t, double s) {
    shape[t] = s;
    changed[t] = 1;
  }

  /** Least shape of the triangles around a vertex. */
  double worst(int v) {
    double least = Double.POSITIVE_INFINITY;
    int h = mesh.out[v];
    do {
      least = Math.min(least, shape(h / 3));
      h = mesh.turn(h);
    } while (h != mesh.out[v]);
    return least;
  }

  /** Marks all triangles around a vertex as changed and forgets their shapes. */
  void markAround(int v) {
    ensure();
    int h = mesh.out[v];
    do {
      setShape(h / 3, Double.NaN);
      h = mesh.turn(h);
    } while (h != mesh.out[v]);
  }

  /** Marks all triangles as changed and forgets their shapes. */
  void markAll() {
    ensure();
    Arrays.fill(changed, 0, mesh.triangles, (byte) 1);
    Arrays.fill(shape, Double.NaN);
  }

  /**
   * Evaluates normals and tensors of all vertices anew and grades them; all triangles count as
   * changed.
   *
   * @param limits whether narrow places between CAD edges lower the sizes
   */
  void refreshAll(boolean limits) {
    int[] all = new int[mesh.vertices];
    int n = 0;
    for (int v = 0; v < mesh.vertices; v++) {
      if (mesh.out[v] >= 0) {
        all[n++] = v;
      }
    }
    sizes.refresh(mesh, field, all, n);
    grading.spread(mesh, field, null, 0);
    if (limits && new CadLimits(mesh, field, sizes.maxAspect()).apply() > 0) {
      grading.spread(mesh, field, null, 0);
    }
    markAll();
  }
}
