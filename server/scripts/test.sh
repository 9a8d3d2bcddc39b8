#!/bin/sh
# npm test: sets up what the checks need, then runs them all. The last line counts them.
set -eu
cd "$(dirname "$0")/../.."
. server/scripts/lib.sh

require_node
ensure_dependencies
if [ -z "${TEST_DATABASE_URL:-}" ]; then
  TEST_DATABASE_URL=$(sh server/scripts/postgres.sh test $$) || exit 1
  export TEST_DATABASE_URL
fi
if [ -z "${CHROMIUM:-}" ] && ! command -v chromium >/dev/null 2>&1 && ! command -v google-chrome >/dev/null 2>&1; then
  install_packages "Chromium, for the journeys in a browser," chromium
fi
# The build that the checks leave behind is a finished one, but npm start must not take it for its own.
rm -f dist/sources
exec npx --no-install tsx server/scripts/run-checks.ts
