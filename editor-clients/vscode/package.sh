#!/usr/bin/env bash
# Makes settlewell-VERSION.vsix, the server's jar inside. The server must be built before:
# mvn -DskipTests package
set -euo pipefail
cd "$(dirname "${BASH_SOURCE[0]}")"

[ -d node_modules ] || npm ci --ignore-scripts --no-audit --no-fund
mkdir -p server
cp ../../server/target/settlewell.jar server/settlewell.jar
npm run --silent check
npm run --silent build
npx vsce package --no-dependencies --allow-missing-repository --skip-license
