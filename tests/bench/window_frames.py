"""How long the window takes from a mouse event to the painted frame that answers it.

Opens a project at 1920 x 1080 under a virtual screen of its own, fills its chain up to ten sections
(leads of a ratio of 1.05), drags a corner, the gain by
the curve and a root in the plane at the pace of a 60 Hz mouse, and prints median, 99th percentile
and worst of the times that the program wrote (CORNERWRIGHT_FRAME_TIMES), and the processor time of
one frame, which a busy machine disturbs less.

usage: window_frames.py PROGRAM PROJECT [MOVES]
"""

import csv
import json
import os
import shutil
import sys
import tempfile
import time

sys.path.insert(0, os.path.join(os.path.dirname(os.path.abspath(__file__)), "..", "end-to-end"))
import window_driver  # noqa: E402

WIDTH, HEIGHT = 1920, 1080
SECTIONS = 10
PACE = 1 / 60  # s


def fill_chain(project):
    with open(project, encoding="utf-8") as file:
        content = json.load(file)
    corner = 100.0
    while len(content["compensator"]) < SECTIONS:
        content["compensator"].append({"kind": "lead", "zero_rad_s": corner,
                                       "pole_rad_s": 1.05 * corner})
        corner *= 2
    with open(project, "w", encoding="utf-8") as file:
        json.dump(content, file)


def drag(screen, x, y, dx, dy, moves):
    """There and back, a little further each event."""
    words = ["mousemove", x, y, "mousedown", 1, "sleep", 0.1]
    for i in range(1, moves + 1):
        share = 1 - abs(1 - 2 * i / moves)
        words += ["mousemove", round(x + dx * share), round(y + dy * share), "sleep", PACE]
    screen.hand(*words, "mouseup", 1)


def processor_seconds(pid):
    """Of the thread that paints, and of all others (the engine)."""
    spent = {}
    for thread in os.listdir(f"/proc/{pid}/task"):
        with open(f"/proc/{pid}/task/{thread}/stat", encoding="ascii") as file:
            fields = file.read().rsplit(")", 1)[1].split()
        spent[int(thread)] = (int(fields[11]) + int(fields[12])) / os.sysconf("SC_CLK_TCK")
    return spent[pid], sum(spent.values()) - spent[pid]


def percentile(values, share):
    return sorted(values)[min(len(values) - 1, int(share * len(values)))]


def tell(name, values):
    if values:
        print(f"  {name}: median {percentile(values, 0.5):.1f} ms, "
              f"99 % {percentile(values, 0.99):.1f} ms, worst {max(values):.1f} ms")


program, source = sys.argv[1:3]
moves = int(sys.argv[3]) if len(sys.argv) > 3 else 240
window_driver.SCREEN = f"{WIDTH}x{HEIGHT}x24"
with tempfile.TemporaryDirectory() as home:
    times = os.path.join(home, "frames.csv")
    os.environ["CORNERWRIGHT_FRAME_TIMES"] = times
    folder = os.path.join(home, "project")
    shutil.copytree(os.path.dirname(os.path.abspath(source)), folder)
    project = os.path.join(folder, os.path.basename(source))
    fill_chain(project)
    with window_driver.Screen() as screen:
        window = window_driver.Window(screen, program, project, home)
        screen.hand("search", "--onlyvisible", "--name", "Cornerwright", "windowmove", 0, 0,
                    "windowsize", WIDTH, HEIGHT)
        time.sleep(0.5)
        screen.hand("mousemove", WIDTH // 2, HEIGHT // 4, "click", 1,  # no window manager gives focus
                    "key", "ctrl+Next", "key", "ctrl+Prior")  # the report follows the content
        window.wait("the size", lambda r: r["window"]["width"] == WIDTH and not r["busy"])
        seen = 0
        for pane, word, dx, dy in (("magnitude", "zero of", 90, 0), ("phase", "pole of", -60, 0),
                                   ("root-locus", "closed-loop pole", -30, -30)):
            handle = next(h for h in window.report()["panes"][pane]["handles"]
                          if word in h["name"])
            before = processor_seconds(window.process.pid)
            drag(screen, handle["x"], handle["y"], dx, dy, moves)
            window.wait("rest", lambda r: not r["busy"])
            after = processor_seconds(window.process.pid)
            with open(times, encoding="ascii") as file:
                written = list(csv.DictReader(file))
            rows = [row for row in written[seen:] if row["kind"] == "move"]
            seen = len(written)
            frames = sum(row["overtaken"] == "0" for row in rows)
            painting, engine = (1000 * (now - then) / frames for now, then in zip(after, before))
            print(f"{pane}, {handle['name']}: {len(rows)} events, {frames} frames, processor time "
                  f"a frame {painting:.1f} ms to paint, {engine:.1f} ms for the engine")
            tell("from delivery", [float(row["from_delivery_ms"]) for row in rows])
            tell("from the server's stamp",
                 [float(row["from_stamp_ms"]) for row in rows if row["from_stamp_ms"]])
        window.close()
