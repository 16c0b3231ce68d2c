"""Current mirrors by scipy, apart from the library: python3 tests/reference/current_mirror.py > tests/reference/current_mirror.json

Every node voltage is an unknown of Kirchhoff's current law and all are found at once by scipy.optimize.root; nothing is
eliminated by hand. Each transistor: Ic = Is exp(VBE/VT) (1 + VCE/VA), Ib = Ic/beta at its operating point. Output
resistances are slopes with the base currents held to their own VBE: Ib = Ib0 exp((VBE - VBE0)/VT).
"""

import json
import sys

import numpy
import scipy
from scipy import optimize

K, Q = 1.380649e-23, 1.602176634e-19
RAIL = 12.0

CASES = [
    {"id": "simple", "topology": "simple", "iref": 500e-6, "beta": 150.0, "va": 50.0, "vout": -10.7},
    {"id": "simple-three", "topology": "simple", "iref": 200e-6, "beta": 80.0, "va": 70.0, "vout": 3.0, "n": 3},
    {"id": "simple-mismatch-warm", "topology": "simple", "iref": 20e-6, "beta": 200.0, "va": 100.0, "vout": 0.0, "dv": 3e-3, "t": 320.0},
    {"id": "simple-series", "topology": "simple", "iref": 500e-6, "beta": 150.0, "va": 50.0, "vout": -10.7, "rs": 33e3},
    {"id": "degenerated", "topology": "degenerated", "iref": 500e-6, "beta": 150.0, "va": 50.0, "vout": -10.7, "r1": 1e3, "r2": 1e3},
    {"id": "degenerated-tail", "topology": "degenerated", "iref": 5e-6, "beta": 150.0, "va": 50.0, "vout": -10.7, "r1": 1e3, "r2": 1e3, "dv": 5e-3},
    {"id": "degenerated-two-of-a-half", "topology": "degenerated", "iref": 300e-6, "beta": 120.0, "va": 80.0, "vout": -5.0, "r1": 2.2e3, "r2": 1e3, "n": 2},
    {"id": "degenerated-cold-series", "topology": "degenerated", "iref": 1e-3, "beta": 60.0, "va": 40.0, "vout": -10.7, "r1": 470.0, "r2": 1.5e3, "rs": 10e3, "t": 280.0, "dv": -2e-3},
    {"id": "wilson", "topology": "wilson", "iref": 500e-6, "beta": 150.0, "va": 50.0, "vout": -10.7},
    {"id": "wilson-textbook", "topology": "wilson", "iref": 1e-3, "beta": 100.0, "va": 100.0, "vout": 10.5},
    {"id": "wilson-mismatch-series", "topology": "wilson", "iref": 100e-6, "beta": 90.0, "va": 60.0, "vout": -8.0, "dv": 1.5e-3, "rs": 15e3, "t": 310.0},
]


def saturation(t):
    vt = K * t / Q
    return 1e-14 * (t / 298.15) ** 3 * numpy.exp((t / 298.15 - 1) * 1.11 / vt)


class Transistor:
    """A PNP counted from its emitter downwards; dv raises its current as a base-emitter voltage would."""

    def __init__(self, case, dv=0.0):
        self.vt = K * case.get("t", 298.15) / Q
        self.isat = saturation(case.get("t", 298.15)) * numpy.exp(dv / self.vt)
        self.va, self.beta = case["va"], case["beta"]
        self.held = None

    def currents(self, emitter, base, collector):
        vbe, vce = emitter - base, emitter - collector
        transport = self.isat * numpy.exp(vbe / self.vt)
        ic = transport * (1 + vce / self.va)
        return ic, transport * self.held if self.held is not None else ic / self.beta

    def hold(self, emitter, base, collector):
        ic, ib = self.currents(emitter, base, collector)
        self.held = ib / (self.isat * numpy.exp((emitter - base) / self.vt))


def pair(case):
    n, rs = case.get("n", 1), case.get("rs", 0.0)
    r1, r2 = case.get("r1", 0.0), case.get("r2", 0.0)
    q1 = Transistor(case)
    q2s = [Transistor(case, case.get("dv", 0.0)) for _ in range(n)]
    v0 = q1.vt * numpy.log(case["iref"] / q1.isat)

    def unpack(x):
        b, e1 = RAIL - x[0], RAIL - x[1]
        return b, e1, RAIL - x[2 : 2 + n], x[2 + n :] * case["iref"]

    def equations(x, vout):
        b, e1, e2s, outs = unpack(x)
        ic1, ib1 = q1.currents(e1, b, b)
        total = ic1 + ib1
        rows = [(RAIL - e1) - r1 * (ic1 + ib1)]
        for k, q2 in enumerate(q2s):
            ic2, ib2 = q2.currents(e2s[k], b, vout[k] + rs * outs[k])
            total += ib2
            rows += [(RAIL - e2s[k]) - r2 * (ic2 + ib2), ic2 / case["iref"] - outs[k] / case["iref"]]
        return [total / case["iref"] - 1, *rows]

    guess_ratio = r1 / r2 if r2 else 1.0
    start = numpy.array([v0 + r1 * case["iref"], r1 * case["iref"], *[r1 * case["iref"]] * n, *[guess_ratio] * n])
    base = [case["vout"]] * n
    x = solve(lambda x: equations(x, base), start)
    b, e1, e2s, outs = unpack(x)
    q1.hold(e1, b, b)
    for k, q2 in enumerate(q2s):
        q2.hold(e2s[k], b, case["vout"] + rs * outs[k])

    def moved(step):
        shifted = [case["vout"] + step, *base[1:]]
        return unpack(solve(lambda x: equations(x, shifted), x))[3][0]

    return outs[0], x[0] - x[1], slope(moved)


def wilson(case):
    rs = case.get("rs", 0.0)
    q1, q2, q3 = Transistor(case), Transistor(case, case.get("dv", 0.0)), Transistor(case)
    v0 = q1.vt * numpy.log(case["iref"] / q1.isat)

    def parts(x, vout):
        b, r, out = RAIL - x[0], RAIL - x[1], x[2] * case["iref"]
        return b, r, out, vout + rs * out

    def equations(x, vout):
        b, r, out, c3 = parts(x, vout)
        ic1, ib1 = q1.currents(RAIL, b, r)
        ic2, ib2 = q2.currents(RAIL, b, b)
        ic3, ib3 = q3.currents(b, r, c3)
        return [
            (ic1 + ib3) / case["iref"] - 1,
            (ic3 + ib3 - ic2 - ib1 - ib2) / case["iref"],
            (ic3 - out) / case["iref"],
        ]

    x = solve(lambda x: equations(x, case["vout"]), numpy.array([v0, 2 * v0, 1.0]))
    b, r, out, c3 = parts(x, case["vout"])
    q1.hold(RAIL, b, r)
    q2.hold(RAIL, b, b)
    q3.hold(b, r, c3)
    moved = lambda step: parts(solve(lambda x: equations(x, case["vout"] + step), x), 0.0)[2]
    return out, x[0], slope(moved)


def solve(f, start):
    found = optimize.root(f, start, method="hybr", options={"xtol": 1e-15})
    residual = numpy.max(numpy.abs(f(found.x)))
    if residual > 1e-9:
        raise SystemExit(f"not converged: {residual}")
    return found.x


def slope(current):
    step = 0.5
    # A fourth-order central difference; the output current falls as the output is pulled up.
    first = current(-step) - current(step)
    second = current(-2 * step) - current(2 * step)
    return 12 * step / (8 * first - second)


def main():
    cases = []
    for case in CASES:
        out, vbe, resistance = (wilson if case["topology"] == "wilson" else pair)(case)
        cases.append({"given": case, "figures": {"outputCurrent": out, "baseEmitterVoltage": vbe, "outputResistance": resistance}})
    versions = {"python": sys.version.split()[0], "numpy": numpy.__version__, "scipy": scipy.__version__}
    print(json.dumps({"made by": "tests/reference/current_mirror.py", "versions": versions, "cases": cases}, indent=2))


main()
