"""Levels and supply of random voices by numpy, apart from the library: python3 tests/reference/whole_voice.py > tests/reference/whole_voice.json

Every voice: two independent noises; the first stands across a pot, whose wiper feeds two or three paths at once; the
second feeds a path of its own. A path is an inverting or non-inverting amplifier, or a transconductance cell. All paths
meet in an inverting sum and leave through a driver. The wiper's node is solved by Kirchhoff's current law with every load
on it, waves are rows of a covariance matrix, and the cell's best-fit gain and distortion are Gauss-Hermite sums. The
supply is counted device by device.
"""

import json
import sys

import numpy

K, Q = 1.380649e-23, 1.602176634e-19
VT = K * 298.15 / Q
random = numpy.random.default_rng(20260117)
nodes, weights = numpy.polynomial.hermite_e.hermegauss(160)
weights = weights / weights.sum()


def pick(low, high):
    return float(numpy.exp(random.uniform(numpy.log(low), numpy.log(high))))


def path():
    kind = random.choice(["inverting", "non-inverting", "cell"])
    if kind == "cell":
        return {"kind": "cell", "rin": pick(20e3, 100e3), "rsh": pick(500, 2e3), "rf": pick(5e3, 20e3), "bias": pick(100e-6, 900e-6)}
    return {"kind": str(kind), "ri": pick(5e3, 50e3), "rf": pick(5e3, 50e3), "rb": pick(20e3, 200e3), "ro": pick(100, 2e3)}


def load_of(p):
    return {"inverting": lambda: p["ri"], "non-inverting": lambda: p["rb"], "cell": lambda: p["rin"] + p["rsh"]}[p["kind"]]()


def through(p, volts):
    """Signed linear coefficient, own uncorrelated RMS, output resistance; volts is the RMS at the path's input node."""
    if p["kind"] == "inverting":
        return -p["rf"] / p["ri"], 0.0, p["ro"]
    if p["kind"] == "non-inverting":
        return 1 + p["rf"] / p["ri"], 0.0, p["ro"]
    sigma = volts * p["rsh"] / (p["rin"] + p["rsh"])
    x = sigma * nodes
    y = p["bias"] * p["rf"] * numpy.tanh(x / (2 * VT))
    g = float(weights @ (x * y) / (weights @ (x * x)))
    rest = float(numpy.sqrt(max(0.0, weights @ (y * y) - g * g * (weights @ (x * x)))))
    return -g * p["rsh"] / (p["rin"] + p["rsh"]), rest, 0.0


def case(index):
    shared = [path() for _ in range(int(random.integers(2, 4)))]
    # Two cells would share their distortion, which is no part of a level plan.
    for extra in [p for p in shared if p["kind"] == "cell"][1:]:
        extra.update({"kind": "inverting", "ri": 22e3, "rf": 10e3, "rb": 1e5, "ro": 470.0})
    own = {"kind": "inverting", "ri": pick(5e3, 50e3), "rf": pick(5e3, 50e3), "rb": 1e5, "ro": pick(100, 2e3)}
    paths = shared + [own]
    given = {
        "id": f"voice-{index}",
        "first": pick(0.2, 2), "second": pick(0.2, 2),
        "pot": {"top": pick(100, 10e3), "track": pick(1e3, 100e3), "bottom": pick(100, 10e3), "rotation": float(random.uniform(0.05, 0.95))},
        "paths": paths,
        "sum": {"r": [pick(10e3, 220e3) for _ in paths], "rf": pick(10e3, 47e3)},
        "driver": {"ri": pick(5e3, 22e3), "rf": pick(5e3, 47e3), "ro": 1e3, "load": 100e3},
    }
    pot = given["pot"]
    upper = pot["top"] + pot["track"] * (1 - pot["rotation"])
    lower = pot["bottom"] + pot["track"] * pot["rotation"]
    conductance = 1 / upper + 1 / lower + sum(1 / load_of(p) for p in shared)
    wiper = given["first"] / upper / conductance
    # Rows: the paths; columns: first noise, second noise, then one uncorrelated rest for each path.
    rows = numpy.zeros((len(paths), 2 + len(paths)))
    resistance = []
    for k, p in enumerate(paths):
        volts = given["second"] if p is own else wiper
        gain, rest, out = through(p, volts)
        rows[k, 1 if p is own else 0] = gain * volts
        rows[k, 2 + k] = rest
        resistance.append(out)
    sum_in = given["sum"]
    weight = numpy.array([-sum_in["rf"] / (r + s) for r, s in zip(sum_in["r"], resistance)])
    total = weight @ rows
    level = float(numpy.sqrt(total @ total))
    driver = given["driver"]
    jack = level * driver["rf"] / driver["ri"] * driver["load"] / (driver["load"] + driver["ro"])
    covariance = rows @ rows.T
    spread = numpy.sqrt(numpy.diag(covariance))
    cells = [p for p in paths if p["kind"] == "cell"]
    op_amps = len(paths) + 2
    packages = -(-op_amps // 2)
    bias = sum(p["bias"] for p in cells)
    positive = packages * 2 * 1.4e-3 + len(cells and [1]) * 2.1e-3 + bias + 1e-3
    negative = positive - 1e-3
    most = packages * 2 * 2.5e-3 + len(cells and [1]) * 4e-3 + bias
    return {
        "given": given,
        "figures": {
            "wiper": wiper,
            "paths": [float(numpy.sqrt(row @ row)) for row in rows],
            "correlation": float(covariance[0, 1] / spread[0] / spread[1]),
            "sum": level,
            "jack": jack,
            "headroomDb": float(20 * numpy.log10(10.5 * driver["load"] / (driver["load"] + driver["ro"]) / (4 * jack))),
            "supply": {"positive": positive, "negative": negative, "most": most + 1.5e-3, "limit": 2 * (most + 1.5e-3), "power": 12 * (positive + negative)},
        },
    }


json.dump(
    {
        "made by": "tests/reference/whole_voice.py",
        "versions": {"python": sys.version.split()[0], "numpy": numpy.__version__},
        "cases": [case(index) for index in range(60)],
    },
    sys.stdout,
    indent=1,
)
print()
