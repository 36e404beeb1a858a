#!/bin/sh
# Makes TARGET/image from a Java home and what the build put into TARGET: a folder that may be moved and needs no Java. The
# classes that placing objects of SURVEY loads are archived in it. make-image.sh JAVA_HOME TARGET SURVEY
# All jars become one module of the runtime; with the classes in the runtime's own file, the archive of loaded classes
# (class-data sharing) stays valid wherever the folder goes, and a single spectrum is placed sooner.
set -e
java_home=$1
target=$2
survey=$3
if [ ! -x "$java_home/bin/jlink" ] || [ ! -d "$java_home/jmods" ]; then
  echo "make-image: $java_home: no jlink or no jmods there; expected a full JDK. Install one with jmods." >&2
  exit 1
fi
feature=$("$java_home/bin/java" -XshowSettings:properties -version 2>&1 | sed -n 's/^ *java.specification.version = //p')
image=$target/image
work=$target/image-work
rm -rf "$image" "$work"
mkdir -p "$image" "$work/classes"
: >"$work/uses"
: >"$work/provided"

# One tree of classes and resources; of classes for several versions of Java that of this one.
for jar in "$target"/lib/*.jar "$target/emberline.jar"; do
  one=$work/one
  rm -rf "$one"
  mkdir "$one"
  (cd "$one" && "$java_home/bin/jar" xf "$jar")
  version=9
  while [ "$version" -le "$feature" ]; do
    if [ -d "$one/META-INF/versions/$version" ]; then
      cp -R "$one/META-INF/versions/$version/." "$one/"
    fi
    version=$((version + 1))
  done
  if [ -f "$one/module-info.class" ]; then
    "$java_home/bin/jar" --describe-module --file "$jar" --release "$feature" |
      sed -n 's/^ *uses \([^ ]*\).*/\1/p' >>"$work/uses"
  fi
  for service in "$one"/META-INF/services/*; do
    if [ -f "$service" ]; then
      awk -v service="$(basename "$service")" '{ sub(/#.*/, "") } NF { print service, $1 }' "$service" >>"$work/provided"
      basename "$service" >>"$work/uses"
    fi
  done
  rm -rf "$one/META-INF" "$one/module-info.class"
  cp -R "$one/." "$work/classes/"
done

# What jdeps sees, and what is reached by name only: logging, character sets of foreign files, zip file systems.
modules=$("$java_home/bin/jdeps" --print-module-deps --ignore-missing-deps "$work/classes" | tr ',' ' ')
{
  echo "open module emberline {"
  for module in $modules java.logging java.management java.xml jdk.unsupported; do
    echo "  requires $module;"
  done | sort -u | grep -v ' java.base;'
  sort -u "$work/uses" | sed -e '/^java\./d' -e 's/.*/  uses &;/'
  awk '{ with[$1] = with[$1] (with[$1] ? ", " : "") $2 }
       END { for (service in with) print "  provides " service " with " with[service] ";" }' "$work/provided" | sort
  echo "}"
} >"$work/module-info.java"
"$java_home/bin/javac" -nowarn -d "$work/classes" "$work/module-info.java"
"$java_home/bin/jlink" --module-path "$java_home/jmods:$work/classes" --add-modules emberline,jdk.charsets,jdk.zipfs \
  --no-header-files --no-man-pages --compress=2 --output "$image/runtime"

cp "$target/emberline" "$image/"
chmod +x "$image/emberline"
cp -R "$target/lib/licences" "$target/lib/THIRD-PARTY.csv" "$image/"

sh "$(dirname "$0")/class-list.sh" "$work" "$survey" "$image/runtime/bin/java" -m emberline/emberline.cli.Emberline
"$image/runtime/bin/java" -Xshare:dump -XX:SharedClassListFile="$work/classes.list" \
  -m emberline/emberline.cli.Emberline >"$work/archive.out" 2>&1

mkdir -p "$image/share/man/man1" "$image/share/bash-completion/completions"
"$image/emberline" manual --out "$image/share/man/man1" >/dev/null
"$image/emberline" completion >"$image/share/bash-completion/completions/emberline"
rm -rf "$work"
