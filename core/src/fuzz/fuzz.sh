#!/bin/sh
# Runs one fuzz target for some seconds: fuzz.sh CLASSPATH CORE TARGET SECONDS. Memory is capped at 700 MB, an input at
# 20 seconds and 30000 bytes. New inputs and what breaks go to CORE/target/fuzz/TARGET.
set -e
classpath=$1
core=$2
target=$3
seconds=$4
work=$core/target/fuzz/$target
seeds=$core/src/test/resources/emberline
mkdir -p "$work/corpus" "$work/found"
cd "$work/found"
exec java -Xmx700m -Djava.awt.headless=true -Demberline.fuzz.target="$target" \
  -Djava.util.logging.config.file="$core/../.config/test-logging.properties" \
  -classpath "$classpath" com.code_intelligence.jazzer.Jazzer \
  --target_class=emberline.fuzz.CoverageFuzz \
  --instrumentation_includes='emberline.**:nom.tam.**:uk.ac.starlink.**:de.siegmar.**' \
  --custom_hook_includes='emberline.**:nom.tam.**:uk.ac.starlink.**' \
  --keep_going="${FUZZ_KEEP_GOING:-10}" \
  -max_total_time="$seconds" -timeout=20 -max_len=30000 -print_final_stats=1 \
  "$work/corpus" "$seeds/fuzz/$target" "$seeds/read/good" "$seeds/read/bad"
