"""The magnitude of a filter over many frequencies with numpy and scipy: reads the task as JSON, prints median milliseconds of the processor and the mean of ln|H|."""
import json
import statistics
import sys
import time

import numpy as np
from scipy import signal

task = json.load(sys.stdin)
zeros = np.array([complex(*root) for root in task["zeros"]])
poles = np.array([complex(*root) for root in task["poles"]])
constant = task["constant"]
count = task["count"]
f = 10.0 ** (task["from"] + (task["to"] - task["from"]) * np.arange(count) / (count - 1))


def by_scipy():
    """scipy's own: complex polynomials from roots, numerator over denominator."""
    return np.log(np.abs(signal.freqs_zpk(zeros, poles, constant, f)[1]))


def by_numpy():
    """The product of squared distances to the roots, real arithmetic, one array operation each."""
    power = np.full(count, constant * constant)
    for root in zeros:
        power *= root.real**2 + (f - root.imag) ** 2
    for root in poles:
        power /= root.real**2 + (f - root.imag) ** 2
    return 0.5 * np.log(power)


def timed(kernel):
    mean = float(np.mean(kernel()))
    times = []
    for _ in range(task["rounds"]):
        start = time.process_time()
        kernel()
        times.append(1e3 * (time.process_time() - start))
    return {"ms": statistics.median(times), "mean": mean}


print(json.dumps({"scipy": timed(by_scipy), "numpy": timed(by_numpy), "versions": f"numpy {np.__version__}, scipy {__import__('scipy').__version__}"}))
