#!/bin/sh
# npm run bench: measures and compares with the limits; exits non-zero when one is over.
set -eu
cd "$(dirname "$0")/../.."
. server/scripts/lib.sh

require_node
load_env_file
ensure_dependencies
if [ -z "${TEST_DATABASE_URL:-}" ]; then
  TEST_DATABASE_URL=$(sh server/scripts/postgres.sh test $$) || exit 1
  export TEST_DATABASE_URL
fi
NODE_ENV=production exec node --import tsx tests/bench/run.ts "$@"
