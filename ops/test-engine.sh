# shellcheck shell=bash
# What the tests need around Maven: packages, a container engine, a PostgreSQL image.
# Sourced by ops/verify and ops/prepare-tests; sets engine_pid when it had to start the engine itself.

official_image=${HINGELINE_POSTGRES_IMAGE:-postgres:15}
built_image=hingeline-postgres:15
engine_dir=$PWD/target/engine
engine_pid=

say() { printf '%s: %s\n' "$(basename "$0")" "$*" >&2; }
die() {
  say "$*"
  exit 1
}

# Installs what is missing of the Debian packages behind the commands the tests call.
install_packages() {
  local missing=()
  [[ -e /usr/sbin/dockerd ]] || command -v dockerd >/dev/null || missing+=(docker.io)
  command -v chromium >/dev/null || missing+=(chromium)
  command -v chromedriver >/dev/null || missing+=(chromium-driver)
  command -v curl >/dev/null || missing+=(curl)
  command -v javac >/dev/null || missing+=(openjdk-17-jdk-headless)
  command -v mvn >/dev/null || missing+=(maven)
  install_now "${missing[@]}"
}

install_now() {
  (($#)) || return 0
  [[ $EUID == 0 ]] || die "needs the Debian packages: $* (run as root to have them installed)"
  say "installing $*"
  mkdir -p target
  {
    timeout 300 apt-get -q update &&
      DEBIAN_FRONTEND=noninteractive timeout 600 apt-get -q install -y --no-install-recommends "$@"
  } >target/packages.log 2>&1 </dev/null || {
    tail -n 20 target/packages.log >&2
    die "could not install $*"
  }
}

engine_answers() { timeout 20 docker info >/dev/null 2>&1; }

# Starts the container engine unless one answers already; waits for it at most a minute.
start_engine() {
  engine_answers && return 0
  if [[ -n ${DOCKER_HOST:-} ]]; then die "no container engine answers at DOCKER_HOST=$DOCKER_HOST"; fi
  [[ $EUID == 0 ]] || die "no container engine answers, and only root can start one"
  if [[ -d /run/systemd/system ]] && timeout 60 systemctl start docker 2>/dev/null && engine_answers; then
    return 0
  fi
  mkdir -p "$engine_dir"
  say "starting dockerd, log in target/engine/dockerd.log"
  setsid dockerd >"$engine_dir/dockerd.log" 2>&1 </dev/null &
  engine_pid=$!
  echo "$engine_pid" >"$engine_dir/dockerd.pid"
  for ((i = 0; i < 60; i++)); do
    engine_answers && return 0
    kill -0 "$engine_pid" 2>/dev/null || break
    sleep 1
  done
  tail -n 20 "$engine_dir/dockerd.log" >&2
  stop_engine
  die "the container engine did not come up"
}

# Stops the engine this shell started, and no other.
stop_engine() {
  [[ -n $engine_pid ]] || return 0
  kill "$engine_pid" 2>/dev/null || true
  for ((i = 0; i < 30; i++)); do
    kill -0 "$engine_pid" 2>/dev/null || break
    sleep 1
  done
  if kill -0 "$engine_pid" 2>/dev/null; then say "dockerd ($engine_pid) has not ended after 30 s"; fi
  rm -f "$engine_dir/dockerd.pid"
  engine_pid=
}

image_here() { docker image inspect "$1" >/dev/null 2>&1; }

# Sees to a PostgreSQL image and names it in HINGELINE_POSTGRES_IMAGE: the official one if it is here or
# can be pulled, otherwise one built from Debian's own packages.
provide_image() {
  if image_here "$official_image"; then
    export HINGELINE_POSTGRES_IMAGE=$official_image
    return 0
  fi
  if ! image_here "$built_image"; then
    say "pulling $official_image"
    if timeout 180 docker pull -q "$official_image" >&2; then
      export HINGELINE_POSTGRES_IMAGE=$official_image
      return 0
    fi
    say "$official_image cannot be pulled: building $built_image from Debian packages"
    build_image
  fi
  say "PostgreSQL comes from $built_image"
  export HINGELINE_POSTGRES_IMAGE=$built_image
}

# One build at a time on a machine; whoever waited finds the image there.
build_image() (
  mkdir -p "$engine_dir"
  exec 9>/run/lock/hingeline-postgres-image.lock
  flock -w 300 9 || die "another build of $built_image does not end"
  if image_here "$built_image"; then exit 0; fi
  command -v debootstrap >/dev/null || install_now debootstrap
  work=$(mktemp -d /var/tmp/hingeline-image.XXXXXX)
  trap 'rm -rf --one-file-system "$work"' EXIT
  timeout 400 debootstrap --variant=minbase --include=postgresql,ca-certificates bookworm "$work/root" \
    ${HINGELINE_DEBIAN_MIRROR:+"$HINGELINE_DEBIAN_MIRROR"} >"$engine_dir/debootstrap.log" 2>&1 || {
    tail -n 20 "$engine_dir/debootstrap.log" >&2
    die "debootstrap failed"
  }
  rm -rf "$work"/root/var/cache/apt/archives/*.deb "$work"/root/var/lib/apt/lists/*
  tar -C "$work/root" -c . | docker import - "$built_image-base" >/dev/null
  mkdir "$work/context"
  cat >"$work/context/Dockerfile" <<DOCKERFILE
FROM $built_image-base
ENV PATH=/usr/lib/postgresql/15/bin:/usr/local/bin:/usr/bin:/bin PGDATA=/var/lib/postgresql/test LANG=C.UTF-8
RUN install -d -o postgres -g postgres -m 700 /var/lib/postgresql/test /run/postgresql
USER postgres
RUN initdb --auth=trust -U test -E UTF8 --no-sync && echo 'host all all all trust' >> /var/lib/postgresql/test/pg_hba.conf \
 && pg_ctl -w start && createdb -U test test && pg_ctl -w stop
EXPOSE 5432
STOPSIGNAL SIGINT
CMD ["postgres","-c","listen_addresses=*"]
DOCKERFILE
  DOCKER_BUILDKIT=0 timeout 300 docker build -q -t "$built_image" "$work/context" >"$engine_dir/image.log" 2>&1 || {
    tail -n 20 "$engine_dir/image.log" >&2
    die "building $built_image failed"
  }
)

# Testcontainers' own helper image cannot be pulled everywhere, so the tests stop their container themselves.
export_test_environment() {
  export TESTCONTAINERS_RYUK_DISABLED=true TESTCONTAINERS_CHECKS_DISABLE=true
  if [[ -z ${DOCKER_HOST:-} ]]; then export TESTCONTAINERS_HOST_OVERRIDE=${TESTCONTAINERS_HOST_OVERRIDE:-localhost}; fi
}
