#!/bin/bash
# Capture analysis beside the reference script, one after the other in the same run, over the same
# records. Needs /usr/bin/python3 with numpy and scipy, and the tests compiled (mvn test-compile).
# usage: deploy/bench-waveforms.sh <folder of make_signals.py and analyse.py> [rounds]
set -e
cd "$(dirname "$0")/.."
reference=$(cd "${1:?folder of make_signals.py and analyse.py}" && pwd)
rounds=${2:-3}
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
cp "$reference"/*.py "$work"
(cd "$work" && /usr/bin/python3 make_signals.py > /dev/null)
mvn -B -q dependency:build-classpath -Dmdep.outputFile="$work/cp.txt" -Dmdep.includeScope=test
for round in $(seq "$rounds"); do
  echo "round $round: reference"
  (cd "$work" && /usr/bin/python3 analyse.py | grep Msamples)
  echo "round $round: Fourthwire"
  java -cp "target/classes:target/test-classes:$(cat "$work/cp.txt")" \
    fourthwire.metering.capture.WaveformBenchmark "$work" 80 9
done
