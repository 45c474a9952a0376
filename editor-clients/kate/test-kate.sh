#!/usr/bin/env bash
# Drives a real Kate on a screen that nobody sees, on demand: it must start the server and be told both
# mistakes; pictures of the marks and of the list are for a person to look at. Needs of Debian:
# kate konsole xvfb xdotool imagemagick.
source "$(dirname "${BASH_SOURCE[0]}")/../testing/common.sh"
need kate kate
need Xvfb xvfb
need xdotool xdotool
need import imagemagick
pictures=${SETTLEWELL_PICTURES:-/tmp/settlewell-kate}
mkdir -p "$pictures"

# What the server answers is kept beside, to wait for it.
cat >"$work/settlewell" <<SERVER
#!/bin/sh
"$settlewell" serve | tee "$work/answers"
SERVER
chmod +x "$work/settlewell"
: >"$work/answers"

# Kate's own places: the plugin switched on, the server where its dialogue would put it.
mkdir -p "$work/config/kate/lspclient"
sed "s|\"settlewell\"|\"$work/settlewell\"|" "$clients/kate/settings.json" \
  >"$work/config/kate/lspclient/settings.json"
cat >"$work/config/katerc" <<'RC'
[General]
Show welcome view for new window=false
Startup Session=new

[Kate Plugins]
lspclientplugin=true
RC

export DISPLAY=:$((RANDOM % 500 + 100)) QT_QPA_PLATFORM=xcb XDG_RUNTIME_DIR=$work/run
mkdir -p -m 700 "$XDG_RUNTIME_DIR"
Xvfb "$DISPLAY" -screen 0 1400x900x24 >"$work/screen.log" 2>&1 &
screen=$!
editor=
trap '[ -z "$editor" ] || kill "$editor" 2>/dev/null || true; kill "$screen"; rm -rf "$work"' EXIT

picture() { import -window root "$pictures/$1.png"; }

# await WHAT COMMAND...: until the command succeeds.
await() {
  local what=$1 end=$((SECONDS + SETTLEWELL_WAIT))
  shift
  until "$@" >/dev/null 2>&1; do
    [ $SECONDS -lt $end ] || { picture failure; failed "waited in vain for $what"; }
    sleep 0.2
  done
}

named() { xdotool search --onlyvisible --name "$1"; }

# Two pictures in a row that are alike: everything is drawn.
still() {
  import -window root "$work/now.png"
  local alike=1
  [ ! -f "$work/before.png" ] || ! cmp -s "$work/before.png" "$work/now.png" || alike=0
  mv "$work/now.png" "$work/before.png"
  return $alike
}

await "the screen" xdotool getdisplaygeometry
kate --new "$sheet" >"$work/kate.log" 2>&1 &
editor=$!
await "Kate's window" named greenhouse
xdotool windowsize "$(named greenhouse | tail -1)" 1400 900

# Kate asks whether it may start this program: Return is yes.
await "Kate's question" named "LSP server start requested"
xdotool windowfocus --sync "$(named "LSP server start requested" | tail -1)" key Return
await "the wrong name" grep -q unknown-name "$work/answers"
await "the short acquisition" grep -q acquisition-too-short "$work/answers"
await "a still picture" still
picture 1-findings
echo "pictures: $pictures"
passed
