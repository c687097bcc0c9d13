"""Kills the window with no warning at random moments while it edits and saves.

After each kill the project file must be readable by the command line, every recovery copy must be
readable too, and the older of the lost edits must be younger than a second: what the file or the
copy holds is compared with the moments at which the edits were made.

usage: window_kill.py VICTIM COMMAND_LINE PROJECT KILLS SEED
"""

import concurrent.futures
import glob
import json
import os
import random
import shutil
import subprocess
import sys
import tempfile
import threading
import time

WORKERS = 3
LONGEST = 2.5  # s from the first edit to the kill
BEARABLE_LOSS = 1.0  # s


def readable(command_line, file):
    done = subprocess.run([command_line, "assess", file], check=False, capture_output=True,
                          text=True)
    if done.returncode not in (0, 1, 2):
        raise AssertionError(f"{file} cannot be read: {done.stderr}")


def value_in(file):
    """What stands in the file for the first section, and that is the number of an edit."""
    with open(file, encoding="utf-8") as opened:
        return json.load(opened)["compensator"][0]["gain"]


def edits_told(victim):
    """Follows the victim's output in a thread, so that its pipe never fills."""
    edits = []

    def follow():
        for line in victim.stdout:
            words = line.split()
            if line.endswith("\n") and len(words) == 3:
                edits.append((float(words[1]), int(words[2]) * 1e-9))

    thread = threading.Thread(target=follow)
    thread.start()
    return edits, thread


def kill_once(program, command_line, source, seed):
    chance = random.Random(seed)
    with tempfile.TemporaryDirectory() as home:
        project = shutil.copy(source, home)
        recovery = os.path.join(home, "recovery")
        environment = dict(os.environ, QT_QPA_PLATFORM="offscreen", HOME=home)
        victim = subprocess.Popen(
            [program, project, recovery, os.path.join(home, "window.ini"), str(seed)],
            env=environment, stdout=subprocess.PIPE, stderr=subprocess.DEVNULL, text=True)
        edits, thread = edits_told(victim)
        while not edits:
            if victim.poll() is not None:
                raise AssertionError("the victim ended by itself")
            time.sleep(0.01)
        time.sleep(chance.uniform(0.0, LONGEST))
        killed = time.monotonic()
        victim.kill()
        victim.wait()
        thread.join()

        readable(command_line, project)
        kept = value_in(project)
        copies = glob.glob(os.path.join(recovery, "*.recovery.json"))
        for copy in copies:
            readable(command_line, copy)
            kept = max(kept, value_in(copy))
        lost = [moment for value, moment in edits if value > kept]
        loss = killed - lost[0] if lost else 0.0
        if loss > BEARABLE_LOSS:
            raise AssertionError(f"seed {seed}: {loss:.3f} s of edits are lost, {len(lost)} edits")
        return loss, len(edits), bool(copies)


program, command_line, source, kills, seed = sys.argv[1:6]
with concurrent.futures.ThreadPoolExecutor(WORKERS) as pool:
    done = list(pool.map(lambda i: kill_once(program, command_line, source, int(seed) + i),
                         range(int(kills))))
if not any(copy for _, _, copy in done):
    sys.exit("no kill found a recovery copy; the test has shown nothing of it")
print(f"{len(done)} kills, {sum(edits for _, edits, _ in done)} edits, every file readable, "
      f"at most {max(loss for loss, _, _ in done):.3f} s of edits lost")
