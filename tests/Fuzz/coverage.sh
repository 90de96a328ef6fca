#!/usr/bin/env bash
# Coverage-guided fuzzing of the FIT decoder with AFL++ (Debian: afl++) and SharpFuzz: tests/Fuzz/coverage.sh SECONDS [FOLDER]
# What crashes or hangs is kept in FOLDER/found/default; every bug so found becomes a test.
set -euo pipefail
cd "$(dirname "$0")"
seconds=${1:?seconds} work=${2:-$(mktemp -d)}
command -v afl-fuzz >/dev/null || { echo "afl-fuzz is not on this machine"; exit 1; }
[ -x "$work/tools/sharpfuzz" ] || dotnet tool install SharpFuzz.CommandLine --version 2.3.0 --tool-path "$work/tools"
dotnet publish Fuzz.csproj -c Release -v quiet -nologo -o "$work/program"
"$work/tools/sharpfuzz" "$work/program/LoadWatch.Decoding.dll"
mkdir -p "$work/seeds"
while read -r name hex; do printf '%b' "$(sed 's/../\\x&/g' <<<"$hex")" >"$work/seeds/$name"; done <../LoadWatch.Decoding.Tests/Data/Fit/vectors.txt
AFL_SKIP_BIN_CHECK=1 AFL_I_DONT_CARE_ABOUT_MISSING_CRASHES=1 AFL_SKIP_CPUFREQ=1 AFL_NO_UI=1 \
    afl-fuzz -V "$seconds" -t 5000 -m none -i "$work/seeds" -o "$work/found" dotnet "$work/program/Fuzz.dll" >"$work/log" || { tail "$work/log"; exit 1; }
grep -E 'execs_done|corpus_count|saved_crashes|saved_hangs|bitmap_cvg' "$work/found/default/fuzzer_stats"
[ -z "$(find "$work/found/default/crashes" -name 'id*')" ]
