"""Random rational loops through the command line and through SciPy: frequency responses,
closed-loop poles, step responses and zero-order-hold equivalents.

usage: scipy_comparison.py CORNERWRIGHT_CLI [LOOPS] [SEED]
"""

import json
import pathlib
import random
import subprocess
import sys
import tempfile

try:
    import numpy as np
    import scipy
    from scipy import signal
except ImportError as missing:
    sys.exit(f"this comparison needs NumPy and SciPy for {sys.executable}: {missing}")

LEVEL = 1e-12  # relative, frequency responses
STEP = 1e-10  # of the largest value of the signal
HELD = 1e-10  # relative, hold equivalents
EPSILON = np.finfo(float).eps


def log_uniform(source, low, high):
    return 10 ** source.uniform(np.log10(low), np.log10(high))


def random_roots(source, count, scale, chance_right):
    """`count` roots in conjugate pairs within a decade and a half of `scale`."""
    roots = []
    while len(roots) < count:
        w = log_uniform(source, scale / 6, scale * 6)
        side = 1.0 if source.random() < chance_right else -1.0
        if len(roots) + 1 == count or source.random() < 0.5:
            roots.append(complex(side * w, 0.0))
        else:
            damping = log_uniform(source, 0.01, 0.95)
            root = complex(side * damping * w, w * np.sqrt(1 - damping**2))
            roots += [root, root.conjugate()]
    return roots


def random_project(source):
    scale = log_uniform(source, 1e-2, 1e4)
    order = source.randint(1, 6)
    poles = random_roots(source, order, scale, 0.1)
    if source.random() < 0.4:
        poles[-1:] = [0j] if poles[-1].imag == 0 else [poles[-1]]
    zeros = random_roots(source, source.randint(0, order - 1), scale, 0.15)
    corner = lambda: log_uniform(source, scale / 8, scale * 8)
    low, high = sorted((corner(), corner()))
    sections = [
        {"kind": "lead", "zero_rad_s": low, "pole_rad_s": high * 1.5},
        {"kind": "lag", "zero_rad_s": high * 1.5, "pole_rad_s": low},
        {"kind": "pi", "corner_rad_s": low},
        {"kind": "notch", "corner_rad_s": corner(), "zero_damping": 0.05, "pole_damping": 0.6},
        {"kind": "complex_poles", "corner_rad_s": high, "damping": 0.7},
    ]
    model_gain = np.prod(np.abs(1j * scale - np.array(poles))) / np.prod(
        np.abs(1j * scale - np.array(zeros))
    )
    pairs = lambda roots: [[root.real, root.imag] for root in roots]
    return {
        "cornerwright": 1,
        "title": "random",
        "plant_cases": [
            {
                "name": "plant",
                "model": {
                    "zeros_rad_s": pairs(zeros),
                    "poles_rad_s": pairs(poles),
                    "gain": model_gain * source.choice([1, 1, 1, -1]),
                    "dead_time_s": 0.0,
                },
            }
        ],
        "compensator": [{"kind": "gain", "gain": log_uniform(source, 0.1, 3)}]
        + source.sample(sections, source.randint(0, 3)),
        "sampling": {
            "sample_period_s": 0.15 / scale,
            "computation_delay_s": 0.0,
            "design_includes_hold": False,
        },
        "realisation": {
            "method": "step_invariant",
            "structure": "direct_form_2_transposed",
            "number_format": {"type": "float64"},
        },
        "requirements": [],
    }, scale


def section_zpk(section):
    """The table of sections of the project file."""
    kind = section["kind"]
    pair = lambda w, d: np.roots([1, 2 * d * w, w * w])
    if kind == "gain":
        return [], [], section["gain"]
    if kind in ("lead", "lag"):
        zero, pole = section["zero_rad_s"], section["pole_rad_s"]
        return [-zero], [-pole], pole / zero
    w = section["corner_rad_s"]
    if kind == "pi":
        return [-w], [0.0], 1.0
    if kind == "notch":
        return pair(w, section["zero_damping"]), pair(w, section["pole_damping"]), 1.0
    return [], pair(w, section["damping"]), w * w


def product(parts):
    return (
        np.concatenate([np.asarray(p[0], complex) for p in parts]),
        np.concatenate([np.asarray(p[1], complex) for p in parts]),
        np.prod([p[2] for p in parts]),
    )


def numbers(pairs):
    return np.array([complex(*pair) for pair in pairs])


class Check:
    def __init__(self, program):
        self.program = program
        self.failures = []
        self.worst = {}

    def run(self, *arguments):
        done = subprocess.run([self.program, *arguments], capture_output=True, text=True)
        if done.returncode not in (0, 1, 2):
            raise RuntimeError(f"{' '.join(arguments)}: {done.stderr}")
        return done.stdout

    def figures(self, *arguments):
        return json.loads(self.run(*arguments, "--json"))

    def compare(self, loop, what, found, wanted, allowed):
        off = np.max(np.abs(found - wanted) / allowed)
        self.worst[what] = max(self.worst.get(what, 0.0), off)
        if not off <= 1.0:
            self.failures.append(f"loop {loop}: {what} is off by {off:.3g} times what is allowed")


def in_units_of(scale, zpk):
    """The same function with s counted in `scale`."""
    zeros, poles, gain = zpk
    return zeros / scale, poles / scale, gain * scale ** (len(zeros) - len(poles))


def held_response(zpk, period, w):
    """SciPy's zero-order-hold equivalent, on z = exp(jw period). Time in periods keeps the matrices
    near 1."""
    states = signal.zpk2ss(*in_units_of(1 / period, zpk))
    a, b, c, d, _ = signal.cont2discrete(states, 1.0, method="zoh")
    identity = np.eye(len(a))
    values = [
        (c @ np.linalg.solve(np.exp(1j * x) * identity - a, b) + d)[0, 0] for x in w * period
    ]
    return np.array(values)


def compare_responses(check, loop, file, compensator, plant, scale):
    w = np.geomspace(scale / 100, scale * 100, 25)
    at = ",".join(repr(float(x)) for x in w)
    points = check.figures("curves", file, "--case", "plant", "--at", at)["points"]
    for key, zpk in (("C", compensator), ("P", plant)):
        wanted = signal.freqs_zpk(*zpk, worN=w)[1]
        found = numbers([point[key] for point in points])
        check.compare(loop, f"response of {key}", found, wanted, LEVEL * np.abs(wanted))
    whole = product([compensator, plant])
    value = signal.freqs_zpk(*whole, worN=w)[1]
    for key, wanted in (("S", 1 / (1 + value)), ("T", value / (1 + value))):
        found = numbers([point[key] for point in points])
        # Where 1 + L nearly vanishes both lose digits.
        allowed = LEVEL * np.abs(wanted) * (1 + np.abs(wanted))
        check.compare(loop, f"response of {key}", found, wanted, allowed)


def closed_loop(zpk):
    """Numerator and denominator of T, highest power first."""
    zeros, poles, gain = zpk
    numerator = gain * np.real(np.poly(zeros))
    return numerator, np.polyadd(np.real(np.poly(poles)), numerator)


def compare_poles(check, loop, assessed, whole, scale):
    _, denominator = closed_loop(in_units_of(scale, whole))
    wanted = np.roots(denominator) * scale
    found = numbers(assessed["closed_loop_poles_rad_s"])
    if len(found) != len(wanted):
        check.failures.append(f"loop {loop}: {len(found)} poles, SciPy has {len(wanted)}")
        return
    # How far rounding of the coefficients moves SciPy's own roots.
    x = wanted / scale
    spread = np.polyval(np.abs(denominator), np.abs(x)) * len(denominator)
    doubt = 10 * EPSILON * spread / np.abs(np.polyval(np.polyder(denominator), x)) * scale
    left = list(found)
    for pole, uncertain in zip(wanted, doubt):
        nearest = min(left, key=lambda other: abs(other - pole))
        left.remove(nearest)
        check.compare(loop, "closed-loop poles", nearest, pole, 1e-10 * abs(pole) + uncertain)
    return wanted


def compare_step(check, loop, file, whole, poles, scale):
    growth = max(np.max(poles.real) / scale, 0.2)
    until = min(20.0, 8.0 / growth) / scale
    shown = ("--until", repr(float(until)), "--points", "101")
    found = check.figures("step", file, "--case", "plant", *shown)
    t = np.array(found["t_s"])
    y = np.array(found["y"])
    # A jump's time stands twice in the drawing; SciPy wants even times.
    t, first = np.unique(t, return_index=True)
    _, wanted = signal.step(closed_loop(in_units_of(scale, whole)), T=t * scale)
    last = np.append(first[1:] - 1, len(y) - 1)
    check.compare(loop, "step of y", y[last], wanted, STEP * np.max(np.abs(wanted)))


def compare_holds(check, loop, file, compensator, plant, period, folder):
    w = np.geomspace(1e-3, 0.98, 15) * np.pi / period
    at = ",".join(repr(float(x)) for x in w)
    realised = ("--case", "plant", "--loop", "realised")
    points = check.figures("curves", file, *realised, "--at", at)["points"]
    found = numbers([point["P"] for point in points])
    wanted = held_response(plant, period, w)
    check.compare(loop, "held plant", found, wanted, HELD * np.abs(wanted))
    check.run("handover", file, "--as", "json", "--to", str(folder))
    written = json.loads((folder / "compensator.json").read_text())
    z = np.exp(1j * w * period)
    value = np.ones_like(z)
    for section in written["sections"]:
        value *= np.polyval(section["b"], z) / np.polyval(section["a"], z)
    wanted = np.ones_like(z)
    for part in compensator:
        zeros, poles = np.asarray(part[0], complex), np.asarray(part[1], complex)
        wanted *= held_response((zeros, poles, part[2]), period, w) if len(poles) else part[2]
    check.compare(loop, "held compensator", value, wanted, HELD * np.abs(wanted))


def main():
    check = Check(sys.argv[1])
    loops = int(sys.argv[2]) if len(sys.argv) > 2 else 200
    source = random.Random(int(sys.argv[3]) if len(sys.argv) > 3 else 1)
    with tempfile.TemporaryDirectory() as place:
        folder = pathlib.Path(place)
        for loop in range(loops):
            project, scale = random_project(source)
            file = str(folder / "loop.cornerwright.json")
            pathlib.Path(file).write_text(json.dumps(project))
            parts = [section_zpk(section) for section in project["compensator"]]
            model = project["plant_cases"][0]["model"]
            plant = (numbers(model["zeros_rad_s"]), numbers(model["poles_rad_s"]), model["gain"])
            compensator = product(parts)
            whole = product([compensator, plant])
            compare_responses(check, loop, file, compensator, plant, scale)
            assessed = check.figures("assess", file)["cases"][0]["loops"]["design"]
            poles = compare_poles(check, loop, assessed, whole, scale)
            if poles is not None:
                compare_step(check, loop, file, whole, poles, scale)
            period = project["sampling"]["sample_period_s"]
            compare_holds(check, loop, file, parts, plant, period, folder)
    print(f"{loops} random loops against SciPy {scipy.__version__}; worst part of what is allowed:")
    for what, off in check.worst.items():
        print(f"  {what}: {off:.3g}")
    for failure in check.failures:
        print(failure)
    sys.exit(1 if check.failures else 0)


if __name__ == "__main__":
    main()
