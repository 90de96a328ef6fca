#!/usr/bin/env bash
# Tries hostile FIT files, half of them changed and half made up: tests/fuzz.sh 20000000
set -euo pipefail
cd "$(dirname "$0")/.."
dotnet build tests/LoadWatch.Decoding.Tests -c Release -v quiet -nologo
LOADWATCH_FUZZ=$(( ${1:-20000000} / 2 )) tests/LoadWatch.Decoding.Tests/bin/Release/net10.0/LoadWatch.Decoding.Tests -class '*FitFuzzTests'
