// Refuses bodies that enclose nothing, leak, or are beyond any sensible size.
#pragma once

#include <BRepBndLib.hxx>
#include <BRepGProp.hxx>
#include <BRepMesh_IncrementalMesh.hxx>
#include <Bnd_Box.hxx>
#include <GProp_GProps.hxx>
#include <Precision.hxx>

#include "assembly_walk.h"
#include "brep_model.h"
#include "triangulation.h"

namespace edgefield {

struct Measure {
  std::array<double, 6> box{};
  double volume = 0;
  double area = 0;
  double size = 0;
};

inline std::string place(const Vec3& p) {
  return "(" + brief(p[0]) + ", " + brief(p[1]) + ", " + brief(p[2]) + ") mm";
}

inline double diagonal(const std::array<double, 6>& b) {
  return std::sqrt((b[3] - b[0]) * (b[3] - b[0]) + (b[4] - b[1]) * (b[4] - b[1]) + (b[5] - b[2]) * (b[5] - b[2]));
}

// Box from control points and edges only: cheap, never too small, safe on absurd geometry.
inline void checkSize(const Body& b, const std::string& entity, double largest_mm) {
  Bnd_Box box;
  BRepBndLib::Add(b.shape, box, false);
  if (box.IsVoid() || box.IsOpen()) throw Refusal{"unbounded", {b.path, entity}};
  std::array<double, 6> x{};
  box.Get(x[0], x[1], x[2], x[3], x[4], x[5]);
  for (const double v : x) {
    if (!(std::abs(v) <= largest_mm)) throw Refusal{"too-large", {b.path, entity, brief(v), brief(largest_mm)}};
  }
}

inline Vec3 middle(const Model& m, const EdgeData& e) {
  Vec3 p, d;
  curveAt(m, static_cast<int>(&e - m.edges.data()), 0.5 * (e.t0 + e.t1), p, d);
  return p;
}

// Every edge must join exactly two face sides.
inline void checkClosed(const Model& m, int part, const Body& b, const std::string& entity) {
  const PartData& p = m.parts[part];
  int open = 0, crowded = 0;
  const EdgeData* first = nullptr;
  const EdgeData* crowd = nullptr;
  for (int i = p.firstEdge; i < p.firstEdge + p.edgeCount; i++) {
    const EdgeData& e = m.edges[i];
    if (e.degenerate || e.uses == 2) continue;
    if (e.uses < 2) {
      if (open++ == 0) first = &e;
    } else if (crowded++ == 0) {
      crowd = &e;
    }
  }
  if (p.faceCount == 0) throw Refusal{"no-faces", {b.path, entity}};
  if (open > 0) throw Refusal{"open-shell", {b.path, entity, std::to_string(open), place(middle(m, *first))}};
  if (crowded > 0) {
    throw Refusal{"crowded-edge", {b.path, entity, std::to_string(crowd->uses), place(middle(m, *crowd))}};
  }
}

inline Measure measure(const Body& b) {
  Measure m;
  GProp_GProps volume, area;
  BRepGProp::VolumeProperties(b.shape, volume);
  BRepGProp::SurfaceProperties(b.shape, area);
  m.volume = volume.Mass();
  m.area = area.Mass();
  Bnd_Box box;
  BRepBndLib::AddOptimal(b.shape, box, false, false);
  box.SetGap(0);
  box.Get(m.box[0], m.box[1], m.box[2], m.box[3], m.box[4], m.box[5]);
  // The kernel keeps its confusion distance on every side.
  for (int i = 0; i < 3; i++) {
    m.box[i] += Precision::Confusion();
    m.box[i + 3] -= Precision::Confusion();
  }
  m.size = diagonal(m.box);
  return m;
}

// Mean thickness 2 V / A against the size of the body.
inline void checkThickness(const Body& b, const std::string& entity, const Measure& m) {
  const double thickness = 2 * std::abs(m.volume) / m.area;
  if (!(thickness > 1e-6 * m.size)) throw Refusal{"no-thickness", {b.path, entity, brief(m.area)}};
}

}  // namespace edgefield
