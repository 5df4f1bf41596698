package org.edgefield.importer.mesh.halfedge;

import java.util.Arrays;
import org.edgefield.importer.ModelException;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.mesh.SurfaceMesh;

/** Builds the half-edge mesh of one part from a surface mesh. */
public final class HalfEdgeBuilder {
  private final ExactGeometry geometry;
  private final SurfaceMesh source;
  private final Part part;

  private int[] original;
  private HalfEdgeMesh mesh;

  private HalfEdgeBuilder(ExactGeometry geometry, SurfaceMesh source, Part part) {
    this.geometry = geometry;
    this.source = source;
    this.part = part;
  }

  /**
   * A built mesh.
   *
   * @param mesh the half-edges; normals are not set yet
   * @param originalVertex vertex id in the source per vertex
   */
  public record Built(HalfEdgeMesh mesh, int[] originalVertex) {}

  /**
   * Builds the mesh of a part.
   *
   * @param geometry exact geometry, asked for poles and seam sides
   * @param source mesh of the whole assembly
   * @param part the part
   * @throws ModelException where the part's triangles do not form a closed two-manifold
   */
  public static Built build(ExactGeometry geometry, SurfaceMesh source, Part part) {
    HalfEdgeBuilder b = new HalfEdgeBuilder(geometry, source, part);
    b.copyTriangles();
    b.pairHalves();
    b.markCadEdges();
    b.markPoles();
    b.findSigns();
    b.checkFans();
    return new Built(b.mesh, b.original);
  }

  private void copyTriangles() {
    int[] local = new int[source.vertexCount()];
    Arrays.fill(local, -1);
    original = new int[source.vertexCount()];
    int count = 0;
    for (int t = 0; t < source.triangleCount(); t++) {
      if (geometry.facePart(source.triangleFace()[t]) == part.index()) {
        count++;
      }
    }
    mesh = new HalfEdgeMesh(count, count);
    double[] p = source.xyz();
    for (int t = 0; t < source.triangleCount(); t++) {
      int f = source.triangleFace()[t];
      if (geometry.facePart(f) != part.index()) {
        continue;
      }
      int own = mesh.addTriangle(f);
      for (int k = 0; k < 3; k++) {
        int g = source.triangles()[3 * t + k];
        if (local[g] < 0) {
          local[g] =
              mesh.addVertex(
                  p[3 * g],
                  p[3 * g + 1],
                  p[3 * g + 2],
                  source.vertexKind()[g],
                  source.vertexEntity()[g]);
          original[local[g]] = g;
        }
        int h = 3 * own + k;
        mesh.org[h] = local[g];
        mesh.uv[2 * h] = source.cornerUv()[6 * t + 2 * k];
        mesh.uv[2 * h + 1] = source.cornerUv()[6 * t + 2 * k + 1];
        mesh.out[local[g]] = h;
      }
    }
    original = Arrays.copyOf(original, mesh.vertices);
  }

  /** Half-edges by origin, so that both halves of an edge are found without hashing. */
  private int[][] byOrigin() {
    int[] start = new int[mesh.vertices + 1];
    int halves = 3 * mesh.triangles;
    for (int h = 0; h < halves; h++) {
      start[mesh.org[h] + 1]++;
    }
    for (int v = 0; v < mesh.vertices; v++) {
      start[v + 1] += start[v];
    }
    int[] fill = start.clone();
    int[] list = new int[halves];
    for (int h = 0; h < halves; h++) {
      list[fill[mesh.org[h]]++] = h;
    }
    return new int[][] {start, list};
  }

  private void pairHalves() {
    int[][] index = byOrigin();
    int halves = 3 * mesh.triangles;
    Arrays.fill(mesh.opp, 0, halves, -1);
    for (int h = 0; h < halves; h++) {
      int a = mesh.org[h];
      int b = mesh.dest(h);
      if (mesh.opp[h] >= 0) {
        continue;
      }
      int found = -1;
      for (int i = index[0][b]; i < index[0][b + 1]; i++) {
        int g = index[1][i];
        if (mesh.dest(g) == a && mesh.opp[g] < 0) {
          if (found < 0 || mesh.face[g / 3] == mesh.face[h / 3]) {
            found = g;
          }
        }
      }
      if (found < 0) {
        throw new ModelException(
            String.format(
                "part %s: its surface is not closed near (%.6g, %.6g, %.6g) m; sew the faces into a"
                    + " solid in the CAD program",
                part.path(), mesh.xyz[3 * a], mesh.xyz[3 * a + 1], mesh.xyz[3 * a + 2]));
      }
      mesh.opp[h] = found;
      mesh.opp[found] = h;
    }
  }

  private void markCadEdges() {
    int[] local = new int[source.vertexCount()];
    Arrays.fill(local, -1);
    for (int v = 0; v < mesh.vertices; v++) {
      local[original[v]] = v;
    }
    int[][] index = byOrigin();
    for (int s = 0; s < source.segmentCount(); s++) {
      int edge = source.segmentEdge()[s];
      if (edge < part.firstEdge() || edge >= part.firstEdge() + part.edgeCount()) {
        continue;
      }
      int a = local[source.segmentVertices()[2 * s]];
      int b = local[source.segmentVertices()[2 * s + 1]];
      if (a < 0 || b < 0) {
        continue;
      }
      double t0 = source.segmentT()[2 * s];
      double t1 = source.segmentT()[2 * s + 1];
      int[] faces = geometry.edgeFaces(edge);
      for (int i = index[0][a]; i < index[0][a + 1]; i++) {
        int h = index[1][i];
        if (mesh.dest(h) != b || mesh.cad[h] >= 0) {
          continue;
        }
        int f = mesh.face[h / 3];
        int g = mesh.face[mesh.opp[h] / 3];
        if ((f == faces[0] && g == faces[1]) || (f == faces[1] && g == faces[0])) {
          mark(h, edge, t0, t1, faces);
          break;
        }
      }
    }
  }

  private void mark(int h, int edge, double t0, double t1, int[] faces) {
    int o = mesh.opp[h];
    mesh.cad[h] = edge;
    mesh.cad[o] = edge;
    mesh.tOrg[h] = t0;
    mesh.tEnd[h] = t1;
    mesh.tOrg[o] = t1;
    mesh.tEnd[o] = t0;
    boolean first;
    if (faces[0] != faces[1]) {
      first = mesh.face[h / 3] == faces[0];
    } else {
      first = seamMisfit(h, o, edge, t0, t1, 0) <= seamMisfit(h, o, edge, t0, t1, 1);
    }
    mesh.side[h] = (byte) (first ? 0 : 1);
    mesh.side[o] = (byte) (first ? 1 : 0);
  }

  /** How badly corner parameters fit when h lies on the given side of a seam and o on the other. */
  private double seamMisfit(int h, int o, int edge, double t0, double t1, int sideOfH) {
    double[] t = {t0, t1};
    double[] uvH = new double[4];
    double[] uvO = new double[4];
    geometry.edgeUv(edge, sideOfH, 2, t, uvH);
    geometry.edgeUv(edge, 1 - sideOfH, 2, t, uvO);
    int[] corners = {h, HalfEdgeMesh.next(h), HalfEdgeMesh.next(o), o};
    double misfit = 0;
    for (int k = 0; k < 4; k++) {
      double[] want = k < 2 ? uvH : uvO;
      int c = corners[k];
      misfit +=
          Math.abs(mesh.uv[2 * c] - want[2 * (k % 2)])
              + Math.abs(mesh.uv[2 * c + 1] - want[2 * (k % 2) + 1]);
    }
    return misfit;
  }

  private void markPoles() {
    for (int e = part.firstEdge(); e < part.firstEdge() + part.edgeCount(); e++) {
      if (!geometry.edgeDegenerate(e)) {
        continue;
      }
      int[] faces = geometry.edgeFaces(e);
      int faceId = faces[0] >= 0 ? faces[0] : faces[1];
      int cadVertex = geometry.edgeVertices(e)[0];
      double[] range = geometry.edgeRange(e);
      double[] uv = new double[4];
      geometry.edgeUv(e, faces[0] >= 0 ? 0 : 1, 2, range, uv);
      byte free = (byte) (Math.abs(uv[2] - uv[0]) >= Math.abs(uv[3] - uv[1]) ? 1 : 2);
      for (int h = 0; h < 3 * mesh.triangles; h++) {
        int v = mesh.org[h];
        if (mesh.face[h / 3] == faceId
            && mesh.kind[v] == SurfaceMesh.ON_VERTEX
            && mesh.entity[v] == cadVertex) {
          mesh.pole[h] = free;
        }
      }
    }
    for (int t = 0; t < mesh.triangles; t++) {
      mesh.settlePole(t);
    }
  }

  /** Compares the outward normal with the one of the parameters, at one corner per face. */
  private void findSigns() {
    mesh.firstFace = part.firstFace();
    mesh.faceSign = new byte[part.faceCount()];
    double[] surface = new double[9];
    double[] curvature = new double[ExactGeometry.CURVATURE_STRIDE];
    for (int h = 0; h < 3 * mesh.triangles; h++) {
      int f = mesh.face[h / 3];
      if (mesh.faceSign[f - mesh.firstFace] != 0 || mesh.pole[h] != 0) {
        continue;
      }
      int[] at = {f};
      double[] uv = {mesh.uv[2 * h], mesh.uv[2 * h + 1]};
      geometry.surface(1, at, uv, surface);
      geometry.curvature(1, at, uv, curvature);
      double dot =
          curvature[0] * (surface[4] * surface[8] - surface[5] * surface[7])
              + curvature[1] * (surface[5] * surface[6] - surface[3] * surface[8])
              + curvature[2] * (surface[3] * surface[7] - surface[4] * surface[6]);
      mesh.faceSign[f - mesh.firstFace] = (byte) Math.signum(dot);
    }
  }

  /** A vertex where two fans of triangles touch would be met as one of them only. */
  private void checkFans() {
    int corners = 0;
    for (int v = 0; v < mesh.vertices; v++) {
      corners += mesh.valence(v);
    }
    if (corners != 3 * mesh.triangles) {
      throw new ModelException(
          "part "
              + part.path()
              + ": its surface touches itself at a point or an edge; separate it in the CAD program");
    }
  }
}
