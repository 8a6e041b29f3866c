#!/usr/bin/env python3
"""Expected values for the tests of src/signal/families, from arithmetic of 50 digits and more, with scipy.signal as a second witness.

    python3 make-filter-vectors.py [FILE]      writes filter-vectors.json beside this script, or FILE

Poles and zeros come from the definition of each family by routes that share nothing with the program: polynomials with exact
coefficients and their roots where the program uses quadrature, a power series or a table; Jacobi functions of complex argument where
the program uses real ones.  Magnitudes come from the definition of |H|^2, not from the poles; delays come from the poles.
scipy.signal designs the same filters where it has the family; the largest relative difference of its poles, zeros and magnitudes from
the stored ones is recorded in "scipy_difference".  It loses the elliptic filters beside a brick wall, which are listed apart.
Needs numpy, scipy and mpmath (made with Debian's python3-numpy, python3-scipy and python3-mpmath; versions are in the file).
"""
import json
import math
import os
import sys
from fractions import Fraction

import mpmath as mp
import numpy as np
import scipy
from scipy import signal

mp.mp.dps = 50
ORDERS = range(1, 21)
ATTENUATIONS = ["20", "40", "70", "120"]
ELLIPTIC = [("0.01", "40"), ("0.1", "40"), ("0.1", "60"), ("0.5", "80"), ("1", "60"), ("3", "20"), ("3", "100"), ("6", "50")]
# Stop edges from 1 + 4e-9 down to 1 + 2e-11, where double precision has nothing left of the edges' distance unless it is kept apart.
TIGHT = [(12, "3", "20"), (16, "3", "20"), (20, "3", "20"), (20, "1", "40"), (18, "0.5", "30"), (20, "3", "6")]
# Relative to the corner: 1e-2 to 1e2, with the edge and its neighbourhood among them.
GRID = ["0.01", "0.2", "0.6", "0.9", "0.97", "1", "1.01", "1.1", "1.5", "2", "5", "100"]
TIGHT_GRID = ["0.01", "0.2", "0.6", "0.9", "0.99", "1.01", "1.1", "1.5", "2", "5", "100"]


def number(x):
    """The nearest double: what a test in double precision can be held to."""
    return float(mp.mpf(x))


def ratio(db):
    """epsilon of a ripple or of an attenuation: sqrt(10^(dB/10) - 1)."""
    return mp.sqrt(mp.mpf(10) ** (mp.mpf(db) / 10) - 1)


def chebyshev_polynomial(n, x):
    before, now = mp.mpf(1), x
    for _ in range(n - 1):
        before, now = now, 2 * x * now - before
    return now


def bisect(fun, low, high):
    """Where a function that is below 0 at `low` and above at `high` crosses it."""
    for _ in range(200):
        middle = (low + high) / 2
        if fun(middle) < 0:
            low = middle
        else:
            high = middle
    return (low + high) / 2


# ------------------------------------------------------------------ families
class Design:
    """Poles and zeros in rad/s, and |H|^2 from the family's own definition."""

    def __init__(self, poles, zeros, power, **more):
        self.poles, self.zeros, self.power, self.more = poles, zeros, power, more


def inverse_chebyshev(n, attenuation):
    """Stop edge at 1."""
    e = ratio(attenuation)
    a = mp.asinh(e) / n
    angles = [mp.pi * (2 * i + 1) / (2 * n) for i in range(n)]
    poles = [1 / mp.mpc(-mp.sinh(a) * mp.sin(t), mp.cosh(a) * mp.cos(t)) for t in angles]
    zeros = [mp.mpc(0, 1 / mp.cos(t)) for i, t in enumerate(angles) if 2 * i + 1 != n]

    def power(w):
        t = chebyshev_polynomial(n, 1 / w)
        return t * t / (t * t + e * e)

    return Design(poles, zeros, power, order=n, attenuation=float(attenuation), halfPower=number(1 / mp.cosh(mp.acosh(e) / n)))


def elliptic(n, ripple, attenuation):
    """Pass edge at 1."""
    e, es = ratio(ripple), ratio(attenuation)
    k1 = e / es
    q = mp.exp(-mp.pi * mp.ellipk(1 - k1**2) / mp.ellipk(k1**2) / n)
    # The complementary modulus from the complementary nome keeps its digits beside a brick wall.
    kc = mp.kfrom(q=mp.exp(mp.pi**2 / mp.log(q)))
    k = mp.kfrom(q=q)
    m = k**2
    quarter, quarter1 = mp.ellipk(m), mp.ellipk(k1**2)
    v0 = mp.ellipf(mp.atan(1 / e), 1 - k1**2) / (n * quarter1)
    inner = [mp.ellipfun("cd", mp.mpf(2 * i - 1) / n * quarter, m=m).real for i in range(1, n // 2 + 1)]
    zeros = [mp.mpc(0, sign / (k * x)) for x in inner for sign in (1, -1)]
    poles = []
    for i in range(1, n // 2 + 1):
        p = mp.mpc(0, 1) * mp.ellipfun("cd", mp.mpc(mp.mpf(2 * i - 1) / n, -v0) * quarter, m=m)
        p = mp.mpc(-abs(p.real), p.imag)
        poles += [p, mp.conj(p)]
    if n % 2:
        p = mp.mpc(0, 1) * mp.ellipfun("sn", mp.mpc(0, v0) * quarter, m=m)
        poles.append(mp.mpc(-abs(p.real), 0))

    def rational(w):
        """The Chebyshev rational function: 1 at 1, nulls at `inner`, poles at their mirror images."""
        value = w if n % 2 else mp.mpf(1)
        for x in inner:
            value *= (w * w - x * x) / (1 - (k * x * w) ** 2) * (1 - (k * x) ** 2) / (1 - x * x)
        return value

    def power(w):
        return 1 / (1 + (e * rational(w)) ** 2)

    more = {"order": n, "ripple": float(ripple), "attenuation": float(attenuation), "stopEdge": number(1 / k)}
    more["stopEdgeLessOne"] = number(kc**2 / (k * (1 + k)))
    if e * rational(mp.mpf(1)) < 1 and es > 1:
        more["halfPower"] = number(bisect(lambda w: (e * rational(w)) ** 2 - 1, mp.mpf(1), 1 / k))
    elif es > 1:
        more["halfPower"] = number(bisect(lambda w: (e * rational(w)) ** 2 - 1, max(inner, default=mp.mpf(0)), mp.mpf(1)))
    return Design(poles, zeros, power, **more)


def bessel_coefficients(n):
    """The reverse Bessel polynomial, highest power first: whole numbers."""
    factorial = math.factorial
    return [factorial(n + k) // (2**k * factorial(k) * factorial(n - k)) for k in range(n + 1)]


def bessel(n):
    """Half power at 1."""
    c = bessel_coefficients(n)
    with mp.workdps(90):
        raw = mp.polyroots(c, maxsteps=500, extraprec=400)
        power = lambda w: (mp.mpf(c[-1]) / abs(mp.polyval(c, mp.mpc(0, w)))) ** 2
        scale = bisect(lambda w: mp.mpf(1) / 2 - power(w), mp.mpf(0), mp.mpf(10 * n))
    return Design([p / scale for p in raw], [], lambda w: power(w * scale), order=n, unitDelayHalfPower=number(scale))


def poles_from_square(coefficients):
    """Left-half poles of 1 / sum(c_i y^i), y = w^2 = -s^2, from exact coefficients, lowest power first."""
    with mp.workdps(120):
        ys = mp.polyroots(coefficients[::-1], maxsteps=2000, extraprec=800)
        return [s if s.real < 0 else -s for s in (mp.sqrt(-y) for y in ys)]


def added(a, b):
    a, b = (x + [Fraction(0)] * (max(len(a), len(b)) - len(x)) for x in (a, b))
    return [u + v for u, v in zip(a, b)]


def multiplied(a, b):
    out = [Fraction(0)] * (len(a) + len(b) - 1)
    for i, u in enumerate(a):
        for j, v in enumerate(b):
            out[i + j] += u * v
    return out


def optimum_polynomial(n):
    """Papoulis (odd) and Fukada (even) L_n as exact coefficients of powers of w^2, lowest first."""
    legendre = [[Fraction(1)], [Fraction(0), Fraction(1)]]
    for m in range(1, n + 2):
        next_one = multiplied([Fraction(0), Fraction(2 * m + 1, m + 1)], legendre[m])
        legendre.append(added(next_one, [-Fraction(m, m + 1) * c for c in legendre[m - 1]]))
    k = (n - 1) // 2
    v = [Fraction(0)]
    for i in range(k + 1):
        if n % 2 or (i - k) % 2 == 0:
            v = added(v, [(2 * i + 1) * c for c in legendre[i]])
    integrand = multiplied(v, v)
    if n % 2 == 0:
        integrand = multiplied(integrand, [Fraction(1), Fraction(1)])
    integral = [Fraction(0)] + [c / (i + 1) for i, c in enumerate(integrand)]
    out, power = [Fraction(0)], [Fraction(1)]
    for c in integral:
        out = added(out, [c * u for u in power])
        power = multiplied(power, [Fraction(-1), Fraction(2)])
    out[0] = Fraction(0)
    return [c / sum(out) for c in out]


def all_pole(coefficients, **more):
    exact = [mp.mpf(c.numerator) / c.denominator if isinstance(c, Fraction) else c for c in coefficients]
    power = lambda w: 1 / mp.polyval(exact[::-1], w * w)
    return Design(poles_from_square(exact), [], power, **more)


def legendre(n):
    return all_pole([Fraction(1)] + optimum_polynomial(n)[1:], order=n)


def gaussian(n):
    """Half power at 1."""
    with mp.workdps(120):
        series = [1 / mp.factorial(i) for i in range(n + 1)]
        scale = bisect(lambda y: mp.polyval(series[::-1], y) - 2, mp.mpf(0), mp.mpf(3))
        return all_pole([c * scale**i for i, c in enumerate(series)], order=n)


# ------------------------------------------------------------------ kinds
def split(h, w0):
    """Both roots of s^2 - 2 h s + w0^2."""
    r = mp.sqrt(h * h - w0 * w0)
    return [h + r, h - r]


def transformed(design, kind, low, high):
    """Poles, zeros and |H|^2 of a high-pass (low = high), band-pass or band-stop."""
    missing = len(design.poles) - len(design.zeros)
    with mp.workdps(80):
        low, high = mp.mpf(low), mp.mpf(high)
        f0, width = mp.sqrt(low * high), high - low
        if kind == "highpass":
            poles, zeros = ([low / q for q in roots] for roots in (design.poles, design.zeros))
            zeros, u = zeros + [mp.mpc(0)] * missing, lambda f: low / f
        elif kind == "bandpass":
            poles, zeros = (sum((split(q * width / 2, f0) for q in roots), []) for roots in (design.poles, design.zeros))
            zeros, u = zeros + [mp.mpc(0)] * missing, lambda f: abs((f * f - f0 * f0) / (f * width))
        else:
            poles, zeros = (sum((split(width / (2 * q), f0) for q in roots), []) for roots in (design.poles, design.zeros))
            zeros, u = zeros + [mp.mpc(0, f0), mp.mpc(0, -f0)] * missing, lambda f: abs(f * width / (f * f - f0 * f0))
    return Design(poles, zeros, lambda f: design.power(u(f)), **design.more)


TRANSFORMS = [
    ("highpass", "butterworth", [3], "1000", "1000"),
    ("highpass", "chebyshev", [5, "0.5"], "2500", "2500"),
    ("highpass", "inverse-chebyshev", [6, "40"], "2500", "2500"),
    ("highpass", "elliptic", [6, "0.1", "60"], "40e3", "40e3"),
    ("highpass", "elliptic", [20, "1", "60"], "40e3", "40e3"),
    ("highpass", "bessel", [4], "10", "10"),
    ("highpass", "gaussian", [20], "10", "10"),
    ("bandpass", "butterworth", [1], "975", "1025"),
    ("bandpass", "butterworth", [2], "65e6", "75e6"),
    ("bandpass", "butterworth", [20], "4.2e6", "4.5e6"),
    ("bandpass", "butterworth", [3], "1", "1e4"),
    ("bandpass", "butterworth", [1], "10", "1000"),
    ("bandpass", "chebyshev", [4, "0.1"], "445e3", "465e3"),
    ("bandpass", "chebyshev", [20, "1"], "999e3", "1001e3"),
    ("bandpass", "inverse-chebyshev", [3, "40"], "0.6e6", "1.6e6"),
    ("bandpass", "elliptic", [5, "0.1", "60"], "10.6e6", "10.8e6"),
    ("bandpass", "elliptic", [10, "0.1", "80"], "99.999e6", "100.001e6"),
    ("bandpass", "bessel", [7], "99e3", "101e3"),
    ("bandpass", "legendre", [8], "300", "3400"),
    ("bandstop", "butterworth", [1], "49", "51"),
    ("bandstop", "butterworth", [2], "48", "53"),
    ("bandstop", "chebyshev", [3, "1"], "8e4", "12e4"),
    ("bandstop", "elliptic", [4, "0.5", "50"], "2.3e9", "2.5e9"),
    ("bandstop", "elliptic", [20, "0.5", "50"], "2.3e9", "2.5e9"),
    ("bandstop", "inverse-chebyshev", [7, "60"], "999e3", "1001e3"),
    ("bandstop", "legendre", [5], "1e3", "1e6"),
]


def butterworth(n):
    poles = [mp.expjpi(mp.mpf(2 * i + n + 1) / (2 * n)) for i in range(n)]
    return Design(poles, [], lambda w: 1 / (1 + w ** (2 * n)), order=n)


def chebyshev(n, ripple):
    e = ratio(ripple)
    a = mp.asinh(1 / e) / n
    angles = [mp.pi * (2 * i + 1) / (2 * n) for i in range(n)]
    poles = [mp.mpc(-mp.sinh(a) * mp.sin(t), mp.cosh(a) * mp.cos(t)) for t in angles]
    return Design(poles, [], lambda w: 1 / (1 + (e * chebyshev_polynomial(n, w)) ** 2), order=n, ripple=float(ripple))


MAKERS = {
    "butterworth": butterworth,
    "chebyshev": chebyshev,
    "inverse-chebyshev": inverse_chebyshev,
    "elliptic": elliptic,
    "bessel": bessel,
    "legendre": legendre,
    "gaussian": gaussian,
}


def edges_of_interest(kind, low, high):
    """Frequencies around the edges and across the band, as doubles."""
    low, high = float(low), float(high)
    f0, width = math.sqrt(low * high), high - low
    if kind == "highpass":
        return [low * u for u in (0.01, 0.2, 0.5, 0.9, 0.99, 1, 1.03, 1.5, 4, 100)]
    near = [f0 * (math.sqrt(1 + (width * u / (2 * f0)) ** 2) + width * u / (2 * f0)) for u in (-3, -1.2, -0.9, -0.3, 0.1, 0.7, 1.1, 2.5)]
    return [f0 / 50, low, *near, high, f0 * 50]


# ------------------------------------------------------------------ records
def delay(design, w):
    """-d(phase)/dw; zeros on the imaginary axis add only jumps."""
    return sum((1 / (mp.mpc(0, w) - p)).real for p in design.poles)


def clean(roots):
    tidy = []
    for root in roots:
        size = abs(root) * mp.mpf(10) ** -38
        tidy.append([0.0 if abs(root.real) <= size else number(root.real), 0.0 if abs(root.imag) <= size else number(root.imag)])
    return sorted((r for r in tidy if r[1] >= 0), key=lambda r: (-r[1], r[0]))


def record(design, points, two_pi=1, **more):
    ws = [mp.mpf(w) for w in points]
    return {
        **more,
        **design.more,
        "poles": clean(design.poles),
        "zeros": clean(design.zeros),
        "gain": [number(mp.sqrt(abs(design.power(w)))) for w in ws],
        "delay": [number(delay(design, w) / two_pi) for w in ws],
    }


def transforms():
    out = []
    for kind, family, arguments, low, high in TRANSFORMS:
        design = transformed(MAKERS[family](*arguments), kind, low, high)
        grid = edges_of_interest(kind, low, high)
        more = {"kind": kind, "family": family, "low": float(low), "high": float(high), "grid": grid}
        out.append(record(design, grid, 2 * mp.pi, **more))
    return out


def noise_bandwidths():
    """int |H|^2 dw from 0 to infinity by residues at 100 digits, in units of the half-power frequency where there is one."""
    out = []
    cases = [("butterworth", [n]) for n in (1, 2, 5, 20)] + [("bessel", [n]) for n in (2, 3, 10, 20)]
    cases += [("legendre", [n]) for n in (3, 8, 20)] + [("gaussian", [n]) for n in (4, 10, 20)]
    cases += [("chebyshev", [n, "0.5"]) for n in (2, 5, 20)]
    cases += [("inverse-chebyshev", [n, "40"]) for n in (3, 7, 19)] + [("elliptic", [n, "0.1", "40"]) for n in (1, 3, 5)]
    for family, arguments in cases:
        with mp.workdps(100):
            design = MAKERS[family](*arguments)
        # 50-digit roots have residues that are good to 30 digits or more.
        total = mp.mpc(0)
        scale = 1
        for a in design.zeros:
            scale *= -a
        for b in design.poles:
            scale /= -b
        gain = mp.sqrt(design.power(mp.mpf(10) ** -60)) / scale.real
        with mp.workdps(100):
            for i, p in enumerate(design.poles):
                residue, mirrored = gain, gain
                for a in design.zeros:
                    residue, mirrored = residue * (p - a), mirrored * (-p - a)
                for j, b in enumerate(design.poles):
                    residue, mirrored = (residue if i == j else residue / (p - b)), mirrored / (-p - b)
                total += residue * mirrored
            value = (mp.pi * total).real
        out.append({"family": family, **design.more, "bandwidth": number(value)})
    return out


def scipy_difference(records, design):
    """Largest relative difference of scipy's poles, zeros and magnitudes from the stored ones."""
    worst = {"roots": 0.0, "gain": 0.0}
    ws = np.array([float(w) for w in GRID])
    for entry in records:
        z, p, k = design(entry)
        for kept, got in ((entry["poles"], p), (entry["zeros"], z)):
            for re, im in kept:
                off = float(np.min(np.abs(got - complex(re, im))) / abs(complex(re, im)))
                worst["roots"] = max(worst["roots"], off)
        got = np.abs(signal.freqs_zpk(z, p, k, ws)[1])
        # Beside a zero every relative difference is large; the attenuation is what is compared there.
        floor = 10 ** (-entry.get("attenuation", 400) / 20)
        worst["gain"] = max(worst["gain"], float(np.max(np.abs(got - entry["gain"]) / np.maximum(entry["gain"], floor))))
    return worst


def main():
    here = os.path.dirname(os.path.abspath(__file__))
    path = sys.argv[1] if len(sys.argv) > 1 else os.path.join(here, "filter-vectors.json")
    inverse = [record(inverse_chebyshev(n, a), GRID) for a in ATTENUATIONS for n in ORDERS]
    ellip = [record(elliptic(n, r, a), GRID) for r, a in ELLIPTIC for n in ORDERS]
    with mp.workdps(90):
        designs = [elliptic(n, r, a) for n, r, a in TIGHT]
        tight = [record(design, TIGHT_GRID) for design in designs]
    bess = [record(bessel(n), GRID) for n in ORDERS]
    document = {
        "how": "mpmath, 50 digits and more; see make-filter-vectors.py",
        "versions": {"python": sys.version.split()[0], "mpmath": mp.__version__, "numpy": np.__version__, "scipy": scipy.__version__},
        "scipy_difference": {
            "inverseChebyshev": scipy_difference(inverse, lambda e: signal.cheb2ap(e["order"], e["attenuation"])),
            "elliptic": scipy_difference(
                [e for e in ellip if e["stopEdgeLessOne"] > 1e-4], lambda e: signal.ellipap(e["order"], e["ripple"], e["attenuation"])
            ),
            "bessel": scipy_difference(bess, lambda e: signal.besselap(e["order"], norm="mag")),
        },
        "grid": [float(w) for w in GRID],
        "tightGrid": [float(w) for w in TIGHT_GRID],
        "inverseChebyshev": inverse,
        "elliptic": ellip,
        "tight": tight,
        "bessel": bess,
        "legendre": [record(legendre(n), GRID) for n in ORDERS],
        "gaussian": [record(gaussian(n), GRID) for n in ORDERS],
        "transforms": transforms(),
        "noiseBandwidths": noise_bandwidths(),
    }
    with open(path, "w") as file:
        json.dump(document, file, separators=(",", ":"))
        file.write("\n")


if __name__ == "__main__":
    main()
