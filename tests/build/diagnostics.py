"""The ids of messages in three lists: in the code, in rules/DIAGNOSTICS.md, and in what the tests provoke.

An id in the code is the text that begins a call of error() or warning(), and any text whose first word is that of a
documented id, so that ids which are handed on are seen too.
"""
import re

from faults import documented_ids, finish, place, line_of, text_files

CALL = re.compile(r'\b(?:error|warning)\(\s*"([a-z0-9-]+)"')
HYPHENATED = re.compile(r'"([a-z][a-z0-9]*(?:-[a-z0-9]+)+)"')
THIS_FOLDER = "build"

rows = documented_ids()
documented = set(rows)
families = {name.partition("-")[0] for name in documented}
used = {}
for folder in ("lib", "cli"):
    for path, text in text_files(folder, ".hpp", ".cpp"):
        ids = [*CALL.finditer(text), *(m for m in HYPHENATED.finditer(text) if m[1].partition("-")[0] in families)]
        for found in ids:
            used.setdefault(found[1], place(path, line_of(text, found.start())))

tested = "\n".join(text for path, text in text_files("tests", ".cpp", ".hpp", ".txt", ".py", ".mjs")
                   if THIS_FOLDER not in path.parts and "fuzz" not in path.parts)
provoked = set(re.findall(r"(?<![\w-])[a-z][a-z0-9]*(?:-[a-z0-9]+)+(?![\w-])", tested))

faults = [f"rules/DIAGNOSTICS.md: {name} has more than one row" for name in sorted(documented) if rows.count(name) > 1]
faults += [f"{used[name]}: {name} has no row in rules/DIAGNOSTICS.md" for name in sorted(set(used) - documented)]
faults += [f"rules/DIAGNOSTICS.md: no code gives {name}" for name in sorted(documented - set(used))]
faults += [f"rules/DIAGNOSTICS.md: no test and no dialogue provokes {name}" for name in sorted(documented - provoked)]
finish(faults, len(documented & set(used)), "ids")
