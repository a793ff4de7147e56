# shellcheck shell=bash disable=SC2034
# Sourced by scripts that run a main class from src/test/java: build_test_classes compiles, and sets test_classes to
# the class path. What Maven needs is taken from this machine if it is all here, otherwise fetched.
build_test_classes() {
  local goals=(test-compile dependency:build-classpath -Dmdep.outputFile=target/test.classpath -Dmdep.includeScope=test)
  mvn -B -q -o "${goals[@]}" >target/test-build.log 2>&1 </dev/null ||
    mvn -B -q "${goals[@]}" >target/test-build.log 2>&1 </dev/null || {
    tail -n 40 target/test-build.log >&2
    echo "the tests could not be compiled; all of it is in target/test-build.log" >&2
    return 1
  }
  test_classes=target/test-classes:target/classes:$(<target/test.classpath)
}
