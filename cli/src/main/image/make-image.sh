#!/bin/sh
# Makes TARGET/image from a Java home and what the build put into TARGET. The modules are those that the jars use.
set -e
java_home=$1
target=$2
if [ ! -x "$java_home/bin/jlink" ] || [ ! -d "$java_home/jmods" ]; then
  echo "make-image: $java_home: no jlink or no jmods there; expected a full JDK. Install one with jmods." >&2
  exit 1
fi
rm -rf "$target/image"
mkdir -p "$target/image"
"$java_home/bin/jlink" --module-path "$java_home/jmods" \
  --add-modules java.base,java.desktop,java.logging,java.management,java.naming,java.sql,java.xml,jdk.management,jdk.unsupported,jdk.charsets,jdk.zipfs \
  --strip-debug --no-header-files --no-man-pages --compress=2 --output "$target/image/runtime"
cp -R "$target/lib" "$target/image/lib"
cp "$target/emberline.jar" "$target/emberline" "$target/image/"
chmod +x "$target/image/emberline"
mkdir -p "$target/image/share/man/man1" "$target/image/share/bash-completion/completions"
"$target/image/emberline" manual --out "$target/image/share/man/man1" >/dev/null
"$target/image/emberline" completion >"$target/image/share/bash-completion/completions/emberline"
