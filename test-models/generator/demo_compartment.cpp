#include "models.hpp"
#include "shapes.hpp"

#include <BRepAlgoAPI_Cut.hxx>
#include <BRepPrimAPI_MakeCylinder.hxx>
#include <BRepPrimAPI_MakeTorus.hxx>

#include <cmath>
#include <string>
#include <vector>

// The demo: cable-end compartment of the fictitious Lake Ombrin pumping station.
// Three flat bars 80 x 30 mm, rounded R12, stand upright at 150 mm pitch in a sheet-steel housing, each on a post insulator.
static std::vector<Piece> compartment(bool sharpL2, bool sharpL3) {
  std::vector<Piece> all;
  const double pitch = 150, z0 = 160, z1 = 640;
  const char* names[] = {"Busbar L1", "Busbar L2", "Busbar L3"};
  for (int i = 0; i < 3; i++) {
    double x = (i - 1) * pitch;
    TopoDS_Shape bar = box(x - 15, -40, z0, x + 15, 40, z1);
    bool leaveSharp = (i == 1 && sharpL2) || (i == 2 && sharpL3);
    // The edge left sharp runs up the bar at its front, on the side towards the next phase.
    bar = filleted(bar, 12, [&](const gp_Pnt& p, const gp_Vec& t) {
      bool front = std::abs(t.Z()) > 0.9 && p.Y() < 0 && p.X() > x;
      return !(leaveSharp && front);
    });
    all.push_back(piece(bar, names[i]));
    TopoDS_Shape post = cylinder(22, 100, gp_Pnt(x, 0, 60), gp_Dir(0, 0, 1));
    all.push_back(resin(rounded(post, 4), "Post insulator " + std::to_string(i + 1)));
  }
  // Shield ring round the upper end of the middle bar.
  gp_Ax2 ring(gp_Pnt(0, 0, z1 - 8), gp_Dir(0, 0, 1));
  all.push_back(steel(BRepPrimAPI_MakeTorus(ring, 60, 10).Shape(), "Shield ring L2"));
  TopoDS_Shape spoke = cylinder(4, 2 * 60, gp_Pnt(0, -60, z1 - 8), gp_Dir(0, 1, 0));
  all.push_back(steel(spoke, "Shield ring spoke L2"));
  // Housing: inside 640 x 420 x 760, sheet 3 mm, a cable opening in the roof and an edged stiffener inside the back.
  TopoDS_Shape housing = hollowBox(640, 420, 760, 3);
  housing = moved(housing, 0, 0, 440);
  housing = solidOf(BRepAlgoAPI_Cut(housing, cylinder(60, 40, gp_Pnt(190, 90, 800), gp_Dir(0, 0, 1))).Shape());
  all.push_back(steel(housing, "Housing"));
  TopoDS_Shape angle = box(-300, 170, 380, 300, 210, 384);
  all.push_back(steel(angle, "Housing stiffener"));
  TopoDS_Shape bolt = BRepPrimAPI_MakeCylinder(gp_Ax2(gp_Pnt(0, 0, 0), gp_Dir(0, -1, 0)), 8, 7).Shape();
  bolt = filleted(bolt, 1, [](const gp_Pnt& p, const gp_Vec&) { return p.Y() < -6.9; });
  all.push_back(steel(placed(bolt, -200, 210, 300), "Housing bolt"));
  all.push_back(steel(placed(bolt, 200, 210, 300), "Housing bolt"));
  return all;
}

void writeDemo(StepFolder& out) {
  std::string size = "housing inside 640 x 420 x 760 bars 30 x 80 x 480 R12 at pitch 150";
  out.write("demo-compartment.step", "demo: one edge of Busbar L2 left sharp", size, compartment(true, false));
  out.write("demo-compartment-mended.step", "demo revision: that edge filleted", size, compartment(false, false));
  out.write("demo-compartment-worse.step", "demo revision: an edge of Busbar L3 sharp as well", size, compartment(true, true));
}
