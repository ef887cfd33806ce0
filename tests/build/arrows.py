"""Every `#include` of lib/ against the table of lib/README.md: which folder may include which.

The table must name exactly the folders that exist, and have no way round in a circle.
"""
import re

from faults import ROOT, finish, line_of, place, text_files

LIBRARY = ROOT / "lib/isohydric"
HEADING = "## Which folder may include which"


def read_table():
    section = (ROOT / "lib/README.md").read_text(encoding="utf-8").partition(HEADING)[2].partition("\n## ")[0]
    rows = re.findall(r"^\| (\w+) \|(.*)\|$", section, re.MULTILINE)
    return {folder: set(re.findall(r"\w+", allowed)) for folder, allowed in rows if folder != "folder"}


def table_faults(table):
    folders = {path.name for path in LIBRARY.iterdir() if path.is_dir()}
    for name in sorted(folders - set(table)):
        yield f"lib/README.md: the table has no row for {name}"
    for name in sorted(set(table).union(*table.values()) - folders):
        yield f"lib/README.md: the table names {name}, which is no folder of lib/isohydric"
    left = dict(table)
    while ends := [name for name, allowed in left.items() if not allowed & set(left)]:
        for name in ends:
            del left[name]
    if left:
        yield f"lib/README.md: the arrows go round in a circle among {', '.join(sorted(left))}"


def include_faults(table, path, text):
    parts = path.relative_to(LIBRARY).parts
    for include in re.finditer(r'^[ \t]*#[ \t]*include[ \t]*(["<])([^">]+)[">]', text, re.MULTILINE):
        quote, target = include.groups()
        where = place(path, line_of(text, include.start()))
        inside = re.match(r"isohydric/(?:(\w+)/)?(detail/)?", target)
        if inside is None:
            if quote == '"':
                yield f'{where}: includes "{target}"; headers of the library are included as "isohydric/<folder>/..."'
            continue
        folder = inside[1]
        if folder is None or len(parts) == 1 or folder == parts[0]:
            continue
        if folder not in table.get(parts[0], ()):
            yield f"{where}: {parts[0]} includes {folder}, which the table of lib/README.md does not allow"
        if inside[2]:
            yield f"{where}: includes {target}, a detail of another folder"


table = read_table()
faults = list(table_faults(table))
files = list(text_files("lib/isohydric", ".hpp", ".cpp"))
for path, text in files:
    faults += include_faults(table, path, text)
finish(faults, len(files) if table else 0, "files")
