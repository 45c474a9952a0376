#!/bin/sh
# Drives Emacs with eglot in batch mode through findings, hover, completion and a fix.
set -eu
here=$(CDPATH='' cd "$(dirname "$0")" && pwd)
if ! command -v emacs >/dev/null || ! emacs --batch -q --eval "(require 'eglot)" 2>/dev/null; then
  echo "skipped: Emacs with eglot is not installed"
  exit 0
fi
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
cp "$here/../sample.channels.yaml" "$work/board.channels.yaml"
mkdir "$work/.git"
export SETTLEWELL_TEST_SHEET="$work/board.channels.yaml"
export SETTLEWELL_CLIENT="$here/settlewell.el"
export HOME="$work"
# -q and not -Q, which would hide the packages of the distribution.
PATH="$here/../../server/bin:$PATH" emacs --batch -q -l "$here/test.el"
