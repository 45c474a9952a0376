#!/bin/sh
# Runs the tests of every editor that is installed; the server must be built.
set -eu
here=$(CDPATH='' cd "$(dirname "$0")" && pwd)
failed=0
for test in "$here"/*/test.sh; do
  name=$(basename "$(dirname "$test")")
  if said=$("$test" 2>&1); then
    echo "$name: $(echo "$said" | tail -n 1)"
  else
    echo "$name: failed"
    echo "$said" | sed 's/^/  /'
    failed=1
  fi
done
exit "$failed"
