"""Every gesture on the panes with real mouse and key events, under a virtual screen.

Each handle of each pane is dragged; handles are nudged by keys, drags are broken off by Escape,
curves are zoomed and sections added, switched and removed. After each gesture that edits, the file
is saved and every figure compared with the command line; one undo must lead back.

usage: window_gestures.py PROGRAM COMMAND_LINE PROJECT
"""

import os
import shutil
import sys
import tempfile
import time

from agreement import save_and_compare
from window_driver import Screen, Window

PANES = ("magnitude", "phase", "root-locus", "step")


class Hand:
    def __init__(self, window):
        self.window = window
        self.do = window.screen.hand

    def press(self, at, shift=False):
        self.do("mousemove", at[0], at[1])
        if shift:
            self.do("keydown", "shift")
        self.do("mousedown", 1)

    def travel(self, at, by, steps=6):
        for step in range(1, steps + 1):
            self.do("mousemove", at[0] + by[0] * step // steps, at[1] + by[1] * step // steps)
            time.sleep(0.02)

    def drag(self, at, by, shift=False):
        self.press(at, shift)
        self.travel(at, by)
        self.do("mouseup", 1)
        if shift:
            self.do("keyup", "shift")


class Gestures:
    def __init__(self, window, command_line, project):
        self.window = window
        self.hand = Hand(window)
        self.command_line = command_line
        self.project = project
        self.start = window.settle()["project"]
        self.edits = 0

    def edited(self, what):
        """After a gesture: the project changed, the figures agree, one undo leads back."""
        changed = self.window.wait(f"an edit by {what}", lambda r: not r["busy"]
                                   and r["project"] != self.start)
        save_and_compare(self.window, self.command_line, self.project, what)
        self.hand.do("key", "ctrl+z")
        self.window.wait(f"undo of {what}", lambda r: not r["busy"] and r["project"] == self.start)
        self.edits += 1
        return changed

    def unchanged(self, what):
        if self.window.settle()["project"] != self.start:
            sys.exit(f"{what} must not edit the project")

    def handles(self, pane):
        return self.window.report()["panes"][pane]["handles"]

    def every_handle(self, pane):
        for index, first in enumerate(self.handles(pane)):
            handle = self.handles(pane)[index]  # axes may stand elsewhere after an undo
            at = (handle["x"], handle["y"])
            self.hand.drag(at, (14, -18))
            self.edited(f"drag of {first['name']} on {pane}")

    def escape(self, pane):
        handle = self.handles(pane)[0]
        at = (handle["x"], handle["y"])
        self.hand.press(at)
        self.hand.travel(at, (20, -10))
        self.window.wait("the drag", lambda r: r["project"] != self.start)
        self.hand.do("key", "Escape")
        self.hand.do("mouseup", 1)
        self.unchanged(f"a drag on {pane} that Escape breaks off")

    def fine(self, pane):
        handle = self.handles(pane)[0]
        self.hand.drag((handle["x"], handle["y"]), (30, -20), shift=True)
        self.edited(f"fine drag on {pane}")

    def nudge(self, pane):
        handle = self.handles(pane)[0]
        for key in ("Right", "Left", "shift+Right", "shift+Left"):
            self.hand.do("mousemove", handle["x"], handle["y"])
            self.hand.do("click", 1)
            self.hand.do("key", key)
            self.edited(f"{key} on {handle['name']}")

    def switch_and_remove(self, pane):
        for key in ("space", "Delete"):
            handle = self.handles(pane)[0]
            self.hand.do("mousemove", handle["x"], handle["y"])
            self.hand.do("click", 1)
            self.hand.do("key", key)
            self.edited(f"{key} on {handle['name']}")

    def look_around(self, pane):
        place = self.window.report()["panes"][pane]
        at = (place["x"] + place["width"] // 2, place["y"] + place["height"] // 2)
        self.hand.do("mousemove", *at)
        self.hand.do("click", 4)
        self.hand.do("click", 5)
        self.hand.do("keydown", "ctrl")
        self.hand.drag((at[0] - 60, at[1] - 40), (120, 80))
        self.hand.do("keyup", "ctrl")
        self.unchanged(f"zoom on {pane}")
        self.hand.do("key", "Home")
        self.unchanged(f"fit of {pane}")

    def add_by_right_click(self):
        place = self.window.report()["panes"]["magnitude"]
        self.hand.do("mousemove", place["x"] + place["width"] // 2, place["y"] + 30)
        self.hand.do("click", 3)
        report = self.window.wait("the menu", lambda r: r["open_menus"])
        first = report["open_menus"][0][0]
        self.hand.do("mousemove", first["x"] + 20, first["y"] + first["height"] // 2)
        self.hand.do("click", 1)
        if first["opens"]:
            report = self.window.wait("the kinds", lambda r: len(r["open_menus"]) == 2)
            kind = report["open_menus"][1][1]
            self.hand.do("mousemove", kind["x"] + 20, kind["y"] + kind["height"] // 2)
            self.hand.do("click", 1)
        self.edited("a section added by right click")

    def typed_value(self):
        field = self.window.report()["cards"][0]["fields"][0]
        self.hand.do("mousemove", field["x"] + field["width"] - 8,
                     field["y"] + field["height"] // 2)
        self.hand.do("click", 1)
        self.hand.do("key", "ctrl+a")
        self.hand.do("type", str(field["value"] * 1.25))
        self.hand.do("key", "Return")
        self.edited("a typed value")


program, command_line, source = sys.argv[1:4]
with tempfile.TemporaryDirectory() as home, Screen() as screen:
    project = os.path.join(home, os.path.basename(source))
    shutil.copy(source, project)
    window = Window(screen, program, project, home)
    gestures = Gestures(window, command_line, project)
    for pane in PANES:
        gestures.every_handle(pane)
        gestures.look_around(pane)
    for pane in ("magnitude", "phase", "root-locus"):
        gestures.escape(pane)
        gestures.fine(pane)
    gestures.nudge("magnitude")
    gestures.switch_and_remove("magnitude")
    gestures.typed_value()
    gestures.add_by_right_click()
    window.close()
    print(f"{gestures.edits} gestures edit, agree with the command line and are undone in one step")
