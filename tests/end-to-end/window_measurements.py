"""Measurement files dropped on the real program become cases; a wrong unit is corrected; a fit is taken.

Four CSV files are dragged with the mouse from another window and dropped on this one. One of them says degrees over a phase in radians:
its unit is corrected in the panel. Then the files are taken in, the project is saved and the command line must find the plant in every
case. At last a model is fitted to one case and taken: root locus and step must be there.

usage: window_measurements.py PROGRAM COMMAND_LINE DRAG_SOURCE PROJECT
"""

import cmath
import json
import math
import os
import shutil
import subprocess
import sys
import tempfile
import time

from window_driver import SCREEN, Screen, Window

GAINS = [40.0, 55.0, 70.0, 90.0]
ROWS = 80


def plant(gain, w):
    s = 1j * w
    return gain / (s * (0.02 * s + 1))


def write_files(folder):
    """Degrees, semicolons with decimal commas, real and imaginary part in rad/s, and the slip: radians called degrees."""
    def table(name, heading, row, gain):
        path = os.path.join(folder, name)
        with open(path, "w", encoding="utf-8") as file:
            file.write(heading + "\n")
            for i in range(ROWS):
                hertz = 0.2 * 1000 ** (i / (ROWS - 1))
                file.write(row(hertz, plant(gain, 2 * math.pi * hertz)) + "\n")
        return path

    def db(p):
        return 20 * math.log10(abs(p))

    return [
        table("unit 1.csv", "Frequency (Hz),Magnitude (dB),Phase (deg)",
              lambda f, p: f"{f!r},{db(p)!r},{math.degrees(cmath.phase(p))!r}", GAINS[0]),
        table("unit 2.csv", "Frequenz (Hz);Betrag (dB);Phase (°)",
              lambda f, p: f"{f!r};{db(p)!r};{math.degrees(cmath.phase(p))!r}".replace(".", ","), GAINS[1]),
        table("unit 3.csv", "w (rad/s),Re,Im", lambda f, p: f"{2 * math.pi * f!r},{p.real!r},{p.imag!r}", GAINS[2]),
        table("unit 4.csv", "Frequency (Hz),Magnitude (dB),Phase (deg)", lambda f, p: f"{f!r},{db(p)!r},{cmath.phase(p)!r}", GAINS[3]),
    ]


def click(screen, place):
    screen.hand("mousemove", place["x"] + place["width"] // 2, place["y"] + place["height"] // 2)
    screen.hand("click", 1)


def drop(screen, source, files, onto):
    """A drag and drop with the mouse, from one program to the other."""
    process = subprocess.Popen([source, *files], env=screen.environment)
    height = int(SCREEN.split("x")[1])
    time.sleep(1.5)  # no window manager tells when the source stands
    hand = screen.hand
    hand("mousemove", 40, height - 40)
    hand("mousedown", 1)
    goal = (onto["x"] + onto["width"] // 2, onto["y"] + onto["height"] // 3)
    for step in range(1, 21):
        hand("mousemove", 40 + (goal[0] - 40) * step // 20, height - 40 + (goal[1] - height + 40) * step // 20)
        time.sleep(0.05)
    time.sleep(0.5)
    hand("mouseup", 1)
    try:
        process.wait(timeout=20)
    except subprocess.TimeoutExpired:
        process.kill()
        sys.exit("the drop was never taken")


def expect_plant(command_line, project, name, gain):
    at = [2.0, 20.0, 200.0]
    told = subprocess.run([command_line, "curves", project, "--case", name, "--loop", "design", "--at", ",".join(map(str, at)), "--json"],
                          check=True, capture_output=True, text=True)
    for point in json.loads(told.stdout)["points"]:
        found, expected = complex(*point["P"]), plant(gain, point["w_rad_s"])
        # Between measured points magnitude and phase are interpolated.
        if abs(found / expected - 1) > 0.01:
            sys.exit(f"{name} at {point['w_rad_s']} rad/s: {found}, expected {expected}")


program, command_line, drag_source, source = sys.argv[1:5]
with tempfile.TemporaryDirectory() as home, Screen() as screen:
    project = os.path.join(home, os.path.basename(source))
    shutil.copy(source, project)
    with open(project, encoding="utf-8") as file:
        content = json.load(file)
    content.pop("sampling", None)  # the plant alone is compared below, without hold and delay
    content.pop("realisation", None)
    with open(project, "w", encoding="utf-8") as file:
        json.dump(content, file)
    files = write_files(home)
    window = Window(screen, program, project, home)
    before = window.report()
    old = len(before["cases"])

    drop(screen, drag_source, files, before["window"])
    window.wait("the panel with four files", lambda r: r["import"]["visible"] and not r["import"]["busy"]
                and [f["points"] for f in r["import"]["files"]] == [ROWS] * 4)
    screen.hand("key", "End")  # the list of files has the focus: the last one
    slip = window.wait("the last file", lambda r: len(r["import"]["units"]) == 3 and r["import"]["units"][2]["shown"] == "deg"
                       and abs(r["import"]["preview_db"][0][0] - 20 * math.log10(abs(plant(GAINS[3], 0.4 * math.pi)))) < 0.1)
    click(screen, slip["import"]["units"][2])
    screen.hand("type", "rad")
    screen.hand("key", "Return")
    ready = window.wait("the corrected unit", lambda r: not r["import"]["busy"] and len(r["import"]["units"]) == 3
                        and r["import"]["units"][2]["shown"] == "rad")
    if len(ready["cases"]) != old:
        sys.exit("nothing may enter the project before it is taken in")
    click(screen, ready["import"]["take"])
    taken = window.wait("four cases", lambda r: len(r["cases"]) == old + 4 and not r["busy"] and not r["import"]["visible"]
                        and "plant_db" in r["cases"][-1])
    for case, gain in zip(taken["cases"][old:], GAINS):
        expected = 20 * math.log10(abs(plant(gain, 0.4 * math.pi)))
        if abs(case["plant_db"][0] - expected) > 1e-6:
            sys.exit(f"{case['name']}: drawn from {case['plant_db'][0]} dB, expected {expected} dB")

    screen.hand("key", "ctrl+g")
    fitted = window.wait("a fitted model", lambda r: r["fit"]["visible"] and not r["fit"]["running"] and r["fit"]["order"] > 0)
    if fitted["locus"] or fitted["cases"][-1]["step_points"]:
        sys.exit("a measured case without a model has neither root locus nor step")
    click(screen, fitted["fit"]["take"])
    final = window.wait("root locus and step", lambda r: not r["busy"] and r["locus"] and r["cases"][-1].get("fitted")
                        and r["cases"][-1]["step_points"] > 0)
    if "fit" not in final["cases"][-1]["step_note"]:
        sys.exit(f"the step must say that it is the fit's: {final['cases'][-1]['step_note']!r}")
    screen.hand("key", "ctrl+s")
    window.wait("the save", lambda r: not r["modified"])
    window.close()

    for case, gain in zip(final["cases"][old:], GAINS):
        expect_plant(command_line, project, case["name"], gain)
print("four files became four cases, one corrected, one fitted")
