#!/bin/sh
# Makes FOLDER/emberline.jsa, an archive of loaded classes (class-data sharing) for FOLDER/emberline.jar, and
# FOLDER/emberline.jsa.bytes, its size, by which the launcher knows one that was cut off. It serves this Java and this jar where
# it stands, and is left aside by Java after either changed. Without it the program starts later and does the same.
# make-archive.sh JAVA_HOME FOLDER SURVEY
java=$1/bin/java
target=$2
survey=$3
archive=$target/emberline.jsa
scripts=$(dirname "$0")

rm -f "$archive" "$archive.bytes"
work=$(mktemp -d "$target/archive-XXXXXX") || exit 1
trap 'rm -rf "$work"' EXIT

give_up() {
  echo "make-archive: $1; the program starts without an archive of classes."
  exit 0
}
sh "$scripts/class-list.sh" "$work" "$survey" "$java" -jar "$target/emberline.jar" || give_up "$java lists no loaded classes"
"$java" -Xshare:dump -XX:+UseSerialGC -XX:SharedClassListFile="$work/classes.list" \
  -XX:SharedArchiveFile="$work/emberline.jsa" -cp "$target/emberline.jar" >"$work/archive.out" 2>&1 ||
  give_up "$java makes no archive of classes"
echo "$(($(wc -c <"$work/emberline.jsa")))" >"$work/bytes"
mv "$work/bytes" "$archive.bytes" && mv "$work/emberline.jsa" "$archive"
