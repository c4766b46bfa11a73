#!/bin/sh
# From histories to models on the (invented) Saltmere rates: the historical model with honest uncertainty, the market price
# of risk from today's curve, the same from a panel of yields, and where the short rate may go. Works from any folder.
set -eu
cd "$(dirname "$0")/.."

jar=target/ebbline.jar
if [ ! -f "$jar" ] || [ -n "$(find pom.xml src/main -newer "$jar" -type f | head -n 1)" ]; then
  echo "building $jar (mvn package, once) ..." >&2
  mvn -B -q -DskipTests package >&2
fi
ebbline() { java -XX:+UseSerialGC -jar "$jar" "$@"; }

models=$(mktemp -d)
trap 'rm -rf "$models"' EXIT

echo "== One rate: 25 years of months, by least squares"
ebbline estimate --history examples/saltmere-rates.csv --window 120 --window-step 60 --save "$models/historical.json"

echo
echo "== The market price of risk from today's curve, and the risk-neutral model"
ebbline estimate --history examples/saltmere-rates.csv --method stationary --curve curves/saltmere.csv \
  --save "$models/risk-neutral.json"

echo
echo "== A panel of yields: both measures at once"
ebbline estimate --history examples/saltmere-panel.csv --method panel --filtered "$models/short-rate.csv"

echo
echo "== Where the short rate may go, historical measure"
ebbline simulate --model "$models/historical.json" --horizons 1Y,5Y,10Y --paths 20000

echo
echo "== A bond under the estimated risk-neutral model"
ebbline price --model "$models/risk-neutral.json" --row 'coupon=4% maturity=10Y'
