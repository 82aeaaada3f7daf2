#!/usr/bin/env bash
# Opens the shop on this machine: installs what is missing, builds, starts everything and says where it is.
set -euo pipefail
cd "$(dirname "$0")/.."
. scripts/prepare.sh

need_node
[ -n "${DATABASE_URL:-}" ] || need_package mariadbd mariadb-server
need_npm_packages
exec node --import tsx scripts/start.ts
