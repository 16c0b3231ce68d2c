"""The swing-type transistor cell by scipy, apart from the library: python3 tests/reference/transistor_cell.py > tests/reference/transistor_cell.json

Averages are taken over the drive on a fine grid, the two junction voltages solved for at each point; the library integrates
over the base voltage by adaptive Gauss-Kronrod rules.
"""

import json
import sys

import numpy
import scipy
from scipy import integrate, optimize, stats

BOLTZMANN, CHARGE = 1.380649e-23, 1.602176634e-19

BASE = {"ri": 10e3, "rb": 100e3, "rc": 10e3, "ro": 1e12, "supply": 8.0, "sigma": 1.0, "beta": 200.0, "reverse": 5.0, "is": 1e-14, "kelvin": 298.15}
CASES = [{"id": f"worked-{v}", **BASE, "supply": v} for v in (0.0, 0.25, 0.5, 1.0, 2.0, 4.0, 8.0)] + [
    {"id": "quiet", **BASE, "sigma": 0.5},
    {"id": "loud", **BASE, "sigma": 2.0},
    {"id": "loaded", **BASE, "ro": 22e3},
    {"id": "other-parts", **BASE, "ri": 2.2e3, "rb": 22e3, "rc": 4.7e3, "ro": 100e3, "sigma": 0.4, "beta": 90.0, "kelvin": 310.0},
]


def average(case, supply, collector):
    vt = BOLTZMANN * case["kelvin"] / CHARGE
    sat, beta, reverse = case["is"], case["beta"], case["reverse"]

    # Newton on (base voltage, base-collector voltage) for a whole grid of drives, from the state at the drive before.
    def state(vb):
        wanted = collector * sat * numpy.expm1(vb / vt) - supply + vb
        scale = collector * sat * (1 + 1 / reverse)
        x = numpy.where(wanted > 0, numpy.minimum(wanted, vt * numpy.log1p(numpy.maximum(wanted, 0) / scale)), 0.0)
        for _ in range(12):
            e = scale * numpy.exp(x / vt)
            x = x - (x + e - scale - wanted) / (1 + e / vt)
        current = vb / case["rb"] + sat * numpy.expm1(vb / vt) / beta + sat * numpy.expm1(x / vt) / reverse
        return vb + case["ri"] * current, current, vb - x

    sigma = case["sigma"]
    high = optimize.brentq(lambda vb: state(numpy.array([vb]))[0][0] - 9 * sigma, 0, 1.2)
    # The base voltage at each of an even grid of drives, by bisection of the whole grid at once.
    drive = numpy.linspace(-18 * sigma, 9 * sigma, 27001)
    left, right = numpy.minimum(drive, 0) - 0.1, numpy.minimum(numpy.maximum(drive, 0) + 0.1, high + 1e-9)
    for _ in range(48):
        middle = (left + right) / 2
        above = state(middle)[0] > drive
        left, right = numpy.where(above, left, middle), numpy.where(above, middle, right)
    _, current, level = state((left + right) / 2)

    def mean(values, bias):
        return integrate.simpson(values * stats.norm.pdf((drive + bias) / sigma) / sigma, x=drive)

    bias = optimize.brentq(lambda b: mean(current, b), 0, 8 * sigma, xtol=1e-14)
    thump = mean(level, bias)
    rms = numpy.sqrt(mean((level - thump) ** 2, bias))
    rho = abs(mean((drive + bias) * (level - thump), bias)) / sigma / rms
    below = level < supply / 2
    turns = numpy.interp(-supply / 2, -level[:], drive) if below.any() and not below.all() and supply > 0 else None
    duty = stats.norm.sf((turns + bias) / sigma) if turns is not None else 0.0
    return {"outputRms": rms, "thump": thump, "selfBias": bias, "correlation": rho, "duty": duty}


def figures(case):
    rc, ro = case["rc"], case["ro"]
    thump = case["supply"]
    for _ in range(12):
        got = average(case, (case["supply"] * ro + thump * rc) / (ro + rc), rc * ro / (rc + ro))
        done = abs(got["thump"] - thump) < 1e-11
        thump = got["thump"]
        if done:
            break
    return {key: float(value) for key, value in got.items()}


def main():
    document = {
        "made by": "tests/reference/transistor_cell.py",
        "versions": {"python": sys.version.split()[0], "numpy": numpy.__version__, "scipy": scipy.__version__},
        "cases": [{"given": case, "figures": figures(case)} for case in CASES],
    }
    json.dump(document, sys.stdout, indent=1)
    sys.stdout.write("\n")


if __name__ == "__main__":
    main()
