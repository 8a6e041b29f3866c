"""Plain-grid second opinion of one channel: strongest alias of each source, flatness, strongest image.

Usage: python3 channel.py < description.json   (needs numpy; prints JSON)

The description, SI units and dB:
  direction   "capture" | "generate"
  rate        [low, nominal, high] in Hz
  wanted      [[low, high, level], ...]
  reference   Hz
  pulse       null | {"seconds": w} | {"share": of the period}
  stages      [{"kind": "butterworth", "order", "corner", "factors": [low, high], "gains": [low, high]},
               {"kind": "chebyshev", "order", "corner", "ripple", "cornerAt": "half-power" | "ripple", ...},
               {"kind": "bandwidth", "corner", ...}]          factors, gains: what multiplies corner and gain
  sources     [[low, high or null, level], ...]               where a tone may stand
  protect     null | [[low, high], ...]
  levelsAt    "input" | "sampler"

Nothing here is shared with the program: magnitudes come from the textbook forms 1/(1 + u^2n) and 1/(1 + eps^2 T_n(u)^2), maxima from
grids over frequency, corner factor and rate. Answers are therefore a hair below the true maxima, never above.
"""
import json
import sys

import numpy as np

GRID = 1201
FACTORS = 33
FOLDS = 24


def db(x):
    with np.errstate(divide="ignore"):
        return 20 * np.log10(np.maximum(x, 1e-300))


def stage_db(stage, f):
    """Gain in dB; the passband maximum is 0 dB."""
    n = stage.get("order", 1)
    u = f / stage["corner"]
    if stage["kind"] in ("butterworth", "bandwidth"):
        return -10 * np.log10(1 + u ** (2 * n))
    eps = np.sqrt(10 ** (stage["ripple"] / 10) - 1)
    if stage["cornerAt"] == "half-power":
        u = u * np.cosh(np.arccosh(1 / eps) / n)
    inside = np.cos(n * np.arccos(np.minimum(u, 1)))
    outside = np.cosh(n * np.arccosh(np.maximum(u, 1)))
    return -10 * np.log10(1 + (eps * np.where(u <= 1, inside, outside)) ** 2)


def pulse_db(spec, rate, f):
    if spec["pulse"] is None:
        return np.zeros_like(f)
    width = spec["pulse"].get("seconds", spec["pulse"].get("share", 0) / rate)
    area = 0 if spec["direction"] == "capture" else db(width * rate)
    return area + db(np.abs(np.sinc(f * width)))


def factors_of(stage):
    low, high = stage["factors"]
    return np.unique(np.append(np.linspace(low, high, FACTORS), 1.0)) if low != high else np.array([1.0])


def extreme_db(stage, f, reference, sense):
    """Largest or smallest over the corner factor, at each f; reference: None, one frequency, or an array beside f."""
    c = factors_of(stage)[:, None]
    gain = stage_db(stage, f[None, :] / c)
    if reference is not None:
        gain = gain - stage_db(stage, np.atleast_1d(np.asarray(reference, float))[None, :] / c)
    best = gain.max(axis=0) if sense > 0 else gain.min(axis=0)
    if reference is None:
        best = best + db(stage["gains"][1] if sense > 0 else stage["gains"][0])
    return best


def path_db(spec, rate, f, reference, sense=1):
    f = np.asarray(f, float)
    total = pulse_db(spec, rate, f)
    if reference is not None:
        total = total - pulse_db(spec, rate, np.atleast_1d(np.asarray(reference, float)))
    for stage in spec["stages"]:
        total = total + extreme_db(stage, f, reference, sense)
    return total


def fold(f, rate):
    return np.abs(f - rate * np.round(f / rate))


def rates_of(spec):
    low, nominal, high = spec["rate"]
    return np.unique([nominal] + list(np.linspace(low, high, 5))) if low != high else np.array([nominal])


def protected(spec, rate):
    if spec["protect"] is not None:
        return spec["protect"]
    return [sorted([float(fold(np.array(low), rate)), float(fold(np.array(high), rate))]) for low, high, _ in spec["wanted"]]


def candidates(spec, rate, low, high):
    """Input frequencies from which something lands, between low and high, outside the wanted bands."""
    top = (FOLDS + 1) * rate if high is None else high
    points = []
    for a, b in protected(spec, rate):
        x = np.linspace(a, b, GRID)
        first = max(0, int(low // rate) - 1)
        for k in range(first, int(top // rate) + 2):
            thin = x if k - first < 6 else x[::60]
            points += [k * rate + thin, k * rate - thin]
    f = np.concatenate(points)
    if high is not None and low == high:
        return np.array([low]) if any(a - 1e-9 * rate <= fold(low, rate) <= b + 1e-9 * rate for a, b in protected(spec, rate)) else np.array([])
    f = f[(f >= low) & (f <= top)]
    for a, b, _ in spec["wanted"]:
        f = f[(f < a * (1 - 1e-9)) | (f > b * (1 + 1e-9))]
    return f


def aliases(spec, relative):
    reference = spec["reference"] if relative or spec["levelsAt"] == "sampler" else None
    weakest = min(level for _, _, level in spec["wanted"])
    answers = []
    for low, high, level in spec["sources"]:
        best = None
        for rate in rates_of(spec):
            f = candidates(spec, rate, low, high)
            if len(f) == 0:
                continue
            gains = level + path_db(spec, rate, f, reference) - (weakest if relative else 0)
            index = int(np.argmax(gains))
            if best is None or gains[index] > best[0]:
                best = (float(gains[index]), float(f[index]), float(fold(f[index], rate)))
        answers.append(None if best is None else {"level": best[0], "frequency": best[1], "lands": best[2]})
    return answers


def flatness(spec):
    worst = 0.0
    for rate in rates_of(spec):
        for low, high, _ in spec["wanted"]:
            f = np.linspace(low, high, 6001)
            for part in np.array_split(f, 10):
                for sense in (1, -1):
                    worst = max(worst, float(np.max(np.abs(path_db(spec, rate, part, spec["reference"], sense)))))
    return worst


def image(spec, relative):
    best = -1e9
    for rate in rates_of(spec):
        for low, high, level in spec["wanted"]:
            w = np.linspace(low, high, GRID)
            x = fold(w, rate)
            middle = (low + high) / 2
            own = (round(middle / rate), -1 if middle < rate * round(middle / rate) else 1)
            for k in range(0, FOLDS):
                for side in (1,) if k == 0 else (-1, 1):
                    if (k, side) == own:
                        continue
                    f = k * rate + side * x
                    gains = path_db(spec, rate, f, w) if relative else level + path_db(spec, rate, f, None)
                    best = max(best, float(np.max(gains)))
    return best


def main():
    spec = json.load(sys.stdin)
    answer = {"flatness": flatness(spec)}
    if spec["direction"] == "capture":
        answer["aliases"] = aliases(spec, False)
        answer["aliasesRelative"] = aliases(spec, True)
    else:
        answer["image"] = image(spec, False)
        answer["imageRelative"] = image(spec, True)
    json.dump(answer, sys.stdout)


main()
