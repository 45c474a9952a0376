#!/bin/sh
# Drives Vim with ALE through findings, hover and an edit.
set -eu
here=$(CDPATH='' cd "$(dirname "$0")" && pwd)
ale=${ALE_FOLDER:-/usr/share/vim-ale}
if ! command -v vim >/dev/null || [ ! -d "$ale" ]; then
  echo "skipped: Vim with ALE is not installed"
  exit 0
fi
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
cp "$here/../sample.channels.yaml" "$work/board.channels.yaml"
mkdir "$work/.git"
export SETTLEWELL_TEST_SHEET="$work/board.channels.yaml"
export SETTLEWELL_TEST_RESULT="$work/result"
cat >"$work/vimrc" <<EOF
set runtimepath^=$ale
source $here/test.vim
source $here/settlewell.vim
EOF
status=0
PATH="$here/../../server/bin:$PATH" TERM=dumb vim -N -i NONE -n --not-a-term -u "$work/vimrc" \
  </dev/null >/dev/null 2>&1 || status=$?
cat "$work/result" 2>/dev/null || echo "FAILED: Vim said nothing"
exit "$status"
