// What keeps the reader process harmless: memory and processor limits, no core, no life after its parent.
#pragma once

#include <fcntl.h>
#include <signal.h>
#include <sys/prctl.h>
#include <sys/resource.h>
#include <unistd.h>

#include <cstdint>

namespace edgefield {

inline void limit(int what, rlim_t value) {
  const rlimit r{value, value};
  setrlimit(static_cast<__rlimit_resource>(what), &r);
}

// Returns a private copy of standard output for messages; the streams themselves are silenced, since the kernel
// prints on them.
inline int silenceStreams() {
  const int pipe = fcntl(STDOUT_FILENO, F_DUPFD_CLOEXEC, 3);
  const int sink = open("/dev/null", O_RDWR | O_CLOEXEC);
  dup2(sink, STDIN_FILENO);
  dup2(sink, STDOUT_FILENO);
  dup2(sink, STDERR_FILENO);
  return pipe;
}

inline void harden(int64_t memoryBytes, int cpuSeconds, pid_t parent) {
  prctl(PR_SET_PDEATHSIG, SIGKILL);
  if (parent > 0 && getppid() != parent) _exit(1);
  prctl(PR_SET_DUMPABLE, 0);
  limit(RLIMIT_CORE, 0);
  limit(RLIMIT_AS, static_cast<rlim_t>(memoryBytes));
  limit(RLIMIT_CPU, static_cast<rlim_t>(cpuSeconds));
}

}  // namespace edgefield
