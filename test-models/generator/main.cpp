// Writes the demo and verification models as STEP files and their manifest, through the same kernel that reads them.
// usage: generate_models STEP_FOLDER MANIFEST_FILE
#include "models.hpp"

#include <Message.hxx>
#include <Message_Messenger.hxx>
#include <Message_Printer.hxx>
#include <STEPControl_Controller.hxx>

#include <fstream>
#include <iostream>

int main(int argc, char** argv) {
  if (argc != 3) {
    std::cerr << "usage: generate_models STEP_FOLDER MANIFEST_FILE\n";
    return 2;
  }
  Message::DefaultMessenger()->RemovePrinters(STANDARD_TYPE(Message_Printer));
  STEPControl_Controller::Init();
  std::ofstream manifest(argv[2], std::ios::trunc);
  StepFolder out(argv[1], manifest);
  writeDemo(out);
  writeExactBodies(out);
  writeEdges(out);
  writeFileVariety(out);
  writeSphereGaps(out);
  return manifest.good() ? 0 : 1;
}
