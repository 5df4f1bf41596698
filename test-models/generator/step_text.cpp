#include "step_text.hpp"

#include <algorithm>
#include <functional>
#include <map>
#include <regex>
#include <string>
#include <vector>

static const std::string COLOURED = "MECHANICAL_DESIGN_GEOMETRIC_PRESENTATION_REPRESENTATION";

// Numbers of the entities that a statement refers to, in the order of the text.
static std::vector<int> references(const std::string& statement) {
  std::vector<int> found;
  for (size_t i = statement.find('#'); i != std::string::npos; i = statement.find('#', i + 1)) {
    if (isdigit(static_cast<unsigned char>(statement[i + 1]))) found.push_back(std::stoi(statement.substr(i + 1)));
  }
  return found;
}

// The colour entities close the file: `first` is the number of the first of them.
static std::string sortedColours(const std::string& section, int first) {
  std::map<int, std::string> bodies;
  std::regex statement("#(\\d+) = ([^;]*);");
  for (std::sregex_iterator i(section.begin(), section.end(), statement), end; i != end; ++i) {
    bodies[std::stoi((*i)[1])] = std::regex_replace((*i)[2].str(), std::regex("\\s*\n\\s*"), "");
  }
  std::vector<int> tops;
  for (auto& b : bodies) {
    if (b.second.compare(0, COLOURED.size(), COLOURED) == 0) tops.push_back(b.first);
  }
  std::sort(tops.begin(), tops.end(), [&](int a, int b) { return references(bodies[a]).back() < references(bodies[b]).back(); });
  std::vector<int> order;
  std::map<int, int> renumbered;
  std::function<void(int)> visit = [&](int id) {
    if (id < first || renumbered.count(id)) return;
    renumbered[id] = first + static_cast<int>(order.size());
    order.push_back(id);
    for (int r : references(bodies[id])) visit(r);
  };
  for (int t : tops) visit(t);
  std::string out;
  for (int id : order) {
    std::string body = bodies[id];
    std::string line;
    for (size_t i = 0; i < body.size(); i++) {
      line += body[i];
      if (body[i] != '#') continue;
      size_t used;
      int r = std::stoi(body.substr(i + 1), &used);
      line += std::to_string(r < first ? r : renumbered[r]);
      i += used;
    }
    out += "#" + std::to_string(renumbered[id]) + " = " + line + ";\n";
  }
  return out;
}

std::string canonical(const std::string& step) {
  std::string s = std::regex_replace(step, std::regex("FILE_NAME\\([^;]*;"),
                                     "FILE_NAME('','2026-01-01T00:00:00',(''),(''),'','','');");
  size_t name = s.find(" = " + COLOURED);
  if (name == std::string::npos) return s;
  size_t begin = s.rfind('#', name), end = s.find("ENDSEC;", begin);
  return s.substr(0, begin) + sortedColours(s.substr(begin, end - begin), std::stoi(s.substr(begin + 1))) + s.substr(end);
}
