#!/bin/sh
# npm run dev: the server restarts and the client reloads when a file changes. The page is vite's address.
set -eu
cd "$(dirname "$0")/../.."
. server/scripts/lib.sh

require_node
load_env_file
ensure_dependencies
ensure_secrets
: "${NODE_ENV:=development}" "${PINTLE_DEMO:=true}" "${SMTP_URL:=local}" "${LOG_LEVEL:=info}"
export NODE_ENV PINTLE_DEMO SMTP_URL LOG_LEVEL
ensure_database
if [ -z "${PORT:-}" ]; then PORT=$(free_port 4380) || fail "There is no free port from 4380 up; choose one with PORT."; fi
CLIENT_PORT=$(free_port 5173) || fail "There is no free port from 5173 up."
# Links in mails must lead to the page that vite serves, and writes come from there.
: "${PUBLIC_URL:=http://127.0.0.1:$CLIENT_PORT}"
export PORT PUBLIC_URL
npx --no-install tsx server/database/seed.ts || fail "The database could not be prepared: see the lines above."
exec npx --no-install concurrently --kill-others --names server,client --prefix-colors blue,green \
  "tsx watch --clear-screen=false server/main.ts" "vite --port $CLIENT_PORT --clearScreen false"
