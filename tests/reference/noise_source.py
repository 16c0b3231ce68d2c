#!/usr/bin/env python3
"""A noise board by scipy: RMS by quadrature of its node equations, hit-to-hit spread from a Lyapunov equation.

Prints tests/reference/noise_source.json. Nothing here knows the closed forms of the library.
"""
import json
import sys

import numpy
import scipy
from scipy import integrate, linalg

CASES = [
    {"id": "as it starts", "rms": 20e-3, "limit": 20e3, "rs": 0.0, "cn": 10e-6, "r1": 10e3, "rf1": 100e3, "r2": 15e3,
     "rf2": 75e3, "ft": 3e6, "f0": 1000.0, "q": 3.0, "h0": 1.0, "window": 0.1},
    {"id": "slow op amps", "rms": 5e-3, "limit": 50e3, "rs": 2.2e3, "cn": 1e-6, "r1": 4.7e3, "rf1": 220e3, "r2": 10e3,
     "rf2": 47e3, "ft": 0.5e6, "f0": 8000.0, "q": 8.0, "h0": 2.5, "window": 5e-3},
    {"id": "thin coupling", "rms": 50e-3, "limit": 10e3, "rs": 0.0, "cn": 22e-9, "r1": 22e3, "rf1": 220e3, "r2": 22e3,
     "rf2": 33e3, "ft": 10e6, "f0": 180.0, "q": 0.4, "h0": 1.0, "window": 20e-3},
    {"id": "critically damped", "rms": 20e-3, "limit": 20e3, "rs": 1e3, "cn": 100e-9, "r1": 10e3, "rf1": 47e3,
     "r2": 10e3, "rf2": 100e3, "ft": 1e6, "f0": 440.0, "q": 0.5, "h0": 4.0, "window": 50e-3},
    {"id": "short hit, sharp band", "rms": 20e-3, "limit": 20e3, "rs": 0.0, "cn": 10e-6, "r1": 10e3, "rf1": 100e3,
     "r2": 15e3, "rf2": 75e3, "ft": 3e6, "f0": 2000.0, "q": 20.0, "h0": 1.0, "window": 2e-3},
]


def board(case, frequency):
    """Output over the junction's voltage, from Kirchhoff's law at the two summing nodes."""
    s = 2j * numpy.pi * frequency
    lag = s / (2 * numpy.pi * case["ft"])
    y1 = 1 / (case["r1"] + case["rs"] + 1 / (s * case["cn"]))
    # Unknowns: summing nodes m1, m2 and outputs o1, o2, with m = −o·lag.
    matrix = numpy.array([
        [y1 + 1 / case["rf1"], -1 / case["rf1"], 0, 0],
        [1, lag, 0, 0],
        [0, -1 / case["r2"], 1 / case["r2"] + 1 / case["rf2"], -1 / case["rf2"]],
        [0, 0, 1, lag],
    ])
    solution = numpy.linalg.solve(matrix, numpy.array([y1, 0, 0, 0]))
    return solution[3] / (1 + 1j * frequency / case["limit"])


def band(case, frequency):
    ratio = frequency / case["f0"]
    return case["h0"] / (1 + 1j * case["q"] * (ratio - 1 / ratio))


def rms_of(case, response):
    density = case["rms"] / numpy.sqrt(numpy.pi / 2 * case["limit"])

    def power(x):
        f = numpy.exp(x)
        return abs(response(f)) ** 2 * f

    total = 0.0
    edges = numpy.log([1e-4, 1, 10, 100, case["f0"] / 2, case["f0"], case["f0"] * 2, 1e5, 1e6, 1e7, 1e9, 1e12])
    for a, b in zip(sorted(edges)[:-1], sorted(edges)[1:]):
        total += integrate.quad(power, a, b, epsabs=0, epsrel=1e-11, limit=400)[0]
    return density * numpy.sqrt(total)


def hit_spread(case):
    """Half the relative deviation of the mean square over a window, for white noise behind the band-pass."""
    w = 2 * numpy.pi * case["f0"]
    a = numpy.array([[0, 1], [-w * w, -w / case["q"]]])
    drive = numpy.array([[0.0], [1.0]])
    covariance = linalg.solve_continuous_lyapunov(a, -drive @ drive.T)
    variance = covariance[1, 1]

    def rho(tau):
        return (linalg.expm(a * tau) @ covariance)[1, 1] / variance

    window = case["window"]
    reach = min(window, 40 * 2 * max(case["q"], 1 / case["q"]) / w)
    edges = numpy.linspace(0, reach, 1 + int(numpy.ceil(reach * case["f0"] * 2)))
    total = 0.0
    for start, end in zip(edges[:-1], edges[1:]):
        total += integrate.quad(lambda t: (1 - t / window) * rho(t) ** 2, start, end, epsabs=1e-16, epsrel=1e-9)[0]
    return 0.5 * numpy.sqrt(4 / window * total)


def figures(case):
    return {
        "rms": float(rms_of(case, lambda f: board(case, f))),
        "bandRms": float(rms_of(case, lambda f: board(case, f) * band(case, f))),
        "hitSpread": float(hit_spread(case)),
    }


def main():
    document = {
        "made by": "tests/reference/noise_source.py",
        "versions": {"python": sys.version.split()[0], "numpy": numpy.__version__, "scipy": scipy.__version__},
        "cases": [{"given": case, "figures": figures(case)} for case in CASES],
    }
    json.dump(document, sys.stdout, indent=1)
    sys.stdout.write("\n")


if __name__ == "__main__":
    main()
