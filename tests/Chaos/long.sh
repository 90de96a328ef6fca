#!/usr/bin/env bash
# The long column of the chaos scenarios: everything once with lasting numbers, then kills with as many other seeds as named. Prints the table of figures.
#   tests/Chaos/long.sh [SEEDS]
set -eu -o pipefail
cd "$(dirname "$0")/../.."
export DOTNET_CLI_TELEMETRY_OPTOUT=1 DOTNET_NOLOGO=1
seeds=${1:-1}

dotnet build -c Release tests/Chaos -v quiet
chaos() { dotnet tests/Chaos/bin/Release/net10.0/chaos.dll "$@"; }
chaos all --long
for seed in $(seq 1 "$seeds"); do
    chaos kills 1000 --seed "$seed"
done
