#!/bin/sh
# No export of the C library can reach a panic: shown by the linker.
#
#     tests/embedded/panic_free.sh
#
# Builds the library without the standard library, its panic handler calling a symbol that nobody defines, and links every
# export while whatever no export reaches is dropped. A panic that can be reached leaves that symbol undefined. The same check is
# then run on a library with a planted panic, and has to fail.
set -eu

cd "$(dirname "$0")/../.."
target=${CARGO_TARGET_DIR:-target}/panic-free
work=$(mktemp -d)
trap 'rm -rf "$work"' EXIT

MARKER=moistair_proof_a_panic_is_reachable
# What a compiler may call without being asked to, on every target.
ALLOWED='^(memcpy|memmove|memset|memcmp|bcmp)$'

build() {
    cargo rustc -q -p moistair-ffi --lib --crate-type staticlib --profile embedded \
        --no-default-features --features "$1" --target-dir "$target"
    cp "$target/embedded/libmoistair.a" "$work/$2.a"
}

exports() {
    nm -g --defined-only "$1" 2>/dev/null | awk '$2 == "T" && $3 ~ /^moistair_/ { print $3 }' | sort -u
}

# Undefined symbols that the exports of a library reach.
undefined() {
    printf '{ global: moistair_*; local: *; };\n' > "$work/exports.map"
    cc -shared -nostdlib -Wl,--gc-sections -Wl,--version-script="$work/exports.map" \
        $(exports "$1" | sed 's/^/-Wl,-u,/') "$1" -o "$work/all.so"
    nm -u "$work/all.so" | awk '{ print $NF }'
}

# Why: the functions that call the panics that are left.
callers() {
    objdump -d --no-show-raw-insn "$1" | c++filt |
        awk '/^[0-9a-f]+ <.*>:$/ { $1 = ""; name = $0 }
             /(call|jmp|bl|b) .*<core\[?[0-9a-f]*\]?::(panicking|option|result|slice|str)/ { sub(/.*</, "<"); print name, "->", $0 }' |
        sort | uniq -c | sort -rn | head -40
}

build panic-proof,helmholtz plain
count=$(exports "$work/plain.a" | wc -l)
[ "$count" -gt 10 ] || { echo "only $count exports found" >&2; exit 1; }
found=$(undefined "$work/plain.a" | grep -Ev "$ALLOWED" || true)
if [ -n "$found" ]; then
    echo "FAIL: the exports reach: $found" >&2
    callers "$work/all.so" >&2
    exit 1
fi
size=$(wc -c < "$work/all.so")

build panic-proof,helmholtz,planted-panic planted
undefined "$work/planted.a" | grep -qx "$MARKER" || { echo "FAIL: a planted panic was not found" >&2; exit 1; }

echo "ok: $count exports, none reaches a panic ($size bytes linked); a planted panic is found"
