#!/usr/bin/python3
"""The demo projects are what their script writes, byte for byte. Argument: the folder of the demos."""
import pathlib
import subprocess
import sys
import tempfile

MADE = ("*.cornerwright.json", "*.csv")


def files(folder):
    return {path.relative_to(folder): path.read_bytes() for kind in MADE for path in folder.rglob(kind)}


def main():
    demos = pathlib.Path(sys.argv[1])
    with tempfile.TemporaryDirectory() as place:
        subprocess.run([sys.executable, demos / "make-demos", place], check=True)
        made, kept = files(pathlib.Path(place)), files(demos)
    wrong = sorted(str(name) for name in made.keys() | kept.keys() if made.get(name) != kept.get(name))
    if wrong or len(made) < 8:
        sys.exit(f"{len(made)} files made; these differ from the demo folder: {', '.join(wrong)}")


main()
