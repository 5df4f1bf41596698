// Messages of the reader process: one line each, fields parted by tabs, control characters escaped.
#pragma once

#include <unistd.h>

#include <cstdio>
#include <initializer_list>
#include <string>
#include <utility>
#include <vector>

namespace edgefield {

// Why a model is refused: a code that Java turns into a sentence, and its arguments.
struct Refusal {
  std::string code;
  std::vector<std::string> args;
};

inline std::string escaped(const std::string& s) {
  std::string out;
  for (const char c : s) {
    if (static_cast<unsigned char>(c) < 0x20 || c == '%' || c == 0x7f) {
      char code[4];
      std::snprintf(code, sizeof code, "%%%02X", static_cast<unsigned char>(c));
      out += code;
    } else {
      out += c;
    }
  }
  return out;
}

inline std::string line(const std::string& head, const std::vector<std::string>& fields) {
  std::string out = head;
  for (const std::string& f : fields) out += "\t" + escaped(f);
  return out + "\n";
}

// Round-trip text of a number.
inline std::string number(double x) {
  char text[32];
  std::snprintf(text, sizeof text, "%.17g", x);
  return text;
}

// A number for people.
inline std::string brief(double x) {
  char text[32];
  std::snprintf(text, sizeof text, "%.6g", x);
  return text;
}

// The pipe to the parent. Written with write(2), so that nothing is lost when the process is killed.
class Report {
 public:
  explicit Report(int fd) : fd_(fd) {}

  void phase(const std::string& name) const { send(line("phase", {name})); }
  void refuse(const Refusal& r) const {
    std::vector<std::string> fields{r.code};
    fields.insert(fields.end(), r.args.begin(), r.args.end());
    send(line("refuse", fields));
  }
  void done() const { send("done\n"); }

 private:
  int fd_;

  void send(const std::string& s) const {
    size_t at = 0;
    while (at < s.size()) {
      const ssize_t n = ::write(fd_, s.data() + at, s.size() - at);
      if (n <= 0) _exit(1);
      at += static_cast<size_t>(n);
    }
  }
};

}  // namespace edgefield
