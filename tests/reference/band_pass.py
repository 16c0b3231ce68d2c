"""The multiple-feedback band-pass by scipy, apart from the library: python3 tests/reference/band_pass.py > tests/reference/band_pass.json

The network is solved symbolically by nobody here: its matrices G + sC are written down node by node, and the state-space
form that scipy.signal needs follows from them by elimination of the nodes without capacitance.
"""

import json
import sys

import numpy
import scipy
from scipy import integrate, optimize, signal

CASES = [
    {"id": "ideal-mid", "ra": 22e3, "rb": 3200.0, "rf": 100e3, "c1": 10e-9, "c2": 10e-9, "rs": 0.0, "rl": None, "ft": None, "ro": 0.0},
    {"id": "3-mhz-mid", "ra": 22e3, "rb": 3200.0, "rf": 100e3, "c1": 10e-9, "c2": 10e-9, "rs": 0.0, "rl": None, "ft": 3e6, "ro": 0.0},
    {"id": "slow-and-narrow", "ra": 31830.0, "rb": 160.0, "rf": 63661.0, "c1": 10e-9, "c2": 10e-9, "rs": 0.0, "rl": None, "ft": 1e6, "ro": 0.0},
    {"id": "unequal-caps", "ra": 15e3, "rb": 1800.0, "rf": 220e3, "c1": 4.7e-9, "c2": 22e-9, "rs": 12.5e3, "rl": None, "ft": 3e6, "ro": 0.0},
    {"id": "output-resistance", "ra": 22e3, "rb": 2200.0, "rf": 100e3, "c1": 10e-9, "c2": 10e-9, "rs": 1e3, "rl": 2e3, "ft": 3e6, "ro": 100.0},
    {"id": "low-and-wide", "ra": 100e3, "rb": 100e3, "rf": 220e3, "c1": 100e-9, "c2": 47e-9, "rs": 0.0, "rl": 10e3, "ft": 0.7e6, "ro": 300.0},
]


def state_space(case):
    """A, B, C, D with the two capacitor voltages (and the op amp's inner voltage) as state."""
    g_in, g_b, g_f = 1 / (case["ra"] + case["rs"]), 1 / case["rb"], 1 / case["rf"]
    c1, c2, ft, ro = case["c1"], case["c2"], case["ft"], case["ro"]
    g_l = 0.0 if case["rl"] is None else 1 / case["rl"]
    # State u1 = x - o, u2 = x - m; e is the op amp's voltage before its output resistance. Each node voltage is affine
    # in (u1, u2, e, vin): found from Kirchhoff's laws with the capacitor currents i1, i2 as further unknowns.
    # Unknowns: x, m, o, i1, i2 (and e where the op amp is ideal).
    ideal = ft is None
    size = 6 if ideal else 5
    left = numpy.zeros((size, size))
    right = numpy.zeros((size, 4))  # columns: u1, u2, e, vin
    x, m, o, i1, i2, e = range(6)
    # node x: (x - vin) gIn + x gB + i1 + i2 = 0
    left[0, [x, i1, i2]] = [g_in + g_b, 1, 1]
    right[0, 3] = g_in
    # node m: i2 = (m - o) gF
    left[1, [i2, m, o]] = [1, -g_f, g_f]
    # x - o = u1, x - m = u2
    left[2, [x, o]] = [1, -1]
    right[2, 0] = 1
    left[3, [x, m]] = [1, -1]
    right[3, 1] = 1
    if ideal:
        left[4, m] = 1  # virtual ground; the output takes what voltage it must
        left[5, e] = 1
    else:
        # node o: (e - o)/ro + i1 + (m - o) gF - o gL = 0, or o = e without output resistance
        left[4, [o, i1, m]] = [1 + ro * (g_f + g_l), -ro, -ro * g_f]
        right[4, 2] = 1
    solved = numpy.linalg.solve(left, right)
    # de/dt = -2 pi ft m
    rows = [solved[i1] / c1, solved[i2] / c2]
    if not ideal:
        rows.append(-2 * numpy.pi * ft * solved[m])
    order = len(rows)
    rows = numpy.array(rows)
    return rows[:, :order], rows[:, 3:], solved[o][None, :order], solved[o][None, 3:]


def figures(case):
    a, b, c, d = state_space(case)
    # The frequency response straight from the state space: no coefficients of a polynomial are formed.
    identity = numpy.eye(a.shape[0])

    def response(frequency):
        return (c @ numpy.linalg.solve(2j * numpy.pi * frequency * identity - a, b) + d)[0, 0]

    def gain(frequency):
        return abs(response(frequency))

    poles = numpy.linalg.eigvals(a)
    slow = sorted(poles, key=abs)[:2]
    guess = numpy.sqrt(abs(slow[0] * slow[1])) / (2 * numpy.pi)

    # d|H|/df = 0 is found as a root, for the flat top of a peak hides half of the digits from a search for the greatest.
    def slope(frequency):
        s = 2j * numpy.pi * frequency
        inner = numpy.linalg.solve(s * identity - a, b)
        derivative = -(c @ numpy.linalg.solve(s * identity - a, inner))[0, 0] * 2j * numpy.pi
        return (numpy.conj(response(frequency)) * derivative).real

    peak = optimize.brentq(slope, guess / 2, guess * 2, xtol=1e-13, rtol=1e-15)
    half = gain(peak) / numpy.sqrt(2)
    edge = lambda near, far: optimize.brentq(lambda f: gain(f) - half, near, far, xtol=1e-13, rtol=1e-15)
    lower, upper = edge(peak / 1000, peak), edge(peak, peak * 100)

    most = 1e6 if d[0, 0] != 0 or case["ro"] > 0 else numpy.inf
    power = lambda log_f: gain(numpy.exp(log_f)) ** 2 * numpy.exp(log_f)
    pieces = [numpy.log(peak * 10.0**k) for k in (-9, -6, -3, -2, -1, -0.3, -0.1, 0, 0.1, 0.3, 1, 2)]
    pieces += [numpy.log(most)] if numpy.isfinite(most) else [numpy.log(peak * 10.0**k) for k in (3, 5, 7, 10, 14)]
    pieces = [p for p in pieces if p <= pieces[-1]]
    noise = sum(
        integrate.quad(power, left, right, epsabs=0, epsrel=1e-12, limit=400)[0]
        for left, right in zip(pieces[:-1], pieces[1:])
    )

    frequencies = [float(f"{f:.6g}") for f in numpy.geomspace(peak / 30, peak * 30, 41)]
    _, curve = signal.freqresp(signal.StateSpace(a, b, c, d), 2 * numpy.pi * numpy.array(frequencies))
    direct = numpy.array([response(f) for f in frequencies])
    # scipy forms polynomials on the way and loses digits there; it must agree to what that allows.
    assert numpy.allclose(curve, direct, rtol=1e-6, atol=0), case["id"]
    return {
        "centre": peak,
        "peak": gain(peak),
        "lower": lower,
        "upper": upper,
        "noiseBandwidth": noise / gain(peak) ** 2,
        "curve": [[f, h.real, h.imag] for f, h in zip(frequencies, direct)],
    }


def main():
    document = {
        "made by": "tests/reference/band_pass.py",
        "versions": {
            "python": sys.version.split()[0],
            "numpy": numpy.__version__,
            "scipy": scipy.__version__,
        },
        "cases": [{"given": case, "figures": figures(case)} for case in CASES],
    }
    json.dump(document, sys.stdout, indent=1)
    sys.stdout.write("\n")


if __name__ == "__main__":
    main()
