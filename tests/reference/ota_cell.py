"""A transconductance cell by scipy, apart from the library: python3 tests/reference/ota_cell.py > tests/reference/ota_cell.json

The pair with its linearising diodes is not reduced by hand: both diode currents, both input voltages and the pair's split
are unknowns of Kirchhoff's laws. Fourier coefficients and Gaussian means are adaptive integrals of that solution.
"""

import json
import sys

import numpy
import scipy
from scipy import integrate, optimize

K, Q = 1.380649e-23, 1.602176634e-19

CASES = [
    {"id": "plain-10-mv", "rin": 33e3, "rsh": 1e3, "id_": 0.0, "t": 298.15, "sine": 0.34, "noise": 0.34},
    {"id": "plain-100-mv", "rin": 33e3, "rsh": 1e3, "id_": 0.0, "t": 298.15, "sine": 3.4, "noise": 1.02},
    {"id": "plain-small-hot", "rin": 10e3, "rsh": 470.0, "id_": 0.0, "t": 330.0, "sine": 0.02, "noise": 0.05},
    {"id": "diodes-half-swing", "rin": 33e3, "rsh": 1e3, "id_": 1e-3, "t": 298.15, "sine": 17.46, "noise": 5.0},
    {"id": "diodes-small-current", "rin": 47e3, "rsh": 2.2e3, "id_": 0.1e-3, "t": 283.15, "sine": 3.0, "noise": 1.0},
    {"id": "diodes-clipping", "rin": 33e3, "rsh": 1e3, "id_": 0.5e-3, "t": 298.15, "sine": 25.0, "noise": 12.0},
]


def share(case, vt):
    """The output's share of the bias current at a source voltage."""
    k = case["rsh"] / (case["rsh"] + case["rin"])
    seen = case["rsh"] * case["rin"] / (case["rsh"] + case["rin"])
    current = case["id_"]

    def plain(v):
        return numpy.tanh(k * v / (2 * vt))

    def predistorted(v):
        # Unknown: the share s of ID through the diode of the + input. Input voltages follow by Ohm, the diodes' own
        # difference must equal theirs, and the pair splits the bias current by it.
        def mismatch(s):
            plus, minus = k * v + seen * current * s, seen * current * (1 - s)
            return (plus - minus) + vt * numpy.log(s / (1 - s))

        s = optimize.brentq(mismatch, 1e-300, 1 - 1e-16, xtol=1e-16, rtol=1e-15)
        difference = k * v + seen * current * (2 * s - 1)
        return numpy.tanh(difference / (2 * vt))

    return plain if current == 0 else predistorted


def sine(f, peak):
    quarter = lambda n: 4 / numpy.pi * integrate.quad(lambda a: f(peak * numpy.sin(a)) * numpy.sin(n * a), 0, numpy.pi / 2, epsabs=1e-14, epsrel=1e-12, limit=400)[0]
    first = quarter(1)
    rest = integrate.quad(lambda a: (f(peak * numpy.sin(a)) - first * numpy.sin(a)) ** 2, 0, numpy.pi / 2, epsabs=1e-18, epsrel=1e-12, limit=400)[0]
    return first, numpy.sqrt(rest * 4 / numpy.pi) / first


def noise(f, rms):
    weight = lambda z: numpy.exp(-z * z / 2) / numpy.sqrt(2 * numpy.pi)
    mean = lambda g: 2 * integrate.quad(lambda z: g(z) * weight(z), 0, 12, epsabs=1e-18, epsrel=1e-12, limit=400)[0]
    gain = mean(lambda z: z * f(rms * z))
    return gain / rms, numpy.sqrt(mean(lambda z: (f(rms * z) - gain * z) ** 2)) / gain


def main():
    cases = []
    for case in CASES:
        vt = K * case["t"] / Q
        f = share(case, vt)
        step = 1e-4
        slope = (8 * (f(step) - f(-step)) - (f(2 * step) - f(-2 * step))) / (12 * step)
        first, sine_distortion = sine(f, case["sine"])
        gain, noise_distortion = noise(f, case["noise"])
        figures = {
            "shareAtPeak": float(f(case["sine"])),
            "sineDistortion": sine_distortion,
            "sineCompressionDb": 20 * numpy.log10(first / case["sine"] / slope),
            "noiseDistortion": noise_distortion,
            "noiseCompressionDb": 20 * numpy.log10(gain / slope),
        }
        cases.append({"given": case, "figures": figures})
    versions = {"python": sys.version.split()[0], "numpy": numpy.__version__, "scipy": scipy.__version__}
    print(json.dumps({"made by": "tests/reference/ota_cell.py", "versions": versions, "cases": cases}, indent=2))


main()
