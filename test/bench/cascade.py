"""The cascade bench in vectorised numpy: the same ladder, the same law of each part, the same outputs.

Arguments: runs, calls a run. Prints the median nanoseconds of one call, then |gamma| and gain of the last call.
"""
import sys
import time

import numpy as np

POINTS = 1001
f = 700e6 + 500e6 * np.arange(POINTS) / (POINTS - 1)
omega = 2 * np.pi * f
jomega = 1j * omega
root = np.sqrt(f)
load = 18 - 37j * 868e6 / f


def impedance(coil, value):
    q, at = (40, 900e6) if coil else (180, 900e6)
    w = 2 * np.pi * at
    if coil:
        return w * value / (q * np.sqrt(at)) * root + jomega * value
    return 1 / (w * value * q * np.sqrt(at)) * root + 1 / (jomega * value)


def evaluate(x):
    ladder = [(True, True, 6.8e-9), (False, False, 2.2e-12), (True, True, 4.7e-9), (False, False, 3.3e-12),
              (True, False, 22e-12), (False, True, 12e-9), (True, True, 3.9e-9), (False, False, 1.5e-12)]
    v = load
    i = np.ones(POINTS, complex)
    for series, coil, value in ladder:
        z = impedance(coil, value * x)
        if series:
            v = v + z * i
        else:
            i = i + v / z
    bottom = v + 50 * i
    return np.abs((v - 50 * i) / bottom), 4 * 50 * load.real / np.abs(bottom) ** 2


runs, calls = int(sys.argv[1]), int(sys.argv[2])
times = []
for run in range(runs + 1):
    start = time.perf_counter_ns()
    for call in range(calls):
        magnitude, gain = evaluate(1 + 1e-6 * (calls - 1 - call))
    if run:
        times.append((time.perf_counter_ns() - start) / calls)
print(repr(sorted(times)[len(times) // 2]))
for m, g in zip(magnitude, gain):
    print(repr(float(m)), repr(float(g)))
