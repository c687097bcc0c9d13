"""Touchstone files that scikit-rf writes are read by `cornerwright-cli read` as what was written.

usage: touchstone_of_skrf.py COMMAND_LINE

One and two ports, every format and unit of frequency, random networks, some with the impedance comments that the library can add. The
response expected is N11 of one port, N21 of two, and any parameter that is asked for.
"""

import itertools
import json
import os
import subprocess
import sys
import tempfile
import warnings

import numpy as np

warnings.simplefilter("ignore")
import skrf  # noqa: E402  (it warns on import where no plots can be made)

TOLERANCE = 1e-9


def network(random, ports, unit):
    points = int(random.integers(2, 60))
    f = np.cumsum(random.uniform(0.1, 3.0, points))
    s = random.normal(size=(points, ports, ports)) + 1j * random.normal(size=(points, ports, ports))
    return skrf.Network(frequency=skrf.Frequency.from_f(f, unit=unit), s=s, z0=50, name="net")


def read(command_line, path, *options):
    done = subprocess.run([command_line, "read", "--json", *options, path], check=False, capture_output=True, text=True)
    if done.returncode != 0:
        sys.exit(f"{path} {options}: {done.stderr}")
    printed = json.loads(done.stdout)
    return np.array(printed["w_rad_s"]), np.array([complex(*value) for value in printed["response"]])


def expect_close(found, expected, what):
    if found.shape != expected.shape or np.max(np.abs(found - expected) / np.abs(expected)) > TOLERANCE:
        sys.exit(f"{what}: read {found[:3]} ..., expected {expected[:3]} ...")


command_line = sys.argv[1]
random = np.random.default_rng(20)
count = 0
with tempfile.TemporaryDirectory() as folder:
    for ports, form, unit, z0 in itertools.product((1, 2), ("ri", "ma", "db"), ("hz", "khz", "mhz", "ghz"), (False, True)):
        written = network(random, ports, unit)
        written.write_touchstone(f"net{count}", dir=folder, form=form, write_z0=z0)
        path = os.path.join(folder, f"net{count}.s{ports}p")
        what = f"{ports} ports, {form}, {unit}, z0 {z0}"
        w, response = read(command_line, path)
        expect_close(w, 2 * np.pi * written.f, what + ", frequencies")
        expect_close(response, written.s[:, ports - 1, 0], what)
        for row, column in itertools.product(range(ports), repeat=2):
            _, response = read(command_line, path, "--parameter", f"S{row + 1}{column + 1}")
            expect_close(response, written.s[:, row, column], f"{what}, S{row + 1}{column + 1}")
        count += 1
print(f"{count} files of scikit-rf {skrf.__version__} read as they were written")
