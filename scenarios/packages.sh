#!/usr/bin/env bash
# Sourced by first-run.sh and tests/run.sh: installs the Debian packages named, if any is missing.
# Needs no network when nothing is missing. As a normal user it uses sudo, or says what to install.

require_packages() {
  local missing=() package
  for package in "$@"; do
    [ "$(dpkg-query -W -f='${db:Status-Status}' "$package" 2>/dev/null)" = installed ] ||
      missing+=("$package")
  done
  [ ${#missing[@]} -eq 0 ] && return 0
  local as_root=()
  if [ "$(id -u)" -ne 0 ]; then
    if command -v sudo >/dev/null 2>&1; then
      as_root=(sudo)
    else
      echo "These Debian packages are missing; have an administrator install them, then run again:" >&2
      echo "  apt-get install --no-install-recommends ${missing[*]}" >&2
      return 2
    fi
  fi
  echo "Installing ${#missing[@]} missing Debian packages: ${missing[*]}"
  "${as_root[@]}" apt-get update -qq
  DEBIAN_FRONTEND=noninteractive "${as_root[@]}" apt-get install -qq -y --no-install-recommends \
    "${missing[@]}" >/dev/null
}

# What building takes, and what the tests take beyond it.
build_packages=(g++ cmake ninja-build pkg-config libboost-dev libsqlite3-dev sqlite3
  libtomlplusplus-dev nlohmann-json3-dev libcli11-dev libfmt-dev)
test_packages=(libgtest-dev libgmock-dev)
