#!/bin/sh
# The installed library as others find it: by pkg-config and by CMake, static and shared, after the tree has moved.
#
#     moistair-ffi/tests/install.sh
set -eu

cd "$(dirname "$0")/.."
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT
prefix="$work/moved"
./install.sh "$work/prefix" >/dev/null
mv "$work/prefix" "$prefix"

abi=$(sed -n 's/^#define MOISTAIR_ABI_VERSION //p' include/moistair.h)
export PKG_CONFIG_PATH="$prefix/lib/pkgconfig" LD_LIBRARY_PATH="$prefix/lib"
strict="-std=c99 -Wall -Wextra -Werror -pedantic"
cc $strict examples/states.c $(pkg-config --cflags --libs moistair) -o "$work/shared"
cc $strict examples/states.c $(pkg-config --cflags moistair) "$prefix/lib/libmoistair.a" -o "$work/static" -lm -lpthread -ldl
readelf -d "$work/shared" | grep -q "NEEDED.*\[libmoistair.so.$abi\]" || { echo "FAIL: no version in the name" >&2; exit 1; }

cat > "$work/CMakeLists.txt" <<END
cmake_minimum_required(VERSION 3.10)
project(user C)
find_package(moistair $(pkg-config --modversion moistair) CONFIG REQUIRED)
foreach(kind moistair static)
  add_executable(cmake_\${kind} "$PWD/examples/states.c")
  target_link_libraries(cmake_\${kind} moistair::\${kind})
endforeach()
END
cmake -S "$work" -B "$work/build" -DCMAKE_PREFIX_PATH="$prefix" >/dev/null
cmake --build "$work/build" >/dev/null

"$work/static" > "$work/expected"
grep -q "wet bulb" "$work/expected" || { echo "FAIL: the example prints no wet bulb" >&2; exit 1; }
for program in "$work/shared" "$work/build/cmake_moistair" "$work/build/cmake_static"; do
    "$program" | cmp - "$work/expected"
done
echo "ok: pkg-config and CMake find the installed library; $(wc -c < "$prefix/lib/libmoistair.a") bytes static," \
    "$(wc -c < "$prefix/lib/libmoistair.so.$abi") shared"
