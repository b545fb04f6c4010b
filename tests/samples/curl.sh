#!/usr/bin/env bash
# The service by curl: ./curl.sh http://localhost:5000
set -euo pipefail
service=$1
here=$(cd "$(dirname "$0")" && pwd)

echo "== One test"
curl --silent --show-error --fail-with-body "$service/v1/moisture-density" \
  --header 'Content-Type: application/json' \
  --data '{ "reference": "Ternmarsh, pit 2", "specimens": [
    { "waterContent": 10, "dryDensity": 1.75 }, { "waterContent": 12, "dryDensity": 1.82 }, { "waterContent": 14, "dryDensity": 1.86 },
    { "waterContent": 16, "dryDensity": 1.83 }, { "waterContent": 18, "dryDensity": 1.77 } ] }' \
  | grep -o '"optimum":{"waterContent":[0-9.]*,"maximumDryDensity":[0-9.]*'

# --upload-file sends as the lines come, and prints the answers as they come.
echo "== A batch, compressed on the way back"
for reference in A B C; do
  echo "{ \"reference\": \"$reference\", \"specimens\": [ { \"waterContent\": 10, \"dryDensity\": 1.75 }, { \"waterContent\": 12, \"dryDensity\": 1.82 }, { \"waterContent\": 14, \"dryDensity\": 1.80 } ] }"
done | curl --silent --show-error --fail-with-body --no-buffer --compressed --request POST --upload-file - \
  --header 'Content-Type: application/x-ndjson' "$service/v1/moisture-density/batch?summary=true" \
  | grep -o '^{"reference":"[A-C]"\|"answered":[0-9]*'

echo "== A CSV file"
printf 'reference,waterContent [%%],dryDensity [Mg/m3]\nB,10,1.75\nB,12,1.82\nB,14,1.86\nB,16,1.83\nB,18,1.77\n' \
  | curl --silent --show-error --fail-with-body --data-binary @- --header 'Content-Type: text/csv' --header 'Accept: text/csv' \
    "$service/v1/exchange/csv?job=moisture-density" | head -2

echo "== An AGS4 file"
curl --silent --show-error --fail-with-body --data-binary "@$here/ternmarsh.ags" --header 'Content-Type: text/plain' --header 'Accept: text/plain' \
  "$service/v1/exchange/ags4" | grep '^"DATA","TP07","0.60","3","LB","S-71","","0.60","1","Brown'
