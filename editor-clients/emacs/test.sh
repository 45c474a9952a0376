#!/usr/bin/env bash
# Drives a real Emacs: findings, hover, completion, two quick fixes.
source "$(dirname "${BASH_SOURCE[0]}")/../testing/common.sh"
need emacs emacs-nox
# Not -Q: it hides what Debian installed beside Emacs.
emacs --batch -q --eval "(require 'eglot)" 2>/dev/null || skip "no eglot in this Emacs (Debian's package elpa-eglot)"

export CLIENT=$clients/emacs
timeout 300 emacs --batch -q -l "$CLIENT/test.el" >"$work/log" 2>&1 ||
  { cat "$work/log"; failed "see above"; }
compare
passed
