#!/usr/bin/env bash
# For development: the server restarts and the page reloads when a file changes. Page on port 5173.
set -euo pipefail
cd "$(dirname "$0")/.."
bash scripts/install.sh
npm run --silent grammar
export TENUITY_DEMO="${TENUITY_DEMO:-on}"
npx tsx watch server/main.ts &
trap 'kill %1' EXIT
npx vite
