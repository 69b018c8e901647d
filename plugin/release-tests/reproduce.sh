#!/usr/bin/env bash
# Builds the committed state twice, in two fresh folders, and compares what is shipped byte by byte. Tests are left out; about as long as two such builds.
# Options are handed to Maven.
set -euo pipefail
root=$(cd "$(dirname "$0")/../.." && pwd)
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
commit=$(git -C "$root" rev-parse HEAD)

for build in one two; do
    git clone -q "$root" "$work/$build"
    git -C "$work/$build" checkout -q "$commit"
    (cd "$work/$build" && mvn -B -q -DskipTests -DskipITs -DforceContextQualifier="c${commit:0:12}" "$@" -pl plugin/release-tests -am verify)
    (cd "$work/$build" && find plugin -path '*/target/*.jar' -not -path '*/classes/*' -not -path '*/test-classes/*' -print0 | sort -z | xargs -0 sha256sum
     cd update-site/target && find repository -type f -print0 | sort -z | xargs -0 sha256sum && sha256sum ./*.zip) > "$work/$build.sums"
done

if ! diff "$work/one.sums" "$work/two.sums"; then
    echo "the two builds of $commit differ in the files above" >&2
    exit 1
fi
echo "$(wc -l < "$work/one.sums") files of $commit are the same in both builds"
grep -E 'modestead(-spark)?\.jar|\.zip' "$work/one.sums"
