#!/usr/bin/env sh
# Sees to what edgefield needs beside this checkout: a JDK (17 or later), Maven, a C++ compiler and the CAD kernel's
# development packages. On Debian and Ubuntu it installs what is missing where it may (root or sudo) after saying so;
# elsewhere it says what to install. Prints nothing when all is there.
# usage: prepare.sh [build|run]     run: only what a finished build needs
set -u
need=${1:-build}

java_release() { # prints the feature version of the Java that will be used, or nothing
  if [ -n "${JAVA_HOME:-}" ]; then home=$JAVA_HOME
  else
    bin=$(command -v java 2>/dev/null) || return 0
    home=$(dirname "$(dirname "$(readlink -f "$bin" 2>/dev/null || echo "$bin")")")
  fi
  if [ -r "$home/release" ]; then sed -n 's/^JAVA_VERSION="\([0-9]*\).*/\1/p' "$home/release"
  else "$home/bin/java" -version 2>&1 | sed -n 's/.*version "\([0-9]*\).*/\1/p'; fi
}
javac_there() {
  if [ -n "${JAVA_HOME:-}" ]; then [ -x "$JAVA_HOME/bin/javac" ]; else command -v javac >/dev/null 2>&1; fi
}
header_there() {
  for d in /usr/include/opencascade /usr/local/include/opencascade /opt/homebrew/include/opencascade; do
    [ -r "$d/STEPCAFControl_Reader.hxx" ] && return 0
  done
  return 1
}
library_there() {
  for l in /usr/lib/*/libTKXDESTEP.so* /usr/lib/libTKXDESTEP.* /usr/lib64/libTKXDESTEP.* /usr/local/lib/libTKXDESTEP.* \
    /opt/homebrew/lib/libTKXDESTEP.*; do [ -e "$l" ] && return 0; done
  return 1
}

missing="" packages=""
release=$(java_release)
if [ -z "$release" ] || [ "$release" -lt 17 ]; then
  if [ -n "${JAVA_HOME:-}" ] && [ -n "$release" ]; then
    echo "edgefield: JAVA_HOME is $JAVA_HOME (Java $release); edgefield needs Java 17 or later. Point JAVA_HOME to one or unset it." >&2
    exit 2
  fi
  missing="$missing JDK-17"; packages="$packages openjdk-17-jdk-headless"
elif [ "$need" = build ] && ! javac_there; then
  missing="$missing javac"; packages="$packages openjdk-$release-jdk-headless"
fi
if [ "$need" = build ]; then
  command -v mvn >/dev/null 2>&1 || { missing="$missing Maven"; packages="$packages maven"; }
  command -v g++ >/dev/null 2>&1 || { missing="$missing g++"; packages="$packages g++"; }
  header_there || { missing="$missing Open-CASCADE-headers"; packages="$packages libocct-data-exchange-dev"; }
else
  library_there || { missing="$missing Open-CASCADE"; packages="$packages libocct-data-exchange-dev"; }
fi
[ -z "$missing" ] && exit 0

if ! command -v apt-get >/dev/null 2>&1; then
  echo "edgefield: missing:$missing" >&2
  echo "edgefield: install a JDK (17 or later), Maven, a C++17 compiler and Open CASCADE 7.6 or later with headers, for example" >&2
  echo "  Fedora: sudo dnf install java-17-openjdk-devel maven gcc-c++ opencascade-devel" >&2
  echo "  macOS:  brew install openjdk@17 maven opencascade && xcode-select --install" >&2
  exit 2
fi
command="apt-get install -y --no-install-recommends$packages"
if [ "$(id -u)" = 0 ]; then as=""
elif command -v sudo >/dev/null 2>&1 && { sudo -n true 2>/dev/null || [ -t 0 ]; }; then as="sudo"
else
  echo "edgefield: missing:$missing; install with" >&2
  echo "  sudo apt-get update && sudo $command" >&2
  exit 2
fi
echo "edgefield: missing:$missing; installing: ${as:+$as }$command" >&2
log=$(mktemp) || exit 2
if ! { $as apt-get update && $as env DEBIAN_FRONTEND=noninteractive $command; } >"$log" 2>&1; then
  tail -n 5 "$log" >&2; rm -f "$log"
  echo "edgefield: the installation failed; run it by hand: ${as:+$as }apt-get update && ${as:+$as }$command" >&2
  exit 2
fi
rm -f "$log"
