// The supervised reader: STEP file in, checked binary boundary representation with its triangulation out.
// usage: step-reader FILE OUT_DIR MEMORY_BYTES CPU_SECONDS PARENT_PID LARGEST_MM ANGLE_RAD

#include <BRepLib.hxx>
#include <BinTools.hxx>
#include <IFSelect_ReturnStatus.hxx>
#include <Interface_Check.hxx>
#include <Interface_CheckIterator.hxx>
#include <Interface_InterfaceModel.hxx>
#include <Interface_Static.hxx>
#include <Message.hxx>
#include <Message_Messenger.hxx>
#include <STEPCAFControl_Reader.hxx>
#include <STEPControl_Controller.hxx>
#include <STEPControl_Reader.hxx>
#include <Standard_Failure.hxx>
#include <StepBasic_MeasureWithUnit.hxx>
#include <StepRepr_DescriptiveRepresentationItem.hxx>
#include <StepRepr_MeasureRepresentationItem.hxx>
#include <StepRepr_ReprItemAndMeasureWithUnit.hxx>
#include <TDocStd_Document.hxx>
#include <TopoDS_Compound.hxx>
#include <XCAFDoc_DocumentTool.hxx>
#include <XSControl_TransferReader.hxx>
#include <XSControl_WorkSession.hxx>

#include <cstdlib>
#include <fstream>
#include <new>

#include "assembly_walk.h"
#include "body_check.h"
#include "process_limits.h"
#include "report.h"

namespace edgefield {

class StepReading {
 public:
  StepReading(const Report& report, std::string file, std::string out, double largest_mm, double angle_rad)
      : report_(report), file_(std::move(file)), out_(std::move(out)), largest_(largest_mm), angle_(angle_rad) {}

  void run() {
    report_.phase("read");
    STEPControl_Controller::Init();
    Interface_Static::SetIVal("read.stepcaf.subshapes.name", 1);
    XCAFDoc_ShapeTool::SetAutoNaming(false);
    read();
    report_.phase("check");
    strictCheck();
    report_.phase("transfer");
    const Handle(TDocStd_Document) doc = new TDocStd_Document("BinXCAF");
    transfer(doc);
    const AssemblyWalk walk(XCAFDoc_DocumentTool::ShapeTool(doc->Main()), XCAFDoc_DocumentTool::ColorTool(doc->Main()));
    report_.phase("bodies");
    checkBodies(walk);
    report_.phase("mesh");
    mesh(walk);
    report_.phase("write");
    write(walk);
  }

 private:
  const Report& report_;
  std::string file_, out_;
  double largest_, angle_;
  STEPCAFControl_Reader reader_;
  std::vector<Measure> measures_;
  std::vector<std::string> warnings_;

  std::string entityOf(const TopoDS_Shape& shape) const {
    const Handle(XSControl_WorkSession) ws = reader_.Reader().WS();
    const Handle(XSControl_TransferReader) tr = ws->TransferReader();
    if (tr.IsNull()) return "";
    const Handle(Standard_Transient) entity = tr->EntityFromShapeResult(shape, 3);
    return entity.IsNull() ? "" : label(entity);
  }

  std::string label(const Handle(Standard_Transient)& entity) const {
    const Handle(TCollection_HAsciiString) text = reader_.Reader().WS()->Model()->StringLabel(entity);
    return text.IsNull() ? "" : text->ToCString();
  }

  void read() {
    if (reader_.ReadFile(file_.c_str()) != IFSelect_RetDone) throw Refusal{"unreadable", {}};
    const Handle(Interface_InterfaceModel) model = reader_.Reader().WS()->Model();
    if (model.IsNull() || model->NbEntities() == 0) throw Refusal{"no-entities", {}};
  }

  void strictCheck() {
    int ignored = 0;
    std::string first;
    Interface_CheckIterator checks = reader_.Reader().WS()->ModelCheckList(true);
    for (checks.Start(); checks.More(); checks.Next()) {
      const Handle(Interface_Check) check = checks.Value();
      if (!check->HasFailed()) continue;
      const Handle(Standard_Transient) entity = check->Entity();
      const std::string who = entity.IsNull() ? "" : label(entity);
      if (entity.IsNull() || carriesShape(entity)) throw Refusal{"check-fail", {who, check->CFail(1)}};
      if (ignored++ == 0) first = who;
    }
    if (ignored > 0) warnings_.push_back(line("warning", {"remarks-ignored", std::to_string(ignored), first}));
  }

  // Whether an entity bears on the bodies: geometry, topology, units, placements, assembly structure. Annotations,
  // tolerances, styles and properties beside the shape do not.
  static bool carriesShape(const Handle(Standard_Transient)& entity) {
    const std::string type = entity->DynamicType()->Name();
    const auto starts = [&type](const char* s) { return type.rfind(s, 0) == 0; };
    if (starts("StepVisual_") || starts("StepDimTol_") || starts("StepFEA_") || starts("StepElement_")) return false;
    return type != "StepRepr_Representation" && type != "StepShape_ShapeRepresentation" &&
           !starts("StepRepr_ItemIdentified") && !starts("StepAP242_") && !entity->IsKind(STANDARD_TYPE(StepBasic_MeasureWithUnit)) &&
           !entity->IsKind(STANDARD_TYPE(StepRepr_DescriptiveRepresentationItem)) &&
           !entity->IsKind(STANDARD_TYPE(StepRepr_MeasureRepresentationItem)) &&
           !entity->IsKind(STANDARD_TYPE(StepRepr_ReprItemAndMeasureWithUnit));
  }

  void transfer(const Handle(TDocStd_Document)& doc) {
    reader_.SetColorMode(true);
    reader_.SetNameMode(true);
    reader_.SetLayerMode(false);
    reader_.SetPropsMode(false);
    reader_.SetSHUOMode(false);
    reader_.SetGDTMode(false);
    reader_.SetMatMode(false);
    reader_.SetViewMode(false);
    Handle(TDocStd_Document) target = doc;
    reader_.Transfer(target);
  }

  void checkBodies(const AssemblyWalk& walk) {
    if (walk.bodies.empty()) {
      if (!walk.sheets.empty()) {
        const auto& [name, sheet] = walk.sheets.front();
        throw Refusal{"sheets-only", {name, entityOf(sheet), std::to_string(walk.sheets.size())}};
      }
      throw Refusal{walk.looseCurves > 0 ? "curves-only" : "no-solid", {}};
    }
    for (const Body& b : walk.bodies) {
      checkSize(b, entityOf(b.original), largest_);
      BRepLib::BuildCurves3d(b.shape);
    }
    std::vector<TopoDS_Shape> shapes;
    for (const Body& b : walk.bodies) shapes.push_back(b.shape);
    const Model model(shapes, {});
    for (size_t i = 0; i < walk.bodies.size(); i++) {
      const Body& b = walk.bodies[i];
      const std::string entity = entityOf(b.original);
      checkClosed(model, static_cast<int>(i), b, entity);
      measures_.push_back(measure(b));
      checkThickness(b, entity, measures_.back());
      if (b.fromShell) warnings_.push_back(line("warning", {"closed-surface", b.path}));
    }
    if (!walk.sheets.empty()) {
      warnings_.push_back(
          line("warning", {"sheets-ignored", std::to_string(walk.sheets.size()), walk.sheets.front().first}));
    }
  }

  static bool hasBareFace(const TopoDS_Shape& body) {
    for (TopExp_Explorer x(body, TopAbs_FACE); x.More(); x.Next()) {
      TopLoc_Location loc;
      if (BRep_Tool::Triangulation(TopoDS::Face(x.Current()), loc).IsNull()) return true;
    }
    return false;
  }

  void mesh(const AssemblyWalk& walk) {
    for (size_t i = 0; i < walk.bodies.size(); i++) {
      const TopoDS_Shape& body = walk.bodies[i].shape;
      const double sag = 0.01 * measures_[i].size;
      BRepMesh_IncrementalMesh(body, sag, false, angle_, false);
      // The mesher gives up on some faces (a cone that ends near its apex) at one angle and not at another.
      for (const double other : {0.8, 1.2, 0.5 * angle_, 0.25 * angle_}) {
        if (!hasBareFace(body)) break;
        BRepTools::Clean(body);
        BRepMesh_IncrementalMesh(body, sag, false, other, false);
      }
    }
    std::vector<TopoDS_Shape> shapes;
    std::vector<int> signs;
    for (size_t i = 0; i < walk.bodies.size(); i++) {
      shapes.push_back(walk.bodies[i].shape);
      signs.push_back(measures_[i].volume < 0 ? -1 : 1);
    }
    const Model model(shapes, signs);
    const Triangulation t(model);
    if (t.bareFace >= 0) {
      const FaceData& f = model.faces[t.bareFace];
      throw Refusal{"unmeshable", {walk.bodies[f.part].path, entityOf(f.face)}};
    }
  }

  void write(const AssemblyWalk& walk) {
    TopoDS_Compound all;
    BRep_Builder build;
    build.MakeCompound(all);
    for (const Body& b : walk.bodies) build.Add(all, b.shape);
    std::ofstream brep(out_ + "/bodies.bin", std::ios::binary);
    BinTools::Write(all, brep);
    brep.close();
    std::ofstream side(out_ + "/bodies.txt", std::ios::binary);
    side << line("unit", {unit()});
    for (const std::string& w : warnings_) side << w;
    for (size_t i = 0; i < walk.bodies.size(); i++) {
      const Body& b = walk.bodies[i];
      const Measure& m = measures_[i];
      std::vector<std::string> fields{b.name, b.path, number(m.volume), number(m.area)};
      for (const double x : m.box) fields.push_back(number(x));
      if (b.colour) {
        for (const double c : *b.colour) fields.push_back(number(c));
      }
      side << line("part", fields);
    }
    side.close();
    if (!brep || !side) throw Refusal{"unwritable", {out_}};
  }

  std::string unit() {
    TColStd_SequenceOfAsciiString length, angle, solid;
    reader_.ChangeReader().FileUnits(length, angle, solid);
    return length.IsEmpty() ? "" : length.First().ToCString();
  }
};

}  // namespace edgefield

int main(int argc, char** argv) {
  using namespace edgefield;
  if (argc != 8) return 2;
  const Report report(silenceStreams());
  harden(std::atoll(argv[3]), std::atoi(argv[4]), static_cast<pid_t>(std::atoi(argv[5])));
  Message::DefaultMessenger()->ChangePrinters().Clear();
  try {
    StepReading(report, argv[1], argv[2], std::strtod(argv[6], nullptr), std::strtod(argv[7], nullptr)).run();
    report.done();
    _exit(0);
  } catch (const Refusal& r) {
    report.refuse(r);
  } catch (const std::bad_alloc&) {
    report.refuse({"memory", {}});
  } catch (const Standard_Failure& f) {
    report.refuse({"kernel", {std::string(f.DynamicType()->Name()) + " " + f.GetMessageString()}});
  } catch (...) {
    report.refuse({"kernel", {""}});
  }
  // The kernel's own exit handlers are slow and have nothing left to do.
  _exit(3);
}
