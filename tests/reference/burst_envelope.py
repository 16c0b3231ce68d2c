"""The gated oscillator by scipy, apart from the library: python3 tests/reference/burst_envelope.py > tests/reference/burst_envelope.json

The capacitor voltage is integrated from rest and each crossing of a threshold located; the library has closed forms.
"""

import json
import sys

import numpy
import scipy
from scipy import integrate

BASE = {"rt": 75e3, "ct": 100e-9, "r1": 10e3, "r2": 22e3, "high": 10.5, "low": -9.5, "bias": 0.0, "rest": 0.0, "gate": 32.577917e-3}
CASES = [
    {"id": "unequal-swings", **BASE},
    {"id": "symmetric", **BASE, "low": -10.5},
    {"id": "biased", **BASE, "bias": 2e-6},
    {"id": "rests-at-lower-threshold", **BASE, "rest": -9.5 * 10 / 32},
    {"id": "many-hits", **BASE, "rt": 33e3, "gate": 40e-3},
    {"id": "single-hit", **BASE, "gate": 5e-3},
]


def figures(case):
    share = case["r1"] / (case["r1"] + case["r2"])
    time, voltage, output = 0.0, case["rest"], case["high"]
    hits, turns = [0.0], []
    while len(turns) < 6 or hits[-1] < case["gate"]:
        aim, threshold = output, share * output
        turn = lambda _, v: v[0] - threshold
        turn.terminal = True
        turn.direction = 1 if output > 0 else -1
        run = integrate.solve_ivp(
            lambda _, v: [((aim - v[0]) / case["rt"] - case["bias"]) / case["ct"]],
            (0, 1), [voltage], method="DOP853", rtol=1e-13, atol=1e-13, events=turn, max_step=case["rt"] * case["ct"] / 20,
        )
        time += run.t_events[0][0]
        turns.append(run.t_events[0][0])
        voltage, output = threshold, case["low"] if output > 0 else case["high"]
        if output > 0:
            hits.append(time)
    return {"highTime": turns[2], "lowTime": turns[1], "firstInterval": turns[0] + turns[1], "hitTimes": [t for t in hits if t <= case["gate"]]}


def main():
    document = {
        "made by": "tests/reference/burst_envelope.py",
        "versions": {"python": sys.version.split()[0], "numpy": numpy.__version__, "scipy": scipy.__version__},
        "cases": [{"given": case, "figures": figures(case)} for case in CASES],
    }
    json.dump(document, sys.stdout, indent=1)
    sys.stdout.write("\n")


if __name__ == "__main__":
    main()
