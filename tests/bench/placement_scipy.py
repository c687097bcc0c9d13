#!/usr/bin/env -S /usr/bin/python3
"""Placement beside SciPy's general-purpose optimisers on the same figures and from the same start.

    placement_scipy.py PLACEMENT_FIGURES [SEED ...]

For each seed: what placement reached and its time; what Nelder-Mead and differential evolution reach, and after how long.  The figures
come through a pipe; the time spent on the pipe is measured with the answers and is small against an evaluation."""
import subprocess
import sys
import time

import numpy as np
from scipy.optimize import differential_evolution, minimize

LIMIT = 60.0  # seconds an optimiser may take before it is stopped and its best is taken


class Figures:
    def __init__(self, program, seed):
        self.process = subprocess.Popen([program, str(seed)], stdin=subprocess.PIPE, stdout=subprocess.PIPE, text=True, bufsize=1)
        self.reached, self.took = map(float, self.process.stdout.readline().split())
        self.start = np.array([float(x) for x in self.process.stdout.readline().split()])
        self.begin()

    def begin(self):
        self.count, self.best, self.until = 0, -np.inf, time.perf_counter() + LIMIT

    def loss(self, logarithms):
        self.process.stdin.write(" ".join(repr(float(x)) for x in logarithms) + "\n")
        merit = float(self.process.stdout.readline())
        self.count += 1
        self.best = max(self.best, merit)
        if time.perf_counter() > self.until:
            raise StopIteration
        return -merit


def run(figures, optimise):
    figures.begin()
    began = time.perf_counter()
    try:
        optimise()
    except (StopIteration, RuntimeError):
        pass
    return figures.best, time.perf_counter() - began, figures.count


def main():
    program, seeds = sys.argv[1], [int(x) for x in sys.argv[2:]] or range(1, 11)
    print("seed | placement, s | Nelder-Mead, s, evaluations | differential evolution, s, evaluations")
    for seed in seeds:
        figures = Figures(program, seed)
        start = figures.start
        simplex = run(figures, lambda: minimize(figures.loss, start, method="Nelder-Mead",
                                                options={"maxfev": 20000, "xatol": 1e-4, "fatol": 1e-4, "adaptive": True}))
        bounds = [(x - np.log(1000.0), x + np.log(1000.0)) for x in start]
        evolution = run(figures, lambda: differential_evolution(figures.loss, bounds, x0=start, seed=1, maxiter=200, polish=False))
        print("%4d | %7.3f %6.2f | %9.3f %6.2f %6d | %9.3f %6.2f %6d" % ((seed, figures.reached, figures.took) + simplex + evolution), flush=True)
        figures.process.stdin.close()
        figures.process.wait()


if __name__ == "__main__":
    main()
