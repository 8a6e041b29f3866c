#!/usr/bin/env python3
"""Folds the outside tables of filters into one compact file.

    python3 make-outside-tables.py FOLDER [FILE]      writes outside-filters.json beside this script, or FILE

FOLDER holds the full tables, one JSON file each: zpk_* (prototypes), resp_* (201 frequencies a filter), transforms, noise_bandwidth and
rc_and_active.  They were made apart from this project by mpmath at 50 to 160 digits, orders 1 to 12 (elliptic to 20), and hold decimal
strings of 25 digits.  What is folded: strings become doubles; of a conjugate pair only the upper root stays; of the responses every fourth
frequency stays (the whole was checked once, in the commit that brought this file), of the other kinds every third; phases are left out.
Needs nothing but Python.
"""
import json
import os
import sys

FAMILIES = {"chebyshev1": "chebyshev", "chebyshev2": "inverse-chebyshev"}
RESPONSE_STEP = 4
KIND_STEP = 3


def design(entry, family=None):
    """Family, order, ripple and attenuation in dB, normalisation; what an entry does not have is left out."""
    family = family or entry["family"]
    more = {"ripple": entry.get("rp_dB", entry.get("rp")), "attenuation": entry.get("rs_dB", entry.get("rs"))}
    out = {"family": FAMILIES.get(family, family), "order": entry["n"]}
    out.update({key: float(value) for key, value in more.items() if value is not None})
    return {**out, "norm": entry["norm"]} if "norm" in entry else out


def upper(roots):
    """The roots of the upper half plane and the real axis as doubles."""
    return [[float(re), float(im)] for re, im in roots if float(im) >= 0]


def prototypes(read):
    for name in ("butterworth", "chebyshev1", "chebyshev2", "elliptic_attenuation", "elliptic_edges", "bessel", "legendre", "gaussian"):
        for entry in read("zpk_" + name)["filters"]:
            out = design(entry, name.split("_")[0])
            out.update(poles=upper(entry["p"]), zeros=upper(entry["z"]), constant=float(entry["k"]))
            for key, ours in (("w_half_power", "halfPower"), ("ws", "stopEdge"), ("ws_minus_1", "stopEdgeLessOne"), ("gd0", "delayAtZero")):
                if key in entry:
                    out[ours] = float(entry[key])
            yield out


def responses(read):
    for name in ("butterworth", "chebyshev1", "chebyshev2", "elliptic", "bessel", "legendre_gaussian"):
        for entry in read("resp_" + name)["filters"]:
            yield {**design(entry), "db": entry["mag_dB"][::RESPONSE_STEP], "delay": entry["group_delay"][::RESPONSE_STEP]}


def kinds(read):
    for entry in read("transforms")["filters"]:
        out = {"kind": entry["kind"], **design({**entry["prototype"], "family": entry["family"]})}
        out["edges"] = [float(edge) for edge in entry.get("edges_Hz", [entry["f0_Hz"]])]
        out.update(poles=upper(entry["p_rad_s"]), zeros=upper(entry["z_rad_s"]))
        out.update(grid=entry["f_Hz"][::KIND_STEP], db=entry["mag_dB"][::KIND_STEP], delay=entry["group_delay_s"][::KIND_STEP])
        yield out


def bandwidths(read):
    for entry in read("noise_bandwidth")["filters"]:
        out = design(entry)
        keys = {"overPeak": "enbw_over_wunit_ref_peak", "overZeroHz": "enbw_over_wunit_ref_dc", "halfPower": "w_half_power_ref_peak",
                "overHalfPower": "enbw_over_w3_ref_peak", "delayAtZero": "group_delay_dc"}
        # JSON has no infinity.
        yield {**out, **{ours: None if entry[key] == "inf" else float(entry[key]) for ours, key in keys.items()}}


def cascades(read):
    for entry in read("noise_bandwidth")["identical_buffered_rc_cascade"]:
        yield {"count": entry["n"], "halfPower": float(entry["w3_over_stage_corner"]), "bandwidth": float(entry["enbw_over_stage_corner"])}


def ladders(read):
    for entry in read("rc_and_active")["equal_rc_ladder"]:
        yield {"poles": [float(p) for p in entry["poles"]], "halfPower": float(entry["w3"]), "delayAtZero": float(entry["elmore_delay"])}


def sections(read):
    for entry in read("rc_and_active")["stage_w0_Q"]:
        family, _, detail = entry["family"].partition("_")
        out = {"family": FAMILIES.get(family, family), "order": entry["n"]}
        if family.startswith("chebyshev"):
            out["ripple"] = float(detail)
        pairs = [[float(s["w0"]), None if s["Q"] is None else float(s["Q"])] for s in entry["sections"]]
        yield {**out, "sections": pairs}


def main():
    folder = sys.argv[1]
    here = os.path.dirname(os.path.abspath(__file__))
    target = sys.argv[2] if len(sys.argv) > 2 else os.path.join(here, "outside-filters.json")

    def read(name):
        with open(os.path.join(folder, name + ".json"), encoding="ascii") as file:
            return json.load(file)

    parts = (prototypes, responses, kinds, bandwidths, cascades, ladders, sections)
    result = {
        "how": "mpmath, 50 to 160 digits, made apart from this project; folded by make-outside-tables.py",
        "responseGrid": "w_i = 10^(-2 + 4 i/200) rad/s, i = 0, %d .. 200" % RESPONSE_STEP,
        "responseStep": RESPONSE_STEP,
        **{part.__name__: list(part(read)) for part in parts},
    }
    with open(target, "w", encoding="ascii") as file:
        json.dump(result, file, separators=(",", ":"), allow_nan=False)
        file.write("\n")


main()
