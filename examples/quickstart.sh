#!/bin/sh
# Builds what is missing and runs the main job on the demo files: today's curve of the (invented) Saltmere Harbour Trust,
# read and built from quotes; the models estimated from history and fitted to curve and options; its books priced; and the
# published examples reproduced. Works from any folder.
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

echo "== The curve"
ebbline curve --curve curves/saltmere.csv

echo
echo "== A curve built from market quotes"
ebbline curve --quotes curves/saltmere-quotes.csv --save "$models/built.csv"

echo
echo "== A rate history: Vasicek under the historical measure"
ebbline estimate examples/saltmere-rates.csv --replications 499

echo
echo "== Vasicek fitted to it (the volatility is held: a curve alone hardly shows it)"
ebbline calibrate --model vasicek --curve curves/saltmere.csv --fix volatility=0.9% --save "$models/vasicek.json"

echo
echo "== Hull-White laid over it"
ebbline calibrate --model hull-white --mean-reversion 0.05 --volatility 0.9% --curve curves/saltmere.csv \
  --save "$models/hull-white.json"

echo
echo "== The book under Hull-White"
ebbline price --model "$models/hull-white.json" --book examples/book.csv

echo
echo "== Hull-White fitted to quotes of swaptions"
ebbline calibrate --model hull-white --curve curves/saltmere.csv --options examples/option-quotes.csv \
  --save "$models/fitted.json"

echo
echo "== Callable, putable and Bermudan rows under it"
ebbline price --model "$models/fitted.json" --book examples/callables.csv

echo
echo "== The same rows challenged: induction, tree and simulation against each other"
ebbline challenge --model "$models/fitted.json" --book examples/callables.csv --paths 4096

echo
echo "== The book under Vasicek"
ebbline price --model "$models/vasicek.json" --book examples/book.csv

echo
echo "== Bonds, bills, notes and swaps against their quotes, with three months of carry"
ebbline price --curve curves/saltmere.csv --book examples/bonds.csv --horizon 3M

echo
echo "== Published worked examples"
ebbline verify --summary
