// What the CAD kernel alone takes: reads a STEP file and meshes every solid with the angle and sag of edgefield's own
// reader, nothing else. No names, no colours, no checks, nothing written.
// usage: kernel_alone FILE ANGLE_RAD      prints the number of triangles

#include <BRepBndLib.hxx>
#include <BRepMesh_IncrementalMesh.hxx>
#include <BRep_Tool.hxx>
#include <Bnd_Box.hxx>
#include <Message.hxx>
#include <Message_Messenger.hxx>
#include <Poly_Triangulation.hxx>
#include <STEPControl_Reader.hxx>
#include <TopExp_Explorer.hxx>
#include <TopoDS.hxx>
#include <TopoDS_Face.hxx>

#include <cmath>
#include <cstdio>
#include <cstdlib>

int main(int argc, char** argv) {
  if (argc != 3) return 2;
  Message::DefaultMessenger()->ChangePrinters().Clear();
  STEPControl_Reader reader;
  if (reader.ReadFile(argv[1]) != IFSelect_RetDone || reader.TransferRoots() == 0) return 3;
  const TopoDS_Shape shape = reader.OneShape();
  const double angle_rad = std::strtod(argv[2], nullptr);
  long triangles = 0;
  for (TopExp_Explorer solid(shape, TopAbs_SOLID); solid.More(); solid.Next()) {
    Bnd_Box box;
    BRepBndLib::Add(solid.Current(), box);
    const double sag = 0.01 * std::sqrt(box.SquareExtent());
    BRepMesh_IncrementalMesh(solid.Current(), sag, false, angle_rad, false);
    for (TopExp_Explorer face(solid.Current(), TopAbs_FACE); face.More(); face.Next()) {
      TopLoc_Location place;
      const Handle(Poly_Triangulation) mesh = BRep_Tool::Triangulation(TopoDS::Face(face.Current()), place);
      if (!mesh.IsNull()) triangles += mesh->NbTriangles();
    }
  }
  std::printf("%ld\n", triangles);
  std::fflush(stdout);
  std::_Exit(0);  // the kernel's exit handlers are slow; edgefield's reader skips them too
}
