// Watertight triangulation out of the kernel's face-by-face one: vertices shared across edges.
#pragma once

#include <Poly_PolygonOnTriangulation.hxx>
#include <Poly_Triangulation.hxx>

#include "evaluate.h"

namespace edgefield {

// Arrays of org.edgefield.importer.mesh.SurfaceMesh, lengths in millimetres.
struct Triangulation {
  enum Kind : int8_t { ON_FACE, ON_EDGE, ON_VERTEX };
  std::vector<double> xyz;
  std::vector<int8_t> vertexKind;
  std::vector<int> vertexEntity;
  std::vector<int> triangles;
  std::vector<int> triangleFace;
  std::vector<double> cornerUv;
  std::vector<int> segmentVertices;
  std::vector<int> segmentEdge;
  std::vector<double> segmentT;
  // Face that carries no triangulation, or -1.
  int bareFace = -1;

  explicit Triangulation(const Model& m) {
    for (size_t i = 0; i < m.vertices.size(); i++) add(m.vertices[i], ON_VERTEX, static_cast<int>(i));
    edgeVertices_.resize(m.edges.size());
    for (const PartData& part : m.parts) {
      for (int e = part.firstEdge; e < part.firstEdge + part.edgeCount; e++) addEdge(m, e);
      for (int f = part.firstFace; f < part.firstFace + part.faceCount; f++) addFace(m, f);
    }
    dropUnused();
  }

 private:
  std::vector<std::vector<int>> edgeVertices_;

  int add(const Vec3& p, Kind kind, int entity) {
    xyz.insert(xyz.end(), p.begin(), p.end());
    vertexKind.push_back(kind);
    vertexEntity.push_back(entity);
    return static_cast<int>(vertexKind.size()) - 1;
  }

  static Handle(Poly_PolygonOnTriangulation) polygon(const Model& m, int edge, int face) {
    TopLoc_Location loc;
    const Handle(Poly_Triangulation) tri = BRep_Tool::Triangulation(m.faces[face].face, loc);
    if (tri.IsNull()) return {};
    return BRep_Tool::PolygonOnTriangulation(m.edges[edge].edge, tri, loc);
  }

  void addEdge(const Model& m, int edge) {
    const EdgeData& e = m.edges[edge];
    if (e.degenerate || e.vertex[0] < 0 || e.vertex[1] < 0) return;
    const int face = e.face[0] >= 0 ? e.face[0] : e.face[1];
    if (face < 0) return;
    const Handle(Poly_PolygonOnTriangulation) poly = polygon(m, edge, face);
    if (poly.IsNull() || !poly->HasParameters()) return;
    const int n = poly->NbNodes();
    std::vector<int>& ids = edgeVertices_[edge];
    ids.resize(n);
    const auto t = [&](int i) { return i == 0 ? e.t0 : i == n - 1 ? e.t1 : poly->Parameter(i + 1); };
    for (int i = 0; i < n; i++) {
      if (i == 0) {
        ids[i] = e.vertex[0];
      } else if (i == n - 1) {
        ids[i] = e.vertex[1];
      } else {
        Vec3 p, d;
        curveAt(m, edge, t(i), p, d);
        ids[i] = add(p, ON_EDGE, edge);
      }
    }
    for (int i = 0; i + 1 < n; i++) {
      segmentVertices.push_back(ids[i]);
      segmentVertices.push_back(ids[i + 1]);
      segmentEdge.push_back(edge);
      segmentT.push_back(t(i));
      segmentT.push_back(t(i + 1));
    }
  }

  void addFace(const Model& m, int face) {
    const FaceData& f = m.faces[face];
    TopLoc_Location loc;
    const Handle(Poly_Triangulation) tri = BRep_Tool::Triangulation(f.face, loc);
    if (tri.IsNull() || tri->NbTriangles() == 0 || !tri->HasUVNodes()) {
      bareFace = face;
      return;
    }
    std::vector<int> id(tri->NbNodes(), -1);
    const PartData& part = m.parts[f.part];
    for (TopExp_Explorer x(f.face.Oriented(TopAbs_FORWARD), TopAbs_EDGE); x.More(); x.Next()) {
      const TopoDS_Edge use = TopoDS::Edge(x.Current());
      const int edge = part.firstEdge + part.edgeIds->FindIndex(use) - 1;
      // A seam carries two polygons; the orientation of the use picks one.
      const Handle(Poly_PolygonOnTriangulation) poly = BRep_Tool::PolygonOnTriangulation(use, tri, loc);
      if (poly.IsNull()) continue;
      const EdgeData& e = m.edges[edge];
      for (int i = 0; i < poly->NbNodes(); i++) {
        const int node = poly->Node(i + 1) - 1;
        if (e.degenerate) {
          id[node] = e.vertex[0];
        } else if (i < static_cast<int>(edgeVertices_[edge].size())) {
          id[node] = edgeVertices_[edge][i];
        }
      }
    }
    for (int i = 0; i < tri->NbNodes(); i++) {
      if (id[i] < 0) {
        const gp_Pnt2d q = tri->UVNode(i + 1);
        id[i] = add(surfaceAt(m, face, q.X(), q.Y()).p, ON_FACE, face);
      }
    }
    for (int i = 1; i <= tri->NbTriangles(); i++) {
      std::array<int, 3> c{};
      tri->Triangle(i).Get(c[0], c[1], c[2]);
      if (f.sign < 0) std::swap(c[1], c[2]);
      const std::array<int, 3> v{id[c[0] - 1], id[c[1] - 1], id[c[2] - 1]};
      if (v[0] == v[1] || v[1] == v[2] || v[2] == v[0]) continue;
      triangles.insert(triangles.end(), v.begin(), v.end());
      triangleFace.push_back(face);
      for (const int n : c) {
        const gp_Pnt2d q = tri->UVNode(n);
        cornerUv.push_back(q.X());
        cornerUv.push_back(q.Y());
      }
    }
  }

  // CAD vertices that no triangle uses would float in the mesh.
  void dropUnused() {
    std::vector<int> to(vertexKind.size(), -1);
    for (const int v : triangles) to[v] = 0;
    int n = 0;
    for (size_t i = 0; i < to.size(); i++) {
      if (to[i] < 0) continue;
      to[i] = n;
      for (int k = 0; k < 3; k++) xyz[3 * n + k] = xyz[3 * i + k];
      vertexKind[n] = vertexKind[i];
      vertexEntity[n] = vertexEntity[i];
      n++;
    }
    xyz.resize(3 * n);
    vertexKind.resize(n);
    vertexEntity.resize(n);
    for (int& v : triangles) v = to[v];
    for (int& v : segmentVertices) v = to[v];
  }
};

}  // namespace edgefield
