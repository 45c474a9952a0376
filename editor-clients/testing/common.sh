# Sourced by every test.sh: where things stand, a folder to work in, and the three ways to end.
# shellcheck shell=bash
set -euo pipefail

clients=$(cd "$(dirname "${BASH_SOURCE[0]}")/.." && pwd)
settlewell=$clients/../server/bin/settlewell

skip() { echo "skipped: $*"; exit 77; }
passed() { echo "passed"; exit 0; }
failed() { echo "failed: $*"; exit 1; }

# need COMMAND PACKAGE: this machine must have it, else nothing is proved here.
need() {
  command -v "$1" >/dev/null || skip "no $1 on this machine (Debian's package $2)"
}

[ -f "$clients/../server/target/settlewell.jar" ] \
  || failed "no server/target/settlewell.jar; build it with: mvn -DskipTests package"

# An empty home, so that no one's own configuration takes part; the editor's folder lies in it.
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
export HOME=$work XDG_CONFIG_HOME=$work/config XDG_DATA_HOME=$work/data XDG_STATE_HOME=$work/state
export XDG_CACHE_HOME=$work/cache LC_ALL=C.UTF-8
export SETTLEWELL=$settlewell

# The project that is edited: one sheet, and what is to become of it once both mistakes are mended.
mkdir -p "$work/project/.git"
sheet=$work/project/greenhouse.channels.yaml
export SHEET=$sheet
cp "$clients/testing/greenhouse.channels.yaml" "$sheet"
sed -e 's/to: reff}/to: ref}/' -e 's/acquisition: 8 cycles/acquisition: 16 cycles/' \
  "$sheet" >"$work/expected"

# How long an editor may take to come to a state, in seconds: generous, for a loaded machine.
export SETTLEWELL_WAIT=${SETTLEWELL_WAIT:-60}

# The saved sheet must be the expected one, to the byte.
compare() {
  diff -u "$work/expected" "$sheet" || failed "the sheet that was saved is not the expected one"
}
