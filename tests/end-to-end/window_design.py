"""From requirement to corner in the real program, by keys alone.

Asks for a phase margin on the chain, sees it in the ledger before it is taken, takes it, saves, and
finds the same sections as the command line designs; takes it back with undo. Then runs samples
inside spreads and finds the same yield as the command line.

usage: window_design.py PROGRAM COMMAND_LINE PROJECT
"""

import json
import os
import shutil
import subprocess
import sys
import tempfile

from window_driver import Screen, Window

MARGIN = 68.0


def worst_of(report, measure):
    return next(row["worst"] for row in report["ledger"] if row["measure"] == measure)


def run(*arguments):
    told = subprocess.run(arguments, check=False, capture_output=True, text=True)
    if told.returncode not in (0, 1, 2):
        sys.exit(f"{arguments}: {told.stderr}")
    return told.stdout


def compensator(project):
    with open(project, encoding="utf-8") as opened:
        return json.load(opened)["compensator"]


program, command_line, source = sys.argv[1:4]
with tempfile.TemporaryDirectory() as home, Screen() as screen:
    project = os.path.join(home, os.path.basename(source))
    designed = os.path.join(home, "designed.cornerwright.json")
    shutil.copy(source, project)
    run(command_line, "design", "lift-phase", project, "--margin", str(MARGIN),
        "--write", designed)

    window = Window(screen, program, project, home)
    first = window.report()
    cards = len(first["cards"])
    # Without a window manager a click gives the window the keyboard.
    card = first["cards"][0]
    screen.hand("mousemove", card["x"] + card["width"] // 2, card["y"] + 8)
    screen.hand("click", 1)
    screen.hand("key", "alt+1")
    window.wait("the panel", lambda r: r["design"]["open"] and not r["design"]["busy"])
    screen.hand("key", "ctrl+a")
    screen.hand("type", str(MARGIN))
    screen.hand("key", "Return")
    shown = window.wait("the wanted margin in the ledger", lambda r: not r["busy"]
                        and r["design"]["possible"]
                        and abs(worst_of(r, "phase_margin") - MARGIN) < 0.01)
    if shown["can_undo"] or len(shown["cards"]) != cards + 1:
        sys.exit("before it is taken the new section must be in sight and be no step")

    screen.hand("key", "ctrl+Return")
    window.wait("the step", lambda r: r["can_undo"] and not r["design"]["open"])
    screen.hand("key", "ctrl+s")
    window.wait("the save", lambda r: not r["modified"] and not r["busy"])
    if compensator(project) != compensator(designed):
        sys.exit("the window and the command line must design the same sections")

    screen.hand("key", "ctrl+z")
    window.wait("undo", lambda r: len(r["cards"]) == cards and not r["busy"])
    screen.hand("key", "ctrl+shift+z")
    window.wait("redo", lambda r: len(r["cards"]) == cards + 1 and not r["busy"])

    screen.hand("key", "ctrl+shift+t")
    screen.hand("key", "space")
    ran = window.wait("the yield", lambda r: r["tolerance"])
    told = json.loads(run(command_line, "tolerance", project, "--plant-gain", "10",
                          "--plant-corners", "5", "--samples", "500", "--seed", "1", "--json"))
    if f"{told['met']} of {told['samples']}" not in ran["tolerance"]:
        sys.exit(f"the window says {ran['tolerance']}, the command line {told['met']}")
    window.close()
print(f"{MARGIN} deg designed, taken and taken back; {ran['tolerance']}")
