// Boundary towards Java: flat arrays only, metres outside. Functions return a negative number on a fault and
// never let an exception through, since arrays may be pinned while they run.
#pragma once

#include <BRep_Builder.hxx>
#include <BinTools.hxx>
#include <Message.hxx>
#include <Message_Messenger.hxx>
#include <TopoDS_Compound.hxx>

#include <fstream>

#include "triangulation.h"

namespace edgefield {

constexpr double METRE = 0.001;
constexpr int64_t FAULT = -1;
constexpr int64_t BAD_INDEX = -2;

struct OpenModel {
  std::unique_ptr<Model> model;
  std::unique_ptr<Triangulation> mesh;
};

inline OpenModel& at(int64_t handle) { return *reinterpret_cast<OpenModel*>(handle); }
inline const Model& modelAt(int64_t handle) { return *at(handle).model; }

// Loads a compound whose direct children are the bodies. signs: +1 or -1 per body.
inline int64_t openModel(const signed char* file, const int* signs, int count) {
  try {
    Message::DefaultMessenger()->ChangePrinters().Clear();
    TopoDS_Shape all;
    std::ifstream in(reinterpret_cast<const char*>(file), std::ios::binary);
    BinTools::Read(all, in);
    if (all.IsNull()) return FAULT;
    std::vector<TopoDS_Shape> bodies;
    for (TopoDS_Iterator i(all); i.More(); i.Next()) bodies.push_back(i.Value());
    if (static_cast<int>(bodies.size()) != count) return FAULT;
    auto h = std::make_unique<OpenModel>();
    h->model = std::make_unique<Model>(bodies, std::vector<int>(signs, signs + count));
    return reinterpret_cast<int64_t>(h.release());
  } catch (...) {
    return FAULT;
  }
}

inline void closeModel(int64_t handle) { delete &at(handle); }

// faces, edges, vertices.
inline void modelSizes(int64_t handle, int* out) {
  const Model& m = modelAt(handle);
  out[0] = static_cast<int>(m.faces.size());
  out[1] = static_cast<int>(m.edges.size());
  out[2] = static_cast<int>(m.vertices.size());
}

// 4 per part: first face, faces, first edge, edges.
inline void partRanges(int64_t handle, int* out) {
  for (const PartData& p : modelAt(handle).parts) {
    *out++ = p.firstFace;
    *out++ = p.faceCount;
    *out++ = p.firstEdge;
    *out++ = p.edgeCount;
  }
}

// ints: part and kind per face; doubles: umin, umax, vmin, vmax, u period, v period per face.
inline void faceTable(int64_t handle, int* ints, double* doubles) {
  for (const FaceData& f : modelAt(handle).faces) {
    *ints++ = f.part;
    *ints++ = f.kind;
    for (const double b : f.bounds) *doubles++ = b;
    *doubles++ = f.uPeriod;
    *doubles++ = f.vPeriod;
  }
}

// ints: degenerate, start vertex, end vertex, face on side 0, face on side 1 per edge; doubles: t0, t1 per edge.
inline void edgeTable(int64_t handle, int* ints, double* doubles) {
  for (const EdgeData& e : modelAt(handle).edges) {
    *ints++ = e.degenerate ? 1 : 0;
    *ints++ = e.vertex[0];
    *ints++ = e.vertex[1];
    *ints++ = e.face[0];
    *ints++ = e.face[1];
    *doubles++ = e.t0;
    *doubles++ = e.t1;
  }
}

inline bool within(int i, size_t size) { return i >= 0 && static_cast<size_t>(i) < size; }

template <class Body>
inline int64_t guarded(Body body) {
  try {
    return body();
  } catch (...) {
    return FAULT;
  }
}

inline double* put(double* out, const Vec3& a, double scale) {
  out[0] = a[0] * scale;
  out[1] = a[1] * scale;
  out[2] = a[2] * scale;
  return out + 3;
}

inline int64_t surface(int64_t handle, int n, const int* face, const double* uv, double* out) {
  const Model& m = modelAt(handle);
  return guarded([&]() -> int64_t {
    for (int i = 0; i < n; i++) {
      if (!within(face[i], m.faces.size())) return BAD_INDEX;
      const SurfacePoint s = surfaceAt(m, face[i], uv[2 * i], uv[2 * i + 1]);
      out = put(out, s.p, METRE);
      out = put(out, s.du, METRE);
      out = put(out, s.dv, METRE);
    }
    return 0;
  });
}

inline int64_t curvature(int64_t handle, int n, const int* face, const double* uv, double* out) {
  const Model& m = modelAt(handle);
  return guarded([&]() -> int64_t {
    for (int i = 0; i < n; i++) {
      if (!within(face[i], m.faces.size())) return BAD_INDEX;
      const CurvaturePoint c = curvatureAt(m, face[i], uv[2 * i], uv[2 * i + 1]);
      out = put(out, c.normal, 1);
      *out++ = c.k1 / METRE;
      *out++ = c.k2 / METRE;
      out = put(out, c.d1, 1);
      out = put(out, c.d2, 1);
    }
    return 0;
  });
}

inline int64_t project(int64_t handle, int n, const int* face, const double* xyz, double* uv) {
  const Model& m = modelAt(handle);
  return guarded([&]() -> int64_t {
    for (int i = 0; i < n; i++) {
      if (!within(face[i], m.faces.size())) return BAD_INDEX;
      const Vec3 p{xyz[3 * i] / METRE, xyz[3 * i + 1] / METRE, xyz[3 * i + 2] / METRE};
      projectOn(m, face[i], p, uv[2 * i], uv[2 * i + 1]);
    }
    return 0;
  });
}

inline int64_t curve(int64_t handle, int n, const int* edge, const double* t, double* out) {
  const Model& m = modelAt(handle);
  return guarded([&]() -> int64_t {
    for (int i = 0; i < n; i++) {
      if (!within(edge[i], m.edges.size())) return BAD_INDEX;
      Vec3 p, d;
      curveAt(m, edge[i], t[i], p, d);
      out = put(out, p, METRE);
      out = put(out, d, METRE);
    }
    return 0;
  });
}

inline int64_t edgeUv(int64_t handle, int edge, int side, int n, const double* t, double* uv) {
  const Model& m = modelAt(handle);
  return guarded([&]() -> int64_t {
    if (!within(edge, m.edges.size()) || side < 0 || side > 1) return BAD_INDEX;
    const Handle(Geom2d_Curve)& c = m.edges[edge].pcurve[side];
    if (c.IsNull()) return BAD_INDEX;
    for (int i = 0; i < n; i++) {
      gp_Pnt2d p;
      c->D0(t[i], p);
      uv[2 * i] = p.X();
      uv[2 * i + 1] = p.Y();
    }
    return 0;
  });
}

// Builds the watertight triangulation; sizes: vertices, triangles, segments.
inline int64_t triangulate(int64_t handle, int* sizes) {
  return guarded([&]() -> int64_t {
    at(handle).mesh = std::make_unique<Triangulation>(modelAt(handle));
    const Triangulation& t = *at(handle).mesh;
    sizes[0] = static_cast<int>(t.vertexKind.size());
    sizes[1] = static_cast<int>(t.triangleFace.size());
    sizes[2] = static_cast<int>(t.segmentEdge.size());
    return t.bareFace >= 0 ? FAULT : 0;
  });
}

// Copies the triangulation out and frees it.
inline void takeTriangulation(int64_t handle, double* xyz, signed char* vertexKind, int* vertexEntity,
                              int* triangles, int* triangleFace, double* cornerUv, int* segmentVertices,
                              int* segmentEdge, double* segmentT) {
  const Triangulation& t = *at(handle).mesh;
  for (size_t i = 0; i < t.xyz.size(); i++) xyz[i] = t.xyz[i] * METRE;
  std::copy(t.vertexKind.begin(), t.vertexKind.end(), vertexKind);
  std::copy(t.vertexEntity.begin(), t.vertexEntity.end(), vertexEntity);
  std::copy(t.triangles.begin(), t.triangles.end(), triangles);
  std::copy(t.triangleFace.begin(), t.triangleFace.end(), triangleFace);
  std::copy(t.cornerUv.begin(), t.cornerUv.end(), cornerUv);
  std::copy(t.segmentVertices.begin(), t.segmentVertices.end(), segmentVertices);
  std::copy(t.segmentEdge.begin(), t.segmentEdge.end(), segmentEdge);
  std::copy(t.segmentT.begin(), t.segmentT.end(), segmentT);
  at(handle).mesh.reset();
}

}  // namespace edgefield
