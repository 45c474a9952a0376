#!/usr/bin/env bash
# Drives a real Neovim: findings, hover, completion, two quick fixes.
source "$(dirname "${BASH_SOURCE[0]}")/../testing/common.sh"
need nvim neovim

export CLIENT=$clients/neovim
timeout 300 nvim --headless -u NONE -c 'filetype plugin indent on' -c "luafile $CLIENT/test.lua" >"$work/log" 2>&1 ||
  { cat "$work/log"; failed "see above"; }
compare
passed
