#!/usr/bin/env bash
# Installs what is missing, builds, runs every test. Usage: bash tests/run.sh [dev|sanitize]
set -euo pipefail
cd "$(dirname "$0")/.."
source scenarios/packages.sh
require_packages "${build_packages[@]}" "${test_packages[@]}"

preset=${1:-dev}
log=build/tests-$preset.log
mkdir -p build
if ! { cmake --preset "$preset" && cmake --build --preset "$preset"; } >"$log" 2>&1; then
  tail -n 60 "$log" >&2
  echo "The build failed; the whole log is $log" >&2
  exit 1
fi
ctest --preset "$preset"
