"""Op amp and transistor as a current sink, by scipy: python3 tests/reference/voltage_to_current.py > tests/reference/voltage_to_current.json

A high but finite open-loop gain drives base stopper and junction; Kirchhoff's laws for the drive voltage and the emitter
are solved at once. With the gain at 10^9 the loop is as good as ideal.
"""

import json
import sys

import numpy
import scipy
from scipy import optimize

VT, IS, GAIN = 1.380649e-23 * 298.15 / 1.602176634e-19, 1e-14, 1e9

CASES = [
    {"id": "bench", "re": 15.5e3, "beta": 200.0, "venv": 7.8, "vos": 0.0, "rb": 0.0},
    {"id": "offset", "re": 15.5e3, "beta": 200.0, "venv": 0.0, "vos": 3e-3, "rb": 0.0},
    {"id": "stopper", "re": 8.2e3, "beta": 60.0, "venv": 5.0, "vos": -2e-3, "rb": 4.7e3},
    {"id": "small", "re": 220e3, "beta": 400.0, "venv": 1.0, "vos": 5e-3, "rb": 2.2e3},
]


def collector(case):
    def equations(x):
        log_ib, emitter = x
        ib = numpy.exp(log_ib)
        vbe = VT * numpy.log(case["beta"] * ib / IS)
        drive = emitter + vbe + ib * case["rb"]
        error = case["venv"] + case["vos"] - emitter
        return [drive / GAIN - error, ((case["beta"] + 1) * ib - emitter / case["re"]) / (ib + 1e-12)]

    emitter = case["venv"] + case["vos"]
    start = [numpy.log(emitter / case["re"] / (case["beta"] + 1)) + 0.1, emitter * 0.99]
    found = optimize.root(equations, start, options={"xtol": 1e-15})
    if numpy.max(numpy.abs(found.fun)) > 1e-9:
        raise SystemExit(f"not converged: {found.fun}")
    return case["beta"] * numpy.exp(found.x[0])


def main():
    cases = [{"given": case, "figures": {"outputCurrent": collector(case)}} for case in CASES]
    versions = {"python": sys.version.split()[0], "numpy": numpy.__version__, "scipy": scipy.__version__}
    print(json.dumps({"made by": "tests/reference/voltage_to_current.py", "versions": versions, "cases": cases}, indent=2))


main()
