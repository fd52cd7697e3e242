#!/usr/bin/env bash
# Builds the project and runs every check. The browser tests need Chromium, which is installed from
# the distribution where it is missing.
set -euo pipefail
cd "$(dirname "$0")/.."

as_root() { if [ "$(id -u)" -eq 0 ]; then "$@"; else sudo "$@"; fi; }

if ! command -v chromium >/dev/null; then
  as_root apt-get update -q
  as_root env DEBIAN_FRONTEND=noninteractive apt-get install -y -q --no-install-recommends chromium
fi

mvn -B verify
