#!/usr/bin/env bash
# Runs the tests of the clients that are light enough for every change, and counts them. Exit code 1
# when one failed; what this machine has no editor for counts as skipped.
set -uo pipefail
cd "$(dirname "${BASH_SOURCE[0]}")"

passed=0 failed=0 skipped=0
for client in neovim emacs vim; do
  begin=$SECONDS
  output=$("$client/test.sh" 2>&1)
  code=$?
  case $code in
    0) passed=$((passed + 1)) ;;
    77) skipped=$((skipped + 1)) ;;
    *)
      failed=$((failed + 1))
      printf '%s\n' "$output" >&2
      ;;
  esac
  case $code in
    0 | 77) verdict=${output##*$'\n'} ;;
    *) verdict=failed ;;
  esac
  printf '%-8s %4d s  %s\n' "$client" $((SECONDS - begin)) "$verdict"
done
echo "$passed passed, $failed failed, $skipped skipped"
[ "$failed" -eq 0 ]
