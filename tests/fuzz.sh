#!/usr/bin/env bash
# Tries hostile FIT, CSV, gzip and zip files, of each kind half changed and half made up: tests/fuzz.sh 20000000, or tests/fuzz.sh 20000000 Csv
set -euo pipefail
cd "$(dirname "$0")/.."
dotnet build tests/LoadWatch.Decoding.Tests -c Release -v quiet -nologo
LOADWATCH_FUZZ=$(( ${1:-20000000} / 2 )) tests/LoadWatch.Decoding.Tests/bin/Release/net10.0/LoadWatch.Decoding.Tests -class "*${2:-}FuzzTests"
