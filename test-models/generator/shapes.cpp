#include "shapes.hpp"

#include <BRepAdaptor_Curve.hxx>
#include <BRepAlgoAPI_Cut.hxx>
#include <BRepBuilderAPI_MakeEdge.hxx>
#include <BRepBuilderAPI_MakeFace.hxx>
#include <BRepBuilderAPI_MakePolygon.hxx>
#include <BRepBuilderAPI_MakeWire.hxx>
#include <BRepBuilderAPI_NurbsConvert.hxx>
#include <BRepBuilderAPI_Transform.hxx>
#include <BRepFilletAPI_MakeFillet.hxx>
#include <BRepPrimAPI_MakeBox.hxx>
#include <BRepPrimAPI_MakeCylinder.hxx>
#include <BRepPrimAPI_MakePrism.hxx>
#include <BRepPrimAPI_MakeRevol.hxx>
#include <BRepPrimAPI_MakeSphere.hxx>
#include <GC_MakeArcOfCircle.hxx>
#include <GC_MakeArcOfEllipse.hxx>
#include <TopExp_Explorer.hxx>
#include <TopoDS.hxx>
#include <gp_Elips.hxx>

#include <algorithm>
#include <cmath>
#include <cstdlib>
#include <iostream>

static const double PI = 3.14159265358979323846;

TopoDS_Shape moved(const TopoDS_Shape& s, double x, double y, double z) {
  gp_Trsf t;
  t.SetTranslation(gp_Vec(x, y, z));
  return BRepBuilderAPI_Transform(s, t, true).Shape();
}

TopoDS_Shape placed(const TopoDS_Shape& s, double x, double y, double z) {
  gp_Trsf t;
  t.SetTranslation(gp_Vec(x, y, z));
  return s.Moved(TopLoc_Location(t));
}

TopoDS_Shape askew(const TopoDS_Shape& s) {
  gp_Trsf turn, shift;
  turn.SetRotation(gp_Ax1(gp_Pnt(0, 0, 0), gp_Dir(0.31, -0.52, 0.77)), 1.2345);
  shift.SetTranslation(gp_Vec(137.3, -71.9, 53.17));
  return BRepBuilderAPI_Transform(s, shift * turn, true).Shape();
}

TopoDS_Shape nurbs(const TopoDS_Shape& s) { return BRepBuilderAPI_NurbsConvert(s, true).Shape(); }

TopoDS_Shape sphere(double r, double x, double y, double z) {
  return BRepPrimAPI_MakeSphere(gp_Pnt(x, y, z), r).Shape();
}

TopoDS_Shape box(double x0, double y0, double z0, double x1, double y1, double z1) {
  return BRepPrimAPI_MakeBox(gp_Pnt(x0, y0, z0), gp_Pnt(x1, y1, z1)).Shape();
}

TopoDS_Shape cylinder(double r, double h, const gp_Pnt& at, const gp_Dir& along) {
  return BRepPrimAPI_MakeCylinder(gp_Ax2(at, along), r, h).Shape();
}

TopoDS_Shape revolved(const std::vector<TopoDS_Edge>& edges) {
  BRepBuilderAPI_MakeWire wire;
  for (const TopoDS_Edge& e : edges) wire.Add(e);
  TopoDS_Face face = BRepBuilderAPI_MakeFace(wire.Wire(), true).Face();
  return BRepPrimAPI_MakeRevol(face, gp_Ax1(gp_Pnt(0, 0, 0), gp_Dir(0, 0, 1))).Shape();
}

TopoDS_Edge line(const gp_Pnt& a, const gp_Pnt& b) { return BRepBuilderAPI_MakeEdge(a, b).Edge(); }

TopoDS_Shape spheroid(double a, double b, bool half) {
  bool prolate = a > b;
  gp_Ax2 axes = prolate ? gp_Ax2(gp_Pnt(0, 0, 0), gp_Dir(0, -1, 0), gp_Dir(0, 0, 1))
                        : gp_Ax2(gp_Pnt(0, 0, 0), gp_Dir(0, -1, 0), gp_Dir(1, 0, 0));
  gp_Elips e(axes, std::max(a, b), std::min(a, b));
  gp_Pnt top(0, 0, a), low = half ? gp_Pnt(b, 0, 0) : gp_Pnt(0, 0, -a);
  Handle(Geom_TrimmedCurve) arc = GC_MakeArcOfEllipse(e, low, top, true).Value();
  Standard_Real mid = 0.5 * (arc->FirstParameter() + arc->LastParameter());
  if (arc->Value(mid).X() < 0 || (half && arc->Value(mid).Z() < 0)) {
    arc = GC_MakeArcOfEllipse(e, low, top, false).Value();
  }
  std::vector<TopoDS_Edge> edges = {BRepBuilderAPI_MakeEdge(arc).Edge()};
  if (half) {
    edges.push_back(line(top, gp_Pnt(0, 0, 0)));
    edges.push_back(line(gp_Pnt(0, 0, 0), low));
  } else {
    edges.push_back(line(top, low));
  }
  return revolved(edges);
}

TopoDS_Shape halfBall(double r) { return BRepPrimAPI_MakeSphere(gp_Pnt(0, 0, 0), r, 0, PI / 2).Shape(); }

// Arc in the half-plane x >= 0 of a circle about z = centre, between two angles from the -z direction.
static TopoDS_Edge meridian(double r, double centre, double from, double to) {
  auto at = [&](double a) { return gp_Pnt(a == PI ? 0 : r * std::sin(a), 0, centre - r * std::cos(a)); };
  Handle(Geom_TrimmedCurve) arc = GC_MakeArcOfCircle(at(from), at((from + to) / 2), at(to)).Value();
  return BRepBuilderAPI_MakeEdge(arc).Edge();
}

TopoDS_Shape ballEndedRod(double r, double l, double ball) {
  double a = std::asin(r / ball), z = l - ball * std::cos(a);
  return revolved({meridian(ball, -l, 0, PI - a), line(gp_Pnt(r, 0, -z), gp_Pnt(r, 0, z)), meridian(ball, l, a, PI),
                   line(gp_Pnt(0, 0, l + ball), gp_Pnt(0, 0, -l - ball))});
}

TopoDS_Shape pear(double r1, double r2, double d) {
  // The common tangent leaves both spheres where the normal makes the angle a with -z.
  double a = std::acos(-(r1 - r2) / d);
  auto at = [&](double r, double centre) { return gp_Pnt(r * std::sin(a), 0, centre - r * std::cos(a)); };
  return revolved({meridian(r1, 0, 0, a), line(at(r1, 0), at(r2, d)), meridian(r2, d, a, PI), line(gp_Pnt(0, 0, d + r2), gp_Pnt(0, 0, -r1))});
}

TopoDS_Shape tube(double bore, double wall, double l) {
  double m = bore + wall / 2, o = bore + wall, h = wall / 2;
  Handle(Geom_TrimmedCurve) top = GC_MakeArcOfCircle(gp_Pnt(o, 0, l), gp_Pnt(m, 0, l + h), gp_Pnt(bore, 0, l)).Value();
  Handle(Geom_TrimmedCurve) low = GC_MakeArcOfCircle(gp_Pnt(bore, 0, -l), gp_Pnt(m, 0, -l - h), gp_Pnt(o, 0, -l)).Value();
  return revolved({line(gp_Pnt(o, 0, -l), gp_Pnt(o, 0, l)), BRepBuilderAPI_MakeEdge(top).Edge(),
                   line(gp_Pnt(bore, 0, l), gp_Pnt(bore, 0, -l)), BRepBuilderAPI_MakeEdge(low).Edge()});
}

TopoDS_Shape roundedDisc(double r, double h) {
  double c = r - h;
  Handle(Geom_TrimmedCurve) rim = GC_MakeArcOfCircle(gp_Pnt(c, 0, -h), gp_Pnt(r, 0, 0), gp_Pnt(c, 0, h)).Value();
  return revolved({line(gp_Pnt(0, 0, -h), gp_Pnt(c, 0, -h)), BRepBuilderAPI_MakeEdge(rim).Edge(),
                   line(gp_Pnt(c, 0, h), gp_Pnt(0, 0, h)), line(gp_Pnt(0, 0, h), gp_Pnt(0, 0, -h))});
}

TopoDS_Shape filleted(const TopoDS_Shape& s, double r,
                      const std::function<bool(const gp_Pnt&, const gp_Vec&)>& take) {
  BRepFilletAPI_MakeFillet fillet(s);
  for (TopExp_Explorer e(s, TopAbs_EDGE); e.More(); e.Next()) {
    BRepAdaptor_Curve c(TopoDS::Edge(e.Current()));
    gp_Pnt p;
    gp_Vec t;
    c.D1(0.5 * (c.FirstParameter() + c.LastParameter()), p, t);
    if (take(p, t.Normalized())) fillet.Add(r, TopoDS::Edge(e.Current()));
  }
  fillet.Build();
  if (!fillet.IsDone()) {
    std::cerr << "fillet failed\n";
    std::exit(1);
  }
  TopoDS_Shape out = fillet.Shape();
  TopExp_Explorer solid(out, TopAbs_SOLID);
  return solid.More() ? solid.Current() : out;
}

TopoDS_Shape rounded(const TopoDS_Shape& s, double r) {
  return filleted(s, r, [](const gp_Pnt&, const gp_Vec&) { return true; });
}

TopoDS_Shape solidOf(const TopoDS_Shape& s) {
  TopExp_Explorer solid(s, TopAbs_SOLID);
  return solid.Current();
}

TopoDS_Shape wedgeBar(double degrees, double flank, double l) {
  double half = degrees * PI / 360;
  gp_Pnt apex(0, 0, -l), p(-flank * std::cos(half), flank * std::sin(half), -l),
      q(-flank * std::cos(half), -flank * std::sin(half), -l);
  BRepBuilderAPI_MakePolygon polygon(apex, p, q, true);
  return BRepPrimAPI_MakePrism(BRepBuilderAPI_MakeFace(polygon.Wire()).Face(), gp_Vec(0, 0, 2 * l)).Shape();
}

TopoDS_Shape hollowBox(double x, double y, double z, double wall) {
  return solidOf(BRepAlgoAPI_Cut(box(-x / 2 - wall, -y / 2 - wall, -z / 2 - wall, x / 2 + wall, y / 2 + wall, z / 2 + wall),
                                 box(-x / 2, -y / 2, -z / 2, x / 2, y / 2, z / 2)).Shape());
}
