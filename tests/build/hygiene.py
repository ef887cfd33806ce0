"""What no tracked file may hold, and what the top folder may.

The patterns are written so that they do not find themselves.
"""
import json
import re
import subprocess

from faults import ROOT, finish, place

TOP = {"CMakeLists.txt", "CMakePresets.json", "README.md", "DEVELOPERS.md", "SAFETY.md", "LICENSE", ".clang-format",
       ".clang-tidy", ".gitignore", ".ci", "cli", "lib", "rules", "samples", "tests"}
HOST = re.compile(r"\b(?:npm[j]s|yarn[p]kg|unp[k]g|jsde[l]ivr|py[p]i|python[h]osted|ruby[g]ems|crat[e]s)\.\w+|\bdeb\.de[b]ian\.|"
                  r"\bregistry\.\w+\.\w+|\b(?:gh[c]r|dock[e]r)\.io\b")
WORKPLACE = re.compile(r"(?<![\w.$}])/w[o]rk/|/tmp/b[r]ief|/ro[o]t/")
PLAIN = (".cpp", ".hpp", ".py", ".mjs", ".cmake", ".json", ".md", ".txt")
COMMENT = re.compile(r'"(?:[^"\\]|\\.)*"|(//.*)')


def comments(line):
    """What a C++ line says in a comment; `//` inside a text is none."""
    return "".join(match[1] or "" for match in COMMENT.finditer(line))


def line_faults(name, line):
    if HOST.search(line):
        yield "names the host of a package registry"
    if WORKPLACE.search(line):
        yield "holds a path of one machine"
    if "\t" in line and name.endswith(PLAIN):
        yield "holds a tab"
    if name.endswith((".cpp", ".hpp")) and not comments(line).isascii():
        yield "has a comment that is not ASCII"


tracked = subprocess.run(["git", "-C", ROOT, "ls-files", "-z"], capture_output=True, check=True, text=True).stdout
names = [name for name in tracked.split("\0") if name and (ROOT / name).is_file()]
faults = [f"{top}: not for the top folder" for top in sorted({name.partition("/")[0] for name in names} - TOP)]
for name in names:
    if "/corpus/" in name:
        continue  # whatever bytes a fuzzer found
    text = (ROOT / name).read_text(encoding="utf-8", errors="replace")
    for number, line in enumerate(text.splitlines(), 1):
        faults += [f"{place(ROOT / name, number)}: {fault}" for fault in line_faults(name, line)]
    if name.endswith("package-lock.json"):
        packages = json.loads(text)["packages"]
        faults += [f"{name}: {package} says where it was resolved" for package in packages if "resolved" in packages[package]]
finish(faults, len(names), "files")
