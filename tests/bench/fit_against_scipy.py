#!/usr/bin/env -S /usr/bin/python3
"""The rational fit beside SciPy's general-purpose least squares, on the same points and weights, in one run, in processor time.

    fit_against_scipy.py FIT_FIGURES DATA_FOLDER

SciPy starts from the linearised polynomial fit of C. K. Sanathanan and J. Koerner (Transfer function synthesis as a ratio of two complex
polynomials, IEEE Trans. Automatic Control 8, 1963; citation from memory), ten rounds, frequencies scaled to the middle of the band, and
refines the polynomial coefficients.  Both are judged by the weighted rms of the relative error on the points ("points"), and of the error
to the true model, which noise hides from both ("truth")."""
import json
import os
import subprocess
import sys
import tempfile
import time

import numpy as np
from scipy.optimize import least_squares

ROUNDS = 10


def read_table(path):
    with open(path, encoding="ascii") as file:
        lines = [line for line in file if not line.startswith("#")]
    heading, rows = lines[0], np.array([[float(x) for x in line.split(",")] for line in lines[1:]])
    scale = 1.0 if "rad/s" in heading else 2 * np.pi
    return rows[:, 0] * scale, rows[:, 1] + 1j * rows[:, 2], rows[:, 3] if rows.shape[1] > 3 else None


def weights_of(coherence, count):
    if coherence is None:
        return np.ones(count)
    c = np.clip(coherence, 1e-6, 1 - 1e-6)
    weights = np.sqrt(c / (1 - c))
    return weights * np.sqrt(count / np.sum(weights**2))


def ratio(parameters, powers, order):
    numerator, denominator = parameters[: order + 1], parameters[order + 1:]
    return powers @ numerator / (1 + powers[:, 1:] @ denominator)


def sanathanan_koerner(powers, response, weights, order):
    """Numerator and denominator coefficients, lowest power first, the denominator's constant being 1."""
    divisor = np.ones(len(response), dtype=complex)
    for _ in range(ROUNDS):
        left = np.hstack([powers, -response[:, None] * powers[:, 1:]]) * (weights / np.abs(response) / np.abs(divisor))[:, None]
        right = response * weights / np.abs(response) / np.abs(divisor)
        solution = np.linalg.lstsq(np.vstack([left.real, left.imag]), np.concatenate([right.real, right.imag]), rcond=None)[0]
        divisor = 1 + powers[:, 1:] @ solution[order + 1:]
    return solution


def by_scipy(w, response, weights, order):
    began = time.process_time()
    powers = (1j * w / np.sqrt(w[0] * w[-1]))[:, None] ** np.arange(order + 1)
    start = sanathanan_koerner(powers, response, weights, order)

    def residuals(parameters):
        error = weights * (ratio(parameters, powers, order) / response - 1)
        return np.concatenate([error.real, error.imag])

    found = least_squares(residuals, start, method="lm", x_scale=np.maximum(np.abs(start), 1e-12), max_nfev=2000)
    seconds = time.process_time() - began
    return ratio(found.x, powers, order), seconds


def ours(program, path, w, order):
    lines = subprocess.run([program, path, str(order)], check=True, capture_output=True, text=True).stdout.splitlines()
    seconds, gain = float(lines[0]), float(lines[1])
    value = np.full(len(w), gain, dtype=complex)
    for line, sign in ((lines[2], -1), (lines[3], 1)):
        numbers = [float(x) for x in line.split()]
        for re, im in zip(numbers[::2], numbers[1::2]):
            value *= (1j * w - complex(re, im)) ** sign
    return value, seconds


def roots_response(plant, w):
    value = np.full(len(w), plant["gain"], dtype=complex)
    for zero in plant["zeros_rad_s"]:
        value *= 1j * w - complex(*zero)
    for pole in plant["poles_rad_s"]:
        value /= 1j * w - complex(*pole)
    return value


def write_modes(path, order, points):
    """Light modes over three decades with a zero pair above each, noise of coherence 0.999 and 16 averages."""
    random = np.random.default_rng(7)
    w = np.logspace(0, 3, points)
    s = 1j * w
    value = np.ones(points, dtype=complex)
    for i in range(order // 2):
        pole = 3 * 300 ** ((i + 0.5) / (order // 2))
        value /= s * s + 0.02 * pole * s + pole * pole
        if i + 1 < order // 2:
            value *= s * s + 0.05 * pole * s + (1.25 * pole) ** 2
    true = value / np.abs(value[0])
    sigma = np.sqrt((1 - 0.999) / (2 * 16 * 0.999))
    value = true * (1 + random.normal(0, sigma, points) + 1j * random.normal(0, sigma, points))
    with open(path, "w", encoding="ascii") as file:
        file.write("w (rad/s),Real,Imaginary,Coherence\n")
        for a, b in zip(w, value):
            file.write("%r,%r,%r,0.999\n" % (float(a), float(b.real), float(b.imag)))
    return true


def compare(name, program, path, order, true_response):
    w, response, coherence = read_table(path)
    weights = weights_of(coherence, len(w))
    true = true_response(w)

    def rms(value, reference):
        return np.sqrt(np.mean(np.abs(weights * (value / reference - 1)) ** 2))

    value, seconds = ours(program, path, w, order)
    other, longer = by_scipy(w, response, weights, order)
    print("%-30s %3d %5d | %9.2e %9.2e %8.4f | %9.2e %9.2e %8.4f | %6.1f"
          % (name, order, len(w), rms(value, response), rms(value, true), seconds, rms(other, response), rms(other, true), longer,
             longer / seconds), flush=True)


def main():
    program, folder = sys.argv[1:3]
    print("case, order, points                      | ours: points, truth, s         | SciPy: points, truth, s        | time ratio")
    for name in sorted(os.listdir(folder)):
        if not name.endswith(".truth.json"):
            continue
        with open(os.path.join(folder, name), encoding="utf-8") as file:
            truth = json.load(file)
        if truth["plant"]["dead_time_s"] == 0:
            stem = name[: -len(".truth.json")]
            compare(stem, program, os.path.join(folder, stem + ".csv"), truth["plant"]["order"], lambda w: roots_response(truth["plant"], w))
    with tempfile.TemporaryDirectory() as place:
        path = os.path.join(place, "modes.csv")
        true = write_modes(path, 12, 1000)
        compare("six light modes", program, path, 12, lambda w: true)


if __name__ == "__main__":
    main()
