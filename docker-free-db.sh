#!/usr/bin/env bash
# Runs MariaDB for this folder without Docker: on loopback only, never as root, with its data under DATA_DIR.
#
#   ./docker-free-db.sh start     install if missing, start, create the database and its accounts
#   ./docker-free-db.sh stop      stop cleanly
#   ./docker-free-db.sh status    say whether it runs and where (exit code 0 running, 3 stopped)
#   ./docker-free-db.sh reset     stop and delete this folder's database
#   ./docker-free-db.sh cluster [start|stop|status|reset]   three Galera nodes on loopback, for trials
#
# Environment: DB_PORT (3317), DATA_DIR (.data), DB_FLUSH (1; 2 trades the last second of commits for speed in tests).
set -euo pipefail
PATH="$PATH:/usr/sbin:/usr/local/sbin:/sbin"

ROOT=$(cd "$(dirname "${BASH_SOURCE[0]}")" && pwd -P)
DB_PORT=${DB_PORT:-3317}
DB_FLUSH=${DB_FLUSH:-1}
DATA_DIR=${DATA_DIR:-.data}
case $DATA_DIR in /*) ;; *) DATA_DIR=$ROOT/$DATA_DIR ;; esac
PACKAGES=(mariadb-server galera-4)
START_SECONDS=120

say() { printf 'database: %s\n' "$*"; }
fail() {
  printf 'database: %s\n' "$@" >&2
  exit 1
}

# ---- who runs the server --------------------------------------------------------------------------------------

if [ "$(id -u)" = 0 ]; then RUN_AS=mysql; else RUN_AS=$(id -un); fi

# Runs a command as the account that owns the data, from a folder that account may enter.
as_db() {
  if [ "$(id -u)" = 0 ]; then
    (cd / && exec setpriv --reuid="$RUN_AS" --regid="$RUN_AS" --clear-groups -- env HOME=/nonexistent "$@")
  else
    (cd / && exec "$@")
  fi
}

# ---- installing -----------------------------------------------------------------------------------------------

installed() { command -v mariadbd >/dev/null && command -v mariadb-install-db >/dev/null && command -v mariadb >/dev/null; }

# Debian starts a system-wide server after installing one; a policy file that says "no" keeps port 3306 free.
apt_install() {
  local policy=/usr/sbin/policy-rc.d made=0 code=0
  if [ ! -e $policy ]; then
    printf '#!/bin/sh\nexit 101\n' >$policy && chmod 755 $policy && made=1
  fi
  export DEBIAN_FRONTEND=noninteractive
  local options=(-y --no-install-recommends -o DPkg::Lock::Timeout=300)
  apt-get install "${options[@]}" "$@" >"$1.apt.log" 2>&1 || {
    apt-get update -o DPkg::Lock::Timeout=300 && apt-get install "${options[@]}" "$@" || code=$?
  }
  [ $made = 0 ] || rm -f $policy
  return $code
}

ensure_installed() {
  installed && return 0
  local command="apt-get update && apt-get install -y --no-install-recommends ${PACKAGES[*]}"
  command -v apt-get >/dev/null || fail "MariaDB is not installed and this system has no apt-get." \
    "Install MariaDB 10.6.18 or newer so that mariadbd, mariadb and mariadb-install-db are on the PATH."
  [ "$(id -u)" = 0 ] || fail "MariaDB is not installed. Run this once as root, then try again:" "  $command"
  say "installing ${PACKAGES[*]} from Debian (about 115 MB) ..."
  apt_install "${PACKAGES[@]}" || fail "Debian's packages could not be installed. Run this by hand to see why:" "  $command"
  installed || fail "MariaDB is still missing after installing ${PACKAGES[*]}."
}
