// The same model must give the same text on every run, so that a change in a committed file is a change of the model.
#pragma once

#include <string>

// Fixes the header's time stamp and author, and puts the colour entities, which the kernel writes in the order of
// memory addresses, into the order of the representations they belong to.
std::string canonical(const std::string& step);
