package org.edgefield.importer.mesh.check;

import java.util.List;
import java.util.Locale;
import org.edgefield.importer.brep.Assembly;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.brep.Part;
import org.edgefield.importer.mesh.MeshRequest;
import org.edgefield.importer.mesh.MeshSettings;
import org.edgefield.importer.mesh.SurfaceMesh;
import org.edgefield.importer.mesh.halfedge.HalfEdgeBuilder;
import org.edgefield.importer.mesh.halfedge.HalfEdgeMesh;
import org.edgefield.importer.mesh.remesh.PartRemesher;
import org.edgefield.importer.mesh.size.Gaps;
import org.edgefield.importer.mesh.size.Metric;
import org.edgefield.importer.mesh.size.SizeSource;
import org.edgefield.importer.mesh.size.VertexField;

/**
 * How good a mesh is for computing. Angles are measured in each element's own metric, the mean of
 * the size tensors at its corners, evaluated anew on the mesh.
 *
 * @param triangles number of triangles
 * @param wanted number of equilateral elements of unit side that the size field integrates to
 * @param angleHistogram number of angles per 10 degrees, 18 bins
 * @param below20 number of angles below 20 degrees
 * @param below5 number of angles below 5 degrees
 * @param smallestAngle_deg smallest angle
 * @param confined angles below 20 degrees in triangles whose three corners all lie on CAD edges
 * @param inverted triangles that do not face along the outward normals of their corners
 * @param faceError largest |x - S(uv)| of vertices inside faces over the part's size
 * @param edgeError largest |x - S(uv)| of corners on CAD edges over the part's size: the tolerance
 *     of the model itself, since x lies on the exact edge
 */
public record MeshQuality(
    int triangles,
    double wanted,
    int[] angleHistogram,
    int below20,
    int below5,
    double smallestAngle_deg,
    int confined,
    int inverted,
    double faceError,
    double edgeError) {

  private static final double UNIT_AREA = Math.sqrt(3) / 4;

  /**
   * Measures a mesh.
   *
   * @param assembly the model
   * @param mesh its mesh
   * @param settings sizes it was made for
   * @param request what was asked for on top
   * @return the figures over all parts
   * @throws org.edgefield.importer.ModelException where a part's mesh is no closed two-manifold
   */
  public static MeshQuality measure(
      Assembly assembly, SurfaceMesh mesh, MeshSettings settings, MeshRequest request) {
    ExactGeometry geometry = assembly.geometry();
    List<Part> parts = assembly.parts();
    Gaps gaps =
        parts.size() > 1 && settings.elementsPerGap() > 0
            ? new Gaps(parts, geometry, mesh, request.partGroup())
            : null;
    Sums sums = new Sums();
    for (Part part : parts) {
      HalfEdgeBuilder.Built built = HalfEdgeBuilder.build(geometry, mesh, part);
      VertexField field = new VertexField(built.mesh().vertices);
      if (request.targetSize_m() != null) {
        for (int v = 0; v < built.mesh().vertices; v++) {
          field.target[v] = request.targetSize_m()[built.originalVertex()[v]];
        }
      }
      SizeSource sizes = new SizeSource(geometry, part, settings, request, gaps);
      PartRemesher.measure(geometry, built.mesh(), field, sizes);
      sums.add(built.mesh(), field);
      sums.addErrors(geometry, built.mesh(), part.size_m());
    }
    return sums.result();
  }

  /** Number of triangles over what the size field integrates to. */
  public double countRatio() {
    return triangles / wanted;
  }

  /** Share of angles below 20 degrees. */
  public double shareBelow20() {
    return below20 / (3.0 * triangles);
  }

  /** One line with the figures. */
  public String line() {
    return String.format(
        Locale.ROOT,
        "%8d triangles, %5.3f x wanted, %7.4f %% < 20 deg (%d confined), %d < 5 deg, min %5.2f deg,"
            + " %d inverted, |x-S| %.1e in faces %.1e on edges",
        triangles,
        countRatio(),
        100 * shareBelow20(),
        confined,
        below5,
        smallestAngle_deg,
        inverted,
        faceError,
        edgeError);
  }

  private static final class Sums {
    private int triangles;
    private double wanted;
    private final int[] histogram = new int[18];
    private int below20;
    private int below5;
    private double smallest = 180;
    private int confined;
    private int inverted;
    private double faceError;
    private double edgeError;
    private final double[] tensor = new double[Metric.STRIDE];

    void add(HalfEdgeMesh mesh, VertexField field) {
      for (int t = 0; t < mesh.triangles; t++) {
        triangles++;
        addTriangle(mesh, field, t);
      }
    }

    private void addTriangle(HalfEdgeMesh mesh, VertexField field, int t) {
      boolean allOnEdges = true;
      for (int i = 0; i < Metric.STRIDE; i++) {
        tensor[i] = 0;
        for (int h = 3 * t; h < 3 * t + 3; h++) {
          tensor[i] += field.metric[Metric.STRIDE * mesh.org[h] + i] / 3;
        }
      }
      double[] side2 = new double[3];
      double[][] e = new double[3][3];
      for (int k = 0; k < 3; k++) {
        int h = 3 * t + k;
        allOnEdges &= mesh.kind[mesh.org[h]] != SurfaceMesh.ON_FACE;
        for (int i = 0; i < 3; i++) {
          e[k][i] = mesh.xyz[3 * mesh.dest(h) + i] - mesh.xyz[3 * mesh.org[h] + i];
        }
        side2[k] = Metric.square(tensor, 0, e[k][0], e[k][1], e[k][2]);
      }
      double area = 0;
      for (int k = 0; k < 3; k++) {
        // Angle at the origin of side k, between side k and the reverse of the one before.
        double a = side2[k];
        double b = side2[(k + 2) % 3];
        double c = side2[(k + 1) % 3];
        double dot = 0.5 * (a + b - c);
        double cross = Math.sqrt(Math.max(0, a * b - dot * dot));
        double angle = Math.toDegrees(Math.atan2(cross, dot));
        area = 0.5 * cross;
        histogram[Math.min(17, (int) (angle / 10))]++;
        smallest = Math.min(smallest, angle);
        below5 += angle < 5 ? 1 : 0;
        if (angle < 20) {
          below20++;
          confined += allOnEdges ? 1 : 0;
        }
      }
      wanted += area / UNIT_AREA;
      double nx = e[0][1] * e[1][2] - e[0][2] * e[1][1];
      double ny = e[0][2] * e[1][0] - e[0][0] * e[1][2];
      double nz = e[0][0] * e[1][1] - e[0][1] * e[1][0];
      boolean faces = true;
      for (int h = 3 * t; h < 3 * t + 3; h++) {
        double dot =
            nx * mesh.normal[3 * h] + ny * mesh.normal[3 * h + 1] + nz * mesh.normal[3 * h + 2];
        faces &= mesh.pole[h] != 0 || dot > 0;
      }
      inverted += faces ? 0 : 1;
    }

    void addErrors(ExactGeometry geometry, HalfEdgeMesh mesh, double size) {
      int n = 3 * mesh.triangles;
      int[] face = new int[n];
      for (int h = 0; h < n; h++) {
        face[h] = mesh.face[h / 3];
      }
      double[] s = new double[9 * n];
      geometry.surface(n, face, mesh.uv, s);
      for (int h = 0; h < n; h++) {
        double d2 = 0;
        for (int i = 0; i < 3; i++) {
          double d = s[9 * h + i] - mesh.xyz[3 * mesh.org[h] + i];
          d2 += d * d;
        }
        double error = Math.sqrt(d2) / size;
        if (mesh.kind[mesh.org[h]] == SurfaceMesh.ON_FACE) {
          faceError = Math.max(faceError, error);
        } else {
          edgeError = Math.max(edgeError, error);
        }
      }
    }

    MeshQuality result() {
      return new MeshQuality(
          triangles, wanted, histogram, below20, below5, smallest, confined, inverted, faceError,
          edgeError);
    }
  }
}
