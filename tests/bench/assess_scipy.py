#!/usr/bin/env -S /usr/bin/python3
"""A full assessment beside the same figures by a straightforward SciPy script, in one run.

    assess_scipy.py BENCH_ASSESS

Design and realised loop of the 14th-order plant with six sections in fourteenth_order.cornerwright.json,
and its root locus. Processor time of one thread, best of several; the figures of both stand beside
each other so that nobody compares two different things."""
import json
import pathlib
import subprocess
import sys
import time

import numpy as np
from scipy import optimize, signal

PROJECT = pathlib.Path(__file__).parent / "fourteenth_order.cornerwright.json"
GRID = 4000  # points over the frequency range, enough for damping 0.013
LOCUS_FACTORS = 200  # about as many as the program's own locus has


def section_zpk(section):
    kind = section["kind"]
    pair = lambda w, d: np.roots([1, 2 * d * w, w * w])
    if kind == "gain":
        return [], [], section["gain"]
    if kind == "pi":
        return [-section["corner_rad_s"]], [0.0], 1.0
    if kind == "lead":
        zero, pole = section["zero_rad_s"], section["pole_rad_s"]
        return [-zero], [-pole], pole / zero
    if kind == "real_pole":
        return [], [-section["pole_rad_s"]], section["pole_rad_s"]
    w = section["corner_rad_s"]
    return pair(w, section["zero_damping"]), pair(w, section["pole_damping"]), 1.0


def corner(section):
    """Where tustin_at_corners is exact; 0: nowhere."""
    if section["kind"] == "lead":
        return np.sqrt(section["zero_rad_s"] * section["pole_rad_s"])
    if section["kind"] == "pi":
        return 0.0
    return section.get("corner_rad_s", section.get("pole_rad_s", 0.0))


def product(parts):
    return (
        np.concatenate([np.asarray(p[0], complex) for p in parts]),
        np.concatenate([np.asarray(p[1], complex) for p in parts]),
        np.prod([p[2] for p in parts]),
    )


def response(zpk, at):
    zeros, poles, gain = zpk
    return gain * np.prod(at[:, None] - zeros, axis=1) / np.prod(at[:, None] - poles, axis=1)


def frequency_figures(loop, compensator, w):
    """Margins and peaks from a grid, each bracket polished."""
    one = lambda function: lambda x: function(np.array([x]))[0]
    value = loop(w)
    level = np.log(np.abs(value))
    crossovers = [
        optimize.brentq(one(lambda x: np.log(np.abs(loop(x)))), w[i], w[i + 1], xtol=1e-12)
        for i in np.nonzero(np.diff(np.sign(level)))[0]
    ]
    turning = np.nonzero((np.diff(np.sign(value.imag)) != 0) & (value.real[:-1] < 0))[0]
    crossings = [
        optimize.brentq(one(lambda x: loop(x).imag), w[i], w[i + 1], xtol=1e-12) for i in turning
    ]
    sizes = 20 * np.log10(np.abs(loop(np.array(crossings)))) if crossings else np.array([])
    margins = np.degrees(np.angle(-loop(np.array(crossovers))))

    def peak(function):
        values = function(w)
        i = min(max(int(np.argmax(values)), 1), len(w) - 2)
        best = optimize.minimize_scalar(
            lambda x: -one(function)(x), bounds=(w[i - 1], w[i + 1]), method="bounded",
            options={"xatol": 1e-9 * w[i]},
        )
        return 20 * np.log10(-best.fun)

    closed = lambda x: np.abs(loop(x) / (1 + loop(x)))
    fallen = np.nonzero(closed(w) < np.sqrt(0.5))[0][0]
    return {
        "phase_margin_deg": margins[np.argmin(np.abs(margins))],
        "gain_margin_db": np.min(-sizes[sizes < 0]),
        "sensitivity_peak_db": peak(lambda x: 1 / np.abs(1 + loop(x))),
        "complementary_peak_db": peak(closed),
        "control_effort_peak_db": peak(lambda x: np.abs(compensator(x) / (1 + loop(x)))),
        "bandwidth_rad_s": optimize.brentq(
            one(lambda x: closed(x) - np.sqrt(0.5)), w[fallen - 1], w[fallen]
        ),
    }


def step_figures(t, y):
    outside = np.nonzero(np.abs(y - 1) > 0.02)[0]
    return {
        "overshoot_percent": 100 * (np.max(y) - 1),
        "peak_time_s": t[np.argmax(y)],
        "rise_time_s": t[np.argmax(y > 0.9)] - t[np.argmax(y > 0.1)],
        "settling_time_s": t[outside[-1] + 1],
    }


def design_figures(project):
    plant, parts = plant_of(project), sections_of(project)
    chain = product(parts)
    whole = product([chain, plant])
    w = np.geomspace(1e-2, 1e6, GRID)
    found = frequency_figures(
        lambda x: response(whole, 1j * x), lambda x: response(chain, 1j * x), w
    )
    denominator, numerator = closed_polynomials(whole)
    poles = np.roots(denominator) * SCALE
    found["stable"] = bool(np.all(poles.real < 0))
    slowest = np.min(-poles.real)
    t = np.linspace(0, 8 / slowest, 4000) * SCALE
    _, y = signal.step((numerator, denominator), T=t)
    found.update(step_figures(t / SCALE, y))
    # Disturbance and control, as the assessment has them too.
    signal.step(closed_transfer(plant, chain), T=t)
    signal.step(closed_transfer(chain, plant), T=t)
    return found


SCALE = 1000.0  # rad/s: time in milliseconds keeps the coefficients near each other


def scaled(zpk):
    zeros, poles, gain = zpk
    return zeros / SCALE, poles / SCALE, gain * SCALE ** (len(zeros) - len(poles))


def closed_polynomials(whole):
    zeros, poles, gain = scaled(whole)
    numerator = gain * np.real(np.poly(zeros))
    return np.polyadd(np.real(np.poly(poles)), numerator), numerator


def closed_transfer(forward, back):
    """forward/(1 + forward back)"""
    (fz, fp, fk), (bz, bp, bk) = scaled(forward), scaled(back)
    numerator = fk * np.real(np.poly(np.concatenate([fz, bp])))
    denominator = np.polyadd(
        np.real(np.poly(np.concatenate([fp, bp]))),
        fk * bk * np.real(np.poly(np.concatenate([fz, bz]))),
    )
    return numerator, denominator


def plant_of(project):
    model = project["plant_cases"][0]["model"]
    numbers = lambda pairs: np.array([complex(*pair) for pair in pairs])
    return numbers(model["zeros_rad_s"]), numbers(model["poles_rad_s"]), model["gain"]


def sections_of(project):
    return [section_zpk(section) for section in project["compensator"]]


def held_plant(plant, period, delay):
    """States of the plant behind hold and a delay below one period, one state more for the delay."""
    from scipy.linalg import expm

    zeros, poles, gain = plant
    a, b, c, _ = signal.zpk2ss(
        zeros * period, poles * period, gain * period ** (len(poles) - len(zeros))
    )
    size = len(a)

    def advance(duration):
        block = expm(np.block([[a, b], [np.zeros((1, size + 1))]]) * duration)
        return block[:size, :size], block[:size, size:]

    rest = delay / period
    whole, _ = advance(1.0)
    after, late = advance(1.0 - rest)
    _, early = advance(rest)
    return (
        np.block([[whole, after @ early], [np.zeros((1, size + 1))]]),
        np.vstack([late, [[1.0]]]),
        np.hstack([c, [[0.0]]]),
        advance,
    )


def discrete_chain(project, period):
    parts = []
    for section in project["compensator"]:
        zeros, poles, gain = section_zpk(section)
        at = corner(section)
        rate = at / np.tan(at * period / 2) / 2 if at > 0 else 1 / period
        if not len(poles):
            parts.append(([], [], gain))
            continue
        parts.append(signal.bilinear_zpk(np.asarray(zeros), np.asarray(poles), gain, rate))
    return product(parts)


def realised_figures(project):
    period = project["sampling"]["sample_period_s"]
    delay = project["sampling"]["computation_delay_s"]
    a, b, c, advance = held_plant(plant_of(project), period, delay)
    chain = discrete_chain(project, period)
    # Responses through the eigenvalues of the sampled plant.
    values, vectors = np.linalg.eig(a)
    left = np.linalg.solve(vectors, b)[:, 0]
    weights = (c @ vectors)[0] * left
    plant = lambda x: np.sum(weights / (np.exp(1j * x * period)[:, None] - values), axis=1)
    controller = lambda x: response(chain, np.exp(1j * x * period))
    w = np.geomspace(1e-1, np.pi / period, GRID)
    found = frequency_figures(lambda x: controller(x) * plant(x), controller, w)
    ac, bc, cc, dc = (np.real(m) for m in signal.zpk2ss(*chain))
    closed = np.block([[a - b @ dc @ c, b @ cc], [-bc @ c, ac]])
    poles = np.linalg.eigvals(closed)
    found["stable"] = bool(np.all(np.abs(poles) < 1))
    samples = int(8 / np.min(-np.log(np.abs(poles))))
    t, y = sampled_step(a, b, c, advance, (ac, bc, cc, dc), delay / period, samples)
    found.update(step_figures(t * period, y))
    return found


def sampled_step(a, b, c, advance, chain, rest, samples):
    """Sample by sample, eight places a period."""
    ac, bc, cc, dc = chain
    size = len(a) - 1
    places = np.arange(8) / 8
    pieces = [advance(p) for p in places]
    late = [advance(max(p - rest, 0.0)) for p in places]
    x, q = np.zeros(len(a)), np.zeros(len(ac))
    y = np.empty(8 * samples)
    for k in range(samples):
        error = 1.0 - (c @ x)[0]
        u = (cc @ q)[0] + dc[0, 0] * error
        for i, (states, held) in enumerate(pieces):
            inside = states @ x[:size]
            # The old value up to the delay, the new one from there on.
            new = late[i][1][:, 0]
            inside = inside + (held[:, 0] - new) * x[size] + new * u
            y[8 * k + i] = c[0, :size] @ inside
        x = a @ x + b[:, 0] * u
        q = ac @ q + bc[:, 0] * error
    return np.arange(8 * samples) / 8, y


def locus(project):
    zeros, poles, gain = scaled(product(sections_of(project) + [plant_of(project)]))
    numerator = gain * np.real(np.poly(zeros))
    denominator = np.real(np.poly(poles))
    return [
        np.roots(np.polyadd(denominator, factor * numerator))
        for factor in np.geomspace(1e-3, 1e3, LOCUS_FACTORS)
    ]


def timed(function, *arguments):
    best = np.inf
    for _ in range(5):
        began = time.process_time()
        result = function(*arguments)
        best = min(best, time.process_time() - began)
    return 1e3 * best, result


def bench_times(program):
    """Processor time in ms of each benchmark."""
    done = subprocess.run(
        [program, "--benchmark_format=json", "--benchmark_repetitions=5", "--benchmark_min_time=0.1"],
        capture_output=True, text=True, check=True,
    )
    times = {}
    for row in json.loads(done.stdout)["benchmarks"]:
        if row["run_type"] == "iteration":
            times[row["name"]] = min(times.get(row["name"], np.inf), row["cpu_time"])
    return times


def main():
    project = json.loads(PROJECT.read_text())
    design, design_found = timed(design_figures, project)
    realised, realised_found = timed(realised_figures, project)
    locus_time, _ = timed(locus, project)
    for name, found in (("design", design_found), ("realised", realised_found)):
        print(name, {key: float(f"{value:.6g}") for key, value in found.items()})
    ours = bench_times(sys.argv[1])
    rows = (
        ("design loop", "assess_design_loop", design),
        ("realised loop", "assess_realised_loop", realised),
        ("both", "assess_everything", design + realised),
        ("locus", "update_locus", locus_time),
    )
    print("processor time, ms      | ours   | SciPy  | ratio")
    for what, key, scipy_time in rows:
        print(f"{what:23s} | {ours[key]:6.3f} | {scipy_time:6.1f} | {scipy_time / ours[key]:5.0f}")


if __name__ == "__main__":
    main()
