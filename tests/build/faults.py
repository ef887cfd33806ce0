"""What the tests of the repository share: the tree they look at, and how they fail.

Every one is run as `<name>.py ROOT ...`. It gathers all faults before it fails, and one that looked at nothing fails too.
"""
import pathlib
import re
import sys

ROOT = pathlib.Path(sys.argv[1]).resolve()


def text_files(folder, *suffixes):
    """Pairs of a path and its text below a folder of the tree, in a fixed order."""
    for path in sorted((ROOT / folder).rglob("*")):
        if path.suffix in suffixes and path.is_file() and not {"node_modules", "__pycache__"} & set(path.parts):
            yield path, path.read_text(encoding="utf-8", errors="replace")


def line_of(text, offset):
    return text.count("\n", 0, offset) + 1


def place(path, line):
    return f"{path.relative_to(ROOT)}:{line}"


def documented_ids():
    """The ids that rules/DIAGNOSTICS.md has a row for; one that stands there twice is listed twice."""
    return re.findall(r"^\| `([a-z0-9-]+)` \|", (ROOT / "rules/DIAGNOSTICS.md").read_text(encoding="utf-8"), re.MULTILINE)


def finish(faults, looked_at, what):
    """Prints every fault and ends the test."""
    for fault in faults:
        print(fault)
    print(f"{looked_at} {what} looked at, {len(faults)} faults")
    sys.exit(1 if faults or looked_at == 0 else 0)
