#!/usr/bin/env bash
# One command from a fresh clone to a served page: installs, builds, migrates, seeds the demonstration and serves.
set -euo pipefail
cd "$(dirname "$0")/.."
bash scripts/install.sh
npm run --silent build
export TENUITY_DEMO="${TENUITY_DEMO:-on}"
exec node dist/server/main.js
