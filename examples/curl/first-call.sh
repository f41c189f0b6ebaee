#!/usr/bin/env bash
# What light does f/8 at 1/125 and ISO 100 suit? Prints the answer as JSON.
# Usage: EVENFALL_KEY=evenfall_server_… examples/curl/first-call.sh
set -euo pipefail

curl --fail-with-body --silent --show-error "${EVENFALL_URL:-http://127.0.0.1:4310}/v1/exposure/value" \
  -H "Authorization: Bearer ${EVENFALL_KEY:?set EVENFALL_KEY to a server key}" \
  -H 'Content-Type: application/json' \
  -d '{"aperture": "f/8", "shutter": "1/125", "iso": 100}'
