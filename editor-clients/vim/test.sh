#!/usr/bin/env bash
# Drives a real Vim with ALE: findings, hover, completion, two quick fixes.
source "$(dirname "${BASH_SOURCE[0]}")/../testing/common.sh"
need vim vim
vim -e -s -N -u NONE -c 'if !has("job") || !has("timers") | cquit | endif | qall!' </dev/null ||
  skip "this Vim is built without jobs or timers (Debian's package vim)"
vim -e -s -N -u NONE -c 'packadd ale | if !exists("g:loaded_ale_dont_use_this_in_other_plugins_please") | cquit | endif | qall!' </dev/null ||
  skip "no ALE for this Vim (Debian's package vim-ale)"

export CLIENT=$clients/vim LOG=$work/log
# A standard input that never ends and never says anything: at its end Vim would leave.
mkfifo "$work/silence"
exec 9<>"$work/silence"
timeout 300 vim --not-a-term -N -n -i NONE -u NONE -S "$CLIENT/test.vim" <&9 >"$work/screen" 2>&1 ||
  { cat "$LOG"; failed "see above"; }
compare
passed
