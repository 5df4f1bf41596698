#include "step_file.hpp"

#include "step_text.hpp"

#include <BRepBndLib.hxx>
#include <BRepGProp.hxx>
#include <Bnd_Box.hxx>
#include <GProp_GProps.hxx>
#include <Interface_Static.hxx>
#include <Quantity_Color.hxx>
#include <STEPCAFControl_Writer.hxx>
#include <TDataStd_Name.hxx>
#include <TDocStd_Document.hxx>
#include <XCAFDoc_ColorTool.hxx>
#include <XCAFDoc_DocumentTool.hxx>
#include <XCAFDoc_ShapeTool.hxx>

#include <cstdio>
#include <cstdlib>
#include <fstream>
#include <iostream>
#include <sstream>

Piece piece(const TopoDS_Shape& s, const std::string& name) { return {s, name, 0.72, 0.45, 0.2}; }
Piece steel(const TopoDS_Shape& s, const std::string& name) { return {s, name, 0.6, 0.63, 0.66}; }
Piece resin(const TopoDS_Shape& s, const std::string& name) { return {s, name, 0.45, 0.25, 0.2}; }

static void makeCanonical(const std::string& path) {
  std::ifstream in(path);
  std::stringstream text;
  text << in.rdbuf();
  in.close();
  std::ofstream out(path, std::ios::trunc);
  out << canonical(text.str());
}

static void setLook(const Handle(XCAFDoc_ColorTool)& colours, const TDF_Label& label, const Piece& p) {
  TDataStd_Name::Set(label, TCollection_ExtendedString(p.name.c_str(), true));
  colours->SetColor(label, Quantity_Color(p.red, p.green, p.blue, Quantity_TOC_sRGB), XCAFDoc_ColorGen);
}

static void addAssembly(const Handle(XCAFDoc_ShapeTool)& shapes, const Handle(XCAFDoc_ColorTool)& colours,
                        const std::string& name, const std::vector<Piece>& pieces) {
  TDF_Label top = shapes->NewShape();
  TDataStd_Name::Set(top, TCollection_ExtendedString(name.c_str(), true));
  for (const Piece& p : pieces) {
    // The placement goes to the instance, so that a shape used twice stays one product.
    TopLoc_Location place = p.shape.Location();
    TopoDS_Shape bare = p.shape.Located(TopLoc_Location());
    TDF_Label label;
    if (!shapes->Search(bare, label)) {
      label = shapes->AddShape(bare, false);
      setLook(colours, label, p);
    }
    TDF_Label instance = shapes->AddComponent(top, label, place);
    TDataStd_Name::Set(instance, TCollection_ExtendedString(p.name.c_str(), true));
  }
  shapes->UpdateAssemblies();
}

static std::string manifestLine(const std::string& file, const std::string& what, const std::string& dimensions,
                                const std::vector<Piece>& pieces, const char* unit) {
  Bnd_Box bounds;
  double volume = 0;
  for (const Piece& p : pieces) {
    BRepBndLib::AddOptimal(p.shape, bounds, false, false);
    GProp_GProps props;
    BRepGProp::VolumeProperties(p.shape, props, 1e-7);
    volume += props.Mass();
  }
  bounds.SetGap(0);
  double lo[3], hi[3];
  bounds.Get(lo[0], lo[1], lo[2], hi[0], hi[1], hi[2]);
  char numbers[256];
  std::string box;
  for (double v : {lo[0], lo[1], lo[2], hi[0], hi[1], hi[2]}) {
    std::snprintf(numbers, sizeof numbers, ",%.3f", std::abs(v) < 5e-4 ? 0.0 : v);
    box += numbers;
  }
  std::snprintf(numbers, sizeof numbers, ",%.6g", volume);
  return file + "," + what + "," + dimensions + "," + unit + "," + std::to_string(pieces.size()) + box + numbers;
}

StepFolder::StepFolder(const std::string& folder, std::ostream& manifest) : folder(folder), manifest(manifest) {
  manifest << "file,what,dimensions_mm,unit,bodies,xmin_mm,ymin_mm,zmin_mm,xmax_mm,ymax_mm,zmax_mm,volume_mm3\n";
}

void StepFolder::write(const std::string& file, const std::string& what, const std::string& dimensions,
                       const std::vector<Piece>& pieces, const char* unit) {
  Handle(TDocStd_Document) doc = new TDocStd_Document("BinXCAF");
  Handle(XCAFDoc_ShapeTool) shapes = XCAFDoc_DocumentTool::ShapeTool(doc->Main());
  Handle(XCAFDoc_ColorTool) colours = XCAFDoc_DocumentTool::ColorTool(doc->Main());
  if (pieces.size() == 1) {
    setLook(colours, shapes->AddShape(pieces[0].shape, false), pieces[0]);
  } else {
    addAssembly(shapes, colours, file.substr(0, file.rfind('.')), pieces);
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
  makeCanonical(path);
  manifest << manifestLine(file, what, dimensions, pieces, unit) << "\n";
}
