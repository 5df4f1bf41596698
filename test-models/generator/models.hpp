// The models by group.
#pragma once

#include "step_file.hpp"

// A switchgear compartment with its mended and its spoilt revision.
void writeDemo(StepFolder& out);
// Bodies whose field or capacitance is known exactly.
void writeExactBodies(StepFolder& out);
// Sharp-edged bodies and their rounded copies.
void writeEdges(StepFolder& out);
// What real files bring: touching and overlapping parts, thin walls, units, names, instances, NURBS.
void writeFileVariety(StepFolder& out);
// The sphere gaps of the standard's table that are not among the exact bodies.
void writeSphereGaps(StepFolder& out);
