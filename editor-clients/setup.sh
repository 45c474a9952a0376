#!/usr/bin/env bash
# Installs from Debian what the tests of the light clients drive: Neovim, Emacs with eglot, Vim with
# ALE. Does nothing where all are there.
set -euo pipefail

packages=(neovim emacs-nox elpa-eglot vim vim-ale)

missing=()
for package in "${packages[@]}"; do
  dpkg-query -W -f='${Status}' "$package" 2>/dev/null | grep -q 'install ok installed' ||
    missing+=("$package")
done
[ ${#missing[@]} -gt 0 ] || exit 0

as_root=()
[ "$(id -u)" -eq 0 ] || as_root=(sudo -n)
"${as_root[@]}" apt-get update -qq
"${as_root[@]}" env DEBIAN_FRONTEND=noninteractive \
  apt-get install -y -qq --no-install-recommends "${missing[@]}"
