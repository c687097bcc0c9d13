#!/usr/bin/env -S /usr/bin/python3
"""What a NumPy script needs to read the same measurement files and to compute only phase and gain margin of the design loop.

    fleet_numpy.py PROJECT DIR

A yardstick for the speed of the fleet command, and an independent look at two of its figures: it prints the smallest of each.  The
compensator and the sampling come from the project file; sections that the file may hold: gain, pi, lead, lag, notch, real and complex
poles.  Files: frequency in Hz, magnitude in dB, phase in deg, one line of heading."""
import json
import os
import sys
import time

import numpy as np


def quadratic(s, w, damping):
    return s * s + 2 * damping * w * s + w * w


def section(part, s):
    kind = part["kind"]
    if kind == "gain":
        return part["gain"]
    if kind == "pi":
        return (s + part["corner_rad_s"]) / s
    if kind in ("lead", "lag"):
        return (s / part["zero_rad_s"] + 1) / (s / part["pole_rad_s"] + 1)
    if kind == "real_pole":
        return 1 / (s / part["pole_rad_s"] + 1)
    w = part["corner_rad_s"]
    if kind == "complex_poles":
        return w * w / quadratic(s, w, part["damping"])
    if kind == "notch":
        return quadratic(s, w, part["zero_damping"]) / quadratic(s, w, part["pole_damping"])
    raise SystemExit("no " + kind + " here")


def margins(loop):
    """Phase margin in deg and gain margin in dB, linear between points."""
    db = 20 * np.log10(np.abs(loop))
    phase = np.degrees(np.unwrap(np.angle(loop)))
    phase_margin = np.inf
    for i in np.nonzero((db[:-1] >= 0) != (db[1:] >= 0))[0]:
        t = db[i] / (db[i] - db[i + 1])
        margin = (180 + phase[i] + t * (phase[i + 1] - phase[i]) + 180) % 360 - 180
        phase_margin = margin if abs(margin) < abs(phase_margin) else phase_margin
    gain_margin = np.inf
    turns = np.floor((phase + 180) / 360)
    for i in np.nonzero(turns[:-1] != turns[1:])[0]:
        goal = 360 * max(turns[i], turns[i + 1]) - 180
        t = (goal - phase[i]) / (phase[i + 1] - phase[i])
        size = db[i] + t * (db[i + 1] - db[i])
        gain_margin = min(gain_margin, -size) if size < 0 else gain_margin
    return phase_margin, gain_margin


def main():
    project, folder = json.load(open(sys.argv[1])), sys.argv[2]
    sampling = project["sampling"]
    began, found = time.perf_counter(), []
    for name in sorted(os.listdir(folder)):
        try:
            table = np.loadtxt(os.path.join(folder, name), delimiter=",", skiprows=1)
        except ValueError as error:
            print(name, error)
            continue
        s = 2j * np.pi * table[:, 0]
        loop = 10 ** (table[:, 1] / 20) * np.exp(1j * np.radians(table[:, 2]))
        for part in project["compensator"]:
            loop = loop * section(part, s)
        period = sampling["sample_period_s"]
        loop = loop * np.exp(-s * sampling["computation_delay_s"]) * (1 - np.exp(-s * period)) / (s * period)
        found.append((name,) + margins(loop))
    took = time.perf_counter() - began
    for column, what in ((1, "phase margin, deg"), (2, "gain margin, dB")):
        worst = min(found, key=lambda unit: abs(unit[column]))
        print("smallest %s: %.4f (%s)" % (what, worst[column], worst[0]))
    print("%d units in %.2f s, %.0f units per second" % (len(found), took, len(found) / took))


if __name__ == "__main__":
    main()
