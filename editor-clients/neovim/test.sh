#!/bin/sh
# Drives a headless Neovim through findings, hover, completion and a fix.
set -eu
here=$(CDPATH='' cd "$(dirname "$0")" && pwd)
if ! command -v nvim >/dev/null; then
  echo "skipped: Neovim is not installed"
  exit 0
fi
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
cp "$here/../sample.channels.yaml" "$work/board.channels.yaml"
mkdir "$work/.git"
export SETTLEWELL_TEST_SHEET="$work/board.channels.yaml"
export SETTLEWELL_CLIENT="$here/settlewell.lua"
PATH="$here/../../server/bin:$PATH" XDG_STATE_HOME="$work" XDG_CACHE_HOME="$work" \
  nvim --headless -u NONE -i NONE -n -c 'set hidden' -c "luafile $here/test.lua"
