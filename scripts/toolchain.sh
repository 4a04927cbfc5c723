# Sourced by the other scripts: finds a JDK 17 or newer, Maven and solver programs, installs what is
# missing where it may, and otherwise says the one command to run.

root=$(CDPATH='' cd -- "$(dirname -- "$0")/.." && pwd -P)
me=$(basename -- "$0")

java_major() {
  "$1" -version 2>&1 | sed -n 's/.*version "\([0-9]*\).*/\1/p' | head -n 1
}

has_jdk() {
  if [ -n "${JAVA_HOME:-}" ] && [ -x "$JAVA_HOME/bin/javac" ]; then
    [ "$(java_major "$JAVA_HOME/bin/java")" -ge 17 ] 2>/dev/null
  else
    command -v javac >/dev/null 2>&1 && [ "$(java_major java)" -ge 17 ] 2>/dev/null
  fi
}

# Sets as_root to what runs a command as root; false if nothing may.
may_install() {
  command -v apt-get >/dev/null 2>&1 || return 1
  if [ "$(id -u)" -eq 0 ]; then
    as_root=env
  elif command -v sudo >/dev/null 2>&1 && sudo -n true 2>/dev/null; then
    as_root="sudo -n env"
  else
    return 1
  fi
}

install_packages() {
  echo "installing $*" >&2
  # shellcheck disable=SC2086 # the command's words are words of their own
  $as_root apt-get -qq update >&2 &&
    $as_root DEBIAN_FRONTEND=noninteractive apt-get -qq -y install --no-install-recommends \
      "$@" >/dev/null
}

ensure_toolchain() {
  missing=
  has_jdk || missing="$missing openjdk-17-jdk-headless"
  command -v mvn >/dev/null 2>&1 || missing="$missing maven"
  [ -n "$missing" ] || return 0
  if ! command -v apt-get >/dev/null 2>&1; then
    echo "$me: install a JDK 17 or newer and Maven, then run this again" >&2
    exit 2
  fi
  if ! may_install; then
    echo "$me: not allowed to install packages; run this, then try again:" >&2
    echo "  sudo apt-get update && sudo apt-get install -y --no-install-recommends$missing" >&2
    exit 2
  fi
  # shellcheck disable=SC2086 # package names are words of their own
  install_packages $missing || {
    echo "$me: could not install$missing" >&2
    exit 2
  }
}

# Installs the solver programs that the backend 'program' is tested with, where it may; nothing else
# needs them.
ensure_solvers() {
  missing=
  for solver in cadical picosat; do
    command -v "$solver" >/dev/null 2>&1 || missing="$missing $solver"
  done
  [ -n "$missing" ] || return 0
  # shellcheck disable=SC2086 # package names are words of their own
  if ! { may_install && install_packages $missing; }; then
    echo "$me: goes on without$missing; tests that need them are skipped" >&2
  fi
}

# Builds the installation unless no source is newer than it.
ensure_built() {
  home=$root/harness/target/steelyard
  mark=$home/.built
  if [ -e "$mark" ] && [ -z "$(find "$root" \( -name target -o -name .git \) -prune -o \
      \( -path '*/src/main/*' -o -name pom.xml \) -type f -newer "$mark" -print -quit)" ]; then
    return 0
  fi
  ensure_toolchain
  echo "building" >&2
  log=$root/target/build.log
  mkdir -p "$root/target"
  if ! (cd "$root" && mvn -B -q -DskipTests package) >"$log" 2>&1; then
    tail -n 40 "$log" >&2
    echo "$me: the build failed; the whole log: $log" >&2
    exit 1
  fi
  touch "$mark"
}
