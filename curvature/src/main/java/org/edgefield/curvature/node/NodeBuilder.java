package org.edgefield.curvature.node;

import java.util.Arrays;
import org.edgefield.curvature.EdgeClass;
import org.edgefield.curvature.EdgeFeature;
import org.edgefield.curvature.Features;
import org.edgefield.curvature.SurfaceNodes;
import org.edgefield.curvature.incidence.DisjointSets;
import org.edgefield.curvature.incidence.MeshIncidence;
import org.edgefield.importer.brep.ExactGeometry;
import org.edgefield.importer.mesh.SurfaceMesh;

/**
 * Builds the nodes of a mesh with exact normals and curvatures.
 *
 * <p>The triangles around a vertex fall into sectors, parted by the CAD edges that do not join
 * smoothly; each sector gets one node. So a vertex inside a face has one node, a vertex on a sharp
 * edge two, a box corner three. A sharp edge that ends inside a patch parts the vertices along it
 * but not the one at its end.
 *
 * <p>Where several faces meet in one node, the node takes the curvature pair with the largest k1.
 * On the line where a fillet joins a flat face the curvature jumps, and the field there lies
 * between the values of the two sides; the tighter curvature gives the higher estimate, so nothing
 * is missed. The normal is the mean over the sector, weighted with the corner angles where they
 * differ (the apex of a cone).
 */
public final class NodeBuilder {
  private final ExactGeometry geometry;
  private final SurfaceMesh mesh;
  private final Features features;
  private final boolean acrossFaces;
  private final MeshIncidence incidence;
  private final PoleParameters poles;

  private final int[] cornerNode;
  private int[] nodeVertex;
  private int nodes;

  /** Points to evaluate: node, corner whose face and parameters to take, weight of the normal. */
  private int[] pointNode;

  private int[] pointCorner;
  private double[] pointWeight;
  private int points;

  private final DisjointSets sectorSets = new DisjointSets(16);
  private int[] sectorNode = new int[16];

  private NodeBuilder(
      ExactGeometry geometry, SurfaceMesh mesh, Features features, boolean acrossFaces) {
    this.geometry = geometry;
    this.mesh = mesh;
    this.features = features;
    this.acrossFaces = acrossFaces;
    incidence = new MeshIncidence(mesh);
    poles = new PoleParameters(geometry, mesh);
    cornerNode = new int[mesh.triangles().length];
    int guess = mesh.vertexCount() + mesh.segmentCount() + 16;
    nodeVertex = new int[guess];
    pointNode = new int[guess];
    pointCorner = new int[guess];
    pointWeight = new double[guess];
  }

  /**
   * Nodes on smooth patches: faces that join along tangent edges and seams share their nodes. The
   * nodes of a field solve.
   */
  public static SurfaceNodes smoothPatches(
      ExactGeometry geometry, SurfaceMesh mesh, Features features) {
    return new NodeBuilder(geometry, mesh, features, true).build();
  }

  /**
   * Nodes per face: each face carries its own values up to its edges, also where it joins its
   * neighbour smoothly. The nodes of the quick estimate, which jumps where the curvature jumps.
   */
  public static SurfaceNodes perFace(ExactGeometry geometry, SurfaceMesh mesh, Features features) {
    return new NodeBuilder(geometry, mesh, features, false).build();
  }

  private SurfaceNodes build() {
    int[] firstCorner = new int[mesh.vertexCount()];
    Arrays.fill(firstCorner, -1);
    int[] triangles = mesh.triangles();
    for (int c = triangles.length - 1; c >= 0; c--) {
      firstCorner[triangles[c]] = c;
    }
    int[] vertexNode = new int[mesh.vertexCount()];
    for (int v = 0; v < vertexNode.length; v++) {
      if (firstCorner[v] < 0) {
        continue;
      }
      if (mesh.vertexKind()[v] == SurfaceMesh.ON_FACE) {
        vertexNode[v] = addNode(v);
        addPoint(vertexNode[v], firstCorner[v], 1);
      } else {
        vertexNode[v] = -1;
        sectors(v);
      }
    }
    for (int c = 0; c < triangles.length; c++) {
      int node = vertexNode[triangles[c]];
      if (node >= 0) {
        cornerNode[c] = node;
      }
    }
    int[] facePatch = facePatches();
    int[] nodePatch = new int[nodes];
    Arrays.fill(nodePatch, Integer.MAX_VALUE);
    for (int c = 0; c < triangles.length; c++) {
      int node = cornerNode[c];
      nodePatch[node] = Math.min(nodePatch[node], facePatch[mesh.triangleFace()[c / 3]]);
    }
    return evaluate(nodePatch, facePatch);
  }

  /** Patch per face, numbered from 0 in the order of their first faces. */
  private int[] facePatches() {
    int n = geometry.faceCount();
    DisjointSets sets = new DisjointSets(n);
    if (acrossFaces) {
      for (int e = 0; e < geometry.edgeCount(); e++) {
        if (features.edge(e).edgeClass() == EdgeClass.TANGENT) {
          int[] faces = geometry.edgeFaces(e);
          sets.unite(faces[0], faces[1]);
        }
      }
    }
    int[] patch = new int[n];
    int count = 0;
    for (int f = 0; f < n; f++) {
      // The root is the smallest face of its set, so it has its number by now.
      int r = sets.find(f);
      patch[f] = r == f ? count++ : patch[r];
    }
    return patch;
  }

  /** Makes one node per sector of triangles around a vertex on CAD edges. */
  private void sectors(int vertex) {
    int from = incidence.cornerStart(vertex);
    int n = incidence.cornerStart(vertex + 1) - from;
    sectorSets.reset(n);
    if (sectorNode.length < n) {
      sectorNode = new int[2 * n];
    }
    for (int i = 0; i < n; i++) {
      int a = incidence.corner(from + i);
      for (int j = 0; j < n; j++) {
        int b = incidence.corner(from + j);
        // Neighbours share an edge that one runs forwards and the other backwards.
        if (i != j
            && incidence.next(a) == incidence.previous(b)
            && joined(vertex, incidence.next(a), face(a), face(b))) {
          sectorSets.unite(i, j);
        }
      }
    }
    boolean everyCorner = mesh.vertexKind()[vertex] == SurfaceMesh.ON_VERTEX;
    for (int i = 0; i < n; i++) {
      int corner = incidence.corner(from + i);
      int r = sectorSets.find(i);
      if (r == i) {
        sectorNode[i] = addNode(vertex);
      }
      int node = sectorNode[r];
      cornerNode[corner] = node;
      // At poles and apexes each corner sees another limit; elsewhere one point per face does.
      if (everyCorner) {
        addPoint(node, corner, cornerAngle(corner));
      } else if (firstOfFace(from, i, r)) {
        addPoint(node, corner, 1);
      }
    }
  }

  private boolean firstOfFace(int from, int i, int sector) {
    int f = face(incidence.corner(from + i));
    for (int j = 0; j < i; j++) {
      if (sectorSets.find(j) == sector && face(incidence.corner(from + j)) == f) {
        return false;
      }
    }
    return true;
  }

  private int face(int corner) {
    return mesh.triangleFace()[corner / 3];
  }

  /** Whether two triangles that share the mesh edge v w lie in one sector. */
  private boolean joined(int v, int w, int faceA, int faceB) {
    if (faceA != faceB && !acrossFaces) {
      return false;
    }
    for (int i = incidence.segmentStart(v); i < incidence.segmentStart(v + 1); i++) {
      int s = incidence.segment(i);
      int v0 = mesh.segmentVertices()[2 * s];
      int v1 = mesh.segmentVertices()[2 * s + 1];
      if ((v0 == v ? v1 : v0) != w) {
        continue;
      }
      int[] faces = geometry.edgeFaces(mesh.segmentEdge()[s]);
      if ((faces[0] == faceA && faces[1] == faceB) || (faces[0] == faceB && faces[1] == faceA)) {
        EdgeFeature feature = features.edge(mesh.segmentEdge()[s]);
        return feature.smoothAt(0.5 * (mesh.segmentT()[2 * s] + mesh.segmentT()[2 * s + 1]));
      }
    }
    return faceA == faceB;
  }

  private double cornerAngle(int corner) {
    double[] x = mesh.xyz();
    int o = 3 * mesh.triangles()[corner];
    int p = 3 * incidence.next(corner);
    int q = 3 * incidence.previous(corner);
    double ax = x[p] - x[o];
    double ay = x[p + 1] - x[o + 1];
    double az = x[p + 2] - x[o + 2];
    double bx = x[q] - x[o];
    double by = x[q + 1] - x[o + 1];
    double bz = x[q + 2] - x[o + 2];
    double cx = ay * bz - az * by;
    double cy = az * bx - ax * bz;
    double cz = ax * by - ay * bx;
    return Math.atan2(Math.sqrt(cx * cx + cy * cy + cz * cz), ax * bx + ay * by + az * bz);
  }

  private int addNode(int vertex) {
    if (nodes == nodeVertex.length) {
      nodeVertex = Arrays.copyOf(nodeVertex, 2 * nodes);
    }
    nodeVertex[nodes] = vertex;
    return nodes++;
  }

  private void addPoint(int node, int corner, double weight) {
    if (points == pointNode.length) {
      pointNode = Arrays.copyOf(pointNode, 2 * points);
      pointCorner = Arrays.copyOf(pointCorner, 2 * points);
      pointWeight = Arrays.copyOf(pointWeight, 2 * points);
    }
    pointNode[points] = node;
    pointCorner[points] = corner;
    pointWeight[points++] = weight;
  }

  private SurfaceNodes evaluate(int[] nodePatch, int[] facePatch) {
    int[] face = new int[points];
    double[] uv = new double[2 * points];
    for (int i = 0; i < points; i++) {
      face[i] = face(pointCorner[i]);
      poles.parameters(pointCorner[i], uv, 2 * i);
    }
    int stride = ExactGeometry.CURVATURE_STRIDE;
    double[] c = CurvatureBatch.evaluate(geometry, face, uv);

    double[] normal = new double[3 * nodes];
    double[] k1 = new double[nodes];
    double[] k2 = new double[nodes];
    int[] tightest = new int[nodes];
    Arrays.fill(tightest, -1);
    for (int i = 0; i < points; i++) {
      int node = pointNode[i];
      int at = stride * i;
      for (int k = 0; k < 3; k++) {
        normal[3 * node + k] += pointWeight[i] * c[at + k];
      }
      if (tightest[node] < 0 || c[at + 3] > k1[node]) {
        tightest[node] = at;
        k1[node] = c[at + 3];
        k2[node] = c[at + 4];
      }
    }
    double[] direction = new double[3 * nodes];
    for (int node = 0; node < nodes; node++) {
      int at = tightest[node];
      int n = 3 * node;
      if (!normalise(normal, n)) {
        // Normals that cancel (a needle) leave no mean: the tightest face's own is as good as any.
        System.arraycopy(c, at, normal, n, 3);
        normalise(normal, n);
      }
      double along = normal[n] * c[at + 5] + normal[n + 1] * c[at + 6] + normal[n + 2] * c[at + 7];
      for (int k = 0; k < 3; k++) {
        direction[n + k] = c[at + 5 + k] - along * normal[n + k];
      }
      if (!normalise(direction, n)) {
        anyTangent(normal, direction, n);
      }
    }
    return new SurfaceNodes(
        cornerNode,
        Arrays.copyOf(nodeVertex, nodes),
        nodePatch,
        facePatch,
        normal,
        k1,
        k2,
        direction);
  }

  /** Writes a unit vector at right angles to the normal. */
  private static void anyTangent(double[] normal, double[] out, int at) {
    int least = 0;
    for (int k = 1; k < 3; k++) {
      if (Math.abs(normal[at + k]) < Math.abs(normal[at + least])) {
        least = k;
      }
    }
    for (int k = 0; k < 3; k++) {
      out[at + k] = (k == least ? 1 : 0) - normal[at + least] * normal[at + k];
    }
    normalise(out, at);
  }

  private static boolean normalise(double[] x, int at) {
    double l = Math.sqrt(x[at] * x[at] + x[at + 1] * x[at + 1] + x[at + 2] * x[at + 2]);
    if (!(l > 1e-9)) {
      return false;
    }
    for (int k = 0; k < 3; k++) {
      x[at + k] /= l;
    }
    return true;
  }
}
