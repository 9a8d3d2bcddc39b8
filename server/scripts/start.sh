#!/bin/sh
# npm start: everything from a fresh checkout to a served address, and nothing twice. Settings: .env.example.
set -eu
cd "$(dirname "$0")/../.."
. server/scripts/lib.sh

require_node
load_env_file
ensure_dependencies
ensure_secrets
# The demo's passwords are public, so it is not for an address that the world can reach.
case ${PUBLIC_URL:-} in https:*) : "${PINTLE_DEMO:=false}" ;; *) : "${PINTLE_DEMO:=true}" ;; esac
: "${NODE_ENV:=production}" "${SMTP_URL:=local}" "${LOG_LEVEL:=warn}"
export NODE_ENV PINTLE_DEMO SMTP_URL LOG_LEVEL
ensure_database
ensure_build
if [ -z "${PORT:-}" ]; then PORT=$(free_port 4380) || fail "There is no free port from 4380 up; choose one with PORT."; fi
export PORT
node --enable-source-maps dist/server/seed.js || fail "The database could not be prepared: see the lines above."
# A small heap is collected before it grows: the server stays under 300 MB with 20 000 exercises. The bench runs it alike.
# exec, so that a signal sent to this process reaches the server.
exec node --max-semi-space-size=4 --max-old-space-size=256 --enable-source-maps dist/server/main.js
