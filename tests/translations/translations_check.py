"""Holds the catalogue of each language against the texts that stand in the sources.

Reads the sources anew with lupdate and compares: every text must stand in the catalogue, finished,
with the places (%1, ...) and the shortcut of the source; none may stand there that the sources have
no more; and a context that the code looks texts up in must be one under which lupdate files them.

usage: translations_check.py LUPDATE SOURCE_TREE
"""

import glob
import os
import re
import shutil
import subprocess
import sys
import tempfile
import xml.etree.ElementTree as ElementTree


def messages_of(file):
    """{(context, source, comment): (translation, state)}"""
    found = {}
    for context in ElementTree.parse(file).getroot().iter("context"):
        for message in context.iter("message"):
            translation = message.find("translation")
            key = (context.findtext("name"), message.findtext("source"),
                   message.findtext("comment") or "")
            found[key] = (translation.text or "", translation.get("type", "finished"))
    return found


def faults_of(key, translation, state):
    context, source, _ = key
    where = f"{context}: \"{source}\""
    if state in ("obsolete", "vanished"):
        return [f"{where} stands in no source any more"]
    if state != "finished" or not translation:
        return [f"{where} is not translated"]
    faults = []
    if sorted(re.findall(r"%\d", source)) != sorted(re.findall(r"%\d", translation)):
        faults.append(f"{where}: other places in \"{translation}\"")
    if ("\t" in source) != ("\t" in translation):
        faults.append(f"{where}: the shortcut is missing in \"{translation}\"")
    if re.search(r"&\w", source) and not re.search(r"&\w", translation):
        faults.append(f"{where}: no letter to type in \"{translation}\"")
    return faults


lupdate, tree = sys.argv[1:3]
faults = []
for catalogue in glob.glob(os.path.join(tree, "resources/translations/*.ts")):
    with tempfile.TemporaryDirectory() as folder:
        fresh = shutil.copy(catalogue, folder)
        subprocess.run([lupdate, "-silent", "-locations", "none", "-I", tree,
                        os.path.join(tree, "app"), os.path.join(tree, "widgets"), "-ts", fresh],
                       check=True, stderr=subprocess.DEVNULL)
        messages = messages_of(fresh)
    if len(messages) < 100:
        sys.exit(f"lupdate found only {len(messages)} texts")
    for key, (translation, state) in messages.items():
        faults += faults_of(key, translation, state)
    contexts = {context for context, _, _ in messages}

for folder in ("app", "widgets"):
    for file in glob.glob(os.path.join(tree, folder, "**", "*.cpp"), recursive=True):
        with open(file, encoding="utf-8") as opened:
            for context in re.findall(r"\btranslate\(\s*\"(\w+)\"", opened.read()):
                if context not in contexts:
                    faults.append(f"{file}: looks texts up in \"{context}\", where none are filed")

if faults:
    sys.exit("\n".join(faults))
print(f"{len(messages)} texts stand in every language")
