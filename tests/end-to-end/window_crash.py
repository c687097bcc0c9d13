"""Ends the real program with no warning while edits are unsaved, and sees that they come back.

Types a value into the first card, waits until the edit is older than a second, kills the program,
starts it again and takes the recovery copy that it offers: the value must be there, and the project
file must be as it was.

usage: window_crash.py PROGRAM PROJECT
"""

import os
import shutil
import sys
import tempfile
import time

from window_driver import Screen, Window

TYPED = "1.2345"


def first_field(report):
    return report["cards"][0]["fields"][0]


program, source = sys.argv[1:3]
with tempfile.TemporaryDirectory() as home, Screen() as screen:
    project = os.path.join(home, os.path.basename(source))
    shutil.copy(source, project)
    with open(project, "rb") as file:
        untouched = file.read()

    window = Window(screen, program, project, home)
    field = first_field(window.report())
    screen.hand("mousemove", field["x"] + field["width"] - 8, field["y"] + field["height"] // 2)
    screen.hand("click", 1)
    screen.hand("key", "ctrl+a")
    screen.hand("type", TYPED)
    screen.hand("key", "Return")
    window.wait("the typed value", lambda r: first_field(r)["value"] == float(TYPED))
    time.sleep(1.5)  # an edit older than a second must be safe
    window.crash()
    with open(project, "rb") as file:
        if file.read() != untouched:
            sys.exit("the project file was touched without a save")

    window = Window(screen, program, project, home)
    offered = window.wait("the offer", lambda r: any(n["choices"] for n in r["notices"]))
    recover = next(c for n in offered["notices"] for c in n["choices"] if c["text"] == "Recover")
    if first_field(offered)["value"] == float(TYPED):
        sys.exit("the file itself must still hold the old value")
    screen.hand("mousemove", recover["x"] + recover["width"] // 2,
                recover["y"] + recover["height"] // 2)
    screen.hand("click", 1)
    window.wait("the recovered value", lambda r: first_field(r)["value"] == float(TYPED)
                and r["modified"])
    window.close()
print("the edit came back")
