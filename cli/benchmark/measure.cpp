// Runs a command and tells what it took.
// usage: measure COMMAND...      prints "WALL_S CPU_S PEAK_MB" on file descriptor 3; exits as the command
// PEAK is the largest resident set of any one process of the command, its waited-for children included.

#include <sys/resource.h>
#include <sys/wait.h>
#include <unistd.h>

#include <chrono>
#include <cstdio>

int main(int argc, char** argv) {
  if (argc < 2) return 2;
  const auto begin = std::chrono::steady_clock::now();
  const pid_t child = fork();
  if (child < 0) return 2;
  if (child == 0) {
    close(3);
    execvp(argv[1], argv + 1);
    _exit(127);
  }
  int status = 0;
  rusage use{};
  if (wait4(child, &status, 0, &use) < 0) return 2;
  const std::chrono::duration<double> wall = std::chrono::steady_clock::now() - begin;
  const auto seconds = [](const timeval& t) { return static_cast<double>(t.tv_sec) + 1e-6 * static_cast<double>(t.tv_usec); };
  dprintf(3, "%.3f %.3f %.0f\n", wall.count(), seconds(use.ru_utime) + seconds(use.ru_stime),
          static_cast<double>(use.ru_maxrss) / 1024);
  return WIFEXITED(status) ? WEXITSTATUS(status) : 1;
}
