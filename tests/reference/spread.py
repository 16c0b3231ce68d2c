"""Spread of a multiple-feedback band-pass over the same random boards, by numpy; exact binomial bounds by scipy.

The boards are drawn anew here: Philox2x32-10 on (board, stream) keyed by the seed, 26 bits of each word, put through the
inverse of the distribution. The network's formulas are the textbook's for an ideal op amp.
"""
import json
import platform

import numpy as np
import scipy
from scipy import special, stats

MASK = np.uint64(0xFFFFFFFF)
LAST = 0xFFFFFFFF


def uniform(seed, boards, stream):
    left = np.arange(boards, dtype=np.uint64)
    right = np.full(boards, stream, dtype=np.uint64)
    key = seed
    for _ in range(10):
        product = np.uint64(0xD256D193) * left
        left = ((product >> np.uint64(32)) ^ np.uint64(key) ^ right) & MASK
        right = product & MASK
        key = (key + 0x9E3779B9) & 0xFFFFFFFF
    k = (left >> np.uint64(6)) * np.uint64(2**26) + (right >> np.uint64(6))
    return (k.astype(float) + 0.5) / 2.0**52


NOMINAL = {"ra": 22e3, "rb": 2200.0, "rbPot": 2000.0, "rf": 100e3, "c1": 10e-9, "c2": 10e-9}
PLACES = {part: place for place, part in enumerate(NOMINAL)}
DRIFTS = {"ra": (-5e-5, 5e-5), "rf": (-5e-5, 5e-5), "rbPot": (-1.5e-3, -3e-4), "c1": (-3.125e-4, 0.0)}


def boards_of(given):
    boards, seed = given["boards"], given["seed"]
    values = {part: np.full(boards, value) for part, value in NOMINAL.items()}
    place = dict(PLACES)
    for lot in given["lots"]:
        for part in lot:
            place[part] = min(PLACES[member] for member in lot)
    warmer = 0.0
    if given["temperature"]:
        least, most = given["temperature"]
        warmer = least + (most - least) * uniform(seed, boards, LAST) - 298.15
    for part, tolerance in given["tolerances"].items():
        u = uniform(seed, boards, 2 * place[part])
        off = 2 * u - 1 if given["distribution"] == "uniform" else special.ndtri(u) / 3
        drift = 0.0
        if given["temperature"] and part in DRIFTS:
            low, high = DRIFTS[part]
            lean = 2 * uniform(seed, boards, 2 * place[part] + 1) - 1
            drift = (low + high + lean * (high - low)) / 2
        values[part] = NOMINAL[part] * (1 + off * tolerance) * (1 + drift * warmer)
    return values


def figures_of(given):
    v = boards_of(given)
    rb = v["rb"] + 0.5 * v["rbPot"]
    g = 1 / v["ra"] + 1 / rb
    centre = np.sqrt(g / (v["rf"] * v["c1"] * v["c2"])) / (2 * np.pi)
    bandwidth = (v["c1"] + v["c2"]) / (2 * np.pi * v["c1"] * v["c2"] * v["rf"])
    quality = centre / bandwidth
    gain = v["rf"] / v["ra"] * v["c2"] / (v["c1"] + v["c2"])
    window = given["window"]
    passed = int(np.sum((centre >= window["least"]) & (centre <= window["most"])))
    boards = given["boards"]
    low = stats.beta.ppf(0.025, passed, boards - passed + 1) if passed else 0.0
    high = stats.beta.ppf(0.975, passed + 1, boards - passed) if passed < boards else 1.0
    at = np.array([700.0, 952.0, 1300.0])
    ratio = at[None, :] / centre[:, None]
    magnitude = 20 * np.log10(gain[:, None] / np.sqrt(1 + (quality[:, None] * (ratio - 1 / ratio)) ** 2))
    return {
        "passed": passed,
        "low": float(low),
        "high": float(high),
        "results": {
            name: {
                "mean": float(np.mean(sample)),
                "standardDeviation": float(np.std(sample, ddof=1)),
                "quantiles": [float(q) for q in np.quantile(sample, [0.05, 0.5, 0.95])],
            }
            for name, sample in (("centreFrequency", centre), ("qualityFactor", quality), ("peakGain", gain))
        },
        "band": [[float(x), *map(float, np.quantile(magnitude[:, i], [0.05, 0.5, 0.95]))] for i, x in enumerate(at)],
    }


FIXED = {"ra": 0.01, "rb": 0.01, "rbPot": 0.2, "rf": 0.01}
WINDOW = {"least": 904.6, "most": 999.8}


def case(name, capacitors, distribution="uniform", lots=(), temperature=None, seed=7, boards=3000):
    return {
        "id": name,
        "boards": boards,
        "seed": seed,
        "distribution": distribution,
        "tolerances": {**FIXED, "c1": capacitors, "c2": capacitors},
        "lots": [list(lot) for lot in lots],
        "temperature": temperature,
        "window": WINDOW,
    }


CASES = [
    case("uniform, 5 % capacitors", 0.05),
    case("three sigma, 5 % capacitors", 0.05, "three-sigma"),
    case("one lot of 5 % capacitors", 0.05, lots=[["c1", "c2"]]),
    case("uniform, 10 % capacitors, another seed", 0.1, seed=4294967295, boards=2500),
    case("0 to 50 degrees", 0.05, temperature=[273.15, 323.15]),
]

BOUNDS = [(20, 20), (0, 20), (19, 20), (950, 1000), (94724, 100000), (1, 100000)]
DEVIATES = [1e-12, 1e-6, 0.01, 0.075, 0.3, 0.5, 0.9, 0.93, 0.999999]

print(
    json.dumps(
        {
            "made by": "tests/reference/spread.py",
            "versions": {"python": platform.python_version(), "numpy": np.__version__, "scipy": scipy.__version__},
            "cases": [{"given": given, "figures": figures_of(given)} for given in CASES]
            + [
                {
                    "given": {"id": "binomial bounds", "seen": [list(pair) for pair in BOUNDS]},
                    "figures": {
                        f"{k} of {n}": {
                            "low": float(stats.beta.ppf(0.025, k, n - k + 1)) if k else 0.0,
                            "high": float(stats.beta.ppf(0.975, k + 1, n - k)) if k < n else 1.0,
                        }
                        for k, n in BOUNDS
                    },
                },
                {
                    "given": {"id": "normal deviates"},
                    "figures": {str(p): float(special.ndtri(p)) for p in DEVIATES},
                },
            ],
        },
        indent=2,
    )
)
