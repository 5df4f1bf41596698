#include "models.hpp"
#include "shapes.hpp"

#include <BRepAlgoAPI_Cut.hxx>
#include <BRepPrimAPI_MakeCone.hxx>
#include <BRepPrimAPI_MakeCylinder.hxx>

static void joinedParts(StepFolder& out) {
  out.write("bolted-bars.step", "two bars face to face and a bolt through both", "A 200 x 60 x 10 R2 B 150 x 50 x 10 bolt R10",
            {piece(rounded(box(0, 0, 0, 200, 60, 10), 2), "Bar A"), piece(box(150, 5, 10, 300, 55, 20), "Bar B"),
             piece(cylinder(10, 34, gp_Pnt(175, 30, -7), gp_Dir(0, 0, 1)), "Bolt")});
  out.write("cube-100-halves.step", "cube cut into two touching blocks", "side 100",
            {piece(box(-50, -50, -50, 50, 50, 0), "Lower half"), piece(box(-50, -50, 0, 50, 50, 50), "Upper half")});
  TopoDS_Shape thin = hollowBox(1000, 600, 800, 1.5);
  thin = solidOf(BRepAlgoAPI_Cut(thin, box(-200, -320, -10, 200, -290, 10)).Shape());
  out.write("thin-housing.step", "conductor in a thin-walled housing with a slot", "inside 1000 x 600 x 800 wall 1.5 slot 400 x 20 conductor 60 x 200 x 300 R8",
            {steel(thin, "Housing"), piece(rounded(box(-30, -100, -150, 30, 100, 150), 8), "Conductor")});
}

static void surfaceKinds(StepFolder& out) {
  TopoDS_Shape c = cylinder(20, 60, gp_Pnt(0, 0, 0), gp_Dir(0, 0, 1));
  out.write("cylinder.step", "cylinder", "R20 height 60", {piece(c, "Cylinder")});
  out.write("cylinder-nurbs.step", "cylinder as NURBS", "R20 height 60", {piece(nurbs(c), "Cylinder")});
  out.write("cone.step", "cone with an apex", "R30 height 60", {piece(BRepPrimAPI_MakeCone(30, 0, 60).Shape(), "Cone")});
  out.write("cone-nurbs.step", "cone frustum as NURBS", "R30 R10 height 40", {piece(nurbs(BRepPrimAPI_MakeCone(30, 10, 40).Shape()), "Cone")});
  TopoDS_Shape bore = cylinder(12, 50, gp_Pnt(30, 30, -10), gp_Dir(0, 0, 1));
  out.write("bore.step", "block with a bore", "60 x 60 x 30 bore R12", {piece(solidOf(BRepAlgoAPI_Cut(box(0, 0, 0, 60, 60, 30), bore).Shape()), "Block with bore")});
}

static void names(StepFolder& out) {
  out.write("nameless.step", "two spheres without names", "R10 distance 40", {piece(sphere(10), ""), piece(sphere(10, 40, 0, 0), "")});
  out.write("names-non-ascii.step", "two spheres with non-ASCII names", "R10 distance 40",
            {piece(sphere(10), "Sammelschiene für Größe 2"), piece(sphere(10, 40, 0, 0), "母线")});
  TopoDS_Shape twin = BRepPrimAPI_MakeCylinder(10, 30).Shape();
  out.write("two-instances.step", "one product placed twice", "R10 height 30 offset 50 0 5", {piece(placed(twin, 0, 0, 0), "Stud"), piece(placed(twin, 50, 0, 5), "Stud")});
}

void writeFileVariety(StepFolder& out) {
  joinedParts(out);
  surfaceKinds(out);
  names(out);
}
