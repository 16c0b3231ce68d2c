"""The diode-charged envelope by scipy, apart from the library: python3 tests/reference/decay_envelope.py > tests/reference/decay_envelope.json

The state is the capacitor voltage, and the diode current is solved for in every evaluation; the library's state is the
junction voltage. After the pulse the capacitor empties through the resistances alone.
"""

import json
import sys

import numpy
import scipy
from scipy import integrate, optimize

BOLTZMANN, CHARGE = 1.380649e-23, 1.602176634e-19

BASE = {"rs": 470.0, "c": 1e-6, "decay": 510e3, "load": 1e6, "height": 9.5, "width": 1e-3, "is": 4e-9, "n": 1.9, "kelvin": 298.15, "rest": 0.0}
CASES = [
    {"id": "long", **BASE},
    {"id": "short", **BASE, "decay": 10e3},
    {"id": "narrow-pulse-long", **BASE, "width": 1.0038013e-3},
    {"id": "narrow-pulse-short", **BASE, "width": 1.0038013e-3, "decay": 10e3},
    {"id": "hardly-charged", **BASE, "width": 20e-6, "rs": 4700.0},
    {"id": "fully-charged", **BASE, "width": 50e-3, "rs": 47.0, "c": 100e-9, "decay": 4700.0},
    {"id": "cold-and-steep", **BASE, "kelvin": 273.15, "n": 1.0, "is": 1e-14, "rs": 100.0},
    {"id": "low-velocity", **BASE, "height": 0.9, "decay": 33e3},
    {"id": "returned-below-ground", **BASE, "rest": -0.3, "decay": 100e3},
]


def figures(case):
    slope = case["n"] * BOLTZMANN * case["kelvin"] / CHARGE
    resistance = 1 / (1 / case["decay"] + 1 / case["load"])
    rest = case["rest"] / case["decay"] * resistance

    def current(v):
        across = case["height"] - v
        if across <= 0:
            return 0.0 if across == 0 else -case["is"]
        balance = lambda i: i * case["rs"] + slope * numpy.log1p(i / case["is"]) - across
        return optimize.brentq(balance, 0, across / case["rs"], xtol=1e-25, rtol=1e-15)

    times = numpy.linspace(0, case["width"], 9)
    run = integrate.solve_ivp(
        lambda _, v: [(current(v[0]) - (v[0] - rest) / resistance) / case["c"]],
        (0, case["width"]), [rest], method="Radau", rtol=1e-12, atol=1e-13, t_eval=times,
    )
    assert run.success, case["id"]
    peak = run.y[0, -1]
    after = case["width"] + numpy.array([0.1, 1.0, 3.0]) * resistance * case["c"]
    tail = rest + (peak - rest) * numpy.exp(-(after - case["width"]) / (resistance * case["c"]))
    return {
        "peak": peak,
        "firstCurrent": current(rest),
        "curve": [[float(t), float(v)] for t, v in zip(numpy.append(times, after), numpy.append(run.y[0], tail))],
    }


def main():
    document = {
        "made by": "tests/reference/decay_envelope.py",
        "versions": {"python": sys.version.split()[0], "numpy": numpy.__version__, "scipy": scipy.__version__},
        "cases": [{"given": case, "figures": figures(case)} for case in CASES],
    }
    json.dump(document, sys.stdout, indent=1)
    sys.stdout.write("\n")


if __name__ == "__main__":
    main()
