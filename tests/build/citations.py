"""Every `[@<key>, <place>]` of lib/ and tests/, and every `ref` of the rules and published cases, against rules/sources.json.

An unknown key, a key that nothing cites, and a citation without a place are faults; so is one broken across lines, unless by the
quotes of adjoining texts.
"""
import json
import re

from faults import ROOT, finish, line_of, place, text_files

BEGIN = re.compile(r"\[@(?=[A-Za-z0-9])")
BREAK = r'"\n *"'
CITATION = re.compile(rf"\[(@(?:{BREAK}|[^\]\n])*)\]")
ONE = re.compile(r"@([a-z0-9-]+), *(\S.*)")


def in_text(path, text):
    """Triples of a place, the key and the place in the work; without a key where the citation cannot be read."""
    for begin in BEGIN.finditer(text):
        where = place(path, line_of(text, begin.start()))
        whole = CITATION.match(text, begin.start())
        if whole is None:
            yield where, None, "the citation does not end on its line"
            continue
        for part in re.split(r"; *(?=@)", re.sub(BREAK, "", whole[1])):
            one = ONE.fullmatch(part)
            yield (where, *one.groups()) if one else (where, None, f"[{part}] is not of the form [@<key>, <place>]")


def in_json(path, value):
    if isinstance(value, list):
        for item in value:
            yield from in_json(path, item)
    elif isinstance(value, dict):
        key = value.get("ref")
        if isinstance(key, str) and key != "common-practice":
            where = path.relative_to(ROOT)
            yield (where, key, value["at"]) if value.get("at") else (where, None, f"{key} is cited without a place")
        for item in value.values():
            yield from in_json(path, item)


citations = []
for folder in ("lib", "cli", "tests"):
    for path, text in text_files(folder, ".hpp", ".cpp", ".csv", ".py", ".mjs"):
        citations += in_text(path, text)
for folder in ("rules", "tests/published"):
    for path, text in text_files(folder, ".json"):
        if "schema" not in path.parts:
            citations += in_json(path, json.loads(text))

items = [item["id"] for item in json.loads((ROOT / "rules/sources.json").read_text(encoding="utf-8"))]
faults = [f"{where}: {problem}" for where, key, problem in citations if key is None]
faults += [f"{where}: rules/sources.json has no {key}" for where, key, _ in citations if key and key not in items]
cited = {key for _, key, _ in citations}
faults += [f"rules/sources.json: nothing cites {item}" for item in items if item not in cited]
finish(faults, len(citations), "citations")
