"""Takes every entry of every menu with the mouse, in the real program under a virtual screen.

After each entry that edited the project the file is saved and every figure of the ledger compared
with what the command line says of it; then the edit is taken back. A proposal
is put back by Escape. Dialogs that open are closed with Escape and must leave the project as it
was. No entry may end the program but Quit.

usage: window_menus.py PROGRAM COMMAND_LINE PROJECT
"""

import os
import shutil
import sys
import tempfile

from agreement import save_and_compare
from window_driver import Screen, Window

LAST = "Quit"


def middle(entry):
    return entry["x"] + entry["width"] // 2, entry["y"] + entry["height"] // 2


def entry_of(entries, text):
    return next((entry for entry in entries if entry["text"] == text), None)


class Menus:
    def __init__(self, window):
        self.window = window
        self.hand = window.screen.hand

    def open(self, path):
        """Opens the menus along a path of texts; returns the entries of the innermost."""
        top = entry_of(self.window.report()["menu_bar"], path[0])
        self.click(top)
        report = self.window.wait(f"menu {path[0]}", lambda r: len(r["open_menus"]) == 1)
        for depth, text in enumerate(path[1:], start=2):
            entry = entry_of(report["open_menus"][-1], text)
            if entry is None or not entry["enabled"]:
                return []  # a menu that is filled anew each time no longer has it
            self.click(entry)
            report = self.window.wait(f"menu {text}", lambda r: len(r["open_menus"]) == depth)
        return report["open_menus"][-1]

    def click(self, entry):
        self.hand("mousemove", *middle(entry))
        self.hand("click", 1)

    def close(self):
        for _ in range(3):
            if not self.window.report()["open_menus"]:
                return
            depth = len(self.window.report()["open_menus"])
            self.hand("key", "Escape")
            self.window.wait("the menu to close", lambda r: len(r["open_menus"]) < depth)

    def leaves(self, path):
        """Paths to everything below a menu that does something."""
        entries = self.open(path)
        self.close()
        found = []
        for entry in entries:
            if entry["opens"] and entry["enabled"]:
                found += self.leaves(path + [entry["text"]])
            elif not entry["opens"]:
                found.append(path + [entry["text"]])
        return found


def take(menus, path):
    """Takes an entry; returns the report after it, None where it cannot be taken now."""
    window = menus.window
    entry = entry_of(menus.open(path[:-1]), path[-1])
    if entry is None or not entry["enabled"]:
        menus.close()
        return None
    menus.click(entry)
    return window.wait(f"{path} to be done",
                       lambda r: not r["open_menus"] and not r["placing"]
                       and not r["design"]["busy"] and (r["dialog"] or not r["busy"]))


program, command_line, source = sys.argv[1:4]
with tempfile.TemporaryDirectory() as home, Screen() as screen:
    project = os.path.join(home, os.path.basename(source))
    shutil.copy(source, project)
    window = Window(screen, program, project, home)
    menus = Menus(window)
    everything = [leaf for top in window.report()["menu_bar"]
                  for leaf in menus.leaves([top["text"]])]
    quit_path = next(path for path in everything if path[-1] == LAST)
    edits = proposals = dialogs = not_now = 0
    for path in everything:
        if path in (quit_path, ["File", "New"]) or path[:2] == ["File", "Open recent"]:
            continue  # these leave the project; they come at the end
        window.settle()
        before = window.report()
        after = take(menus, path)
        if after is None:
            not_now += 1
            continue
        after = window.settle()
        if after["dialog"]:
            dialogs += 1
            screen.hand("key", "Escape")
            window.wait("the dialog to close", lambda r: not r["dialog"])
            if window.report()["project"] != before["project"]:
                sys.exit(f"{path}: a dialog that was closed changed the project")
        elif after["design"]["open"]:
            # Left open it would propose anew after every edit that follows, possible or not.
            proposals += 1
            screen.hand("key", "Escape")
            window.wait(f"{path} to be put back", lambda r: not r["design"]["open"]
                        and not r["busy"] and r["project"] == before["project"])
        elif after["project"] != before["project"]:
            edits += 1
            save_and_compare(window, command_line, project, path)
            screen.hand("key", "ctrl+z")
            window.wait(f"undo of {path}", lambda r: not r["busy"]
                        and r["project"] == before["project"])
            save_and_compare(window, command_line, project, f"undo of {path}")
        window.to_panes()
    if edits < 20 or dialogs < 3:
        sys.exit(f"only {edits} entries edited, {dialogs} opened a dialog")
    take(menus, ["File", "New"])
    window.wait("an empty project", lambda r: not r["cards"] or not r["ledger"])
    entry = menus.open(quit_path[:-1])
    menus.click(entry_of(entry, LAST))
    window.process.wait(timeout=30)
    print(f"{len(everything)} entries: {edits} edited and agree with the command line, "
          f"{proposals} proposed and put back, {dialogs} opened a dialog, "
          f"{not_now} cannot be taken on a fresh project")
