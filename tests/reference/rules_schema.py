"""Rule files against their JSON Schemas, by an outside validator: the shipped files are valid, and of a list of damaged
files the schema and the program's own reader refuse the same ones. Damages that only the reader can see (a name that
nothing has, a unit that does not agree) are listed apart: there the schema must accept.

Usage: rules_schema.py READ_RULES SOURCE_DIR
"""

import copy
import json
import pathlib
import subprocess
import sys
import tempfile

import jsonschema

READER = sys.argv[1]
RULES = pathlib.Path(sys.argv[2]) / "rules"
HEAD = {"source": {"ref": "common-practice"}, "reviewed": "2026-12-01"}


def validator(name):
    schema = json.loads((RULES / "schema" / f"{name}.schema.json").read_text())
    jsonschema.Draft202012Validator.check_schema(schema)
    return jsonschema.Draft202012Validator(schema)


VALIDATORS = {name: validator(name) for name in ("rules", "set", "cases", "sources")}


def schema_of(path):
    """Which schema a file of the rule tree follows; None for files that other readers read."""
    if path.name == "analytes.json" or {"schema", "imprecision"} & set(path.parts):
        return None
    if path.name.endswith(".cases.json"):
        return "cases"
    if path.name == "sources.json":
        return "sources"
    return "set" if path.parent.name == "sets" else "rules"


def refs_below(value):
    if isinstance(value, list):
        return [ref for item in value for ref in refs_below(item)]
    if isinstance(value, dict):
        own = [value["ref"]] if isinstance(value.get("ref"), str) else []
        return own + refs_below(list(value.values()))
    return []


ANALYTES = json.loads((RULES / "analytes.json").read_text())
SOUND = {
    "set.json": {"id": "s", "version": "1", "title": "t", "extends": None, "analytes": "analytes.json",
                 "sources": "sources.json", "files": ["r.json"], "conventions": {"c": "c-1"}, "replace": [], "remove": [],
                 "approved": {"role": "", "date": ""}},
    "analytes.json": ANALYTES,
    "sources.json": [{"id": key, "type": "book", "title": "t"}
                     for key in sorted(set(refs_below(ANALYTES)) - {"common-practice"} | {"k"})],
    "r.cases.json": [{"id": "a", "panel": {"Na": "140"}, "context": {"specimen": "venous"},
                      "expect": {"q": 1.5, "f": "yes"}, "source": {"ref": "k", "at": "p. 1"}}],
    "r.json": {
        "topic": "all kinds",
        "disorders": [{"id": "d", "label": "d", "main": True, "approaches": ["general"], **HEAD},
                      {"id": "kind", "label": "k", "kindOf": "d", **HEAD}],
        "quantities": [{"id": "q", "label": "q", "unit": "mmol/L", "decimals": 1, "formula": "Na", "interval": "q", **HEAD},
                       {"id": "first", "internal": True, "unit": "mmol/L",
                        "firstOf": [{"from": "entered", "formula": "K"}], **HEAD}],
        "conditions": [{"id": "on", "when": "Na.exists()", "policy": True, **HEAD}],
        "intervals": [{"id": "i", "of": "q", "unit": "mmol/L", "low": 1, "mid": 2, "high": 3,
                       "for": {"specimen": ["venous"], "population": ["adult"], "age": {"from": "18 a"},
                               "altitude": {"below": "2 km"}}, "shippedLimit": True, "shownAs": "x", **HEAD}],
        "findings": [{"id": "f", "approach": "general", "label": "f", "when": "q > limits.q.high", "states": "{q}",
                      "unless": ["t.r"], "asserts": ["kind"], "consider": ["x"], **HEAD}],
        "tables": [{"id": "t", "approach": "general",
                    "axes": [{"id": "a", "cases": [{"id": "c", "when": "on"}]}],
                    "rows": [{"id": "r", "cells": ["c"], "states": "s"}, {"id": "stop", "cells": ["*"], "stops": "s"}],
                    **HEAD}],
        "explanations": [{"id": "e", "approach": "general", "disorders": ["d"], "onset": "acute", "when": "on",
                          "compensation": {"quantity": "q", "low": "q", "high": None, "from": "x"},
                          "early": {"beside": ["d"], "states": "s"}, "states": "s", **HEAD}],
        "groups": [{"id": "g", "members": ["f", "t", "explanations:general"], "exclusive": True, "domain": "true", **HEAD}],
        "checks": [{"id": "ch", "when": "on", "then": "warns", "states": "s", "contradicts": ["Na"], **HEAD}],
        "criticals": [{"id": "cr", "when": "on", "states": "s", "value": "Na", **HEAD}],
        "conventions": [{"id": "c-1", "choice": "c", "title": "t", "why": "w",
                         "quantities": [{"id": "k", "internal": True, "unit": "1", "formula": "1", **HEAD}],
                         "conditions": [{"id": "kOn", "when": "true", **HEAD}], **HEAD}],
    },
}

REMOVE = object()


def at(document, path):
    """The container and the last step of a path such as "quantities.0.id"."""
    steps = [int(step) if step.isdigit() else step for step in path.split(".")]
    for step in steps[:-1]:
        document = document[step]
    return document, steps[-1]


def put(document, path, value):
    container, last = at(document, path)
    if value is REMOVE:
        del container[last]
    elif isinstance(container, list) and last == len(container):
        container.append(value)
    else:
        container[last] = value


# file, path, value: refused by both.
BOTH = [
    ("r.json", "quantites", []), ("r.json", "topic", 3), ("r.json", "checks", {}), ("r.json", "checks.0", "x"),
    *[("r.json", f"{kind}.0.{member}", REMOVE)
      for kind in ("quantities", "conditions", "intervals", "findings", "tables", "explanations", "groups", "checks",
                   "criticals", "disorders", "conventions")
      for member in ("id", "source", "reviewed")],
    *[("r.json", f"{kind}.0.extra", 1)
      for kind in ("quantities", "conditions", "intervals", "findings", "tables", "explanations", "groups", "checks",
                   "criticals", "disorders", "conventions")],
    ("r.json", "quantities.0.id", "raised-gap"), ("r.json", "quantities.0.id", "1q"), ("r.json", "quantities.0.id", "limits"),
    ("r.json", "groups.0.id", "Group"), ("r.json", "groups.0.id", "a--b"), ("r.json", "groups.0.id", "a-"),
    ("r.json", "groups.0.id", "a.b"), ("r.json", "groups.0.id", ""), ("r.json", "groups.0.id", "1.-a"),
    ("r.json", "quantities.0.unit", REMOVE), ("r.json", "quantities.0.unit", 1), ("r.json", "quantities.0.label", REMOVE),
    ("r.json", "quantities.0.decimals", REMOVE), ("r.json", "quantities.0.decimals", 1.5),
    ("r.json", "quantities.0.decimals", -1), ("r.json", "quantities.0.decimals", 10),
    ("r.json", "quantities.0.decimals", "1"), ("r.json", "quantities.0.formula", REMOVE),
    ("r.json", "quantities.0.firstOf", [{"from": "x", "formula": "Na"}]), ("r.json", "quantities.0.inputs", {}),
    ("r.json", "quantities.0.model", "m"), ("r.json", "quantities.1.firstOf", []),
    ("r.json", "quantities.1.firstOf.0.from", REMOVE), ("r.json", "quantities.1.firstOf.0.extra", 1),
    ("r.json", "quantities.0.internal", "yes"), ("r.json", "conditions.0.policy", 1), ("r.json", "conditions.0.when", True),
    ("r.json", "intervals.0.of", REMOVE), ("r.json", "intervals.0.unit", REMOVE), ("r.json", "intervals.0.low", "1"),
    ("r.json", "intervals.0.for.specimen.0", "artery"), ("r.json", "intervals.0.for.population", "adult"),
    ("r.json", "intervals.0.for.method", "x"), ("r.json", "intervals.0.for.age.to", "1 a"),
    ("r.json", "intervals.0.for.age.from", 18), ("r.json", "intervals.0.for.specimen.1", "venous"),
    ("r.json", "findings.0.approach", "other"), ("r.json", "findings.0.approach", REMOVE),
    ("r.json", "findings.0.when", REMOVE), ("r.json", "findings.0.states", REMOVE), ("r.json", "findings.0.states", "{q"),
    ("r.json", "findings.0.states", "q}"), ("r.json", "findings.0.states", "{{q}}"), ("r.json", "findings.0.states", "{}"),
    ("r.json", "findings.0.asserts", "kind"), ("r.json", "findings.0.unless.1", "t.r"), ("r.json", "findings.0.consider.0", 1),
    ("r.json", "tables.0.axes", REMOVE), ("r.json", "tables.0.rows", REMOVE), ("r.json", "tables.0.rows.0.cells", REMOVE),
    ("r.json", "tables.0.rows.0.cells.0", None), ("r.json", "tables.0.rows.0.states", REMOVE),
    ("r.json", "tables.0.rows.0.stops", "s"), ("r.json", "tables.0.rows.1.asserts", ["kind"]),
    ("r.json", "tables.0.rows.0.source", HEAD["source"]), ("r.json", "tables.0.axes.0.cases.0.when", REMOVE),
    ("r.json", "tables.0.axes.0.cases.0.id", "C"), ("r.json", "tables.0.axes.0.id", REMOVE),
    ("r.json", "explanations.0.onset", "sudden"), ("r.json", "explanations.0.disorders", REMOVE),
    ("r.json", "explanations.0.states", REMOVE), ("r.json", "explanations.0.compensation", {"quantity": "q", "from": "x"}),
    ("r.json", "explanations.0.compensation.from", REMOVE), ("r.json", "explanations.0.early.beside", REMOVE),
    ("r.json", "groups.0.exclusive", False), ("r.json", "groups.0.domain", REMOVE), ("r.json", "groups.0.members", REMOVE),
    ("r.json", "checks.0.then", "halts"), ("r.json", "checks.0.contradicts.0", "sodium"),
    ("r.json", "criticals.0.value", REMOVE), ("r.json", "disorders.1.main", True), ("r.json", "disorders.0.label", REMOVE),
    ("r.json", "disorders.0.approaches.0", "x"), ("r.json", "conventions.0.why", REMOVE),
    ("r.json", "conventions.0.choice", REMOVE), ("r.json", "conventions.0.quantities.0.unit", REMOVE),
    ("r.json", "conventions.0.findings", []),
    ("r.json", "checks.0.source", []), ("r.json", "checks.0.source", {"ref": "k"}), ("r.json", "checks.0.source", "k"),
    ("r.json", "checks.0.source", {"ref": "k", "at": ""}), ("r.json", "checks.0.source", {"at": "p. 1"}),
    ("r.json", "checks.0.source", {"ref": "common-practice", "at": "p. 1"}),
    ("r.json", "checks.0.source", {"ref": "k", "at": "p. 1", "page": 1}), ("r.json", "checks.0.reviewed", "1 Dec 2026"),
    ("set.json", "id", REMOVE), ("set.json", "version", 1), ("set.json", "title", REMOVE), ("set.json", "extra", 1),
    ("set.json", "analytes", REMOVE), ("set.json", "sources", REMOVE), ("set.json", "files", "r.json"),
    ("set.json", "files.1", "r.json"), ("set.json", "remove", ["f"]), ("set.json", "replace", ["r.json"]),
    ("set.json", "conventions.c", 1), ("set.json", "approved", {"role": "x"}),
    ("set.json", "approved", {"role": "x", "date": "soon"}),
    ("sources.json", "0.id", REMOVE), ("sources.json", "0.title", REMOVE), ("sources.json", "0.type", REMOVE),
    ("r.cases.json", "0.id", REMOVE), ("r.cases.json", "0.panel", REMOVE), ("r.cases.json", "0.expect", REMOVE),
    ("r.cases.json", "0.extra", 1), ("r.cases.json", "0.panel.Na", 140), ("r.cases.json", "0.context.sample", "x"),
    ("r.cases.json", "0.expect.f", "maybe"), ("r.cases.json", "0.expect.f", True), ("r.cases.json", "0.expect.q", None),
    ("r.cases.json", "0.source", {"ref": "k"}),
]

# Refused by the reader only: a schema cannot look things up, nor compare.
READER_ONLY = [
    ("r.json", "checks.0.when", "nothing"), ("r.json", "quantities.0.unit", "mmool/L"),
    ("r.json", "findings.0.asserts.0", "nothing"), ("r.json", "intervals.0.low", 3), ("r.json", "groups.0.id", "f"),
    ("r.json", "tables.0.rows.0.cells", []), ("r.json", "checks.0.reviewed", "2026-02-30"),
    ("r.json", "checks.0.source", {"ref": "unknown", "at": "p. 1"}), ("r.json", "findings.0.states", "{nothing}"),
    ("set.json", "conventions", {}), ("r.cases.json", "0.panel.Natrium", "1"), ("r.cases.json", "0.expect.q", "yes"),
]

# Accepted by both: what is optional, and null for what is absent.
NEITHER = [
    ("r.json", "topic", REMOVE), ("r.json", "groups.0.id", "co2-0.0307-6.100"), ("r.json", "findings.0.label", REMOVE),
    ("r.json", "findings.0.asserts", None), ("r.json", "intervals.0.for", None), ("r.json", "explanations.0.onset", None),
    ("r.json", "explanations.0.compensation", None), ("r.json", "explanations.0.early", REMOVE),
    ("r.json", "conditions.0.policy", None), ("r.json", "quantities.1.decimals", 3),
    ("r.json", "checks.0.source", [{"ref": "k", "at": "p. 1", "checked": False, "note": "n"}]),
    ("r.json", "intervals.0.mid", REMOVE), ("set.json", "approved", REMOVE), ("set.json", "extends", REMOVE),
    ("set.json", "approved", {"role": "x", "date": "2026-12-01"}), ("sources.json", "0.DOI", "10.1/x"),
    ("r.cases.json", "0.context", REMOVE), ("r.cases.json", "0.expect.q", "unknown"), ("r.cases.json", "0.source", REMOVE),
]


def schema_accepts(name, document):
    kind = {"r.json": "rules", "set.json": "set", "sources.json": "sources", "r.cases.json": "cases"}[name]
    return VALIDATORS[kind].is_valid(document)


def reader_accepts(tree):
    with tempfile.TemporaryDirectory() as folder:
        for name, document in tree.items():
            (pathlib.Path(folder) / name).write_text(json.dumps(document))
        run = subprocess.run([READER, folder, "set.json"], capture_output=True, text=True, check=False)
    if run.returncode not in (0, 1):
        raise RuntimeError(f"the reader ended with {run.returncode}: {run.stderr}")
    return run.returncode == 0


def compare(changes, schema_wanted, reader_wanted):
    faults = []
    for name, path, value in changes:
        tree = copy.deepcopy(SOUND)
        put(tree[name], path, value)
        found = schema_accepts(name, tree[name]), reader_accepts(tree)
        if found != (schema_wanted, reader_wanted):
            shown = "removed" if value is REMOVE else json.dumps(value)
            faults.append(f"{name} {path} {shown}: schema accepts {found[0]}, reader accepts {found[1]}")
    return faults


def main():
    faults = []
    shipped = 0
    for path in sorted(RULES.rglob("*.json")):
        kind = schema_of(path.relative_to(RULES))
        if kind is not None:
            shipped += 1
            errors = VALIDATORS[kind].iter_errors(json.loads(path.read_text()))
            faults += [f"{path}: {error.json_path}: {error.message[:200]}" for error in errors]
    if shipped == 0:
        faults.append("no shipped rule file was found")
    if not reader_accepts(SOUND):
        faults.append("the reader refuses the sound tree")
    faults += [f"the schema refuses the sound {name}"
               for name in SOUND if name != "analytes.json" and not schema_accepts(name, SOUND[name])]
    faults += compare(BOTH, False, False) + compare(READER_ONLY, True, False) + compare(NEITHER, True, True)
    print("\n".join(faults) or f"{shipped} shipped files valid; schema and reader agree on "
          f"{len(BOTH) + len(READER_ONLY) + len(NEITHER)} changed files")
    return 1 if faults else 0


if __name__ == "__main__":
    sys.exit(main())
