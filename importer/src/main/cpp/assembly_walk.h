// From the transferred document to bodies with names, instance paths, colours and placements.
#pragma once

#include <BRep_Builder.hxx>
#include <Quantity_Color.hxx>
#include <TCollection_AsciiString.hxx>
#include <TDF_Label.hxx>
#include <TDF_LabelSequence.hxx>
#include <TDataStd_Name.hxx>
#include <TopExp_Explorer.hxx>
#include <TopoDS_Shell.hxx>
#include <TopoDS_Solid.hxx>
#include <XCAFDoc_ColorTool.hxx>
#include <XCAFDoc_ShapeTool.hxx>

#include <array>
#include <map>
#include <optional>
#include <set>

#include "report.h"

namespace edgefield {

struct Body {
  TopoDS_Shape shape;
  // Shape at its own origin, as transferred: finds its STEP entity.
  TopoDS_Shape original;
  std::string name;
  std::string path;
  std::optional<std::array<double, 3>> colour;
  bool fromShell = false;
};

class AssemblyWalk {
 public:
  std::vector<Body> bodies;
  // Shells, faces and wires that belong to no solid, by the product that holds them.
  std::vector<std::pair<std::string, TopoDS_Shape>> sheets;
  int looseCurves = 0;

  AssemblyWalk(const Handle(XCAFDoc_ShapeTool)& shapes, const Handle(XCAFDoc_ColorTool)& colours)
      : shapes_(shapes), colours_(colours) {
    TDF_LabelSequence roots;
    shapes_->GetFreeShapes(roots);
    for (TDF_Label root : roots) visit(root, TopLoc_Location(), "", std::nullopt, 0);
    nameTheNameless();
  }

 private:
  using Colour = std::optional<std::array<double, 3>>;
  static constexpr int DEEPEST = 200;
  Handle(XCAFDoc_ShapeTool) shapes_;
  Handle(XCAFDoc_ColorTool) colours_;

  static std::string nameOf(const TDF_Label& label) {
    Handle(TDataStd_Name) name;
    if (!label.FindAttribute(TDataStd_Name::GetID(), name)) return "";
    const TCollection_AsciiString text(name->Get(), 0);
    std::string s = text.ToCString();
    while (!s.empty() && (s.back() == ' ' || s.back() == '/')) s.pop_back();
    size_t start = 0;
    while (start < s.size() && s[start] == ' ') start++;
    s = s.substr(start);
    return s == "NONE" ? "" : s;
  }

  Colour colourOf(const TDF_Label& label) const {
    Quantity_Color c;
    for (const XCAFDoc_ColorType type : {XCAFDoc_ColorSurf, XCAFDoc_ColorGen}) {
      if (!label.IsNull() && colours_->GetColor(label, type, c)) {
        return std::array<double, 3>{c.Red(), c.Green(), c.Blue()};
      }
    }
    return std::nullopt;
  }

  void visit(const TDF_Label& label, const TopLoc_Location& place, const std::string& path, const Colour& inherited,
             int depth) {
    if (depth > DEEPEST) throw Refusal{"assembly-depth", {path}};
    TDF_Label product = label;
    TopLoc_Location at = place;
    const bool instance = XCAFDoc_ShapeTool::IsReference(label);
    if (instance) {
      XCAFDoc_ShapeTool::GetReferredShape(label, product);
      at = place * XCAFDoc_ShapeTool::GetLocation(label);
    }
    const std::string productName = nameOf(product);
    std::string step = instance ? nameOf(label) : productName;
    if (step.empty()) step = productName;
    const std::string here = path.empty() ? step : step.empty() ? path : path + "/" + step;
    // A colour on the instance overrides the product's; on the assembly it overrides nothing below.
    Colour colour = instance ? colourOf(label) : std::nullopt;
    if (!colour) colour = inherited;
    if (XCAFDoc_ShapeTool::IsAssembly(product)) {
      TDF_LabelSequence components;
      XCAFDoc_ShapeTool::GetComponents(product, components);
      for (TDF_Label c : components) visit(c, at, here, colour, depth + 1);
      return;
    }
    leaf(product, at, productName, here, colour);
  }

  void leaf(const TDF_Label& product, const TopLoc_Location& at, const std::string& productName,
            const std::string& path, const Colour& override) {
    const TopoDS_Shape shape = XCAFDoc_ShapeTool::GetShape(product);
    // A root product may carry a placement of its own.
    std::vector<std::pair<TopoDS_Shape, bool>> solids;
    for (TopExp_Explorer x(shape, TopAbs_SOLID); x.More(); x.Next()) solids.emplace_back(x.Current(), false);
    for (TopExp_Explorer x(shape, TopAbs_SHELL, TopAbs_SOLID); x.More(); x.Next()) {
      if (x.Current().Closed() || BRep_Tool::IsClosed(x.Current())) {
        solids.emplace_back(x.Current(), true);
      } else {
        sheets.emplace_back(path.empty() ? productName : path, x.Current());
      }
    }
    for (TopExp_Explorer x(shape, TopAbs_FACE, TopAbs_SHELL); x.More(); x.Next()) {
      sheets.emplace_back(path.empty() ? productName : path, x.Current());
    }
    for (TopExp_Explorer x(shape, TopAbs_EDGE, TopAbs_FACE); x.More(); x.Next()) looseCurves++;
    for (const auto& [solid, fromShell] : solids) {
      TDF_Label own;
      std::string solidName;
      if (shapes_->FindSubShape(product, solid, own)) solidName = nameOf(own);
      Body body;
      body.original = solid;
      if (fromShell) {
        TopoDS_Solid made;
        BRep_Builder build;
        build.MakeSolid(made);
        build.Add(made, solid);
        body.shape = made.Moved(at);
      } else {
        body.shape = solid.Moved(at);
      }
      body.fromShell = fromShell;
      const bool several = solids.size() > 1;
      body.name = several && !solidName.empty() ? solidName : productName.empty() ? solidName : productName;
      body.path = several && !solidName.empty() ? (path.empty() ? solidName : path + "/" + solidName) : path;
      Colour colour = override;
      if (!colour) colour = colourOf(own);
      if (!colour) colour = colourOf(product);
      if (!colour) colour = faceColour(product, solid);
      body.colour = colour;
      bodies.push_back(body);
    }
  }

  // Colour of the faces where the body has none: that of the first coloured face.
  Colour faceColour(const TDF_Label& product, const TopoDS_Shape& solid) const {
    for (TopExp_Explorer x(solid, TopAbs_FACE); x.More(); x.Next()) {
      TDF_Label label;
      if (!shapes_->FindSubShape(product, x.Current(), label)) continue;
      if (const Colour c = colourOf(label)) return c;
    }
    return std::nullopt;
  }

  void nameTheNameless() {
    std::set<std::string> taken;
    std::map<std::string, int> next;
    for (size_t i = 0; i < bodies.size(); i++) {
      Body& b = bodies[i];
      if (b.name.empty()) b.name = "part " + std::to_string(i + 1);
      if (b.path.empty()) b.path = b.name;
      const std::string plain = b.path;
      while (!taken.insert(b.path).second) b.path = plain + " (" + std::to_string(++next[plain] + 1) + ")";
    }
  }
};

}  // namespace edgefield
