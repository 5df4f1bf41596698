// Writes the demo and verification models of edgefield as STEP files, through the same kernel that reads them.
// usage: generate_models OUTPUT_FOLDER
#include <BRepAdaptor_Curve.hxx>
#include <BRepAlgoAPI_Common.hxx>
#include <BRepAlgoAPI_Cut.hxx>
#include <BRepAlgoAPI_Fuse.hxx>
#include <BRepBuilderAPI_MakeEdge.hxx>
#include <BRepBuilderAPI_MakeFace.hxx>
#include <BRepBuilderAPI_MakePolygon.hxx>
#include <BRepBuilderAPI_MakeWire.hxx>
#include <BRepBuilderAPI_NurbsConvert.hxx>
#include <BRepBuilderAPI_Transform.hxx>
#include <BRepFilletAPI_MakeFillet.hxx>
#include <BRepPrimAPI_MakeBox.hxx>
#include <BRepPrimAPI_MakeCone.hxx>
#include <BRepPrimAPI_MakeCylinder.hxx>
#include <BRepPrimAPI_MakePrism.hxx>
#include <BRepPrimAPI_MakeRevol.hxx>
#include <BRepPrimAPI_MakeSphere.hxx>
#include <BRepPrimAPI_MakeTorus.hxx>
#include <GC_MakeArcOfCircle.hxx>
#include <GC_MakeArcOfEllipse.hxx>
#include <GC_MakeSegment.hxx>
#include <Interface_Static.hxx>
#include <Message.hxx>
#include <Message_Messenger.hxx>
#include <Message_Printer.hxx>
#include <Quantity_Color.hxx>
#include <STEPCAFControl_Writer.hxx>
#include <STEPControl_Controller.hxx>
#include <TDataStd_Name.hxx>
#include <TDocStd_Document.hxx>
#include <TopExp_Explorer.hxx>
#include <TopoDS.hxx>
#include <TopoDS_Edge.hxx>
#include <XCAFDoc_ColorTool.hxx>
#include <XCAFDoc_DocumentTool.hxx>
#include <XCAFDoc_ShapeTool.hxx>
#include <gp_Elips.hxx>
#include <gp_Quaternion.hxx>

#include <cmath>
#include <cstdio>
#include <fstream>
#include <functional>
#include <iostream>
#include <regex>
#include <sstream>
#include <string>
#include <vector>

namespace {

const double PI = 3.14159265358979323846;

struct Piece {
  TopoDS_Shape shape;
  std::string name;
  double r, g, b;
};

std::string folder;

// The header's time stamp and the kernel's own product stamps would differ from run to run.
void normalise(const std::string& path) {
  std::ifstream in(path);
  std::stringstream text;
  text << in.rdbuf();
  in.close();
  std::string s = text.str();
  s = std::regex_replace(s, std::regex("FILE_NAME\\([^;]*;"),
                         "FILE_NAME('','2026-01-01T00:00:00',(''),(''),'','','');");
  std::ofstream out(path, std::ios::trunc);
  out << s;
}

void write(const std::string& file, const std::vector<Piece>& pieces, const char* unit = "MM") {
  Handle(TDocStd_Document) doc = new TDocStd_Document("BinXCAF");
  Handle(XCAFDoc_ShapeTool) shapes = XCAFDoc_DocumentTool::ShapeTool(doc->Main());
  Handle(XCAFDoc_ColorTool) colours = XCAFDoc_DocumentTool::ColorTool(doc->Main());
  if (pieces.size() == 1) {
    TDF_Label label = shapes->AddShape(pieces[0].shape, false);
    TDataStd_Name::Set(label, TCollection_ExtendedString(pieces[0].name.c_str(), true));
    colours->SetColor(label, Quantity_Color(pieces[0].r, pieces[0].g, pieces[0].b, Quantity_TOC_sRGB),
                      XCAFDoc_ColorGen);
  } else {
    TDF_Label top = shapes->NewShape();
    std::string stem = file.substr(0, file.rfind('.'));
    TDataStd_Name::Set(top, TCollection_ExtendedString(stem.c_str(), true));
    for (const Piece& p : pieces) {
      // The placement goes to the instance, so that a shape used twice stays one product.
      TopLoc_Location place = p.shape.Location();
      TopoDS_Shape bare = p.shape.Located(TopLoc_Location());
      TDF_Label label;
      if (!shapes->Search(bare, label)) {
        label = shapes->AddShape(bare, false);
        TDataStd_Name::Set(label, TCollection_ExtendedString(p.name.c_str(), true));
        colours->SetColor(label, Quantity_Color(p.r, p.g, p.b, Quantity_TOC_sRGB), XCAFDoc_ColorGen);
      }
      TDF_Label instance = shapes->AddComponent(top, label, place);
      TDataStd_Name::Set(instance, TCollection_ExtendedString(p.name.c_str(), true));
    }
    shapes->UpdateAssemblies();
  }
  Interface_Static::SetCVal("write.step.unit", unit);
  Interface_Static::SetCVal("write.step.schema", "AP214IS");
  Interface_Static::SetIVal("write.surfacecurve.mode", 0);
  STEPCAFControl_Writer writer;
  writer.SetNameMode(true);
  writer.SetColorMode(true);
  std::string path = folder + "/" + file;
  if (!writer.Transfer(doc) || writer.Write(path.c_str()) != IFSelect_RetDone) {
    std::cerr << "cannot write " << path << "\n";
    std::exit(1);
  }
  normalise(path);
  std::cout << file << "\n";
}

Piece piece(const TopoDS_Shape& s, const std::string& name, double r = 0.72, double g = 0.45, double b = 0.2) {
  return {s, name, r, g, b};
}
Piece steel(const TopoDS_Shape& s, const std::string& name) { return {s, name, 0.6, 0.63, 0.66}; }
Piece resin(const TopoDS_Shape& s, const std::string& name) { return {s, name, 0.45, 0.25, 0.2}; }

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
// Turned and shifted by odd amounts: nothing lies along an axis any more.
TopoDS_Shape askew(const TopoDS_Shape& s) {
  gp_Trsf turn, shift;
  turn.SetRotation(gp_Ax1(gp_Pnt(0, 0, 0), gp_Dir(0.31, -0.52, 0.77)), 1.2345);
  shift.SetTranslation(gp_Vec(137.3, -71.9, 53.17));
  return BRepBuilderAPI_Transform(s, shift * turn, true).Shape();
}
TopoDS_Shape nurbs(const TopoDS_Shape& s) { return BRepBuilderAPI_NurbsConvert(s, true).Shape(); }

TopoDS_Shape sphere(double r, double x = 0, double y = 0, double z = 0) {
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

// Ellipsoid of revolution about z with semi-axes a (polar) and b; from height `from` upwards.
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

// Solid of revolution: rod of radius r with hemispherical ends, straight between -l and l.
TopoDS_Shape capsule(double r, double l) {
  Handle(Geom_TrimmedCurve) low = GC_MakeArcOfCircle(gp_Pnt(0, 0, -l - r), gp_Pnt(r * std::sin(PI / 4), 0, -l - r * std::cos(PI / 4)), gp_Pnt(r, 0, -l)).Value();
  Handle(Geom_TrimmedCurve) high = GC_MakeArcOfCircle(gp_Pnt(r, 0, l), gp_Pnt(r * std::sin(PI / 4), 0, l + r * std::cos(PI / 4)), gp_Pnt(0, 0, l + r)).Value();
  return revolved({BRepBuilderAPI_MakeEdge(low).Edge(), line(gp_Pnt(r, 0, -l), gp_Pnt(r, 0, l)),
                   BRepBuilderAPI_MakeEdge(high).Edge(), line(gp_Pnt(0, 0, l + r), gp_Pnt(0, 0, -l - r))});
}

// Tube with rounded rims: bore R, wall w, half length l.
TopoDS_Shape tube(double bore, double wall, double l) {
  double m = bore + wall / 2, o = bore + wall, h = wall / 2;
  Handle(Geom_TrimmedCurve) top = GC_MakeArcOfCircle(gp_Pnt(o, 0, l), gp_Pnt(m, 0, l + h), gp_Pnt(bore, 0, l)).Value();
  Handle(Geom_TrimmedCurve) low = GC_MakeArcOfCircle(gp_Pnt(bore, 0, -l), gp_Pnt(m, 0, -l - h), gp_Pnt(o, 0, -l)).Value();
  return revolved({line(gp_Pnt(o, 0, -l), gp_Pnt(o, 0, l)), BRepBuilderAPI_MakeEdge(top).Edge(),
                   line(gp_Pnt(bore, 0, l), gp_Pnt(bore, 0, -l)), BRepBuilderAPI_MakeEdge(low).Edge()});
}

// Flat disc about z with a rim of radius h (fully rounded): radius r in all, half thickness h.
TopoDS_Shape roundedDisc(double r, double h) {
  double c = r - h;
  Handle(Geom_TrimmedCurve) rim = GC_MakeArcOfCircle(gp_Pnt(c, 0, -h), gp_Pnt(r, 0, 0), gp_Pnt(c, 0, h)).Value();
  return revolved({line(gp_Pnt(0, 0, -h), gp_Pnt(c, 0, -h)), BRepBuilderAPI_MakeEdge(rim).Edge(),
                   line(gp_Pnt(c, 0, h), gp_Pnt(0, 0, h)), line(gp_Pnt(0, 0, h), gp_Pnt(0, 0, -h))});
}

// Fillets every edge that the choice takes, by the edge's mid-point and direction.
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

// Prism along z (from -l to l) of a triangle-like wedge: interior angle at the origin, flanks of length a.
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

// The demo: cable-end compartment of the fictitious Lake Ombrin pumping station.
// Three flat bars 60 x 10 mm stand upright at 150 mm pitch in a sheet-steel housing, each on a post insulator.
std::vector<Piece> compartment(bool sharpL2, bool sharpL3) {
  std::vector<Piece> all;
  const double pitch = 150, z0 = 160, z1 = 640;
  const char* names[] = {"Busbar L1", "Busbar L2", "Busbar L3"};
  for (int i = 0; i < 3; i++) {
    double x = (i - 1) * pitch;
    TopoDS_Shape bar = box(x - 5, -30, z0, x + 5, 30, z1);
    bool leaveSharp = (i == 1 && sharpL2) || (i == 2 && sharpL3);
    // The edge left sharp runs up the bar at its front, on the side towards the next phase.
    bar = filleted(bar, 2, [&](const gp_Pnt& p, const gp_Vec& t) {
      bool front = std::abs(t.Z()) > 0.9 && p.Y() < 0 && p.X() > x;
      return !(leaveSharp && front);
    });
    all.push_back(piece(bar, names[i]));
    TopoDS_Shape post = cylinder(22, 100, gp_Pnt(x, 0, 60), gp_Dir(0, 0, 1));
    all.push_back(resin(rounded(post, 4), "Post insulator " + std::to_string(i + 1)));
  }
  // Shield ring round the upper end of the middle bar.
  gp_Ax2 ring(gp_Pnt(0, 0, z1 - 8), gp_Dir(0, 0, 1));
  all.push_back(piece(BRepPrimAPI_MakeTorus(ring, 46, 9).Shape(), "Shield ring L2", 0.8, 0.8, 0.82));
  TopoDS_Shape spoke = cylinder(4, 2 * 46, gp_Pnt(0, -46, z1 - 8), gp_Dir(0, 1, 0));
  all.push_back(piece(spoke, "Shield ring spoke L2", 0.8, 0.8, 0.82));
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

void spherePair(const std::string& file, double r1, double r2, double gap) {
  write(file, {piece(sphere(r1), "Sphere A"), steel(sphere(r2, 0, 0, r1 + gap + r2), "Sphere B")});
}

void verification() {
  write("sphere-r50.step", {piece(sphere(50), "Sphere")});
  write("sphere-r50-askew.step", {piece(askew(sphere(50)), "Sphere")});
  write("sphere-r50-nurbs.step", {piece(nurbs(sphere(50)), "Sphere")});
  write("sphere-r2in.step", {piece(sphere(50.8), "Sphere")}, "INCH");
  write("sphere-r1m.step", {piece(sphere(1000), "Sphere")}, "M");
  write("sphere-r250.step", {piece(sphere(250), "Sphere terminal")});
  write("sphere-r100.step", {piece(sphere(100), "Sphere terminal")});
  for (int ratio : {2, 3, 5, 10}) {
    TopoDS_Shape t = BRepPrimAPI_MakeTorus(10.0 * ratio, 10).Shape();
    write("torus-" + std::to_string(ratio) + ".step", {piece(t, "Torus")});
    if (ratio == 3) {
      write("torus-3-askew.step", {piece(askew(t), "Torus")});
      write("torus-3-nurbs.step", {piece(nurbs(t), "Torus")});
    }
  }
  TopoDS_Shape shell = solidOf(BRepAlgoAPI_Cut(sphere(110), sphere(100)).Shape());
  write("concentric-spheres.step", {piece(sphere(50), "Inner sphere"), steel(shell, "Outer shell")});
  write("coaxial-cylinders.step", {piece(capsule(10, 300), "Rod"), steel(tube(50, 20, 200), "Tube")});
  TopoDS_Shape plate = roundedDisc(200, 20);
  write("parallel-plates.step", {piece(moved(plate, 0, 0, 40), "Upper plate"), steel(moved(plate, 0, 0, -40), "Lower plate")});
  write("prolate-5.step", {piece(spheroid(100, 20, false), "Prolate spheroid 5:1")});
  write("prolate-10.step", {piece(spheroid(100, 10, false), "Prolate spheroid 10:1")});
  write("prolate-5-askew.step", {piece(askew(spheroid(100, 20, false)), "Prolate spheroid 5:1")});
  write("oblate-5.step", {piece(spheroid(20, 100, false), "Oblate spheroid 5:1")});
  spherePair("pair-gap-0.1.step", 50, 50, 5);
  spherePair("pair-gap-0.05.step", 50, 50, 2.5);
  spherePair("pair-1-4-far.step", 10, 40, 400);
  spherePair("pair-1-4-near.step", 10, 40, 10);
  for (auto& g : std::vector<std::pair<std::string, double>>{{"0.1", 5}, {"1", 50}, {"10", 500}})
    write("sphere-over-plane-" + g.first + ".step", {piece(sphere(50, 0, 0, 50 + g.second), "Sphere")});
  for (int h : {1, 2, 5, 10})
    write("boss-" + std::to_string(h) + ".step", {piece(h == 1 ? spheroid(50.0000001, 50, true) : spheroid(100, 100.0 / h, true), "Boss")});
  TopoDS_Shape cube = box(-50, -50, -50, 50, 50, 50);
  write("cube-100.step", {piece(cube, "Cube")});
  for (auto& f : std::vector<std::pair<std::string, double>>{{"0.01", 1}, {"0.02", 2}, {"0.05", 5}, {"0.1", 10}})
    write("cube-100-rounded-" + f.first + ".step", {piece(rounded(cube, f.second), "Rounded cube")});
  TopoDS_Shape bar = box(-10, -30, -150, 10, 30, 150);
  TopoDS_Shape room = hollowBox(120, 160, 420, 5);
  write("bar-in-box-sharp.step", {piece(bar, "Bar"), steel(room, "Box")});
  for (auto& f : std::vector<std::pair<std::string, double>>{{"0.2", 0.2}, {"0.4", 0.4}, {"1", 1}, {"2", 2}, {"5", 5}})
    write("bar-in-box-r" + f.first + ".step", {piece(rounded(bar, f.second), "Bar"), steel(room, "Box")});
  write("disc-rounded.step", {piece(roundedDisc(100, 5), "Disc")});
  TopoDS_Shape disc = cylinder(100, 40, gp_Pnt(0, 0, -20), gp_Dir(0, 0, 1));
  write("disc-sharp.step", {piece(disc, "Disc")});
  for (auto& f : std::vector<std::pair<std::string, double>>{{"0.4", 0.4}, {"2", 2}})
    write("disc-rim-r" + f.first + ".step", {piece(rounded(disc, f.second), "Disc")});
  for (int w : {60, 120}) {
    TopoDS_Shape s = wedgeBar(w, 60, 150);
    write("wedge-" + std::to_string(w) + "-sharp.step", {piece(s, "Wedge")});
    for (auto& f : std::vector<std::pair<std::string, double>>{{"0.6", 0.6}, {"2", 2}}) {
      TopoDS_Shape r = filleted(s, f.second, [](const gp_Pnt& p, const gp_Vec& t) { return std::abs(t.Z()) > 0.9 && std::hypot(p.X(), p.Y()) < 1e-6; });
      write("wedge-" + std::to_string(w) + "-r" + f.first + ".step", {piece(r, "Wedge")});
    }
  }
  BRepBuilderAPI_MakePolygon l;
  for (auto& p : std::vector<std::pair<double, double>>{{0, 0}, {120, 0}, {120, 12}, {12, 12}, {12, 80}, {0, 80}}) l.Add(gp_Pnt(p.first, p.second, 0));
  l.Close();
  TopoDS_Shape bracket = BRepPrimAPI_MakePrism(BRepBuilderAPI_MakeFace(l.Wire()).Face(), gp_Vec(0, 0, 40)).Shape();
  bracket = filleted(bracket, 5, [](const gp_Pnt& p, const gp_Vec& t) { return std::abs(t.Z()) > 0.9 && p.X() > 119; });
  bracket = filleted(bracket, 1, [](const gp_Pnt& p, const gp_Vec& t) { return std::abs(t.Z()) > 0.9 && p.Y() > 79; });
  bracket = filleted(bracket, 3, [](const gp_Pnt& p, const gp_Vec& t) { return std::abs(t.Z()) > 0.9 && p.X() < 1 && p.Y() < 1; });
  bracket = filleted(bracket, 8, [](const gp_Pnt& p, const gp_Vec& t) { return std::abs(t.Z()) > 0.9 && std::abs(p.X() - 12) < 0.1 && std::abs(p.Y() - 12) < 0.1; });
  write("l-bracket.step", {piece(bracket, "Bracket")});
  write("spheres-connected.step", {piece(sphere(100), "Large sphere"), piece(sphere(25, 0, 0, 5000), "Small sphere")});
  for (auto& g : std::vector<std::pair<int, double>>{{20, 5}, {100, 20}, {250, 50}, {1000, 200}})
    spherePair("sphere-gap-d" + std::to_string(g.first) + ".step", g.first / 2.0, g.first / 2.0, g.second);
  TopoDS_Shape busbar = rounded(box(-5, -200, 100, 5, 200, 160), 2);
  write("busbar-over-plane.step", {piece(busbar, "Busbar")});
  write("bolted-bars.step", {piece(rounded(box(0, 0, 0, 200, 60, 10), 2), "Bar A"), piece(box(150, 5, 10, 300, 55, 20), "Bar B"),
                             piece(cylinder(10, 34, gp_Pnt(175, 30, -7), gp_Dir(0, 0, 1)), "Bolt")});
  TopoDS_Shape thin = hollowBox(1000, 600, 800, 1.5);
  thin = solidOf(BRepAlgoAPI_Cut(thin, box(-200, -320, -10, 200, -290, 10)).Shape());
  write("thin-housing.step", {steel(thin, "Housing"), piece(rounded(box(-30, -100, -150, 30, 100, 150), 8), "Conductor")});
  write("cylinder.step", {piece(cylinder(20, 60, gp_Pnt(0, 0, 0), gp_Dir(0, 0, 1)), "Cylinder")});
  write("cylinder-nurbs.step", {piece(nurbs(cylinder(20, 60, gp_Pnt(0, 0, 0), gp_Dir(0, 0, 1))), "Cylinder")});
  TopoDS_Shape cone = BRepPrimAPI_MakeCone(30, 0, 60).Shape();
  write("cone.step", {piece(cone, "Cone")});
  write("cone-nurbs.step", {piece(nurbs(BRepPrimAPI_MakeCone(30, 10, 40).Shape()), "Cone")});
  write("bore.step", {piece(solidOf(BRepAlgoAPI_Cut(box(0, 0, 0, 60, 60, 30), cylinder(12, 50, gp_Pnt(30, 30, -10), gp_Dir(0, 0, 1))).Shape()), "Block with bore")});
  write("nameless.step", {piece(sphere(10), ""), piece(sphere(10, 40, 0, 0), "")});
  write("names-non-ascii.step", {piece(sphere(10), "Sammelschiene für Größe 2"), piece(sphere(10, 40, 0, 0), "母线")});
  TopoDS_Shape twin = BRepPrimAPI_MakeCylinder(10, 30).Shape();
  write("two-instances.step", {piece(placed(twin, 0, 0, 0), "Stud"), piece(placed(twin, 50, 0, 5), "Stud")});
}

}  // namespace

int main(int argc, char** argv) {
  if (argc != 2) {
    std::cerr << "usage: generate_models OUTPUT_FOLDER\n";
    return 2;
  }
  folder = argv[1];
  Message::DefaultMessenger()->RemovePrinters(STANDARD_TYPE(Message_Printer));
  STEPControl_Controller::Init();
  write("demo-compartment.step", compartment(true, false));
  write("demo-compartment-mended.step", compartment(false, false));
  write("demo-compartment-worse.step", compartment(true, true));
  verification();
  return 0;
}
