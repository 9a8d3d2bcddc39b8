# Shared by the start, dev, test and bench scripts; sourced from the project's root.

say() { printf '%s\n' "$*" >&2; }
fail() {
  printf '\nPintle: %s\n' "$*" >&2
  exit 1
}
is_root() { [ "$(id -u)" = 0 ]; }

# Installs Debian packages when this can be done, or says what to install. Usage: install_packages "what for" package…
install_packages() {
  purpose=$1
  shift
  if ! is_root || ! command -v apt-get >/dev/null 2>&1; then
    fail "$purpose is missing. Install it (Debian: apt-get install $*), then run this again."
  fi
  say "Installing $purpose ($*) …"
  mkdir -p .data
  if [ -z "${PINTLE_APT_UPDATED:-}" ]; then
    apt-get update -qq >.data/apt.log 2>&1 || {
      tail -n 5 .data/apt.log >&2
      fail "apt-get update failed; $purpose could not be installed. Check the network."
    }
    PINTLE_APT_UPDATED=1
  fi
  DEBIAN_FRONTEND=noninteractive apt-get install -y -qq --no-install-recommends \
    -o Dpkg::Options::=--force-confold "$@" >.data/apt.log 2>&1 || {
    tail -n 10 .data/apt.log >&2
    fail "$purpose could not be installed: see the lines above (.data/apt.log)."
  }
}

require_node() {
  command -v node >/dev/null 2>&1 || fail "Node.js 20 is needed, and there is no node on the PATH."
  node -e 'const [a, b] = process.versions.node.split(".").map(Number); process.exit(a > 20 || (a === 20 && b >= 12) ? 0 : 1)' ||
    fail "Node.js 20.12 or newer is needed; this is $(node --version)."
}

# npm ci only when what is installed is not what the lock file says.
ensure_dependencies() {
  if node server/scripts/dependencies-current.mjs; then return 0; fi
  say "Installing dependencies …"
  npm ci --include=dev --no-audit --no-fund --loglevel=error >&2 ||
    fail "npm ci failed: see the lines above. Pintle needs the npm registry once."
}

# Variables of .env that the environment does not set already.
load_env_file() {
  if [ -f .env ]; then
    exports=$(node server/scripts/read-env.mjs .env) || fail ".env could not be read."
    eval "$exports"
  fi
}

# Secrets that nobody chose are made once and kept where only this user can read them.
ensure_secrets() {
  mkdir -p .data
  chmod 711 .data 2>/dev/null || true
  if [ -z "${ACCESS_TOKEN_SECRET:-}" ]; then
    if [ ! -s .data/access-token-secret ]; then
      (umask 077 && node -e 'process.stdout.write(require("node:crypto").randomBytes(48).toString("base64url"))' \
        >.data/access-token-secret) || fail "The folder .data cannot be written."
    fi
    ACCESS_TOKEN_SECRET=$(cat .data/access-token-secret) || fail "The file .data/access-token-secret cannot be read."
    export ACCESS_TOKEN_SECRET
  fi
}

# Uses DATABASE_URL when it is set; else a private PostgreSQL that lives as long as this process.
ensure_database() {
  if [ -z "${DATABASE_URL:-}" ]; then
    DATABASE_URL=$(sh server/scripts/postgres.sh main $$) || exit 1
    export DATABASE_URL
  fi
}

# The first free loopback port from this one up.
free_port() { node server/scripts/free-port.mjs "$1"; }

# Builds client and server into dist/, unless that was done from the very same sources.
ensure_build() {
  hash=$(node server/scripts/sources-hash.mjs)
  if [ -f dist/sources ] && [ "$(cat dist/sources)" = "$hash" ]; then return 0; fi
  say "Building …"
  rm -f dist/sources
  mkdir -p .data
  for config in vite.config.ts vite.server.config.ts; do
    NODE_ENV=production npx --no-install vite build -c "$config" --logLevel warn >.data/build.log 2>&1 || {
      cat .data/build.log >&2
      fail "The build failed: see the lines above."
    }
  done
  printf '%s' "$hash" >dist/sources
}
