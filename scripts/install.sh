#!/usr/bin/env bash
# Installs the packages of the lock file, unless this very lock file is installed already.
set -euo pipefail
cd "$(dirname "$0")/.."
if ! cmp -s package-lock.json node_modules/.installed-lock.json; then
  echo "Installing packages"
  npm ci --no-audit --no-fund --loglevel=error
  cp package-lock.json node_modules/.installed-lock.json
fi
