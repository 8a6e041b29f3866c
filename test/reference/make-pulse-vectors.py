#!/usr/bin/env python3
"""Expected values for the tests of src/signal/pulses, from 60-digit quadrature of the waveforms themselves.

    python3 make-pulse-vectors.py [FILE [EVERY]]      writes pulse-vectors.json beside this script, or FILE; of every EVERY-th pulse only

Nothing here knows a closed form of a spectrum: every pulse is a waveform on [0, w] in units of its width, integrated against
e^(-j 2 pi f t) piece by piece; the delay is Re of the first moment over the zeroth.  A track-and-hold weight is the Fourier coefficient
of the output of a tone e^(j 2 pi f t) over one period.  Needs mpmath (made with Debian's python3-mpmath; the version is in the file).
"""
import json
import os
import sys

import mpmath as mp

mp.mp.dps = 60
# Of f times the width: ordinary values, removable singularities (1/2, 1, 2) and their neighbourhood, nulls' neighbourhoods.  Powers of two
# beside them, so that double precision holds the argument exactly.
NEAR = [mp.mpf(2) ** -20, mp.mpf(2) ** -40]
GRID = [mp.mpf(x) for x in ("0", "0.0009765625", "0.125", "0.25", "0.5", "0.75", "1", "1.25", "1.4375", "1.5", "2", "2.25", "2.5", "3", "3.375",
                            "4", "5.625", "7.5", "20.3125")]
GRID += [mp.mpf(c) + s * n for c in ("0.5", "1", "1.5", "2", "3", "4") for n in NEAR for s in (1, -1)]
EDGES = ["0.5", "0.25", "0.125", "0.0625"]
DECAYS = ["0.0625", "0.25", "1", "32", "1048576"]


def constant(value):
    return lambda t: mp.mpf(value)


def waveforms():
    """Shape, extra length over the width, pieces (from, to, p) at height 1."""
    half = mp.mpf(1) / 2
    yield "rectangle", None, [(0, 1, constant(1))]
    yield "triangle", None, [(0, half, lambda t: 2 * t), (half, 1, lambda t: 2 - 2 * t)]
    yield "half-sine", None, [(0, 1, lambda t: mp.sin(mp.pi * t))]
    yield "split", None, [(0, half, constant(1)), (half, 1, constant(-1))]
    for text in EDGES:
        e = mp.mpf(text)
        yield "trapezoid", text, [(0, e, lambda t, e=e: t / e), (e, 1 - e, constant(1)), (1 - e, 1, lambda t, e=e: (1 - t) / e)]
        yield "raised-cosine", text, [(0, e, lambda t, e=e: (1 - mp.cos(mp.pi * t / e)) / 2), (e, 1 - e, constant(1)),
                                      (1 - e, 1, lambda t, e=e: (1 - mp.cos(mp.pi * (1 - t) / e)) / 2)]
    for text in DECAYS:
        tau = mp.mpf(text)
        yield "exponential", text, [(0, 1, lambda t, tau=tau: mp.exp(-t / tau))]


def gauss(count):
    """Nodes and weights of Gauss and Legendre on [0, 1], by Newton on the recurrence."""
    result = []
    for i in range(count):
        x = mp.cos(mp.pi * (i + mp.mpf(3) / 4) / (count + mp.mpf(1) / 2))
        for _ in range(8):
            before, now = mp.mpf(1), x
            for n in range(2, count + 1):
                before, now = now, ((2 * n - 1) * x * now - (n - 1) * before) / n
            slope = count * (x * now - before) / (x * x - 1)
            x -= now / slope
        result.append(((1 + x) / 2, 1 / ((1 - x * x) * slope * slope)))
    return result


RULE = gauss(40)


def nodes(pieces):
    """(t, weight, p(t)): each piece in slices of at most 1/16; 40 points give 55 digits of what turns once or twice in a slice."""
    result = []
    for low, high, p in pieces:
        count = int(mp.ceil((high - low) * 16))
        for slice_ in range(count):
            width = (high - low) / mp.mpf(count)
            for x, weight in RULE:
                t = low + (slice_ + x) * width
                result.append((t, weight * width, p(t)))
    return result


def integral(points, turns):
    """The integral of p(t) e^(-j 2 pi turns t), and that with one more t."""
    terms = [(t, weight * p * mp.expj(-2 * mp.pi * turns * t)) for t, weight, p in points]
    return mp.fsum(term for _, term in terms), mp.fsum(t * term for t, term in terms)


def pulse(shape, extra, pieces):
    points = nodes(pieces)
    area = mp.fsum(weight * abs(p) for _, weight, p in points)
    energy = mp.fsum(weight * p * p for _, weight, p in points)
    rows = []
    for x in GRID:
        zeroth, first = (value / area for value in integral(points, x))
        size = abs(zeroth)
        if size < mp.mpf(10) ** -32:
            rows.append([float(x), 0.0, None, None])
        else:
            rows.append([float(x), float(size), float(mp.arg(zeroth)), float((first / zeroth).real)])
    return {"shape": shape, "extra": None if extra is None else float(mp.mpf(extra)), "area": float(area), "energy": float(energy), "rows": rows}


def weight(d, k, f):
    """Coefficient at f + k of the output of e^(j 2 pi f t), period 1; the held part alone, and its first moment from where it begins."""
    tracked, _ = integral(nodes([(mp.mpf(0), d, constant(1))]), k)
    held, moment = integral(nodes([(mp.mpf(0), 1 - d, constant(1))]), f + k)
    turn = mp.expj(-2 * mp.pi * k * d)
    return tracked + turn * held, turn * moment


def track_and_hold(every):
    inputs = [mp.mpf(x) for x in ("0", "0.0625", "0.25", "0.4375", "-0.125", "-0.5", "1.3125", "-2.625")] + [NEAR[0], -NEAR[0]]
    for text in ("0.125", "0.25", "0.5", "0.75", "0.9375")[::every]:
        d = mp.mpf(text)
        rows = []
        for k in (0, 1, 2, 3, 5, 8, -1, -2, -4):
            for f in inputs:
                w, _ = weight(d, k, f)
                rows.append([k, float(f), float(w.real), float(w.imag)] if abs(w) > mp.mpf(10) ** -32 else [k, float(f), 0.0, 0.0])
        # Only the held part of copy 0 turns with frequency, about the moment at which it begins: -d(phase)/d(omega) is its first moment over the whole.
        delays = []
        for f in inputs[:4]:
            w, moment = weight(d, 0, f)
            delays.append([float(f), float((moment / w).real)])
        yield {"trackShare": float(d), "rows": rows, "delays": delays}


def main():
    here = os.path.dirname(os.path.abspath(__file__))
    target = sys.argv[1] if len(sys.argv) > 1 else os.path.join(here, "pulse-vectors.json")
    every = int(sys.argv[2]) if len(sys.argv) > 2 else 1
    result = {
        "how": "mpmath, 60 digits, quadrature of the waveforms; see make-pulse-vectors.py",
        "versions": {"mpmath": mp.__version__},
        "columns": ["f times width", "|P|", "phase, rad", "group delay over width"],
        "pulses": [pulse(*w) for w in list(waveforms())[::every]],
        "trackAndHoldColumns": ["copy", "input f times T", "re", "im"],
        "trackAndHold": list(track_and_hold(every)),
    }
    with open(target, "w", encoding="ascii") as file:
        json.dump(result, file, separators=(",", ":"))
        file.write("\n")


main()
