"""The other band-pass networks by scipy, apart from the library: python3 tests/reference/band_pass_networks.py > tests/reference/band_pass_networks.json

Each network is a list of parts. Its matrices G + sC (modified nodal analysis, one unknown current per source and op amp) are
filled part by part; poles are the eigenvalues of that pencil, the noise bandwidth is a quadrature, and the struck ring is the
inverse Laplace transform by the residues of the numerical response. No transfer function is written down anywhere.
"""

import json
import sys

import numpy
import scipy
from scipy import integrate, linalg, optimize

SK = {"r1": 22e3, "r2": 22e3, "r3": 22e3, "rf": 24e3, "rg": 10e3, "c1": 10e-9, "c2": 10e-9}
TWO = {"r1": 16e3, "r2": 16e3, "rq1": 82e3, "rq2": 10e3, "ri": 10e3, "ra": 10e3, "rb": 10e3, "c1": 10e-9, "c2": 10e-9}
BT = {"r1": 1e3, "r2": 1e6, "rin": 1e6, "c1": 22e-9, "c2": 22e-9}
RC = {"r1": 4700.0, "c1": 33e-9, "r2": 47e3, "c2": 3.3e-9}

CASES = [
    {"id": "sallen-key-ideal", "topology": "sallen-key", "parts": SK, "rs": 0.0, "ft": None},
    {"id": "sallen-key-3-mhz", "topology": "sallen-key", "parts": SK, "rs": 1e3, "ft": 3e6},
    {"id": "sallen-key-unequal", "topology": "sallen-key", "parts": {**SK, "r1": 15e3, "r2": 47e3, "rf": 10e3, "c1": 22e-9, "c2": 4.7e-9}, "rs": 0.0, "ft": 1e6},
    {"id": "two-integrator-ideal", "topology": "two-integrator", "parts": TWO, "rs": 0.0, "ft": None},
    {"id": "two-integrator-3-mhz", "topology": "two-integrator", "parts": TWO, "rs": 0.0, "ft": 3e6},
    {"id": "two-integrator-stress", "topology": "two-integrator", "parts": {**TWO, "r1": 31830.0, "r2": 31830.0, "c1": 1e-9, "c2": 1e-9, "rq1": 290e3}, "rs": 0.0, "ft": 1e6},
    {"id": "two-integrator-unequal", "topology": "two-integrator", "parts": {**TWO, "r1": 27e3, "ra": 22e3, "ri": 47e3, "c2": 4.7e-9}, "rs": 5e3, "ft": 0.5e6},
    {"id": "bridged-t-ideal", "topology": "bridged-t", "parts": BT, "rs": 0.0, "ft": None, "strike": [10.0, 1e-3]},
    {"id": "bridged-t-3-mhz", "topology": "bridged-t", "parts": BT, "rs": 0.0, "ft": 3e6, "strike": [10.0, 1e-3]},
    {"id": "bridged-t-low", "topology": "bridged-t", "parts": {"r1": 2200.0, "r2": 470e3, "rin": 220e3, "c1": 100e-9, "c2": 47e-9}, "rs": 10e3, "ft": 1e6, "strike": [5.0, 5e-3]},
    {"id": "passive", "topology": "passive", "parts": RC, "rs": 0.0, "ft": None},
    {"id": "passive-loaded", "topology": "passive", "parts": RC, "rs": 1e3, "ft": None, "rl": 100e3},
]

NETWORKS = {
    "sallen-key": ([("r1", "in", "x"), ("c1", "x", "0"), ("c2", "x", "p"), ("r2", "p", "0"), ("r3", "o", "x"), ("rf", "o", "g"), ("rg", "g", "0")], [("p", "g", "o")], "o"),
    "two-integrator": ([("ri", "in", "s"), ("ra", "lp", "s"), ("rb", "hp", "s"), ("rq1", "bp", "q"), ("rq2", "q", "0"), ("r1", "hp", "a"), ("c1", "a", "bp"), ("r2", "bp", "b"), ("c2", "b", "lp")], [("q", "s", "hp"), ("0", "a", "bp"), ("0", "b", "lp")], "bp"),
    "bridged-t": ([("rin", "in", "m"), ("c1", "m", "x"), ("c2", "x", "o"), ("r1", "x", "0"), ("r2", "o", "m")], [("0", "m", "o")], "o"),
    "passive": ([("c1", "in", "a"), ("r1", "a", "0"), ("r2", "a", "o"), ("c2", "o", "0")], [], "o"),
}


def matrices(case):
    parts, amps, out = NETWORKS[case["topology"]]
    listed = [(name, a, b, case["parts"][name]) for name, a, b in parts]
    entry = "in"
    if case["rs"] > 0:
        listed.append(("rs", "source", "in", case["rs"]))
        entry = "source"
    if case.get("rl"):
        listed.append(("rl", out, "0", case["rl"]))
    nodes = sorted({n for _, a, b, _ in listed for n in (a, b)} - {"0"})
    size = len(nodes) + 1 + len(amps)
    g, c, b = numpy.zeros((size, size)), numpy.zeros((size, size)), numpy.zeros(size)
    row = lambda n: None if n == "0" else nodes.index(n)
    for name, p, q, value in listed:
        target, y = (c, value) if name.startswith("c") else (g, 1 / value)
        for u, v in ((row(p), row(q)), (row(q), row(p))):
            if u is None:
                continue
            target[u, u] += y
            if v is not None:
                target[u, v] -= y
    k = len(nodes)
    g[row(entry), k] += 1
    g[k, row(entry)] = 1
    b[k] = 1
    for i, (plus, minus, output) in enumerate(amps):
        k = len(nodes) + 1 + i
        g[row(output), k] += 1
        for n, sign in ((plus, 1), (minus, -1)):
            if row(n) is not None:
                g[k, row(n)] += sign
        if case["ft"] is not None:
            c[k, row(output)] -= 1 / (2 * numpy.pi * case["ft"])
    return g, c, b, row(out)


def figures(case):
    g, c, b, out = matrices(case)
    at = lambda s: numpy.linalg.solve(g + s * c, b)[out]
    gain = lambda f: abs(at(2j * numpy.pi * f))
    eigenvalues = linalg.eigvals(g, -c)
    poles = eigenvalues[numpy.isfinite(eigenvalues) & (abs(eigenvalues) < 1e12)]
    complex_poles = sorted((p for p in poles if p.imag > 1e-6 * abs(p)), key=abs)
    if complex_poles:
        pole = complex_poles[0]
        size, quality = abs(pole), abs(pole) / (-2 * pole.real)
    else:
        slow, fast = sorted(-poles.real)[:2]
        size, quality = numpy.sqrt(slow * fast), numpy.sqrt(slow * fast) / (slow + fast)
    centre = size / (2 * numpy.pi)
    found = {"poleCentre": centre, "poleQuality": quality}
    if case["topology"] == "bridged-t":
        top = centre
        found.update(ring(case, at, poles, centre))
    else:

        def slope(f):
            s = 2j * numpy.pi * f
            inner = numpy.linalg.solve(g + s * c, b)
            turned = -numpy.linalg.solve(g + s * c, c @ inner)[out] * 2j * numpy.pi
            return (numpy.conj(inner[out]) * turned).real

        top = optimize.brentq(slope, centre / 1.5, centre * 1.5, xtol=1e-13, rtol=1e-14)
        half = gain(top) / numpy.sqrt(2)
        edge = lambda near, far: optimize.brentq(lambda f: gain(f) - half, near, far, xtol=1e-13, rtol=1e-14)
        found.update(centreFrequency=top, lowerEdge=edge(top / 1000, top), upperEdge=edge(top, top * 100))
    found["peakGain"] = gain(top)
    power = lambda log_f: gain(numpy.exp(log_f)) ** 2 * numpy.exp(log_f)
    pieces = [numpy.log(top * 10.0**k) for k in (-13, -9, -6, -3, -2, -1, -0.3, -0.1, 0, 0.1, 0.3, 1, 2, 3, 5, 7, 10, 13)]
    noise = sum(integrate.quad(power, p, q, epsabs=0, epsrel=1e-12, limit=400)[0] for p, q in zip(pieces[:-1], pieces[1:]))
    found["noiseBandwidth"] = noise / found["peakGain"] ** 2
    return found


def ring(case, at, poles, centre):
    """The farthest swing after a pulse: residues off a small circle around each pole, then a fine search in time."""
    height, width = case["strike"]
    modes = []
    for p in poles:
        radius = 1e-3 * min([abs(p)] + [abs(p - q) for q in poles if abs(p - q) > 1e-9 * abs(p)])
        circle = radius * numpy.exp(2j * numpy.pi * (numpy.arange(16) + 0.5) / 16)
        modes.append((p, numpy.mean([at(p + d) * d for d in circle])))
    step = lambda t: sum(r / p * (numpy.exp(p * t) - 1) for p, r in modes).real if t > 0 else 0.0
    swing = lambda t: -abs(height * (step(t) - step(t - width)))
    times = numpy.linspace(0, width + 1.5 / centre, 4001)
    best = times[numpy.argmin([swing(t) for t in times])]
    found = optimize.minimize_scalar(swing, bounds=(best - times[1], best + times[1]), method="bounded", options={"xatol": 1e-13})
    return {"ringPeak": -found.fun}


def main():
    document = {
        "made by": "tests/reference/band_pass_networks.py",
        "versions": {"python": sys.version.split()[0], "numpy": numpy.__version__, "scipy": scipy.__version__},
        "cases": [{"given": case, "figures": figures(case)} for case in CASES],
    }
    json.dump(document, sys.stdout, indent=1)
    sys.stdout.write("\n")


if __name__ == "__main__":
    main()
