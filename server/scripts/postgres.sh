#!/bin/sh
# A private PostgreSQL for this checkout: postgres.sh <main|test> <pid>
# Starts the cluster if it does not run, prints its URL on standard output, and stops it when the last process that
# asked for it is gone. Listens on loopback only, without a Unix socket, with a generated password (scram-sha-256).
set -eu
cd "$(dirname "$0")/../.."
. server/scripts/lib.sh

name=${1:-main}
user_pid=${2:-}
case $name in main | test) ;; *) fail "usage: postgres.sh main|test <pid>" ;; esac
project=$(pwd)
state=$project/.data/postgres-$name
mkdir -p "$state/users" || fail "The folder .data cannot be written."
chmod 711 .data "$state" 2>/dev/null || true

find_binaries() {
  bin=
  for candidate in $(ls -d /usr/lib/postgresql/*/bin 2>/dev/null | sort -t/ -k5 -n); do
    if [ -x "$candidate/initdb" ]; then bin=$candidate; fi
  done
  if [ -z "$bin" ] && command -v pg_config >/dev/null 2>&1 && [ -x "$(pg_config --bindir)/initdb" ]; then
    bin=$(pg_config --bindir)
  fi
  [ -n "$bin" ]
}

install_postgres() {
  # Debian would start a cluster of its own on the well-known port; this checkout brings its own.
  install_packages "PostgreSQL" postgresql-common
  if [ -f /etc/postgresql-common/createcluster.conf ]; then
    sed -i 's/^#* *create_main_cluster *=.*/create_main_cluster = false/' /etc/postgresql-common/createcluster.conf
  fi
  if apt-cache show postgresql-15 >/dev/null 2>&1; then
    install_packages "PostgreSQL" postgresql-15
  else
    install_packages "PostgreSQL" postgresql
  fi
  find_binaries || fail "PostgreSQL was installed, but its programs are not under /usr/lib/postgresql."
}

# PostgreSQL refuses to run as root.
as_owner() { if is_root; then (cd / && runuser -u postgres -- "$@"); else "$@"; fi; }

# Where the database lies: under .data, unless the database's user cannot get there.
locate() {
  home=$state
  if [ -s "$state/elsewhere" ]; then home=$(cat "$state/elsewhere"); fi
  data=$home/data
}

choose_data_folder() {
  if is_root && [ ! -s "$state/elsewhere" ] && ! as_owner test -x "$state"; then
    elsewhere=/var/lib/pintle-$(printf '%s' "$project" | sha256sum | cut -c1-12)-$name
    say "The user postgres cannot reach $state (a folder above it is closed to others)."
    say "The database is kept in $elsewhere instead."
    printf '%s' "$elsewhere" >"$state/elsewhere"
  fi
  locate
  mkdir -p "$data" || fail "The folder $data cannot be made."
  if is_root; then
    chmod 711 "$home"
    chown postgres: "$data" || fail "The folder $data cannot be given to the user postgres."
  elif [ ! -O "$data" ]; then
    fail "The folder $data belongs to another user. Run as that user, or set DATABASE_URL."
  fi
  as_owner test -w "$data" || fail "The database user cannot write to $data."
}

create_cluster() {
  # The mark is set last: what an interrupted creation left behind is no cluster.
  if [ -f "$home/created" ]; then
    [ -f "$data/PG_VERSION" ] || fail "The database in $data is damaged: PG_VERSION is missing."
    wanted=$(cat "$data/PG_VERSION")
    if [ ! -x "/usr/lib/postgresql/$wanted/bin/postgres" ]; then
      [ "$("$bin/postgres" --version | sed 's/[^0-9]*\([0-9]*\).*/\1/')" = "$wanted" ] ||
        fail "The database in $data was made by PostgreSQL $wanted, which is not installed any more."
    else
      bin=/usr/lib/postgresql/$wanted/bin
    fi
    [ -s "$home/password" ] || fail "The password file $home/password is gone. Restore it, or delete $home to start afresh."
    return 0
  fi
  say "Creating a private PostgreSQL cluster …"
  (umask 077 && node -e 'process.stdout.write(require("node:crypto").randomBytes(24).toString("base64url"))' >"$home/password")
  find "$data" -mindepth 1 -delete
  rm -rf "$home/initdb-password"
  (umask 077 && cp "$home/password" "$home/initdb-password")
  if is_root; then chown postgres: "$home/initdb-password"; fi
  as_owner "$bin/initdb" -D "$data" -U pintle -A scram-sha-256 --pwfile="$home/initdb-password" \
    -E UTF8 --locale=C.UTF-8 >"$state/initdb.log" 2>&1 || {
    rm -f "$home/initdb-password"
    fail "initdb failed: $(tail -n 3 "$state/initdb.log")"
  }
  rm -f "$home/initdb-password"
  {
    printf "listen_addresses = '127.0.0.1'\nunix_socket_directories = ''\npassword_encryption = 'scram-sha-256'\n"
    printf "timezone = 'UTC'\nlog_statement = 'none'\nlog_min_error_statement = panic\nlog_parameter_max_length_on_error = 0\n"
    if [ "$name" = test ]; then
      printf "fsync = off\nsynchronous_commit = off\nfull_page_writes = off\nmax_connections = 200\n"
    fi
  } >>"$data/postgresql.conf"
  : >"$home/created"
}

# True when the process that postmaster.pid names is this cluster's server; after a reboot it may be anybody.
is_running() {
  [ -f "$data/postmaster.pid" ] || return 1
  pid=$(head -n 1 "$data/postmaster.pid")
  [ -r "/proc/$pid/cmdline" ] && tr '\0' ' ' <"/proc/$pid/cmdline" | grep -qF -- "-D $data"
}

start_cluster() {
  if is_running; then
    port=$(sed -n 4p "$data/postmaster.pid")
    return 0
  fi
  rm -f "$data/postmaster.pid"
  port=$(free_port 0)
  as_owner "$bin/pg_ctl" -D "$data" -s -w -t 60 -l "$data/server.log" -o "-p $port" start </dev/null >/dev/null 2>&1 9>&- || {
    tail -n 5 "$data/server.log" >&2
    fail "PostgreSQL did not start: see the lines above ($data/server.log)."
  }
}

ensure_application_database() {
  PGPASSWORD=$(cat "$home/password")
  export PGPASSWORD
  export PGCONNECT_TIMEOUT=10
  found=$("$bin/psql" -h 127.0.0.1 -p "$port" -U pintle -d postgres -XAtc "select 1 from pg_database where datname = 'pintle'") ||
    fail "PostgreSQL runs but refuses the password in $home/password."
  if [ "$found" != 1 ]; then
    "$bin/createdb" -h 127.0.0.1 -p "$port" -U pintle pintle || fail "The database could not be created."
  fi
}

# Waits until every process that asked for the cluster is gone, then stops it.
watch_users() {
  while :; do
    alive=
    for file in "$state"/users/*; do
      [ -e "$file" ] || continue
      if kill -0 "$(basename "$file")" 2>/dev/null; then alive=1; else rm -f "$file"; fi
    done
    if [ -z "$alive" ]; then
      (
        flock 9
        # Somebody may have asked while this waited for the lock.
        for file in "$state"/users/*; do [ -e "$file" ] && exit 1; done
        as_owner "$bin/pg_ctl" -D "$data" -s -m fast -w stop >/dev/null 2>&1
        rm -f "$state/watcher"
        exit 0
      ) 9>"$state/lock" && return 0
    fi
    sleep 1
  done
}

if [ "$user_pid" = --watch ]; then
  find_binaries
  locate
  watch_users
  exit 0
fi

exec 9>"$state/lock"
flock 9
find_binaries || install_postgres
choose_data_folder
create_cluster
start_cluster
ensure_application_database
if [ -n "$user_pid" ]; then
  : >"$state/users/$user_pid"
  if ! { [ -s "$state/watcher" ] && kill -0 "$(cat "$state/watcher")" 2>/dev/null; }; then
    setsid sh server/scripts/postgres.sh "$name" --watch </dev/null >/dev/null 2>&1 9>&- &
    printf '%s' $! >"$state/watcher"
  fi
fi
database=pintle
[ "$name" = main ] || database=postgres
printf 'postgres://pintle:%s@127.0.0.1:%s/%s\n' "$(cat "$home/password")" "$port" "$database"
