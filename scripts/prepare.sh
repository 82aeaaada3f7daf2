# Sourced by start.sh and test.sh: what a fresh Debian with Node lacks. Each thing that cannot be put right is told in one line.

fail() {
  echo "$1" >&2
  exit 1
}

need_node() {
  command -v node >/dev/null || fail "Node is not installed: Node 20.19 or newer is needed, below 23."
  local version major minor
  version=$(node -p process.versions.node)
  IFS=. read -r major minor _ <<<"$version"
  if ((major < 20 || major > 22 || (major == 20 && minor < 19))); then
    fail "Node $version is here; 20.19 or newer is needed, below 23."
  fi
}

# need_package PROGRAM PACKAGE: installs a Debian package unless its program is there.
need_package() {
  PATH="$PATH:/usr/sbin" command -v "$1" >/dev/null && return
  local as_root=()
  if [ "$(id -u)" != 0 ]; then
    command -v sudo >/dev/null || fail "The package $2 is missing: run this as root, or first apt-get install $2."
    as_root=(sudo)
  fi
  command -v apt-get >/dev/null || fail "The program $1 is missing (Debian's package $2), and there is no apt-get to install it."
  echo "Installing $2…"
  mkdir -p -m 700 .data
  {
    "${as_root[@]}" apt-get update -qq &&
      "${as_root[@]}" env DEBIAN_FRONTEND=noninteractive apt-get install -y -qq --no-install-recommends "$2"
  } >.data/apt.log 2>&1 || fail "The package $2 could not be installed: see .data/apt.log, or apt-get install $2."
}

need_npm_packages() {
  node scripts/packages-are-installed.mjs && return
  echo "Installing npm packages…"
  mkdir -p -m 700 .data
  npm ci --no-audit --no-fund >.data/npm.log 2>&1 || fail "npm ci failed: see .data/npm.log."
}
