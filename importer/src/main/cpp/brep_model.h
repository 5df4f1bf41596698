// Numbering of a boundary representation: parts, faces, edges and vertices through the whole model.
#pragma once

#include <BRepTools.hxx>
#include <BRep_Tool.hxx>
#include <Geom2d_Curve.hxx>
#include <GeomAdaptor_Curve.hxx>
#include <GeomAdaptor_Surface.hxx>
#include <Geom_Curve.hxx>
#include <Geom_Surface.hxx>
#include <TopExp.hxx>
#include <TopExp_Explorer.hxx>
#include <TopTools_IndexedMapOfShape.hxx>
#include <TopoDS.hxx>
#include <TopoDS_Edge.hxx>
#include <TopoDS_Face.hxx>
#include <TopoDS_Iterator.hxx>
#include <TopoDS_Shape.hxx>
#include <TopoDS_Vertex.hxx>

#include <array>
#include <atomic>
#include <cmath>
#include <cstdint>
#include <memory>
#include <mutex>
#include <thread>
#include <unordered_map>
#include <vector>

namespace edgefield {

// Order of org.edgefield.importer.brep.SurfaceKind.
enum SurfaceKind { PLANE, CYLINDER, CONE, SPHERE, TORUS, NURBS, OTHER };

using Vec3 = std::array<double, 3>;

inline Vec3 vec(const gp_XYZ& p) { return {p.X(), p.Y(), p.Z()}; }
inline double dot(const Vec3& a, const Vec3& b) { return a[0] * b[0] + a[1] * b[1] + a[2] * b[2]; }
inline Vec3 cross(const Vec3& a, const Vec3& b) {
  return {a[1] * b[2] - a[2] * b[1], a[2] * b[0] - a[0] * b[2], a[0] * b[1] - a[1] * b[0]};
}
inline Vec3 scaled(const Vec3& a, double s) { return {a[0] * s, a[1] * s, a[2] * s}; }
inline Vec3 plus(const Vec3& a, const Vec3& b, double s = 1) {
  return {a[0] + s * b[0], a[1] + s * b[1], a[2] + s * b[2]};
}
inline double norm(const Vec3& a) { return std::sqrt(dot(a, a)); }

// One trimmed face; lengths in the kernel's millimetres.
struct FaceData {
  TopoDS_Face face;
  Handle(Geom_Surface) surface;
  SurfaceKind kind = OTHER;
  int part = 0;
  // +1 where dS/du x dS/dv points into the gas, -1 where it points into the solid.
  double sign = 1;
  std::array<double, 4> bounds{};
  std::array<double, 4> natural{};
  double uPeriod = 0;
  double vPeriod = 0;
  // Axes and radii of elementary surfaces.
  Vec3 origin{}, x{}, y{}, z{};
  double radius = 0, minor = 0, sinAngle = 0, cosAngle = 1;
  double handed = 1;
  // Largest |dS/du| and |dS/dv| on a coarse grid: scale against which a point counts as singular.
  double uSpeed = 0, vSpeed = 0;
};

struct EdgeData {
  enum Kind { NONE, LINE, CIRCLE, CURVE };
  TopoDS_Edge edge;
  Handle(Geom_Curve) curve;
  Kind kind = NONE;
  double t0 = 0, t1 = 0;
  bool degenerate = false;
  std::array<int, 2> vertex{-1, -1};
  // Side 0 runs along the edge with the solid's face on the left seen from the gas; side 1 the other way.
  std::array<int, 2> face{-1, -1};
  std::array<Handle(Geom2d_Curve), 2> pcurve;
  int uses = 0;
  Vec3 origin{}, x{}, y{};
  double radius = 0;
};

struct PartData {
  TopoDS_Shape shape;
  int firstFace = 0, faceCount = 0, firstEdge = 0, edgeCount = 0, firstVertex = 0, vertexCount = 0;
  // -1 where the body is stored inside out.
  int sign = 1;
  // Position of an edge in the part, from 1; 0 where it is not there.
  std::shared_ptr<TopTools_IndexedMapOfShape> edgeIds;
};

struct ThreadEval {
  std::vector<std::unique_ptr<GeomAdaptor_Surface>> surface;
  std::vector<std::unique_ptr<GeomAdaptor_Curve>> curve;
};

// Numbered bodies with what evaluation needs beside them. Immutable after construction but for the adaptors
// that each thread keeps for itself, since the kernel's spline caches are not thread-safe.
class Model {
 public:
  std::vector<PartData> parts;
  std::vector<FaceData> faces;
  std::vector<EdgeData> edges;
  std::vector<Vec3> vertices;

  explicit Model(const std::vector<TopoDS_Shape>& bodies, const std::vector<int>& signs) {
    static std::atomic<uint64_t> count{0};
    serial_ = ++count;
    for (size_t i = 0; i < bodies.size(); i++) addPart(bodies[i], i < signs.size() ? signs[i] : 1);
  }

  ThreadEval& local() const {
    thread_local uint64_t serial = 0;
    thread_local ThreadEval* eval = nullptr;
    if (serial != serial_) {
      std::lock_guard<std::mutex> guard(lock_);
      auto& slot = evals_[std::this_thread::get_id()];
      if (!slot) {
        slot = std::make_unique<ThreadEval>();
        slot->surface.resize(faces.size());
        slot->curve.resize(edges.size());
      }
      eval = slot.get();
      serial = serial_;
    }
    return *eval;
  }

  GeomAdaptor_Surface& surface(int face) const {
    auto& slot = local().surface[face];
    if (!slot) slot = std::make_unique<GeomAdaptor_Surface>(faces[face].surface);
    return *slot;
  }

  GeomAdaptor_Curve& curve(int edge) const {
    auto& slot = local().curve[edge];
    if (!slot) slot = std::make_unique<GeomAdaptor_Curve>(edges[edge].curve, edges[edge].t0, edges[edge].t1);
    return *slot;
  }

 private:
  uint64_t serial_ = 0;
  mutable std::mutex lock_;
  mutable std::unordered_map<std::thread::id, std::unique_ptr<ThreadEval>> evals_;

  static void axes(FaceData& f, const gp_Ax3& a) {
    f.origin = vec(a.Location().XYZ());
    f.x = vec(a.XDirection().XYZ());
    f.y = vec(a.YDirection().XYZ());
    f.z = vec(a.Direction().XYZ());
    f.handed = a.Direct() ? 1 : -1;
  }

  static void classify(FaceData& f) {
    const GeomAdaptor_Surface s(f.surface);
    f.uPeriod = s.IsUPeriodic() ? s.UPeriod() : 0;
    f.vPeriod = s.IsVPeriodic() ? s.VPeriod() : 0;
    f.natural = {s.FirstUParameter(), s.LastUParameter(), s.FirstVParameter(), s.LastVParameter()};
    switch (s.GetType()) {
      case GeomAbs_Plane:
        f.kind = PLANE;
        axes(f, s.Plane().Position());
        break;
      case GeomAbs_Cylinder:
        f.kind = CYLINDER;
        axes(f, s.Cylinder().Position());
        f.radius = s.Cylinder().Radius();
        break;
      case GeomAbs_Cone:
        f.kind = CONE;
        axes(f, s.Cone().Position());
        f.radius = s.Cone().RefRadius();
        f.sinAngle = std::sin(s.Cone().SemiAngle());
        f.cosAngle = std::cos(s.Cone().SemiAngle());
        break;
      case GeomAbs_Sphere:
        f.kind = SPHERE;
        axes(f, s.Sphere().Position());
        f.radius = s.Sphere().Radius();
        break;
      case GeomAbs_Torus:
        f.kind = TORUS;
        axes(f, s.Torus().Position());
        f.radius = s.Torus().MajorRadius();
        f.minor = s.Torus().MinorRadius();
        break;
      case GeomAbs_BSplineSurface:
      case GeomAbs_BezierSurface:
        f.kind = NURBS;
        break;
      default:
        f.kind = OTHER;
    }
    if (f.kind >= NURBS) {
      for (int i = 0; i <= 4; i++) {
        for (int j = 0; j <= 4; j++) {
          gp_Pnt p;
          gp_Vec du, dv;
          s.D1(f.bounds[0] + (f.bounds[1] - f.bounds[0]) * i / 4, f.bounds[2] + (f.bounds[3] - f.bounds[2]) * j / 4,
               p, du, dv);
          f.uSpeed = std::max(f.uSpeed, du.Magnitude());
          f.vSpeed = std::max(f.vSpeed, dv.Magnitude());
        }
      }
    }
  }

  static void classify(EdgeData& e) {
    const GeomAdaptor_Curve c(e.curve);
    if (c.GetType() == GeomAbs_Line) {
      e.kind = EdgeData::LINE;
      e.origin = vec(c.Line().Location().XYZ());
      e.x = vec(c.Line().Direction().XYZ());
    } else if (c.GetType() == GeomAbs_Circle) {
      e.kind = EdgeData::CIRCLE;
      e.origin = vec(c.Circle().Location().XYZ());
      e.x = vec(c.Circle().XAxis().Direction().XYZ());
      e.y = vec(c.Circle().YAxis().Direction().XYZ());
      e.radius = c.Circle().Radius();
    } else {
      e.kind = EdgeData::CURVE;
    }
  }

  void addPart(const TopoDS_Shape& body, int sign) {
    PartData part;
    part.shape = body;
    part.sign = sign;
    TopTools_IndexedMapOfShape faceMap, vertexMap;
    part.edgeIds = std::make_shared<TopTools_IndexedMapOfShape>();
    TopTools_IndexedMapOfShape& edgeMap = *part.edgeIds;
    TopExp::MapShapes(body, TopAbs_FACE, faceMap);
    TopExp::MapShapes(body, TopAbs_EDGE, edgeMap);
    TopExp::MapShapes(body, TopAbs_VERTEX, vertexMap);
    part.firstFace = static_cast<int>(faces.size());
    part.firstEdge = static_cast<int>(edges.size());
    part.firstVertex = static_cast<int>(vertices.size());
    part.faceCount = faceMap.Extent();
    part.edgeCount = edgeMap.Extent();
    part.vertexCount = vertexMap.Extent();
    for (int i = 1; i <= vertexMap.Extent(); i++) {
      vertices.push_back(vec(BRep_Tool::Pnt(TopoDS::Vertex(vertexMap(i))).XYZ()));
    }
    for (int i = 1; i <= edgeMap.Extent(); i++) {
      EdgeData e;
      e.edge = TopoDS::Edge(edgeMap(i).Oriented(TopAbs_FORWARD));
      e.degenerate = BRep_Tool::Degenerated(e.edge);
      e.curve = BRep_Tool::Curve(e.edge, e.t0, e.t1);
      if (e.curve.IsNull()) {
        BRep_Tool::Range(e.edge, e.t0, e.t1);
      } else {
        classify(e);
      }
      TopoDS_Vertex a, b;
      TopExp::Vertices(e.edge, a, b);
      e.vertex = {a.IsNull() ? -1 : part.firstVertex + vertexMap.FindIndex(a) - 1,
                  b.IsNull() ? -1 : part.firstVertex + vertexMap.FindIndex(b) - 1};
      edges.push_back(e);
    }
    for (int i = 1; i <= faceMap.Extent(); i++) {
      FaceData f;
      f.face = TopoDS::Face(faceMap(i));
      f.part = static_cast<int>(parts.size());
      f.sign = (f.face.Orientation() == TopAbs_REVERSED ? -1 : 1) * sign;
      f.surface = BRep_Tool::Surface(f.face);
      BRepTools::UVBounds(f.face, f.bounds[0], f.bounds[1], f.bounds[2], f.bounds[3]);
      classify(f);
      const int id = part.firstFace + i - 1;
      const TopoDS_Face plain = TopoDS::Face(f.face.Oriented(TopAbs_FORWARD));
      for (TopExp_Explorer x(plain, TopAbs_EDGE); x.More(); x.Next()) {
        const TopoDS_Edge use = TopoDS::Edge(x.Current());
        EdgeData& e = edges[part.firstEdge + edgeMap.FindIndex(use) - 1];
        e.uses++;
        int side = ((use.Orientation() == TopAbs_REVERSED) != (f.sign < 0)) ? 1 : 0;
        if (e.face[side] >= 0) side = 1 - side;
        if (e.face[side] >= 0) continue;
        double first = 0, last = 0;
        e.face[side] = id;
        e.pcurve[side] = BRep_Tool::CurveOnSurface(use, plain, first, last);
      }
      faces.push_back(f);
    }
    parts.push_back(part);
  }
};

}  // namespace edgefield
