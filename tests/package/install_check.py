"""Installs the built programs into an empty folder and looks at what a user would find there.

way "install": cmake --install; way "package": the Debian package that CPack makes, unpacked.
The installed programs must run there, the desktop entry must be valid and name them, its icon must
be there, and the file type must claim project files.

usage: install_check.py install|package BUILD CMAKE CPACK PROJECT
"""

import configparser
import fnmatch
import glob
import json
import os
import subprocess
import sys
import tempfile
import xml.etree.ElementTree as ElementTree


def run(*arguments, allowed=(0,), **options):
    done = subprocess.run(arguments, check=False, capture_output=True, text=True, **options)
    if done.returncode not in allowed:
        sys.exit(f"{arguments[0]} ended with {done.returncode}: {done.stdout}{done.stderr}")
    return done.stdout


def unpack(way, build, cmake, cpack, folder):
    """Brings the files to a folder; returns the prefix below which they lie."""
    if way == "install":
        run(cmake, "--install", build, "--prefix", folder)
        return folder
    run(cpack, "--config", os.path.join(build, "CPackConfig.cmake"), "-G", "DEB", "-B", folder)
    packages = glob.glob(os.path.join(folder, "*.deb"))
    if len(packages) != 1:
        sys.exit(f"expected one package, found {packages}")
    depends = run("dpkg-deb", "--field", packages[0], "Depends")
    for library in ("libqt6widgets6", "libqcustomplot", "libc6"):
        if library not in depends:
            sys.exit(f"the package does not depend on {library}: {depends}")
    run("dpkg-deb", "-x", packages[0], os.path.join(folder, "root"))
    return os.path.join(folder, "root", "usr")


def check_desktop(prefix):
    entry_file = os.path.join(prefix, "share/applications/cornerwright.desktop")
    run("desktop-file-validate", entry_file)
    entry = configparser.ConfigParser(interpolation=None, strict=True)
    entry.read(entry_file, encoding="utf-8")
    entry = entry["Desktop Entry"]
    program = os.path.join(prefix, "bin", entry["Exec"].split()[0])
    if not os.access(program, os.X_OK):
        sys.exit(f"the desktop entry starts {program}, which is not there")
    icon = os.path.join(prefix, f"share/icons/hicolor/scalable/apps/{entry['Icon']}.svg")
    if not ElementTree.parse(icon).getroot().tag.endswith("svg"):
        sys.exit(f"{icon} is no SVG")

    space = "{http://www.freedesktop.org/standards/shared-mime-info}"
    types = ElementTree.parse(os.path.join(prefix, "share/mime/packages/cornerwright.xml"))
    kind = types.getroot().find(space + "mime-type")
    if kind.get("type") not in entry["MimeType"].split(";"):
        sys.exit(f"the desktop entry does not open {kind.get('type')}")
    pattern = kind.find(space + "glob").get("pattern")
    if not fnmatch.fnmatch("belt.cornerwright.json", pattern) or fnmatch.fnmatch("a.json", pattern):
        sys.exit(f"{pattern} does not stand for project files")
    return program


def check_programs(prefix, program, project, home):
    told = json.loads(run(os.path.join(prefix, "bin/cornerwright-cli"), "assess", project, "--json",
                          allowed=(0, 1, 2)))
    if not told["requirements"]:
        sys.exit("the installed command line judged nothing")
    picture = os.path.join(home, "window.png")
    environment = dict(os.environ, HOME=home, QT_QPA_PLATFORM="offscreen")
    run(program, "--picture", picture, project, env=environment)
    with open(picture, "rb") as file:
        if file.read(4) != b"\x89PNG":
            sys.exit("the installed window drew no picture")


way, build, cmake, cpack, project = sys.argv[1:6]
with tempfile.TemporaryDirectory() as folder:
    prefix = unpack(way, build, cmake, cpack, folder)
    check_programs(prefix, check_desktop(prefix), project, folder)
    print(f"{way}: programs, desktop entry, icon and file type stand")
