#include "models.hpp"
#include "shapes.hpp"

#include <BRepAlgoAPI_Cut.hxx>
#include <BRepPrimAPI_MakeTorus.hxx>

#include <cmath>
#include <string>
#include <vector>

// A length as file names carry it: 0.5, 2, 62.5.
static std::string text(double v) {
  char s[32];
  std::snprintf(s, sizeof s, "%g", v);
  return s;
}

static void spherePair(StepFolder& out, const std::string& file, double r1, double r2, double gap) {
  out.write(file, "two spheres on the z axis", "R" + text(r1) + " and R" + text(r2) + " gap " + text(gap),
            {piece(sphere(r1), "Sphere A"), steel(sphere(r2, 0, 0, r1 + gap + r2), "Sphere B")});
}

static void spheresAndTori(StepFolder& out) {
  out.write("sphere-r50.step", "sphere", "R50", {piece(sphere(50), "Sphere")});
  out.write("sphere-r50-askew.step", "sphere turned and shifted", "R50", {piece(askew(sphere(50)), "Sphere")});
  out.write("sphere-r50-nurbs.step", "sphere as NURBS", "R50", {piece(nurbs(sphere(50)), "Sphere")});
  out.write("sphere-r2in.step", "sphere in inches", "R50.8", {piece(sphere(50.8), "Sphere")}, "INCH");
  out.write("sphere-r1m.step", "sphere terminal in metres", "R1000", {piece(sphere(1000), "Sphere")}, "M");
  out.write("sphere-r250.step", "sphere terminal", "R250", {piece(sphere(250), "Sphere terminal")});
  out.write("sphere-r100.step", "sphere terminal", "R100", {piece(sphere(100), "Sphere terminal")});
  for (int ratio : {2, 3, 5, 10}) {
    std::string n = std::to_string(ratio), size = "R" + text(10.0 * ratio) + " r10";
    TopoDS_Shape t = BRepPrimAPI_MakeTorus(10.0 * ratio, 10).Shape();
    out.write("torus-" + n + ".step", "torus R/r = " + n, size, {piece(t, "Torus")});
    if (ratio == 3) {
      out.write("torus-3-askew.step", "torus turned and shifted", size, {piece(askew(t), "Torus")});
      out.write("torus-3-nurbs.step", "torus as NURBS", size, {piece(nurbs(t), "Torus")});
      out.write("torus-3-inch.step", "torus in inches", size, {piece(t, "Torus")}, "INCH");
    }
  }
}

static void enclosedPairs(StepFolder& out) {
  TopoDS_Shape shell = solidOf(BRepAlgoAPI_Cut(sphere(110), sphere(100)).Shape());
  out.write("concentric-spheres.step", "sphere in a hollow sphere", "R50 in R100 wall 10",
            {piece(sphere(50), "Inner sphere"), steel(shell, "Outer shell")});
  out.write("coaxial-cylinders.step", "rod with ball ends through a tube with rounded rims",
            "rod r10 tube bore R50 wall 20 length 400 balls R40 at z = +-340",
            {piece(ballEndedRod(10, 340, 40), "Rod"), steel(tube(50, 20, 200), "Tube")});
  TopoDS_Shape plate = roundedDisc(200, 20);
  out.write("parallel-plates.step", "two discs with round rims", "R200 thickness 40 gap 40",
            {piece(moved(plate, 0, 0, 40), "Upper plate"), steel(moved(plate, 0, 0, -40), "Lower plate")});
}

static void spheroids(StepFolder& out) {
  for (int n : {2, 5, 10}) {
    std::string ratio = std::to_string(n);
    std::string name = "Prolate spheroid " + ratio + ":1";
    out.write("prolate-" + ratio + ".step", "prolate spheroid", "semi-axes 100 and " + text(100.0 / n), {piece(spheroid(100, 100.0 / n, false), name)});
  }
  TopoDS_Shape p = spheroid(100, 20, false);
  out.write("prolate-5-askew.step", "prolate spheroid turned and shifted", "semi-axes 100 and 20", {piece(askew(p), "Prolate spheroid 5:1")});
  out.write("prolate-5-nurbs.step", "prolate spheroid as NURBS", "semi-axes 100 and 20", {piece(nurbs(p), "Prolate spheroid 5:1")});
  out.write("prolate-5-inch.step", "prolate spheroid in inches", "semi-axes 100 and 20", {piece(p, "Prolate spheroid 5:1")}, "INCH");
  // NURBS, since a surface of revolution whose meridian is half an ellipse cut across its long axis comes back from
  // STEP as the whole ellipse.
  out.write("oblate-5.step", "oblate spheroid as NURBS", "semi-axes 20 and 100", {piece(nurbs(spheroid(20, 100, false)), "Oblate spheroid 5:1")});
  out.write("oblate-20.step", "disc-like oblate spheroid as NURBS", "semi-axes 5 and 100", {piece(nurbs(spheroid(5, 100, false)), "Oblate spheroid 20:1")});
}

static void spherePairs(StepFolder& out) {
  spherePair(out, "pair-gap-0.1.step", 50, 50, 5);
  spherePair(out, "pair-gap-0.05.step", 50, 50, 2.5);
  spherePair(out, "pair-gap-0.001.step", 50, 50, 0.05);
  spherePair(out, "pair-1-4-far.step", 10, 40, 400);
  spherePair(out, "pair-1-4-near.step", 10, 40, 10);
  out.write("pair-gap-0.1-metre.step", "two spheres in metres", "R50 and R50 gap 5",
            {piece(sphere(50), "Sphere A"), steel(sphere(50, 0, 0, 105), "Sphere B")}, "M");
  out.write("spheres-connected.step", "large and small sphere of one electrode far apart", "R100 and R25 distance 5000",
            {piece(sphere(100), "Large sphere"), piece(sphere(25, 0, 0, 5000), "Small sphere")});
  out.write("overlapping-spheres.step", "two spheres that cut each other at right angles", "R40 and R30 distance 50",
            {piece(sphere(40), "Sphere A"), piece(sphere(30, 0, 0, 50), "Sphere B")});
  // From the sphere-gap standard; writeSphereGaps has the others.
  for (auto& g : std::vector<std::pair<double, double>>{{20, 1}, {20, 2}, {20, 5}, {50, 5}, {50, 10}, {50, 25}, {100, 10}, {100, 20}, {100, 50},
                                                        {250, 20}, {250, 50}, {250, 125}, {500, 50}, {500, 100}, {500, 250}, {1000, 100}, {1000, 200}, {1000, 500}})
    spherePair(out, "sphere-gap-d" + text(g.first) + "-s" + text(g.second) + ".step", g.first / 2, g.first / 2, g.second);
}

static void bodiesOverEarth(StepFolder& out) {
  for (double ratio : {0.1, 1.0, 10.0})
    out.write("sphere-over-plane-" + text(ratio) + ".step", "sphere over the plane z = 0", "R50 gap " + text(50 * ratio), {piece(sphere(50, 0, 0, 50 * (1 + ratio)), "Sphere")});
  out.write("boss-1.step", "hemisphere on the plane z = 0", "R50", {piece(halfBall(50), "Boss")});
  for (int h : {2, 5, 10})
    out.write("boss-" + std::to_string(h) + ".step", "half spheroid on the plane z = 0", "height 100 base radius " + text(100.0 / h), {piece(spheroid(100, 100.0 / h, true), "Boss")});
  // Rods of 1 m as half spheroids: tip radius = base radius^2 / height.
  for (double tip : {0.5, 2.0, 10.0, 50.0, 250.0})
    out.write("rod-1m-tip-r" + text(tip) + ".step", "half spheroid rod on the plane z = 0", "height 1000 tip radius " + text(tip), {piece(spheroid(1000, std::sqrt(1000 * tip), true), "Rod")});
  TopoDS_Shape busbar = rounded(box(-5, -200, 100, 5, 200, 160), 2);
  out.write("busbar-over-plane.step", "rounded busbar over the plane z = 0", "10 x 60 x 400 edges R2 height 100", {piece(busbar, "Busbar")});
}

void writeExactBodies(StepFolder& out) {
  spheresAndTori(out);
  enclosedPairs(out);
  spheroids(out);
  spherePairs(out);
  bodiesOverEarth(out);
}

void writeSphereGaps(StepFolder& out) {
  const std::vector<std::pair<double, std::vector<double>>> gaps{{20, {0.5}},
                                                                 {50, {15, 20}},
                                                                 {100, {5, 30, 40}},
                                                                 {150, {10, 20, 30, 40, 50, 60, 75}},
                                                                 {250, {10, 30, 75, 100}},
                                                                 {500, {20, 150, 200}},
                                                                 {1000, {50, 300, 400}}};
  for (auto& [diameter, all] : gaps)
    for (double gap : all)
      spherePair(out, "sphere-gap-d" + text(diameter) + "-s" + text(gap) + ".step", diameter / 2, diameter / 2, gap);
}
