#!/bin/sh
# Builds the C library and installs library, header, pkg-config and CMake files below a prefix. The tree may be moved afterwards.
#
#     moistair-ffi/install.sh PREFIX
set -eu

[ $# -eq 1 ] || { echo "usage: $0 PREFIX" >&2; exit 2; }
mkdir -p "$1"
prefix=$(cd "$1" && pwd)
cd "$(dirname "$0")"
target=${CARGO_TARGET_DIR:-../target}/install
abi=$(sed -n 's/^#define MOISTAIR_ABI_VERSION //p' include/moistair.h)
soname=libmoistair.so.$abi

# Without the Rust library beside them they need no bitcode for others, less than half of the size.
cargo rustc --release -p moistair-ffi --lib --crate-type staticlib,cdylib --target-dir "$target" -- \
    -C strip=debuginfo -C link-arg="-Wl,-soname,$soname"
version=$(sed -n 's/^#define MOISTAIR_VERSION_\(MAJOR\|MINOR\|PATCH\) //p' include/moistair.h | paste -sd.)

mkdir -p "$prefix/include" "$prefix/share/doc/moistair" "$prefix/lib/pkgconfig" "$prefix/lib/cmake/moistair"
install -m 644 include/moistair.h "$prefix/include/"
install -m 644 "$target/release/libmoistair.a" "$prefix/lib/"
install -m 755 "$target/release/libmoistair.so" "$prefix/lib/$soname"
ln -sf "$soname" "$prefix/lib/libmoistair.so"
install -m 644 ../LICENSE-MIT ../LICENSE-APACHE "$prefix/share/doc/moistair/"
install -m 644 packaging/moistair-config.cmake "$prefix/lib/cmake/moistair/"
fill() { sed -e "s|@VERSION@|$version|" "$1"; }
fill packaging/moistair.pc.in > "$prefix/lib/pkgconfig/moistair.pc"
fill packaging/moistair-config-version.cmake.in > "$prefix/lib/cmake/moistair/moistair-config-version.cmake"
echo "moistair $version installed below $prefix"
