// A model as it goes to disk: named, coloured pieces, one STEP file, one line of the manifest.
#pragma once

#include <TopoDS_Shape.hxx>

#include <ostream>
#include <string>
#include <vector>

struct Piece {
  TopoDS_Shape shape;
  std::string name;
  double red, green, blue;
};

// Copper, sheet steel, cast resin.
Piece piece(const TopoDS_Shape& s, const std::string& name);
Piece steel(const TopoDS_Shape& s, const std::string& name);
Piece resin(const TopoDS_Shape& s, const std::string& name);

class StepFolder {
 public:
  StepFolder(const std::string& folder, std::ostream& manifest);

  // Writes one file. `what` and `dimensions` go to the manifest, where no comma may stand in them; several pieces make an assembly, and a shape that
  // is used twice one product with two instances. `unit` is MM, INCH or M.
  void write(const std::string& file, const std::string& what, const std::string& dimensions,
             const std::vector<Piece>& pieces, const char* unit = "MM");

 private:
  std::string folder;
  std::ostream& manifest;
};
