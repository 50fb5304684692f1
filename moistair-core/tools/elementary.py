"""The coefficients and the reference values of the elementary functions in src/real/.

    python3 elementary.py coefficients > ../src/real/coefficients.rs
    python3 elementary.py reference    > ../src/real/elementary_reference.csv

Only Python's standard library; decimal arithmetic of fixed precision, so that every machine prints the same text.

Each function is a short known start plus a correction polynomial q. With nodes and weights of Chebyshev, least squares
in the relative error of the whole function comes within a factor of about two of the best polynomial. The coefficients
are rounded to the type one after the other, the remaining ones fitted anew each time, so that rounding costs nothing.
"""

import math
import random
import struct
import sys
from decimal import Decimal as D
from decimal import getcontext

getcontext().prec = 70
NODES = 120


def atan(x):
    """Arc tangent: the argument halved five times, then the power series."""
    for _ in range(5):
        x = x / (1 + (1 + x * x).sqrt())
    term, total, n = x, D(0), 1
    while abs(term) > abs(x) * D("1e-68"):
        total += term / n
        term, n = -term * x * x, n + 2
    return 32 * total


def atanh(x):
    return ((1 + x) / (1 - x)).ln() / 2


LN_2 = D(2).ln()
PI = 4 * atan(D(1))


def as_f64(x):
    """The nearest double. Conversion from a decimal string is correctly rounded."""
    return D(float(x))


def as_f32(x):
    """The nearest single; rounding twice is harmless for these values."""
    return D(struct.unpack("f", struct.pack("f", float(x)))[0])


def leading_bits(x, bits):
    """x cut after its first `bits` binary places."""
    return D(int(x * 2**bits)) / 2**bits


# ---------------------------------------------------------------- coefficients


def chebyshev_nodes(low, high):
    """cos((k + 1/2) pi / n) from the recurrence of the cosine, mapped to the interval."""
    n, step = NODES, PI / NODES
    half = cosine(step / 2)
    first, second = half, cosine(3 * step / 2)
    nodes = [first, second]
    while len(nodes) < n:
        nodes.append(2 * cosine(step) * nodes[-1] - nodes[-2])
    return [(low + high) / 2 + (high - low) / 2 * c for c in nodes]


def cosine(x):
    term, total, n = D(1), D(0), 0
    while abs(term) > D("1e-69"):
        total += term
        n += 2
        term = -term * x * x / (n * (n - 1))
    return total


def solve(matrix, right):
    """Gaussian elimination with pivoting."""
    rows = [row + [value] for row, value in zip(matrix, right)]
    n = len(rows)
    for i in range(n):
        pivot = max(range(i, n), key=lambda j: abs(rows[j][i]))
        rows[i], rows[pivot] = rows[pivot], rows[i]
        for j in range(i + 1, n):
            factor = rows[j][i] / rows[i][i]
            rows[j] = [a - factor * b for a, b in zip(rows[j], rows[i])]
    x = [D(0)] * n
    for i in reversed(range(n)):
        x[i] = (rows[i][n] - sum(rows[i][j] * x[j] for j in range(i + 1, n))) / rows[i][i]
    return x


def fit(target, weight, low, high, terms, rounded):
    """q with target ~ q(x), least squares of weight * (q - target); returns (q, largest weighted error)."""
    points = [(x, target(x), weight(x)) for x in chebyshev_nodes(low, high)]
    fixed = []
    while len(fixed) < terms:
        powers = range(len(fixed), terms)
        rest = [(x, y - sum(c * x**i for i, c in enumerate(fixed)), w * w) for x, y, w in points]
        matrix = [[sum(w * x ** (i + j) for x, _, w in rest) for j in powers] for i in powers]
        right = [sum(w * y * x**i for x, y, w in rest) for i in powers]
        fixed.append(rounded(solve(matrix, right)[0]))
    error = max(abs(w * (sum(c * x**i for i, c in enumerate(fixed)) - y)) for x, y, w in points)
    return fixed, error


def exp_correction(terms, rounded):
    """exp r = 1 + r + r^2 q(r) for |r| <= ln(2)/2."""
    edge = LN_2 / 2 * D("1.0001")
    return fit(lambda r: (r.exp() - 1 - r) / r**2, lambda r: r**2 / r.exp(), -edge, edge, terms, rounded)


def ln_correction(terms, rounded):
    """ln(1 + f) = 2 atanh s = 2 s + s z q(z), s = f / (2 + f), z = s^2, for 1/sqrt(2) <= 1 + f <= sqrt(2)."""
    edge = (D(2).sqrt() - 1) / (D(2).sqrt() + 1) * D("1.0001")

    def ratio(z):
        return 2 * atanh(z.sqrt()) / z.sqrt()

    return fit(lambda z: (ratio(z) - 2) / z, lambda z: z / ratio(z), D(0), edge**2, terms, rounded)


def atan_correction(terms, rounded):
    """atan t = t + t z q(z), z = t^2, for |t| <= 1/2."""

    def ratio(z):
        return atan(z.sqrt()) / z.sqrt()

    return fit(lambda z: (ratio(z) - 1) / z, lambda z: z / ratio(z), D(0), D("0.25"), terms, rounded)


def literal(x):
    text = repr(float(x))
    return text if "." in text or "e" in text else text + ".0"


def constant(doc, name, kind, value):
    print(f"    /// {doc}")
    print(f"    pub const {name}: {kind} = {value};")


def polynomial(doc, name, result):
    coefficients, error = result
    for half, start in (("EVEN", 0), ("ODD", 1)):
        chosen = [literal(c) for c in coefficients[start::2]]
        power = "even" if start == 0 else "odd"
        constant(f"{doc}, {power} powers; error of the fit {float(error):.1e}.", f"{name}_{half}",
                 f"[f64; {len(chosen)}]", "[" + ", ".join(chosen) + "]")


def module(name, kind, rounded, digits, exponents, exp_terms, ln_terms, atan_terms):
    """One module of constants; `digits` of the significand, `exponents` = binary digits of the largest exponent."""
    largest, smallest = 2 ** (exponents - 1), 2 - 2 ** (exponents - 1)
    high = leading_bits(LN_2, digits - exponents)
    print(f"\n/// For `{kind}`.\n#[rustfmt::skip]\npub mod {name} {{")
    constant("ln 2, so few digits that a product with an exponent is exact.", "LN_2_HIGH", kind, literal(high))
    constant("The rest of ln 2.", "LN_2_LOW", kind, literal(rounded(LN_2 - high)))
    constant("Largest argument whose exponential is finite.", "EXP_LARGEST", kind,
             literal(toward_zero(largest * LN_2, rounded, digits)))
    constant("Smallest argument whose exponential is a normal number.", "EXP_SMALLEST", kind,
             literal(toward_zero(smallest * LN_2, rounded, digits)))
    for text, number in (("half", PI / 2), ("quarter", PI / 4)):
        constant(f"What {text} a π is above its rounded value.", f"{text.upper()}_PI_LOW", kind,
                 literal(rounded(number - rounded(number))))
    polynomial("(eʳ − 1 − r)/r²", "EXP", exp_correction(exp_terms, rounded))
    polynomial("(2 artanh(s)/s − 2)/z by z = s²", "LN", ln_correction(ln_terms, rounded))
    polynomial("(atan(t)/t − 1)/z by z = t²", "ATAN", atan_correction(atan_terms, rounded))
    print("}")


def toward_zero(x, rounded, digits):
    """The nearest value not beyond x; x is between 64 and 1024 in size."""
    nearest, step = rounded(x), D(2) ** ((6 if abs(x) < 128 else 9) + 1 - digits)
    return nearest if abs(nearest) <= abs(x) else nearest - step.copy_sign(x)


def coefficients():
    print("//! Constants of the elementary functions. Printed by `tools/elementary.py coefficients`; do not edit.")
    print("\n#![allow(clippy::approx_constant, reason = \"ln 2 in two parts\")]")
    module("double", "f64", as_f64, 53, 11, 10, 7, 12)
    module("single", "f32", as_f32, 24, 8, 5, 3, 5)


# ---------------------------------------------------------------- reference values

# name of the function, name of the range, smallest and largest argument, logarithmic spacing, further arguments
RANGES = [
    ("exp", "reduced", -0.3466, 0.3466, False, ["0.0", "-0.0", "0x1p-1074", "0x1p-53", "-0x1p-54"]),
    ("exp", "used", -30.0, 30.0, False, ["1.0", "-1.0"]),
    ("exp", "all", -708.0, 709.0, False, ["0x1.62e42fefa39efp+9", "-0x1.6232bdd7abcd2p+9"]),
    ("ln", "near one", 0.7, 1.42, False, ["0x1.fffffffffffffp-1", "0x1.0000000000001p+0", "0x1.6a09e667f3bccp-1",
                                          "0x1.6a09e667f3bcdp-1", "0x1.6a09e667f3bcep-1", "0x1.6a09e667f3bcdp+0"]),
    ("ln", "used", 1e-3, 1e7, True, ["2.0", "10.0", "101325.0", "273.15"]),
    ("ln", "all", 1e-300, 1e300, True, ["0x1p-1022", "0x1.fffffffffffffp+1023"]),
    ("ln", "subnormal", 5e-324, 2e-308, False, ["0x1p-1074", "0x0.fffffffffffffp-1022"]),
    ("atan", "below a half", 0.0, 0.5, False, ["0.0", "-0.0", "0x1p-1074", "-0x1p-30", "0.5", "-0.3"]),
    ("atan", "half to two", 0.5, 2.0, False, ["0x1.0000000000001p-1", "1.0", "2.0", "-0.7", "-1.0"]),
    ("atan", "above two", 2.0, 1e300, True, ["0x1.0000000000001p+1", "3.0", "-10.0", "0x1.fffffffffffffp+1023"]),
]
# The arguments with the largest errors out of 2 430 000 random ones.
HARD = {
    ("exp", "reduced"): [
        "-0x1.5f7a43bf47353p-2", "-0x1.3ddc2c686abccp-2", "-0x1.564e2093f2312p-2", "-0x1.5a8f2282fcd4cp-2",
        "0x1.62e8c8dab5377p-2", "0x1.62ea912b4c661p-2", "0x1.62e435d6874d6p-2", "0x1.62e8298b88a68p-2",
        "-0x1.62e45727c7edfp-2", "-0x1.62e62865ec2d3p-2", "-0x1.61814aed79b77p-2", "-0x1.6174eae768a38p-2",
    ],
    ("exp", "used"): [
        "-0x1.1a052d06e45dap+4", "-0x1.51ee757064229p+4", "-0x1.1f9d6f5ee5f24p+2", "0x1.86059997a060cp+3",
    ],
    ("exp", "all"): [
        "-0x1.5b7049528e7dbp+9", "0x1.718a09d957c60p+7", "-0x1.f0f8242f80362p+7", "-0x1.6220c62613c04p+7",
    ],
    ("ln", "near one"): [
        "0x1.6924cb5da56d7p+0", "0x1.670c2878afad1p+0", "0x1.688d0e2d82bcbp-1", "0x1.699f92ac3d814p+0",
        "0x1.69a747b28f6ffp+0", "0x1.68cea06df7e8fp+0", "0x1.6750f45797201p+0", "0x1.68ef1c06a0d47p+0",
    ],
    ("ln", "used"): [
        "0x1.665daf1aa9e01p+0", "0x1.694dd888de58ap+0", "0x1.432e44c15e2fep-1", "0x1.47f0d738c61e2p+0",
    ],
    ("ln", "all"): [
        "0x1.53d9ab3d96927p+1", "0x1.42b0c6d2d2021p-1", "0x1.a5ff79a0cf48ep+0", "0x1.5354fbeef3ccbp+1",
    ],
    ("atan", "below a half"): [
        "0x1.ec1405157611ep-2", "0x1.e671ed61e43a7p-2", "0x1.f27046fd2f97dp-2", "0x1.df8b4aa01eb61p-2",
    ],
    ("atan", "half to two"): [
        "0x1.00a40cc99b22dp-1", "0x1.020920794c237p-1", "0x1.06f84682c7eb3p-1", "0x1.0a21fdad02501p-1",
        "0x1.049bb3156a40fp-1", "0x1.028449f50adcbp-1", "0x1.03e775d4c212fp-1", "0x1.052533c661fcfp-1",
    ],
    ("atan", "above two"): [
        "0x1.3f93987f38be1p+1", "0x1.74a755092a910p+1", "0x1.163f3c8fadb31p+1", "0x1.9982c2187fa67p+1",
        "0x1.2cb6e6ce340a2p+1", "0x1.86f22e99bcadep+1", "0x1.00980852d6cc0p+5", "0x1.847a19bbab81ap+1",
    ],
}
RANDOM_ARGUMENTS = 56


def random_arguments(seed, low, high, logarithmic):
    """The sequence of Random.random() for a seed is the same in all versions of Python 3."""
    generator = random.Random(seed)
    if not logarithmic:
        return [low + (high - low) * generator.random() for _ in range(RANDOM_ARGUMENTS)]
    fraction, first = math.frexp(low)
    first, last = first - (fraction == 0.5), math.frexp(high)[1] - 2
    return [math.ldexp(1.0 + generator.random(), first + int(generator.random() * (last - first + 1)))
            for _ in range(RANDOM_ARGUMENTS)]


def exact(function, x):
    x = D(x)
    if function == "atan":
        return atan(x)
    return x.exp() if function == "exp" else x.ln()


def bits(x):
    return struct.pack(">d", x).hex()


def reference():
    print("# Reference values of exp, ln and atan. Printed by tools/elementary.py reference, decimal arithmetic of 70 digits.")
    print("# Bits of doubles: the argument, the nearest value, and what remains of the value to be added.")
    print("function,range,argument,value,remainder")
    for function, name, low, high, logarithmic, further in RANGES:
        chosen = [float.fromhex(x) if "x" in x else float(x) for x in further + HARD.get((function, name), [])]
        for x in chosen + random_arguments(f"{function} {name}", low, high, logarithmic):
            value = exact(function, x)
            high_part = float(value)
            if high_part == 0:
                high_part = math.copysign(0.0, x)
            print(f"{function},{name},{bits(x)},{bits(high_part)},{bits(float(value - D(high_part)))}")


if __name__ == "__main__":
    {"coefficients": coefficients, "reference": reference}[sys.argv[1]]()
