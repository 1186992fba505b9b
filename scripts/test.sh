#!/usr/bin/env bash
# Every check there is, from a fresh clone: types, lint, format, unit, API, and end to end in a real browser on
# the production build. Ends with a line "N passed, N failed"; exits with 1 if anything failed.
set -uo pipefail
cd "$(dirname "$0")/.."
export TZ=UTC

bash scripts/install.sh || exit 1

if ! command -v chromium >/dev/null && ! command -v chromium-browser >/dev/null && ! command -v google-chrome >/dev/null; then
  echo "Installing Debian's chromium for the end-to-end tests"
  as_root=""
  [ "$(id -u)" -eq 0 ] || as_root="sudo"
  if ! { $as_root apt-get update -qq && $as_root env DEBIAN_FRONTEND=noninteractive apt-get install -y -qq chromium; } >/dev/null; then
    echo "Chromium could not be installed. Install the package 'chromium' and run npm test again." >&2
    exit 1
  fi
fi

passed=0
failed=0
check() { # name, command…: counts as one test
  echo "== $1"
  shift
  if "$@"; then passed=$((passed + 1)); else failed=$((failed + 1)); fi
}

npm run --silent grammar || exit 1
check "types" npx tsc --noEmit
check "lint" npx eslint . --max-warnings 0
check "format" npx prettier --check --log-level warn .
check "build" npm run --silent build

log=$(mktemp)
npx vitest run 2>&1 | tee "$log"
status=${PIPESTATUS[0]}
line=$(grep -E '^[0-9]+ passed, [0-9]+ failed$' "$log" | tail -n 1)
rm -f "$log"
if [[ "$line" =~ ^([0-9]+)\ passed,\ ([0-9]+)\ failed$ ]]; then
  passed=$((passed + BASH_REMATCH[1]))
  failed=$((failed + BASH_REMATCH[2]))
else
  failed=$((failed + 1))
fi
if [ "$status" -ne 0 ] && [ "$failed" -eq 0 ]; then failed=1; fi

echo
echo "$passed passed, $failed failed"
[ "$failed" -eq 0 ]
