// Points, derivatives, normals, principal curvatures and nearest points on faces and edges.
// Inside this file lengths are the kernel's millimetres; kernel.h converts to metres.
#pragma once

#include "brep_model.h"

namespace edgefield {

struct SurfacePoint {
  Vec3 p, du, dv;
};

struct CurvaturePoint {
  Vec3 normal;
  double k1, k2;
  Vec3 d1, d2;
};

inline Vec3 radial(const FaceData& f, double u) { return plus(scaled(f.x, std::cos(u)), f.y, std::sin(u)); }
inline Vec3 azimuth(const FaceData& f, double u) { return plus(scaled(f.x, -std::sin(u)), f.y, std::cos(u)); }

inline SurfacePoint surfaceAt(const Model& m, int face, double u, double v) {
  const FaceData& f = m.faces[face];
  switch (f.kind) {
    case PLANE:
      return {plus(plus(f.origin, f.x, u), f.y, v), f.x, f.y};
    case CYLINDER:
      return {plus(plus(f.origin, radial(f, u), f.radius), f.z, v), scaled(azimuth(f, u), f.radius), f.z};
    case CONE: {
      const Vec3 e = radial(f, u);
      const double rho = f.radius + v * f.sinAngle;
      return {plus(plus(f.origin, e, rho), f.z, v * f.cosAngle), scaled(azimuth(f, u), rho),
              plus(scaled(e, f.sinAngle), f.z, f.cosAngle)};
    }
    case SPHERE: {
      const Vec3 e = radial(f, u);
      const double c = std::cos(v), s = std::sin(v);
      return {plus(plus(f.origin, e, f.radius * c), f.z, f.radius * s), scaled(azimuth(f, u), f.radius * c),
              plus(scaled(e, -f.radius * s), f.z, f.radius * c)};
    }
    case TORUS: {
      const Vec3 e = radial(f, u);
      const double c = std::cos(v), s = std::sin(v), rho = f.radius + f.minor * c;
      return {plus(plus(f.origin, e, rho), f.z, f.minor * s), scaled(azimuth(f, u), rho),
              plus(scaled(e, -f.minor * s), f.z, f.minor * c)};
    }
    default: {
      gp_Pnt p;
      gp_Vec du, dv;
      m.surface(face).D1(u, v, p, du, dv);
      return {vec(p.XYZ()), vec(du.XYZ()), vec(dv.XYZ())};
    }
  }
}

inline Vec3 unit(const Vec3& a) { return scaled(a, 1 / norm(a)); }

inline CurvaturePoint ordered(const Vec3& n, double ka, const Vec3& a, double kb, const Vec3& b) {
  return ka >= kb ? CurvaturePoint{n, ka, kb, a, b} : CurvaturePoint{n, kb, ka, b, a};
}

// Shape operator given in an orthonormal tangent frame (e1, e2 = n x e1).
inline CurvaturePoint principal(const Vec3& n, const Vec3& e1, double w11, double w12, double w22) {
  const double mean = 0.5 * (w11 + w22), half = 0.5 * (w11 - w22);
  const double r = std::hypot(half, w12);
  const double angle = r == 0 ? 0 : 0.5 * std::atan2(w12, half);
  const Vec3 d1 = plus(scaled(e1, std::cos(angle)), cross(n, e1), std::sin(angle));
  return {n, mean + r, mean - r, d1, cross(n, d1)};
}

// Curvature of a surface known only through its derivatives: eigenvalues of the shape operator in an
// orthonormal tangent frame. Returns false where the parametrisation is singular.
inline bool generalCurvature(const Model& m, int face, double u, double v, CurvaturePoint& out) {
  const FaceData& f = m.faces[face];
  gp_Pnt p;
  gp_Vec gu, gv, guu, gvv, guv;
  m.surface(face).D2(u, v, p, gu, gv, guu, gvv, guv);
  const Vec3 su = vec(gu.XYZ()), sv = vec(gv.XYZ());
  const Vec3 raw = cross(su, sv);
  const double area = norm(raw);
  if (!(area > 1e-6 * f.uSpeed * f.vSpeed)) return false;
  const Vec3 n = scaled(raw, f.sign / area);
  const double a = norm(su);
  const Vec3 e1 = scaled(su, 1 / a), e2 = cross(n, e1);
  const double b = dot(sv, e1), c = dot(sv, e2);
  const double l = -dot(vec(guu.XYZ()), n), mixed = -dot(vec(guv.XYZ()), n), nn = -dot(vec(gvv.XYZ()), n);
  const double w11 = l / (a * a);
  const double w12 = (mixed - a * b * w11) / (a * c);
  const double w22 = (nn - b * b * w11 - 2 * b * c * w12) / (c * c);
  out = principal(n, e1, w11, w12, w22);
  return std::isfinite(out.k1) && std::isfinite(out.k2);
}

// Curvature at a pole, where one parameter moves nothing. Each line of the other parameter leaves the pole in a
// direction of its own, with a normal from the mixed derivative and a normal curvature from the second one, so nothing
// has to be extrapolated; the curvatures of eight directions give the shape operator by least squares. Returns false
// where the lines leave a point that has no tangent plane (an apex).
inline bool poleCurvature(const Model& m, int face, double u, double v, CurvaturePoint& out) {
  const FaceData& f = m.faces[face];
  const SurfacePoint q = surfaceAt(m, face, u, v);
  const bool alongU = norm(q.du) * f.vSpeed > norm(q.dv) * f.uSpeed;
  const int range = alongU ? 2 : 0;
  const double inward = alongU ? 0.5 * (f.bounds[0] + f.bounds[1]) - u : 0.5 * (f.bounds[2] + f.bounds[3]) - v;
  const double turn = (inward < 0 ? -1 : 1) * f.sign;
  Vec3 n{}, e1{}, e2{};
  double a[3][4] = {};
  double scale = 0, misfit = 0;
  std::array<std::array<double, 4>, 9> rows{};
  for (int i = 0; i <= 8; i++) {
    const double w = f.bounds[range] + (f.bounds[range + 1] - f.bounds[range]) * (i - 0.5) / 8;
    gp_Pnt p;
    gp_Vec gu, gv, guu, gvv, guv;
    m.surface(face).D2(alongU || i == 0 ? u : w, alongU && i > 0 ? w : v, p, gu, gv, guu, gvv, guv);
    const Vec3 along = vec((alongU ? gu : gv).XYZ()), mixed = vec(guv.XYZ());
    const Vec3 raw = alongU ? cross(along, mixed) : cross(mixed, along);
    const double length = norm(along), area = norm(raw);
    if (!(area > 1e-9 * length * norm(mixed)) || !(length > 0)) return false;
    const Vec3 here = scaled(raw, turn / area);
    if (i == 0) {
      n = here;
      e1 = scaled(plus(along, n, -dot(along, n)), 1 / length);
      e1 = scaled(e1, 1 / norm(e1));
      e2 = cross(n, e1);
    } else if (norm(cross(n, here)) > 1e-6) {
      return false;
    }
    const double x = dot(along, e1) / length, y = dot(along, e2) / length;
    const double k = -dot(vec((alongU ? guu : gvv).XYZ()), n) / (length * length);
    rows[i] = {x * x, 2 * x * y, y * y, k};
    scale = std::max(scale, std::abs(k));
    for (int r = 0; r < 3; r++) {
      for (int c = 0; c < 4; c++) a[r][c] += rows[i][r] * rows[i][c];
    }
  }
  double w[3];
  for (int r = 0; r < 3; r++) {
    int pivot = r;
    for (int i = r + 1; i < 3; i++) {
      if (std::abs(a[i][r]) > std::abs(a[pivot][r])) pivot = i;
    }
    std::swap(a[r], a[pivot]);
    if (!(std::abs(a[r][r]) > 1e-9)) return false;
    for (int i = r + 1; i < 3; i++) {
      const double g = a[i][r] / a[r][r];
      for (int c = r; c < 4; c++) a[i][c] -= g * a[r][c];
    }
  }
  for (int r = 2; r >= 0; r--) {
    w[r] = a[r][3];
    for (int c = r + 1; c < 3; c++) w[r] -= a[r][c] * w[c];
    w[r] /= a[r][r];
  }
  for (const auto& row : rows) {
    misfit = std::max(misfit, std::abs(row[0] * w[0] + row[1] * w[1] + row[2] * w[2] - row[3]));
  }
  out = principal(n, e1, w[0], w[1], w[2]);
  return misfit <= 1e-3 * scale && std::isfinite(out.k1) && std::isfinite(out.k2);
}

// At poles and apexes the limit along the face: elementary surfaces in closed form, an apex with the curvature
// at 1e-6 of the face's extent, others from the lines that leave the pole, an apex among them by stepping towards the middle of
// the face until the point is regular.
inline CurvaturePoint curvatureAt(const Model& m, int face, double u, double v) {
  const FaceData& f = m.faces[face];
  const double s = f.sign * f.handed;
  switch (f.kind) {
    case PLANE:
      return {scaled(f.z, s), 0, 0, f.x, f.y};
    case CYLINDER:
      return ordered(scaled(radial(f, u), s), s / f.radius, azimuth(f, u), 0, f.z);
    case CONE: {
      const double rho = f.radius + v * f.sinAngle;
      const double least = 1e-6 * std::abs(f.sinAngle) * std::max(std::abs(f.bounds[3] - f.bounds[2]), 1e-6);
      // On the apex itself the nappe is the one the face lies on.
      const double middle = f.radius + 0.5 * (f.bounds[2] + f.bounds[3]) * f.sinAngle;
      const double nappe = (std::abs(rho) > least ? rho : middle) < 0 ? -1 : 1;
      const Vec3 e = radial(f, u);
      const Vec3 n = plus(scaled(e, s * nappe * f.cosAngle), f.z, -s * nappe * f.sinAngle);
      return ordered(n, s * f.cosAngle / std::max(std::abs(rho), least), azimuth(f, u), 0,
                     plus(scaled(e, f.sinAngle), f.z, f.cosAngle));
    }
    case SPHERE: {
      const Vec3 e = radial(f, u);
      const double c = std::cos(v), sn = std::sin(v), k = s / f.radius;
      return {scaled(plus(scaled(e, c), f.z, sn), s), k, k, azimuth(f, u), plus(scaled(e, -sn), f.z, c)};
    }
    case TORUS: {
      const Vec3 e = radial(f, u);
      const double c = std::cos(v), sn = std::sin(v);
      double rho = f.radius + f.minor * c;
      const double least = 1e-6 * f.minor;
      if (std::abs(rho) < least) rho = rho < 0 ? -least : least;
      const double side = rho < 0 ? -s : s;
      return ordered(scaled(plus(scaled(e, c), f.z, sn), side), side * c / rho, azimuth(f, u), side / f.minor,
                     plus(scaled(e, -sn), f.z, c));
    }
    default: {
      CurvaturePoint out{};
      const double um = 0.5 * (f.bounds[0] + f.bounds[1]), vm = 0.5 * (f.bounds[2] + f.bounds[3]);
      if (generalCurvature(m, face, u, v, out) || poleCurvature(m, face, u, v, out)) return out;
      for (double step = 1e-5; step <= 1; step *= 4) {
        if (generalCurvature(m, face, u + (um - u) * step, v + (vm - v) * step, out)) return out;
      }
      const SurfacePoint q = surfaceAt(m, face, um, vm);
      const Vec3 raw = cross(q.du, q.dv);
      const Vec3 n = norm(raw) > 0 ? scaled(unit(raw), f.sign) : Vec3{0, 0, 1};
      const Vec3 d = std::abs(n[0]) < 0.6 ? unit(cross(n, {1, 0, 0})) : unit(cross(n, {0, 1, 0}));
      return {n, 0, 0, d, cross(n, d)};
    }
  }
}

inline double nearestTurn(double angle, double guess, double period) {
  return period > 0 ? angle + period * std::round((guess - angle) / period) : angle;
}

// Newton on half the squared distance, damped, held inside the surface's own parameter range.
inline double newtonFoot(const Model& m, int face, const Vec3& p, double& u, double& v) {
  const FaceData& f = m.faces[face];
  GeomAdaptor_Surface& s = m.surface(face);
  const auto inside = [&f](double& a, double& b) {
    if (f.uPeriod == 0) a = std::min(std::max(a, f.natural[0]), f.natural[1]);
    if (f.vPeriod == 0) b = std::min(std::max(b, f.natural[2]), f.natural[3]);
  };
  inside(u, v);
  double best = -1;
  for (int i = 0; i < 40; i++) {
    gp_Pnt q;
    gp_Vec gu, gv, guu, gvv, guv;
    s.D2(u, v, q, gu, gv, guu, gvv, guv);
    const Vec3 d = plus(vec(q.XYZ()), p, -1), su = vec(gu.XYZ()), sv = vec(gv.XYZ());
    best = dot(d, d);
    double g0 = dot(d, su), g1 = dot(d, sv);
    const double e = dot(su, su), ff = dot(su, sv), g = dot(sv, sv);
    double h00 = e + dot(d, vec(guu.XYZ())), h01 = ff + dot(d, vec(guv.XYZ())), h11 = g + dot(d, vec(gvv.XYZ()));
    if (!(h00 > 0 && h11 > 0 && h00 * h11 - h01 * h01 > 1e-3 * (e * g - ff * ff))) {
      h00 = e, h01 = ff, h11 = g;
    }
    // A parameter held at the end of its range takes no part in the step.
    const bool heldU = f.uPeriod == 0 && ((u <= f.natural[0] && g0 > 0) || (u >= f.natural[1] && g0 < 0));
    const bool heldV = f.vPeriod == 0 && ((v <= f.natural[2] && g1 > 0) || (v >= f.natural[3] && g1 < 0));
    double su1 = 0, sv1 = 0;
    const double det = h00 * h11 - h01 * h01;
    if (heldU && heldV) break;
    if (heldU || !(std::abs(h00) > 1e-14 * f.uSpeed * f.uSpeed)) {
      if (h11 > 0 && !heldV) sv1 = -g1 / h11;
    } else if (heldV || !(det > 1e-14 * h00 * h11)) {
      su1 = -g0 / h00;
    } else {
      su1 = -(h11 * g0 - h01 * g1) / det;
      sv1 = -(h00 * g1 - h01 * g0) / det;
    }
    bool lower = false;
    double nu = u, nv = v;
    for (double step = 1; step > 1e-4; step *= 0.5) {
      nu = u + step * su1, nv = v + step * sv1;
      inside(nu, nv);
      const Vec3 r = plus(vec(s.Value(nu, nv).XYZ()), p, -1);
      if (dot(r, r) <= best) {
        best = dot(r, r);
        lower = true;
        break;
      }
    }
    if (!lower) break;
    const double moved = std::abs(nu - u) * f.uSpeed + std::abs(nv - v) * f.vSpeed;
    u = nu, v = nv;
    if (moved < 1e-13 * (1 + std::abs(p[0]) + std::abs(p[1]) + std::abs(p[2]))) break;
  }
  return best;
}

inline void projectOn(const Model& m, int face, const Vec3& p, double& u, double& v) {
  const FaceData& f = m.faces[face];
  const Vec3 d = plus(p, f.origin, -1);
  const double px = dot(d, f.x), py = dot(d, f.y), pz = dot(d, f.z), flat = std::hypot(px, py);
  // On the axis every u is nearest: keep the start value.
  const auto turn = [&](double nearU) {
    return flat > 1e-14 * (1 + std::abs(pz)) ? nearestTurn(std::atan2(py, px), nearU, 2 * M_PI) : nearU;
  };
  switch (f.kind) {
    case PLANE:
      u = px, v = py;
      return;
    case CYLINDER:
      u = turn(u), v = pz;
      return;
    case CONE: {
      const double guess = f.radius + v * f.sinAngle;
      if (guess >= 0) {
        u = turn(u);
        v = (flat - f.radius) * f.sinAngle + pz * f.cosAngle;
      } else {
        u = turn(u + M_PI) - M_PI;
        v = (-flat - f.radius) * f.sinAngle + pz * f.cosAngle;
      }
      return;
    }
    case SPHERE:
      u = turn(u), v = std::atan2(pz, flat);
      return;
    case TORUS:
      u = turn(u);
      v = nearestTurn(std::atan2(pz, flat - f.radius), v, 2 * M_PI);
      return;
    default: {
      const double u0 = u, v0 = v;
      double best = newtonFoot(m, face, p, u, v);
      const SurfacePoint q = surfaceAt(m, face, u, v);
      const Vec3 off = plus(q.p, p, -1);
      const double far = norm(off);
      const double slope = (std::abs(dot(off, q.du)) / (norm(q.du) + 1e-300) +
                            std::abs(dot(off, q.dv)) / (norm(q.dv) + 1e-300));
      if (slope <= 1e-6 * far + 1e-9) return;
      // Not a foot point: start again from the nearest of a grid over the face.
      double bu = u0, bv = v0, least = -1;
      for (int i = 0; i <= 12; i++) {
        for (int j = 0; j <= 12; j++) {
          const double gu = f.bounds[0] + (f.bounds[1] - f.bounds[0]) * i / 12;
          const double gv = f.bounds[2] + (f.bounds[3] - f.bounds[2]) * j / 12;
          const Vec3 r = plus(vec(m.surface(face).Value(gu, gv).XYZ()), p, -1);
          if (least < 0 || dot(r, r) < least) least = dot(r, r), bu = gu, bv = gv;
        }
      }
      const double again = newtonFoot(m, face, p, bu, bv);
      if (again < best) u = bu, v = bv;
    }
  }
}

// Point and d/dt. Edges without a curve (poles, apexes) stand still at their vertex.
inline void curveAt(const Model& m, int edge, double t, Vec3& p, Vec3& d) {
  const EdgeData& e = m.edges[edge];
  switch (e.kind) {
    case EdgeData::LINE:
      p = plus(e.origin, e.x, t);
      d = e.x;
      return;
    case EdgeData::CIRCLE: {
      const double c = std::cos(t), s = std::sin(t);
      p = plus(plus(e.origin, e.x, e.radius * c), e.y, e.radius * s);
      d = plus(scaled(e.x, -e.radius * s), e.y, e.radius * c);
      return;
    }
    case EdgeData::CURVE: {
      gp_Pnt q;
      gp_Vec g;
      m.curve(edge).D1(t, q, g);
      p = vec(q.XYZ());
      d = vec(g.XYZ());
      return;
    }
    default:
      p = e.vertex[0] >= 0 ? m.vertices[e.vertex[0]] : Vec3{};
      d = Vec3{};
  }
}

}  // namespace edgefield
