"""Holds the figures that the window shows against what the command line says of the saved file."""

import json
import subprocess
import sys


def told_of(command_line, project):
    done = subprocess.run([command_line, "assess", project, "--json"], check=False,
                          capture_output=True, text=True)
    if done.returncode not in (0, 1, 2):
        sys.exit(f"assess failed: {done.stderr}")
    return json.loads(done.stdout)


def number(value):
    return value if isinstance(value, (int, float)) else None


def disagreement(shown, printed):
    """The first row of the window's ledger that the command line does not say; None if none."""
    rows = sorted((r["measure"], r["case"], r["state"], str(r["worst"])) for r in shown["ledger"])
    said = sorted((r["measure"], r["case"], r["state"], str(number(r["worst"])))
                  for r in printed["requirements"])
    if len(rows) != len(said):
        return f"{len(rows)} rows in the window, {len(said)} requirements told"
    for row, other in zip(rows, said):
        if row[:3] != other[:3] or (row[3] != other[3] and float(row[3]) != float(other[3])):
            return f"the window says {row}, the command line {other}"
    return None


def save_and_compare(window, command_line, project, after):
    """Saves with the keyboard and compares; ends the test where a figure differs."""
    window.screen.hand("key", "ctrl+s")
    saved = window.wait(f"the save after {after}", lambda r: not r["modified"] and not r["busy"])
    fault = disagreement(saved, told_of(command_line, project))
    if fault:
        sys.exit(f"after {after}: {fault}")
    return saved
