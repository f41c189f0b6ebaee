#!/usr/bin/env bash
# The same question as a link: calls with plain fields also answer GET, and a repeated one costs nothing.
# Usage: EVENFALL_KEY=evenfall_server_… examples/curl/link.sh
set -euo pipefail

address="${EVENFALL_URL:-http://127.0.0.1:4310}/v1/exposure/solve?ev100=5&aperture=f%2F4&iso=400"
key="Authorization: Bearer ${EVENFALL_KEY:?set EVENFALL_KEY to a server key}"

tag=$(curl --fail --silent --output /dev/null --dump-header - -H "$key" "$address" | tr -d '\r' | sed -n 's/^ETag: //p')
echo "first:  tag $tag"
curl --silent --output /dev/null --write-out 'second: status %{http_code}\n' -H "$key" -H "If-None-Match: $tag" "$address"
