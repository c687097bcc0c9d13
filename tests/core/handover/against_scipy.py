"""Handed-over coefficients against SciPy, and the realised figures that `assess` prints against
figures computed from those coefficients alone.

SciPy (a general numerical library) knows the bilinear map, with or without a frequency at which it
is exact, and the zero-order-hold and first-order-hold equivalents. Matched roots it does not know.

Usage: against_scipy.py CORNERWRIGHT_CLI
"""

import json
import math
import subprocess
import sys
import tempfile
import unittest
from pathlib import Path

import numpy
from scipy import optimize, signal

CLI = ""
PERIOD = 0.001
RELATIVE = 1e-10  # SciPy works on expanded coefficients, and loses the digits in between


def lead(zero, pole):
    kind = "lead" if pole > zero else "lag"
    return {"kind": kind, "zero_rad_s": zero, "pole_rad_s": pole}


CHAINS = {
    "gain": [{"kind": "gain", "gain": -1.75}],
    "integrator": [{"kind": "gain", "gain": 20.0}, {"kind": "integrator"}],
    "pi": [{"kind": "pi", "corner_rad_s": 30.0}],
    "lead": [lead(40.0, 400.0)],
    "lag": [lead(80.0, 9.0)],
    "real pole": [{"kind": "real_pole", "pole_rad_s": 700.0}],
    "washout": [{"kind": "washout", "corner_rad_s": 50.0}],
    "complex poles": [{"kind": "complex_poles", "corner_rad_s": 600.0, "damping": 0.3}],
    "overdamped": [{"kind": "complex_poles", "corner_rad_s": 90.0, "damping": 3.0}],
    "notch": [{"kind": "notch", "corner_rad_s": 800.0, "zero_damping": 0.02, "pole_damping": 0.5}],
    "open notch": [{"kind": "notch", "corner_rad_s": 300.0, "zero_damping": 0.0,
                    "pole_damping": 0.2}],
    "servo": [{"kind": "gain", "gain": 0.8}, {"kind": "pi", "corner_rad_s": 4.0},
              lead(60.0, 500.0), {"kind": "real_pole", "pole_rad_s": 1500.0}],
    "two notches": [{"kind": "notch", "corner_rad_s": 800.0, "zero_damping": 0.02,
                     "pole_damping": 0.5},
                    {"kind": "notch", "corner_rad_s": 1300.0, "zero_damping": 0.01,
                     "pole_damping": 0.4}],
    "improper inside": [{"kind": "real_zero", "zero_rad_s": 50.0},
                        {"kind": "real_pole", "pole_rad_s": 600.0},
                        {"kind": "complex_zeros", "corner_rad_s": 200.0, "damping": 0.1},
                        {"kind": "complex_poles", "corner_rad_s": 900.0, "damping": 0.8}],
}
IMPROPER = {"improper inside"}


def continuous(section):
    """Numerator and denominator of one section, from the table of the project format."""
    kind = section["kind"]
    w = section.get("corner_rad_s", 1.0)
    if kind == "gain":
        return [section["gain"]], [1.0]
    if kind == "integrator":
        return [1.0], [1.0, 0.0]
    if kind == "pi":
        return [1.0, w], [1.0, 0.0]
    if kind in ("lead", "lag"):
        return [1.0 / section["zero_rad_s"], 1.0], [1.0 / section["pole_rad_s"], 1.0]
    if kind == "real_zero":
        return [1.0 / section["zero_rad_s"], 1.0], [1.0]
    if kind == "real_pole":
        return [1.0], [1.0 / section["pole_rad_s"], 1.0]
    if kind == "washout":
        return [1.0 / w, 0.0], [1.0 / w, 1.0]
    if kind == "notch":
        return ([1.0, 2.0 * section["zero_damping"] * w, w * w],
                [1.0, 2.0 * section["pole_damping"] * w, w * w])
    pair = [1.0 / w ** 2, 2.0 * section["damping"] / w, 1.0]
    return ([1.0], pair) if kind == "complex_poles" else (pair, [1.0])


def product(polynomials):
    result = numpy.array([1.0])
    for polynomial in polynomials:
        result = numpy.polymul(result, polynomial)
    return result


def whole(chain):
    parts = [continuous(section) for section in chain]
    return product(n for n, _ in parts), product(d for _, d in parts)


def by_scipy(chain, method, match):
    """Numerator and denominator in z."""
    if method == "tustin":
        return signal.bilinear(*whole(chain), fs=1.0 / PERIOD)
    if method == "tustin_at":
        return signal.bilinear(*whole(chain), fs=match / 2.0 / math.tan(match * PERIOD / 2.0))
    kind = {"step_invariant": "zoh", "ramp_invariant": "foh"}[method]
    numerators, denominators = [], []
    for section in chain:
        b, a = continuous(section)
        if len(a) > 1:
            b, a, _ = signal.cont2discrete((b, a), PERIOD, method=kind)
            b = numpy.atleast_1d(numpy.squeeze(b))
        numerators.append(b)
        denominators.append(a)
    return product(numerators), product(denominators)


class Workshop(unittest.TestCase):
    def setUp(self):
        self.folder = tempfile.TemporaryDirectory()
        self.addCleanup(self.folder.cleanup)
        self.place = Path(self.folder.name)

    def project(self, chain, realisation, plant="1/(s + 1)"):
        path = self.place / "p.cornerwright.json"
        path.write_text(json.dumps({
            "cornerwright": 1, "title": "comparison",
            "plant_cases": [{"name": "bench", "formula": plant}],
            "compensator": chain,
            "sampling": {"sample_period_s": PERIOD, "computation_delay_s": 0.0},
            "realisation": realisation, "requirements": []}))
        return path

    def handed_over(self, project):
        subprocess.run([CLI, "handover", str(project), "--as", "json", "--to", str(self.place)],
                       check=True, capture_output=True)
        return json.loads((self.place / "compensator.json").read_text())

    def ask(self, *arguments):
        done = subprocess.run([CLI, *map(str, arguments)], capture_output=True, text=True)
        self.assertIn(done.returncode, (0, 1, 2), done.stderr)
        return json.loads(done.stdout)


def response(handover, z):
    value = 1.0
    for section in handover["sections"]:
        value = value * numpy.polyval(section["b"], z) / numpy.polyval(section["a"], z)
    return value


def realisation_of(method, structure="direct_form_2_transposed", match=None):
    result = {"method": method, "structure": structure, "number_format": {"type": "float64"}}
    if match:
        result["match_rad_s"] = match
    return result


class AgainstSciPy(Workshop):
    def compare(self, name, method, match=None):
        chain = CHAINS[name]
        handover = self.handed_over(self.project(chain, realisation_of(method, match=match)))
        b, a = by_scipy(chain, method, match)
        z = numpy.exp(1j * PERIOD * numpy.array([0.5, 9.0, 70.0, 450.0, 1300.0, 2800.0]))
        expected = numpy.polyval(b, z) / numpy.polyval(a, z)
        worst = numpy.max(numpy.abs(response(handover, z) / expected - 1.0))
        self.assertLess(worst, RELATIVE, f"{name}, {method}")
        if len(handover["sections"]) == 1 and len(a) == 3:
            ours = handover["sections"][0]
            b = numpy.concatenate([numpy.zeros(3 - len(b)), b])
            numpy.testing.assert_allclose(ours["b"], b / a[0], atol=1e-11 * max(abs(b / a[0])))
            numpy.testing.assert_allclose(ours["a"], a / a[0], atol=1e-11)

    def test_tustin(self):
        for name in CHAINS:
            self.compare(name, "tustin")

    def test_tustin_exact_at_one_frequency(self):
        for name in CHAINS:
            self.compare(name, "tustin_at", match=350.0)

    def test_step_invariant(self):
        for name in CHAINS.keys() - IMPROPER:
            self.compare(name, "step_invariant")

    def test_ramp_invariant(self):
        for name in CHAINS.keys() - IMPROPER:
            self.compare(name, "ramp_invariant")


class Json(Workshop):
    METHODS = ("tustin", "tustin_at_corners", "matched_roots", "step_invariant", "ramp_invariant")
    STRUCTURES = ("direct_form_1", "direct_form_2_transposed", "delta")

    def test_sections_reproduce_the_compensator(self):
        """To 1e-12, at frequencies where `curves` tells what the realised loop was judged with."""
        asked = "2,30,300,900,2500"
        w = numpy.array([float(value) for value in asked.split(",")])
        for name in ("servo", "two notches", "pi", "overdamped"):
            for method in self.METHODS:
                for structure in self.STRUCTURES:
                    project = self.project(CHAINS[name], realisation_of(method, structure))
                    handover = self.handed_over(project)
                    curves = self.ask("curves", project, "--case", "bench", "--loop", "realised",
                                      "--at", asked, "--json")
                    judged = numpy.array([complex(*point["C"]) for point in curves["points"]])
                    d = numpy.exp(1j * w * PERIOD) - 1.0
                    found = handover["gain"] * numpy.ones_like(d)
                    for re, im in handover["compensator_zeros_z"]:
                        found = found * (d + 1.0 - complex(re, im))
                    for re, im in handover["compensator_poles_z"]:
                        found = found / (d + 1.0 - complex(re, im))
                    by_roots = numpy.max(numpy.abs(found / judged - 1.0))
                    by_sections = numpy.max(numpy.abs(response(handover, d + 1.0) / judged - 1.0))
                    words = f"{name}, {method}, {structure}"
                    self.assertLess(by_sections, 1e-12, words)
                    self.assertLess(by_roots, 1e-12, words)

    def test_sections_give_the_realised_figures(self):
        """Phase margin, gain margin and sensitivity peak from the handed-over numbers and SciPy's
        sampled plant."""
        plant = ([900.0], [1.0, 12.0, 0.0])
        chain = [{"kind": "gain", "gain": 9.0}, {"kind": "pi", "corner_rad_s": 4.0},
                 lead(60.0, 500.0)]
        for method in self.METHODS:
            project = self.project(chain, realisation_of(method), "900/(s (s + 12))")
            handover = self.handed_over(project)
            figures = self.ask("assess", project, "--json")["cases"][0]["loops"]["realised"]
            b, a, _ = signal.cont2discrete(plant, PERIOD, method="zoh")

            def loop(w):
                z = numpy.exp(1j * w * PERIOD)
                return response(handover, z) * numpy.polyval(b[0], z) / numpy.polyval(a, z)

            crossover = optimize.brentq(lambda w: abs(loop(w)) - 1.0, 20.0, 1000.0, xtol=1e-11)
            margin = 180.0 + math.degrees(numpy.angle(loop(crossover)))
            margin = (margin + 180.0) % 360.0 - 180.0
            self.assertAlmostEqual(figures["phase_margin_deg"], margin, delta=1e-6)
            turn = optimize.brentq(lambda w: loop(w).imag, 300.0, 3100.0, xtol=1e-11)
            self.assertAlmostEqual(figures["gain_margin_db"],
                                   -20.0 * math.log10(abs(loop(turn))), delta=1e-6)
            peak = optimize.minimize_scalar(lambda w: -1.0 / abs(1.0 + loop(w)),
                                            bounds=(crossover, 5.0 * crossover),
                                            method="bounded", options={"xatol": 1e-9})
            self.assertAlmostEqual(figures["sensitivity_peak_db"],
                                   20.0 * math.log10(-peak.fun), delta=1e-6)


if __name__ == "__main__":
    CLI = sys.argv.pop(1)
    unittest.main(verbosity=2)
