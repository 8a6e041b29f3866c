#!/usr/bin/env python3
"""Expected values for the tests of src/signal, from 50-digit arithmetic, with scipy.signal as a second witness.

    python3 make-vectors.py [FILE]      writes signal-vectors.json beside this script, or FILE

Every stored value comes from mpmath at 50 digits by a route that shares nothing with the program: poles from the definition of each
family, magnitudes from the definition of |H|^2 (not from the poles), delays from the poles.  scipy.signal designs the same filters; the
largest relative difference of its poles and magnitudes from the stored ones is recorded in "scipy_difference".
Needs numpy, scipy and mpmath (made with Debian's python3-numpy, python3-scipy and python3-mpmath; versions are in the file).
"""
import json
import os
import sys

import mpmath as mp
import numpy as np
import scipy
from scipy import signal

mp.mp.dps = 50
ORDERS = range(1, 21)
RIPPLES = ["0.01", "0.1", "0.5", "1", "3", "6"]
# Relative to the corner: 1e-2 to 1e2, with the edge and its neighbourhood among them.
GRID = ["0.01", "0.05", "0.2", "0.4", "0.6", "0.8", "0.9", "0.97", "1", "1.01", "1.1", "1.5", "2", "5", "20", "100"]


def number(x):
    """The nearest double: what a test in double precision can be held to."""
    return float(mp.mpf(x))


def butterworth_poles(n):
    return [mp.expjpi(mp.mpf(2 * i + n + 1) / (2 * n)) for i in range(n)]


def chebyshev_poles(n, ripple):
    a = mp.asinh(1 / epsilon(ripple)) / n
    angles = [mp.pi * (2 * i + 1) / (2 * n) for i in range(n)]
    return [mp.mpc(-mp.sinh(a) * mp.sin(t), mp.cosh(a) * mp.cos(t)) for t in angles]


def epsilon(ripple):
    return mp.sqrt(mp.mpf(10) ** (mp.mpf(ripple) / 10) - 1)


def chebyshev_polynomial(n, x):
    """T_n by its recurrence: exact enough at 50 digits, and unlike cos(n arccos x) the same formula inside and outside."""
    before, now = mp.mpf(1), x
    for _ in range(n - 1):
        before, now = now, 2 * x * now - before
    return now


def half_power(n, ripple):
    """The last x with epsilon |T_n(x)| = 1, by bisection from above: |T_n| falls to 0 at the last zero cos(pi/2n)."""
    e = epsilon(ripple)
    low, high = mp.cos(mp.pi / (2 * n)), mp.mpf(1)
    while e * abs(chebyshev_polynomial(n, high)) < 1:
        high *= 2
    for _ in range(110):
        middle = (low + high) / 2
        if e * abs(chebyshev_polynomial(n, middle)) < 1:
            low = middle
        else:
            high = middle
    return high


def delay(poles, w):
    """-d(phase)/dw of 1/prod(s - p), seconds for w in rad/s."""
    return sum((1 / (mp.mpc(0, w) - p)).real for p in poles)


def phase(poles, w):
    """Unwrapped, 0 at w = 0 for conjugate poles."""
    return -sum(mp.atan2(w - p.imag, -p.real) for p in poles)


def clean(poles):
    tidy = [[number(p.real), 0.0 if abs(p.imag) < mp.mpf(10) ** -40 else number(p.imag)] for p in poles]
    return sorted((p for p in tidy if p[1] >= 0), key=lambda p: -p[1])


def record(poles, gains, **more):
    ws = [mp.mpf(w) for w in GRID]
    return {
        **more,
        "poles": clean(poles),
        "gain": [number(g) for g in gains],
        "delay": [number(delay(poles, w)) for w in ws],
        "phase": [number(phase(poles, w)) for w in ws],
    }


def butterworth():
    out = []
    for n in ORDERS:
        gains = [1 / mp.sqrt(1 + mp.mpf(w) ** (2 * n)) for w in GRID]
        out.append(record(butterworth_poles(n), gains, order=n))
    return out


def chebyshev():
    out = []
    for ripple in RIPPLES:
        for n in ORDERS:
            e = epsilon(ripple)
            gains = [1 / mp.sqrt(1 + (e * chebyshev_polynomial(n, mp.mpf(w))) ** 2) for w in GRID]
            more = {"order": n, "ripple": float(ripple), "halfPower": number(half_power(n, ripple))}
            out.append(record(chebyshev_poles(n, ripple), gains, **more))
    return out


def holds():
    xs = ["1e-9", "1e-5", "0.001", "0.1", "0.25", "0.4", "0.45", "0.5", "0.75", "0.999999", "1.000001", "1.5", "2.5", "7.3", "1000.25"]
    out = []
    for text in xs:
        # The double that the program is handed, not the decimal: beside a null they differ in the ninth place.
        x = mp.mpf(float(text))
        out.append([float(text), number(abs(mp.sinpi(x) / (mp.pi * x)))])
    return out


def side_lobes():
    """Where |sinc| peaks in lobe n, and how high: tan(z) = z."""
    out = []
    for n in (1, 2, 3, 10, 1000):
        q = mp.pi * (n + mp.mpf("0.5"))
        z = mp.findroot(lambda t: mp.sin(t) - t * mp.cos(t), q - 1 / q)
        out.append([n, number(z / mp.pi), number(abs(mp.sin(z) / z))])
    return out


def scipy_difference(filters, design):
    """Largest relative difference of scipy's poles and magnitudes from the stored ones."""
    poles_off = gain_off = 0.0
    ws = np.array([float(w) for w in GRID])
    for entry in filters:
        z, p, k = design(entry)
        for re, im in entry["poles"]:
            poles_off = max(poles_off, float(np.min(np.abs(p - complex(re, im))) / abs(complex(re, im))))
        got = np.abs(signal.freqs_zpk(z, p, k, ws)[1])
        gain_off = max(gain_off, float(np.max(np.abs(got / np.array(entry["gain"]) - 1))))
    return {"poles": poles_off, "gain": gain_off}


def main():
    here = os.path.dirname(os.path.abspath(__file__))
    path = sys.argv[1] if len(sys.argv) > 1 else os.path.join(here, "signal-vectors.json")
    low, cheb = butterworth(), chebyshev()
    document = {
        "how": "mpmath, 50 digits; see make-vectors.py",
        "versions": {"python": sys.version.split()[0], "mpmath": mp.__version__, "numpy": np.__version__, "scipy": scipy.__version__},
        "scipy_difference": {
            "butterworth": scipy_difference(low, lambda e: signal.buttap(e["order"])),
            "chebyshev": scipy_difference(cheb, lambda e: signal.cheb1ap(e["order"], e["ripple"])),
        },
        "grid": [float(w) for w in GRID],
        "butterworth": low,
        "chebyshev": cheb,
        "sinc": holds(),
        "sideLobes": side_lobes(),
    }
    with open(path, "w") as file:
        json.dump(document, file, separators=(",", ":"))
        file.write("\n")


if __name__ == "__main__":
    main()
