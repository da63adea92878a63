#!/bin/sh
# Instructions per pipe of all passes, counted by valgrind: the same on every run, whatever else the machine does.
set -eu

if ! command -v valgrind >/dev/null; then
    echo "instructions per pipe: valgrind is not installed"
    exit 0
fi
bench=$(cargo bench -q -p dwv-core --bench passes --no-run --message-format=json |
    sed -n 's/.*"executable":"\([^"]*passes-[^"]*\)".*/\1/p' | tail -n 1)
count() {
    valgrind --tool=callgrind --callgrind-out-file=/dev/null "$bench" --houses "$1" 2>&1 |
        sed -n 's/.*Collected : \([0-9]*\).*/\1/p'
}
few=$(count 100)
many=$(count 1100)
echo "instructions per pipe, all passes with reasons: $(((many - few) / 1000 / 50))"
