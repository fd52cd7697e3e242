#!/bin/bash
# A log of gigabytes through the running service with 512 MB of heap: uploaded, its reading cancelled;
# uploaded and read; handed in again; deleted; read once more and deleted with its site. Prints what
# the job says of itself on the way, how large the database is and how much memory the service took.
# The rows are those of a short log again and again, a minute apart.
# usage: deploy/try-large-log.sh <log.csv> [gigabytes] [port] [heap]
# RUN starts the service; without it target/fourthwire.jar is run.
set -e
cd "$(dirname "$0")/.."
log=${1:?a log with a row of headings and times in the first column}
gigabytes=${2:-4}
port=${3:-8099}
heap=${4:-512m}
work=$(mktemp -d)
run=${RUN:-java -jar target/fourthwire.jar}
leave() {
  kill "$service" 2> /dev/null || true
  wait "$service" 2> /dev/null || true
  if grep -q java.lang.OutOfMemoryError "$work/service.out"; then
    rm -rf "$work/large.csv" "$work/data"
    echo "memory ran out: the service's log and a dump of its heap are kept in $work"
  else
    rm -rf "$work"
  fi
}
trap leave EXIT
/usr/bin/python3 - "$log" "$gigabytes" "$work/large.csv" << 'PYTHON'
import datetime, itertools, sys
lines = [line for _, line in zip(range(2001), open(sys.argv[1]))]
rows = [line[line.index(","):] for line in lines[1:]]
left = int(float(sys.argv[2]) * 1e9)
at = datetime.datetime(2015, 1, 1)
with open(sys.argv[3], "w", buffering=1 << 22) as out:
    out.write("Time (UTC)" + lines[0][lines[0].index(","):])
    for row in itertools.cycle(rows):
        text = at.strftime("%Y-%m-%d %H:%M:%S") + row
        out.write(text)
        at += datetime.timedelta(minutes=1)
        left -= len(text)
        if left <= 0:
            break
PYTHON
ls -l "$work/large.csv" | awk '{printf "file of %.2f GB\n", $5 / 1e9}'
JAVA_TOOL_OPTIONS="-Xmx$heap -Xlog:gc:file=$work/gc.log -XX:+HeapDumpOnOutOfMemoryError -XX:HeapDumpPath=$work" \
  $run --server.port=$port --fourthwire.data-dir="$work/data" --fourthwire.demo=false \
  > "$work/service.out" 2>&1 &
service=$!
address=http://127.0.0.1:$port/api/v1
until curl -sf "$address/sites" > /dev/null; do sleep 1; done
field() { /usr/bin/python3 -c "import json,sys; d=json.load(sys.stdin); print(eval(sys.argv[1]))" "$1"; }
memory() { awk '/VmHWM/ {printf "  resident at most %.0f MB\n", $2 / 1024}' "/proc/$service/status"; }
/usr/bin/python3 -c 'import shutil, sys; shutil.make_archive(sys.argv[1], "zip", "sample-data/survey")' "$work/survey"
site=$(curl -s -F "survey=@$work/survey.zip" "$address/sites" | field 'd["id"]')
node=$(/usr/bin/python3 -c 'import csv; print(next(csv.DictReader(open("sample-data/survey/panels.csv")))["panel"])')
send() { curl -s -F "file=@$work/large.csv" -F "at=$node" "$address/sites/$site/readings"; }
watch() {
  local job=$1 state message last=""
  while true; do
    state=$(curl -s "$address/jobs/$job")
    message=$(echo "$state" | field '"%s %.3f %s" % (d["state"], d.get("progress", 0), d.get("message", ""))')
    [ "$message" = "$last" ] || echo "  $(date +%T) $message"
    last=$message
    case $message in done* | failed* | cancelled*) break ;; esac
    sleep 10
  done
  reading=$(echo "$state" | field 'd.get("reading", d.get("result", ""))')
}
size() { du -sm "$work/data" | awk '{print "  database " $1 " MB"}'; }
upload() {
  SECONDS=0
  answer=$(send)
  echo "$1: answered after $SECONDS s: $answer"
  memory
  size
}
read_on() {
  SECONDS=0
  watch "$(echo "$answer" | field 'd["job"]')"
  echo "read in $SECONDS s"
  memory
  size
  curl -s "$address/sites/$site/readings" | field '"readings " + str([(r["id"], r.get("rows")) for r in d])'
}
remove() {
  SECONDS=0
  curl -s -o /dev/null -w "delete $1: %{http_code}" -X DELETE "$address/$1"
  echo " in $SECONDS s"
  memory
  size
}
upload "to be cancelled"
sleep 10
curl -s -X POST -o /dev/null -w "cancel: %{http_code}\n" "$address/jobs/$(echo "$answer" | field 'd["job"]')/cancel"
read_on
upload "uploaded"
read_on
upload "the same file again"
read_on
remove "readings/$reading"
upload "uploaded"
read_on
remove "sites/$site"
grep -c java.lang.OutOfMemoryError "$work/service.out" || true
awk -F'->' '/Pause/ {split($2, a, "M"); if (a[1] + 0 > most) most = a[1] + 0} END {print "heap in use after a collection, at most: " most " MB (garbage that it did not look for included)"}' "$work/gc.log"
awk -F'->' '/Pause Full/ {split($2, a, "M"); if (a[1] + 0 > most) most = a[1] + 0} END {print "after a full collection, at most: " most " MB"}' "$work/gc.log"
