#include "models.hpp"
#include "shapes.hpp"

#include <BRepBuilderAPI_MakeFace.hxx>
#include <BRepBuilderAPI_MakePolygon.hxx>
#include <BRepPrimAPI_MakePrism.hxx>

#include <cmath>
#include <string>
#include <utility>
#include <vector>

// Radii with the text that file names carry.
using Radii = std::vector<std::pair<std::string, double>>;

static void cubes(StepFolder& out) {
  TopoDS_Shape cube = box(-50, -50, -50, 50, 50, 50);
  out.write("cube-100.step", "cube", "side 100", {piece(cube, "Cube")});
  for (auto& f : Radii{{"0.01", 1}, {"0.02", 2}, {"0.05", 5}, {"0.1", 10}})
    out.write("cube-100-rounded-" + f.first + ".step", "cube with rounded edges r/a = " + f.first, "side 100", {piece(rounded(cube, f.second), "Rounded cube")});
}

static void barsInBox(StepFolder& out) {
  TopoDS_Shape bar = box(-10, -30, -150, 10, 30, 150);
  TopoDS_Shape room = hollowBox(120, 160, 420, 5);
  std::string size = "bar 20 x 60 x 300 box inside 120 x 160 x 420 wall 5";
  out.write("bar-in-box-sharp.step", "sharp bar in a closed box", size, {piece(bar, "Bar"), steel(room, "Box")});
  for (auto& f : Radii{{"0.2", 0.2}, {"0.4", 0.4}, {"1", 1}, {"2", 2}, {"5", 5}})
    out.write("bar-in-box-r" + f.first + ".step", "rounded bar R" + f.first + " in a closed box", size, {piece(rounded(bar, f.second), "Bar"), steel(room, "Box")});
}

static void discs(StepFolder& out) {
  out.write("disc-rounded.step", "thin disc with a fully rounded rim", "R100 thickness 10", {piece(roundedDisc(100, 5), "Disc")});
  TopoDS_Shape disc = cylinder(100, 40, gp_Pnt(0, 0, -20), gp_Dir(0, 0, 1));
  out.write("disc-sharp.step", "thick disc with sharp rims", "R100 thickness 40", {piece(disc, "Disc")});
  for (auto& f : Radii{{"0.4", 0.4}, {"0.8", 0.8}, {"2", 2}, {"4", 4}})
    out.write("disc-rim-r" + f.first + ".step", "thick disc with rims R" + f.first, "R100 thickness 40", {piece(rounded(disc, f.second), "Disc")});
}

static void wedges(StepFolder& out) {
  for (int angle : {60, 120}) {
    std::string stem = "wedge-" + std::to_string(angle), what = "bar with a wedge of " + std::to_string(angle) + " degrees";
    TopoDS_Shape sharp = wedgeBar(angle, 60, 150);
    out.write(stem + "-sharp.step", what, "flanks 60 length 300", {piece(sharp, "Wedge")});
    for (auto& f : Radii{{"0.6", 0.6}, {"1.2", 1.2}, {"2", 2}, {"3", 3}, {"6", 6}}) {
      TopoDS_Shape round = filleted(sharp, f.second, [](const gp_Pnt& p, const gp_Vec& t) { return std::abs(t.Z()) > 0.9 && std::hypot(p.X(), p.Y()) < 1e-6; });
      out.write(stem + "-r" + f.first + ".step", what + " rounded R" + f.first, "flanks 60 length 300", {piece(round, "Wedge")});
    }
  }
}

// An angle bracket whose four edges along z have radii of their own; the edges round its two flat sides stay sharp.
static void bracket(StepFolder& out) {
  BRepBuilderAPI_MakePolygon outline;
  for (auto& p : std::vector<std::pair<double, double>>{{0, 0}, {120, 0}, {120, 12}, {12, 12}, {12, 80}, {0, 80}}) outline.Add(gp_Pnt(p.first, p.second, 0));
  outline.Close();
  TopoDS_Shape s = BRepPrimAPI_MakePrism(BRepBuilderAPI_MakeFace(outline.Wire()).Face(), gp_Vec(0, 0, 40)).Shape();
  s = filleted(s, 5, [](const gp_Pnt& p, const gp_Vec& t) { return std::abs(t.Z()) > 0.9 && p.X() > 119; });
  s = filleted(s, 1, [](const gp_Pnt& p, const gp_Vec& t) { return std::abs(t.Z()) > 0.9 && p.Y() > 79; });
  s = filleted(s, 3, [](const gp_Pnt& p, const gp_Vec& t) { return std::abs(t.Z()) > 0.9 && p.X() < 1 && p.Y() < 1; });
  s = filleted(s, 8, [](const gp_Pnt& p, const gp_Vec& t) { return std::abs(t.Z()) > 0.9 && std::abs(p.X() - 12) < 0.1 && std::abs(p.Y() - 12) < 0.1; });
  out.write("l-bracket.step", "angle bracket with fillets", "120 x 80 x 40 legs 12 fillets R1 R3 R5 R8", {piece(s, "Bracket")});
}

void writeEdges(StepFolder& out) {
  cubes(out);
  barsInBox(out);
  discs(out);
  wedges(out);
  bracket(out);
  out.write("pear.step", "two spheres joined by a tangent cone", "R40 and R10 distance 80", {piece(pear(40, 10, 80), "Pear")});
}
