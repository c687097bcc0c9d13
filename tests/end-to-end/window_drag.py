"""Drives the real program under a virtual screen with real mouse and key events.

Opens a project, drags the zero of its lead on the magnitude pane, sees the phase margin of the
ledger change, takes it back with undo, drags again, saves, reopens, and compares every figure of
the ledger with what the command line says of the saved file.

usage: window_drag.py PROGRAM COMMAND_LINE PROJECT
"""

import json
import os
import shutil
import subprocess
import sys
import tempfile
import time

from window_driver import Screen, Window


def handle_of(report, pane, words):
    for handle in report["panes"][pane]["handles"]:
        if all(word in handle["name"] for word in words):
            return handle
    names = [handle["name"] for handle in report["panes"][pane]["handles"]]
    sys.exit(f"no handle named with {words} on {pane}: {names}")


def worst_of(report, measure):
    return next(row["worst"] for row in report["ledger"] if row["measure"] == measure)


def drag(window, handle, by):
    hand = window.screen.hand
    x, y = handle["x"], handle["y"]
    hand("mousemove", x, y)
    hand("mousedown", 1)
    steps = 8
    for step in range(1, steps + 1):
        hand("mousemove", x + by * step // steps, y)
        time.sleep(0.03)
    hand("mouseup", 1)


def drag_lead(window, by):
    """Drags the zero of the lead; returns the report after it."""
    before = window.report()
    label = before["cards"][lead_index]["fields"][0]["name"].rsplit(",", 1)[0]
    drag(window, handle_of(before, "magnitude", ["zero", label]), by)
    margin = worst_of(before, "phase_margin")
    return before, window.wait("the phase margin to change", lambda r: not r["busy"]
                               and r["can_undo"] and worst_of(r, "phase_margin") != margin)


def agree(shown, printed):
    """Every worst figure of the window against the command line's, to the last bit."""
    for row in shown["ledger"]:
        others = [r for r in printed["requirements"] if r["measure"] == row["measure"]]
        values = [r["worst"] if isinstance(r["worst"], (int, float)) else None for r in others]
        if row["worst"] not in values:
            sys.exit(f"{row['measure']}: the window says {row['worst']}, the command line {values}")
        if row["state"] not in [r["state"] for r in others]:
            sys.exit(f"{row['measure']}: the window says {row['state']}")


program, command_line, source = sys.argv[1:4]
with open(source, encoding="utf-8") as opened:
    kinds = [section["kind"] for section in json.load(opened)["compensator"]]
lead_index = kinds.index("lead")

with tempfile.TemporaryDirectory() as home, Screen() as screen:
    folder = os.path.join(home, "project")
    shutil.copytree(os.path.dirname(source), folder)
    project = os.path.join(folder, os.path.basename(source))

    window = Window(screen, program, project, home)
    before, dragged = drag_lead(window, 60)
    start_margin = worst_of(before, "phase_margin")
    print(f"phase margin {start_margin:.3f} deg, after the drag "
          f"{worst_of(dragged, 'phase_margin'):.3f} deg")
    if not dragged["modified"]:
        sys.exit("a drag must leave the project modified")

    screen.hand("key", "ctrl+z")
    back = window.wait("undo", lambda r: not r["busy"] and not r["can_undo"]
                       and worst_of(r, "phase_margin") == start_margin)
    if back["modified"]:
        sys.exit("undo back to the file must leave nothing unsaved")

    drag_lead(window, -40)
    screen.hand("key", "ctrl+s")
    saved = window.wait("the save", lambda r: not r["modified"] and not r["busy"])
    window.close()

    window = Window(screen, program, project, home)
    reopened = window.report()
    window.close()
    if reopened["ledger"] != saved["ledger"]:
        sys.exit("the reopened project shows other figures than the saved one")
    told = subprocess.run([command_line, "assess", project, "--json"], check=False,
                          capture_output=True, text=True)
    if told.returncode not in (0, 1, 2):
        sys.exit(f"assess failed: {told.stderr}")
    agree(reopened, json.loads(told.stdout))
    print(f"{len(reopened['ledger'])} figures agree with the command line")
