#!/usr/bin/env bash
# Runs every check and test, after installing what is missing. The last line counts them.
set -euo pipefail
cd "$(dirname "$0")/.."
. scripts/prepare.sh

need_node
need_package mariadbd mariadb-server
need_package chromium chromium
# Renders printed pages for the tests that look at them.
need_package pdftoppm poppler-utils
need_npm_packages
exec node --import tsx scripts/test.ts
