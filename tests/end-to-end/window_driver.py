"""The real program under a virtual screen of its own, moved by real mouse and key events."""


import json
import os
import subprocess
import sys
import time

SCREEN = "1600x1000x24"
PATIENCE = 30.0  # s, for anything the window is waited for


class Screen:
    """A virtual screen of its own, on a number that the server chooses."""

    def __enter__(self):
        reading, writing = os.pipe()
        self.server = subprocess.Popen(
            ["Xvfb", "-displayfd", str(writing), "-screen", "0", SCREEN, "-nolisten", "tcp"],
            pass_fds=[writing], stderr=subprocess.DEVNULL)
        os.close(writing)
        with os.fdopen(reading) as pipe:
            self.environment = dict(os.environ, DISPLAY=":" + pipe.readline().strip(),
                                    QT_QPA_PLATFORM="xcb")
        return self

    def __exit__(self, *_):
        self.server.terminate()
        self.server.wait()

    def hand(self, *arguments):
        subprocess.run(["xdotool", *map(str, arguments)], env=self.environment, check=True)


class Window:
    """The program with its test report."""

    def __init__(self, screen, program, project, home):
        self.screen = screen
        self.report_file = os.path.join(home, "report.json")
        if os.path.exists(self.report_file):
            os.remove(self.report_file)
        environment = dict(screen.environment, HOME=home, XDG_CONFIG_HOME=home + "/config",
                           XDG_DATA_HOME=home + "/data", XDG_RUNTIME_DIR=home)
        self.process = subprocess.Popen([program, "--test-report", self.report_file, project],
                                        env=environment)
        self.wait("the first assessment", lambda r: r["ledger"] and not r["busy"])
        time.sleep(0.5)  # no window manager tells when the first frame stands

    def report(self):
        with open(self.report_file, encoding="utf-8") as file:
            return json.load(file)

    def wait(self, what, condition):
        end = time.monotonic() + PATIENCE
        while time.monotonic() < end:
            if self.process.poll() is not None:
                sys.exit(f"the program ended while waiting for {what}")
            if os.path.exists(self.report_file):
                report = self.report()
                if condition(report):
                    return report
            time.sleep(0.05)
        sys.exit(f"no sign of {what} within {PATIENCE:g} s")

    def settle(self):
        """Waits until nothing is computed and the report has come to rest; returns it."""
        time.sleep(0.15)  # the report is written 50 ms after the last change
        return self.wait("rest", lambda r: not r["busy"] or r["dialog"])

    def to_panes(self):
        """Back to all panes, whatever page or pane took the window."""
        self.screen.hand("key", "Escape")
        self.screen.hand("key", "shift+F11")

    def close(self):
        self.process.terminate()
        self.process.wait()

    def crash(self):
        """Ends it as a power cut would: no handler runs."""
        self.process.kill()
        self.process.wait()
