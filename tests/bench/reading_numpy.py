#!/usr/bin/env -S /usr/bin/python3
"""Reading a text table beside NumPy's loadtxt and beside a plain loop over the lines, in one run, in processor time.

    reading_numpy.py READING_RATE [ROWS]

Our reader also judges separator, heading, units and order and makes complex responses; NumPy makes an array of the numbers only."""
import os
import subprocess
import sys
import tempfile
import time

import numpy as np


def write_table(path, rows):
    random = np.random.default_rng(1)
    f = np.logspace(0, 5, rows)
    columns = np.column_stack([f, -20 * np.log10(1 + f) + random.normal(0, 0.1, rows), -90 + random.normal(0, 1, rows)])
    np.savetxt(path, columns, fmt="%.9g", delimiter=",", header="Frequency (Hz),Magnitude (dB),Phase (deg)", comments="")


def best_of(runs, read, path):
    best = np.inf
    for _ in range(runs):
        began = time.process_time()
        read(path)
        best = min(best, time.process_time() - began)
    return best


def plain_loop(path):
    with open(path, encoding="ascii") as file:
        next(file)
        return [[float(field) for field in line.split(",")] for line in file]


def main():
    program, rows = sys.argv[1], int(sys.argv[2]) if len(sys.argv) > 2 else 400000
    with tempfile.TemporaryDirectory() as folder:
        path = os.path.join(folder, "table.csv")
        write_table(path, rows)
        ours = subprocess.run([program, path], check=True, capture_output=True, text=True).stdout.split()
        megabytes, seconds, points = float(ours[0]), float(ours[1]), int(ours[2])
        if points != rows:
            sys.exit(f"{points} points of {rows} rows")
        print(f"{rows} rows, {megabytes:.1f} MB, NumPy {np.__version__}")
        print(f"our reader      {megabytes / seconds:8.1f} MB/s")
        for name, read, runs in (("NumPy loadtxt", lambda p: np.loadtxt(p, delimiter=",", skiprows=1), 3), ("plain loop", plain_loop, 2)):
            other = best_of(runs, read, path)
            print(f"{name:15s} {megabytes / other:8.1f} MB/s, ours is {other / seconds:.1f} times as fast")


if __name__ == "__main__":
    main()
