#!/bin/bash
# The year's log beside three reference programs, one after the other in the same run: as a plain
# process on the engine's classes, and as a job of the service from its start to the stored result.
# Statistics are compared with the dataframe's to 1e-9. Needs /usr/bin/python3 with numpy and pandas
# and the tests compiled (mvn test-compile). The folder holds gen_log.py, base_pandas.py,
# base_numpy.py and DuckBench.java, which needs the database's driver: lib/duckdb_jdbc-*.jar in the
# folder, or DRIVER=<jar>, as the command
#   mvn dependency:copy -Dartifact=org.duckdb:duckdb_jdbc:1.5.6.0 -DoutputDirectory=<folder>
# fetches it. A reference that is not at hand is named as such, in the first lines and the last.
# usage: deploy/bench-logs.sh <folder> [rounds] [seed]
set -e
cd "$(dirname "$0")/.."
reference=$(cd "${1:?folder of the reference programs}" && pwd)
rounds=${2:-3}
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
mvn -B -q dependency:build-classpath -Dmdep.outputFile="$work/cp.txt" -Dmdep.includeScope=test
libraries=$(cat "$work/cp.txt")
plain=$(tr ':' '\n' < "$work/cp.txt" | grep -E 'jspecify' | tr '\n' ':')
classes="$PWD/target/classes:$PWD/target/test-classes"
driver=${DRIVER:-$(ls "$reference"/lib/duckdb_jdbc-*.jar "$reference"/duckdb_jdbc-*.jar 2> /dev/null | tail -1 || true)}
[ -z "$driver" ] || driver=$(realpath "$driver")
at_hand="references at hand: dataframe, arrays, $([ -n "$driver" ] && echo "database ($(basename "$driver"))" || echo "NOT the database: no driver")"
echo "$at_hand"
uptime
cp "$reference"/*.py "$work"
cd "$work"
/usr/bin/python3 gen_log.py log.csv ${3:-7}
[ -z "$driver" ] || javac -cp "$driver" -d "$work" "$reference/DuckBench.java"
cat log.csv > /dev/null
timed() {
  local name=$1
  shift
  local times
  times=$( { /usr/bin/time -f '%e %U %S %M' "$@" > "$name.out" 2> "$name.err"; } 2>&1; tail -1 "$name.err")
  echo "$name $times" >> times.txt
  echo "$name $times" | awk '{printf "%-10s %6.2f s wall %6.2f s processor %5.0f MB\n", $1, $2, $3 + $4, $5 / 1024}'
}
for round in $(seq "$rounds"); do
  echo "round $round"
  timed dataframe /usr/bin/python3 base_pandas.py log.csv frame
  timed arrays /usr/bin/python3 base_numpy.py log.csv arrays
  [ -z "$driver" ] || timed database java -cp "$driver:$work" DuckBench log.csv base
  timed fourthwire java -Xmx512m -Xmn48m -XX:TieredStopAtLevel=1 -XX:+UseSerialGC \
    -cp "$classes:$plain" fourthwire.intake.reading.log.LogBenchmark log.csv ours
  cat fourthwire.out
done
echo "service, jobs of one process between dataframe runs"
java -Xmx2g -cp "$classes:$libraries" fourthwire.jobs.LogJobBenchmark \
  log.csv $((6 + rounds)) /usr/bin/python3 base_pandas.py log.csv frame 2> job.err | tee jobs.txt
/usr/bin/python3 - << 'PYTHON'
import csv, math
import numpy as np
best = {}
for line in open("times.txt"):
    name, wall, user, system, memory = line.split()
    w, c = best.get(name, (9e9, 9e9))
    best[name] = (min(w, float(wall)), min(c, float(user) + float(system)))
ours = best.pop("fourthwire")
for name, (wall, cpu) in best.items():
    print(f"plain process against {name}: wall {wall / ours[0]:.2f} times as fast, processor {cpu / ours[1]:.2f} (minima)")
rows = list(csv.reader(open("frame_columns.csv")))
names = [r[0] for r in rows[1:]]
own = list(csv.reader(open("ours_columns.csv")))
scale = [float(r[3]) / float(o[3]) for r, o in zip(rows[1:], own)]
scale = [10.0 ** round(math.log10(abs(s))) for s in scale]
worst = 0.0
def compare(a, b):
    global worst
    a, b = float(a or "nan"), float(b)
    if math.isnan(a) != math.isnan(b):
        raise SystemExit(f"{a} against {b}")
    if not math.isnan(a):
        worst = max(worst, abs(a - b) / max(abs(a), 1e-12))
for r, o, s in zip(rows[1:], own, scale):
    for a, b, f in zip(r[1:], o[1:], [1, s, s, s, s, s]):
        compare(a, float(b) * f)
def lists(file):
    found = {}
    for line in open(file):
        parts = line.strip().split(",[")
        found[len(found)] = [np.array([float(x) for x in p.strip("[]").split(", ")]) for p in parts[1:]]
    return found
weekly, hours = lists("ours_weekly.csv"), lists("ours_hourweek.csv")
table = list(csv.reader(open("frame_weekly.csv")))
for j, name in enumerate(table[0][2:]):
    k = names.index(name)
    for i, row in enumerate(table[1:]):
        compare(row[j + 2], weekly[k][i % 2][i // 2] * scale[k])
table = list(csv.reader(open("frame_hourweek.csv")))
for j in range(len(names)):
    for row in table[1:]:
        compare(row[j + 1], hours[j][0][int(row[0])] * scale[j])
print(f"largest difference from the dataframe's statistics: {worst:.1e} of the value")
if worst > 1e-9:
    raise SystemExit("the statistics differ")
PYTHON
echo "$at_hand"
