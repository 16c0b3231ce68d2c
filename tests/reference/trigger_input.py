"""The pulse through a transistor threshold by scipy, apart from the library: python3 tests/reference/trigger_input.py > tests/reference/trigger_input.json

The state is the voltage across the differentiator's capacitor; the two nodes behind it are solved for in every evaluation.
The library separates the equation for the base voltage and integrates the time instead.
"""

import json
import sys

import numpy
import scipy
from scipy import integrate, optimize

BOLTZMANN, CHARGE = 1.380649e-23, 1.602176634e-19

BASE = {"ra": 100e3, "rb": 47e3, "rc": 10e3, "cd": 22e-9, "rd": 47e3, "rs": 1e3, "step": 10.0, "rail": 12.0, "beta": 100.0, "is": 1e-14}
CASES = [
    {"id": "worked", **BASE},
    {"id": "low-step", **BASE, "step": 4.0},
    {"id": "high-gain", **BASE, "beta": 500.0},
    {"id": "other-parts", **BASE, "ra": 47e3, "rb": 22e3, "rd": 220e3, "cd": 10e-9, "rs": 4.7e3, "rc": 22e3},
    {"id": "large-junction", **BASE, "is": 1e-12, "rail": 9.0},
]


def figures(case):
    vt = BOLTZMANN * 298.15 / CHARGE
    half = (case["rail"] - 0.2) / case["rc"] / 2
    edge = vt * numpy.log1p(half / case["is"])

    def nodes(held, held_base=None):
        """Base voltage and current through the capacitor, with `held` volts across it; the base as a junction or a held voltage."""

        def at(vb):
            into = vb / case["rb"] + case["is"] / case["beta"] * numpy.expm1(vb / vt)
            va = vb + case["ra"] * into
            return va, va / case["rd"] + into

        def balance(vb):
            va, current = at(vb)
            return va + case["rs"] * current - (case["step"] - held)

        vb = optimize.brentq(balance, -1, 0.9, xtol=1e-15, rtol=1e-15)
        return vb, at(vb)[1]

    passes = lambda _, u: nodes(u[0])[0] - edge
    passes.terminal = True
    run = integrate.solve_ivp(lambda _, u: [nodes(u[0])[1] / case["cd"]], (0, 0.1), [0.0], method="Radau", rtol=1e-12, atol=1e-13, events=passes)

    # The base held at a voltage: a linear network, whose capacitor voltage is stepped by the same integrator.
    vbe = 0.6
    threshold = vbe * (1 + case["ra"] / case["rb"])

    def held(u):
        conductance = 1 / case["rs"] + 1 / case["rd"] + 1 / case["ra"]
        va = ((case["step"] - u) / case["rs"] + vbe / case["ra"]) / conductance
        return va, (case["step"] - u - va) / case["rs"]

    falls = lambda _, u: held(u[0])[0] - threshold
    falls.terminal = True
    linear = integrate.solve_ivp(lambda _, u: [held(u[0])[1] / case["cd"]], (0, 0.1), [0.0], method="Radau", rtol=1e-12, atol=1e-13, events=falls)
    return {"widthHalf": run.t_events[0][0], "width": linear.t_events[0][0]}


def main():
    document = {
        "made by": "tests/reference/trigger_input.py",
        "versions": {"python": sys.version.split()[0], "numpy": numpy.__version__, "scipy": scipy.__version__},
        "cases": [{"given": case, "figures": figures(case)} for case in CASES],
    }
    json.dump(document, sys.stdout, indent=1)
    sys.stdout.write("\n")


if __name__ == "__main__":
    main()
