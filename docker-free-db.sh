#!/usr/bin/env bash
# Runs MariaDB for this folder without Docker: on loopback only, never as root, with its data under DATA_DIR.
#
#   ./docker-free-db.sh start     install if missing, start, create the database and its accounts
#   ./docker-free-db.sh stop      stop cleanly
#   ./docker-free-db.sh status    say whether it runs and where (exit code 0 running, 3 stopped)
#   ./docker-free-db.sh reset     stop, and delete this folder's database
#   ./docker-free-db.sh cluster [start|stop|status|reset]   three Galera nodes on loopback, for trials
#
# Environment: DB_PORT (3317), DATA_DIR (.data), DB_FLUSH (1; 2 risks the last second on power loss, for fast tests).
set -euo pipefail
PATH="$PATH:/usr/sbin:/usr/local/sbin:/sbin"

ROOT=$(cd "$(dirname "${BASH_SOURCE[0]}")" && pwd -P)
DB_PORT=${DB_PORT:-3317}
DB_FLUSH=${DB_FLUSH:-1}
DATA_DIR=${DATA_DIR:-.data}
case $DATA_DIR in /*) ;; *) DATA_DIR=$ROOT/$DATA_DIR ;; esac
PACKAGES=(mariadb-server galera-4)
CLUSTER_PACKAGES=(rsync lsof socat iproute2)
START_SECONDS=120
STOP_SECONDS=120
NODES=(1 2 3)
SQL_MODE=STRICT_TRANS_TABLES,ERROR_FOR_DIVISION_BY_ZERO,NO_ZERO_DATE,NO_ZERO_IN_DATE,NO_ENGINE_SUBSTITUTION

say() { printf 'database: %s\n' "$*"; }
fail() {
  printf 'database: %s\n' "$@" >&2
  exit 1
}
is_root() { [ "$(id -u)" = 0 ]; }

# ---- the account the server runs under ------------------------------------------------------------------------

if is_root; then RUN_AS=mysql; else RUN_AS=$(id -un); fi
PREFIX=()
if is_root; then PREFIX=(setpriv "--reuid=$RUN_AS" "--regid=$RUN_AS" --clear-groups --); fi

# Runs a command as that account, from a folder it may enter.
as_db() { (cd / && exec "${PREFIX[@]}" "$@"); }

own() { if is_root; then chown "$RUN_AS:$RUN_AS" "$@"; fi; }

# ---- installing -----------------------------------------------------------------------------------------------

have() {
  local program
  for program in "$@"; do command -v "$program" >/dev/null || return 1; done
}

# Debian starts a system-wide server right after installing one; a policy file that says no prevents that.
apt_install() {
  local policy=/usr/sbin/policy-rc.d made='' code=0
  if [ ! -e $policy ]; then
    printf '#!/bin/sh\nexit 101\n' >$policy && chmod 755 $policy
    made=yes
  fi
  {
    apt-get update -o DPkg::Lock::Timeout=300 &&
      DEBIAN_FRONTEND=noninteractive apt-get install -y --no-install-recommends -o DPkg::Lock::Timeout=300 "$@"
  } >"$DATA_DIR/apt.log" 2>&1 </dev/null || code=$?
  if [ -n "$made" ]; then rm -f $policy; fi
  return $code
}

# ensure_installed "<programs>" <packages...>
ensure_installed() {
  local programs
  read -ra programs <<<"$1"
  shift
  if have "${programs[@]}"; then return; fi
  local by_hand="apt-get update && apt-get install -y --no-install-recommends $*"
  have apt-get || fail "$* missing, and this system has no apt-get." \
    "Install MariaDB 10.6.18 or newer so that these are on the PATH: ${programs[*]}."
  is_root || fail "$* missing. Run this once as root, then try again:" "  $by_hand"
  say "installing $* from Debian's packages (the server is about 30 MB to fetch) ..."
  if ! apt_install "$@"; then
    tail -n 5 "$DATA_DIR/apt.log" >&2
    fail "the packages could not be installed (whole log: $DATA_DIR/apt.log). By hand:" "  $by_hand"
  fi
  have "${programs[@]}" || fail "still missing after installing $*: one of ${programs[*]}."
}

# ---- where the data is ----------------------------------------------------------------------------------------

# BASE is DATA_DIR, or a folder of the system when the server's account may not enter DATA_DIR (a home of mode 700).
find_base() {
  mkdir -p "$DATA_DIR"
  BASE=$DATA_DIR
  is_root || return 0
  chmod a+x "$DATA_DIR"
  id "$RUN_AS" >/dev/null 2>&1 || return 0
  if ! as_db test -x "$DATA_DIR"; then
    BASE=/var/lib/undereave/$(printf '%s' "$DATA_DIR" | cksum | cut -d ' ' -f 1)
    (umask 022 && mkdir -p "$BASE")
  fi
}

# One start, stop or reset of a folder at a time. The server must not inherit the lock.
take_lock() {
  exec 9>"$DATA_DIR/db.lock"
  flock -w 300 9 || fail "another start or stop of this database has not ended after 5 minutes ($DATA_DIR/db.lock)."
}

# Points the functions below at one server: its folder, its port and further options.
use_node() {
  NODE_HOME=$1 NODE_PORT=$2
  shift 2
  NODE_OPTIONS_EXTRA=("$@")
}

# The socket's path may hold about 107 bytes: a short folder under /tmp stands in when ours is too deep.
socket_path() {
  local inside=$NODE_HOME/s.sock
  if [ ${#inside} -le 100 ]; then echo "$inside"; return; fi
  if [ ! -d "$(cat "$NODE_HOME/socket-dir" 2>/dev/null)" ]; then
    mktemp -d /tmp/undereave-db-XXXXXX >"$NODE_HOME/socket-dir"
    own "$(cat "$NODE_HOME/socket-dir")"
    chmod 755 "$(cat "$NODE_HOME/socket-dir")"
  fi
  echo "$(cat "$NODE_HOME/socket-dir")/s.sock"
}

# ---- one server -----------------------------------------------------------------------------------------------

# The server's process id, only if that process really is the one that holds our data folder.
node_pid() {
  local file pid
  for file in "$NODE_HOME/pid" "$NODE_HOME/mariadbd.pid"; do
    pid=$(cat "$file" 2>/dev/null) || continue
    if [ -n "$pid" ] && tr '\0' '\n' 2>/dev/null <"/proc/$pid/cmdline" | grep -qxF -e "--datadir=$NODE_HOME/data"; then
      echo "$pid"
      return
    fi
  done
  return 1
}

node_port() { tr '\0' '\n' <"/proc/$1/cmdline" | sed -n 's/^--port=//p'; }

root_sql() { mariadb --no-defaults --socket="$(socket_path)" --user="$(id -un)" --batch --skip-column-names "$@"; }

# Made under another name first, so that an interrupted installation is not taken for a database.
make_data() {
  if [ -d "$NODE_HOME/data/mysql" ]; then return; fi
  rm -rf "$NODE_HOME/data" "$NODE_HOME/data.new"
  mkdir -m 700 "$NODE_HOME/data.new" && own "$NODE_HOME/data.new"
  as_db mariadb-install-db --no-defaults --datadir="$NODE_HOME/data.new" --skip-test-db \
    --auth-root-authentication-method=socket --auth-root-socket-user="$RUN_AS" >"$NODE_HOME/install.log" 2>&1 ||
    fail "the data folder could not be set up: $(tail -n 3 "$NODE_HOME/install.log")"
  mv "$NODE_HOME/data.new" "$NODE_HOME/data"
}

make_home() {
  mkdir -p "$NODE_HOME"
  own "$NODE_HOME"
  as_db test -w "$NODE_HOME" || fail "$NODE_HOME belongs to another account (was it started as another user?)."
}

server_options() {
  printf '%s\n' --no-defaults --datadir="$NODE_HOME/data" --pid-file="$NODE_HOME/mariadbd.pid" \
    --socket="$(socket_path)" --bind-address=127.0.0.1 --port="$NODE_PORT" --skip-name-resolve --local-infile=0 \
    --default-time-zone=+00:00 --character-set-server=utf8mb4 --collation-server=utf8mb4_unicode_ci \
    --sql-mode="$SQL_MODE" --innodb-flush-log-at-trx-commit="$DB_FLUSH" --innodb-snapshot-isolation=ON \
    --innodb-log-file-size=64M --log-bin="$NODE_HOME/data/binlog" --binlog-format=ROW --sync-binlog="$DB_SYNC" \
    --binlog-expire-logs-seconds=2592000 --log-bin-trust-function-creators=1 --max-allowed-packet=64M
  if [ ${#NODE_OPTIONS_EXTRA[@]} -gt 0 ]; then printf '%s\n' "${NODE_OPTIONS_EXTRA[@]}"; fi
}

port_taken() { (exec 3<>"/dev/tcp/127.0.0.1/$1") 2>/dev/null; }

launch() {
  local options
  if port_taken "$NODE_PORT"; then
    fail "port $NODE_PORT is taken by another program. Stop it, or choose another port: DB_PORT=$((NODE_PORT + 100))"
  fi
  mapfile -t options < <(server_options)
  (cd / && exec setsid nohup "${PREFIX[@]}" mariadbd "${options[@]}" "$@" \
    </dev/null >>"$NODE_HOME/server.log" 2>&1 9>&-) &
  echo $! >"$NODE_HOME/pid"
}

answers() { mariadb-admin --no-defaults --socket="$(socket_path)" ping >/dev/null 2>&1; }

# wait_until <check> <what for>: fails when the server dies or the time is up.
wait_until() {
  local started=$SECONDS told=''
  until "$1"; do
    if ! node_pid >/dev/null; then
      sleep 0.3
      node_pid >/dev/null || fail "the server ended while starting. The end of $NODE_HOME/server.log:" \
        "$(tail -n 15 "$NODE_HOME/server.log" | sed 's/^/  /')"
    fi
    if [ $((SECONDS - started)) -ge $START_SECONDS ]; then fail "no answer after $START_SECONDS s ($2); see $NODE_HOME/server.log"; fi
    if [ -z "$told" ] && [ $((SECONDS - started)) -ge 5 ]; then told=yes && say "still starting ($2) ..."; fi
    sleep 0.1
  done
}

start_node() {
  local pid
  if pid=$(node_pid); then
    [ "$(node_port "$pid")" = "$NODE_PORT" ] ||
      fail "already running on port $(node_port "$pid"), not $NODE_PORT. Stop it first, or use that port."
  else
    launch "$@"
  fi
  wait_until answers 'opening the data'
}

stop_node() {
  local pid started=$SECONDS
  pid=$(node_pid) || return 1
  kill -TERM "$pid" 2>/dev/null || fail "process $pid belongs to another account; stop it as that user."
  while node_pid >/dev/null; do
    if [ $((SECONDS - started)) -ge $STOP_SECONDS ]; then fail "process $pid has not stopped after $STOP_SECONDS s."; fi
    sleep 0.1
  done
  rm -f "$NODE_HOME/pid"
  if [ -f "$NODE_HOME/socket-dir" ]; then rm -rf -- "$(cat "$NODE_HOME/socket-dir")" "$NODE_HOME/socket-dir"; fi
}

# ---- the database and its accounts ----------------------------------------------------------------------------

# The password kept in a file that only we may read; made on first use.
password() {
  local file=$DATA_DIR/$1
  if [ ! -s "$file" ]; then
    (umask 077 && od -An -N24 -tx1 /dev/urandom | tr -d ' \n' >"$file.new" && mv "$file.new" "$file")
  fi
  cat "$file"
}

# Rows for the application, tables for the migration runner; both also in databases beside ours named undereave_...
make_accounts() {
  local app migrate
  app=$(password db-password)
  migrate=$(password db-migrate-password)
  root_sql <<SQL
CREATE DATABASE IF NOT EXISTS undereave CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci;
CREATE USER IF NOT EXISTS 'undereave'@'127.0.0.1', 'undereave_migrate'@'127.0.0.1';
ALTER USER 'undereave'@'127.0.0.1' IDENTIFIED BY '$app', 'undereave_migrate'@'127.0.0.1' IDENTIFIED BY '$migrate';
GRANT SELECT, INSERT, UPDATE, DELETE ON \`undereave\`.* TO 'undereave'@'127.0.0.1';
GRANT SELECT, INSERT, UPDATE, DELETE ON \`undereave\\_%\`.* TO 'undereave'@'127.0.0.1';
GRANT ALL PRIVILEGES ON \`undereave\`.* TO 'undereave_migrate'@'127.0.0.1';
GRANT ALL PRIVILEGES ON \`undereave\\_%\`.* TO 'undereave_migrate'@'127.0.0.1';
SQL
}

# ---- commands -------------------------------------------------------------------------------------------------

prepare() {
  mkdir -p "$DATA_DIR"
  take_lock
  ensure_installed 'mariadbd mariadb-install-db mariadb mariadb-admin' "${PACKAGES[@]}"
  find_base
}

start() {
  prepare
  use_node "$BASE/db" "$DB_PORT"
  make_home
  make_data
  start_node
  make_accounts
  say "ready on 127.0.0.1:$DB_PORT (data in $NODE_HOME)"
}

stop() {
  find_base
  take_lock
  use_node "$BASE/db" "$DB_PORT"
  if stop_node; then say 'stopped'; else say 'was not running'; fi
}

status() {
  local pid
  find_base
  use_node "$BASE/db" "$DB_PORT"
  if pid=$(node_pid); then
    say "running on 127.0.0.1:$(node_port "$pid"), process $pid, data in $NODE_HOME"
  else
    say "stopped (data in $NODE_HOME)"
    return 3
  fi
}

reset() {
  find_base
  take_lock
  use_node "$BASE/db" "$DB_PORT"
  stop_node || true
  rm -rf -- "${NODE_HOME:?}" "$DATA_DIR/db-password" "$DATA_DIR/db-migrate-password" "$DATA_DIR/epoch"
  if [ "$BASE" != "$DATA_DIR" ]; then rmdir "$BASE" 2>/dev/null || true; fi
  say "deleted $NODE_HOME"
}

# ---- three nodes ----------------------------------------------------------------------------------------------

galera_port() { echo $((DB_PORT + 1243 + 10 * $1)); }

# Node n: SQL on DB_PORT + 19 + n (3337 to 3339), replication on ports from 4570.
use_cluster_node() {
  local n addresses='' port
  for n in "${NODES[@]}"; do addresses+=${addresses:+,}127.0.0.1:$(galera_port "$n"); done
  port=$(galera_port "$1")
  use_node "$BASE/cluster/n$1" $((DB_PORT + 19 + $1)) --innodb-autoinc-lock-mode=2 --wsrep-on=ON \
    --wsrep-provider="$(galera_library)" --wsrep-cluster-name=undereave --wsrep-cluster-address="gcomm://$addresses" \
    --wsrep-node-name="n$1" --wsrep-node-address="127.0.0.1:$port" --wsrep-sync-wait=1 --wsrep-sst-method=rsync \
    --wsrep-sst-receive-address="127.0.0.1:$((port + 2))" --wsrep-provider-options="gmcast.listen_addr=tcp://127.0.0.1:$port;ist.recv_addr=127.0.0.1:$((port + 1));gcache.size=64M;socket.ssl=no"
}

galera_library() {
  local file
  for file in /usr/lib/galera/libgalera_smm.so /usr/lib64/galera-4/libgalera_smm.so; do
    if [ -e "$file" ]; then echo "$file"; return; fi
  done
}

synced() { [ "$(root_sql -e "SHOW STATUS LIKE 'wsrep_local_state_comment'" 2>/dev/null | cut -f 2)" = Synced ]; }

# The last transaction a stopped node holds, -1 when it has none: after a crash only the server itself can tell.
recovered_seqno() {
  local options position
  [ -d "$NODE_HOME/data/mysql" ] || { echo -1; return; }
  mapfile -t options < <(server_options)
  position=$(as_db mariadbd "${options[@]}" --wsrep-recover 2>&1 | sed -n 's/.*Recovered position: *[^:]*:\(-\{0,1\}[0-9]*\).*/\1/p' | tail -n 1)
  echo "${position:--1}"
}

# The node that knows most may found the cluster anew; node 1 when nothing exists yet.
pick_founder() {
  local n best=1 best_seqno=-2 seqno
  for n in "${NODES[@]}"; do
    use_cluster_node "$n"
    seqno=$(recovered_seqno)
    if [ "$seqno" -gt "$best_seqno" ]; then best=$n best_seqno=$seqno; fi
  done
  echo "$best"
}

found_cluster() {
  local founder state
  founder=$(pick_founder)
  use_cluster_node "$founder"
  make_data
  state=$NODE_HOME/data/grastate.dat
  if [ -f "$state" ]; then sed -i 's/^safe_to_bootstrap: 0/safe_to_bootstrap: 1/' "$state"; fi
  start_node --wsrep-new-cluster
  wait_until synced "founding the cluster on n$founder"
  make_accounts
}

cluster_running() {
  local n
  for n in "${NODES[@]}"; do
    use_cluster_node "$n"
    if node_pid >/dev/null; then return 0; fi
  done
  return 1
}

cluster_start() {
  local n
  prepare
  ensure_installed 'rsync lsof ss' "${CLUSTER_PACKAGES[@]}"
  [ -n "$(galera_library)" ] || fail 'the Galera library is missing. As root: apt-get install -y galera-4'
  mkdir -p "$BASE/cluster" && own "$BASE/cluster"
  for n in "${NODES[@]}"; do use_cluster_node "$n" && make_home; done
  cluster_running || found_cluster
  for n in "${NODES[@]}"; do
    use_cluster_node "$n"
    mkdir -p "$NODE_HOME/data" && own "$NODE_HOME/data"
    start_node
    wait_until synced "n$n is fetching the data"
    say "n$n ready on 127.0.0.1:$NODE_PORT"
  done
}

cluster_stop() {
  local i
  find_base
  take_lock
  for ((i = ${#NODES[@]} - 1; i >= 0; i--)); do
    use_cluster_node "${NODES[i]}"
    if stop_node; then say "n${NODES[i]} stopped"; fi
  done
}

cluster_status() {
  local n pid up=0
  find_base
  for n in "${NODES[@]}"; do
    use_cluster_node "$n"
    if pid=$(node_pid); then say "n$n running on 127.0.0.1:$NODE_PORT, process $pid" && up=$((up + 1)); else say "n$n stopped"; fi
  done
  [ $up -gt 0 ] || return 3
}

cluster_reset() {
  cluster_stop
  rm -rf -- "${BASE:?}/cluster"
  say "deleted $BASE/cluster"
}

usage() { sed -n '2,10p' "${BASH_SOURCE[0]}" | sed 's/^# \{0,1\}//'; }

case $DB_FLUSH in
  1) DB_SYNC=1 ;;
  0 | 2) DB_SYNC=0 ;;
  *) fail "DB_FLUSH must be 0, 1 or 2, not '$DB_FLUSH'." ;;
esac
case $DB_PORT in '' | *[!0-9]*) fail "DB_PORT must be a number, not '$DB_PORT'." ;; esac
case ${1:-} in
  start | stop | status | reset) "$1" ;;
  cluster)
    case ${2:-start} in
      start | stop | status | reset) "cluster_${2:-start}" ;;
      *) usage && exit 2 ;;
    esac
    ;;
  *) usage && exit 2 ;;
esac
