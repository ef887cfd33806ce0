"""Whether the cases beside the rule files hold every entry on both sides: each finding, check, alert limit, explanation, table row
and condition in force is expected `yes` in one case and `no` in another, each quantity is expected as a number, and the program
runs exactly the cases that stand in the files.

One side is enough where the other cannot be: rows that refuse a panel, conditions that a convention fixes as `true` or `false`,
and entries that ask for a condition fixed as `false`.

Usage: case_coverage.py SOURCE_DIR PROGRAM
"""

import json
import pathlib
import re
import subprocess
import sys

RULES = pathlib.Path(sys.argv[1]) / "rules"
PROGRAM = sys.argv[2]
SET = RULES / "sets" / "default.json"

TRUTHS = ("conditions", "findings", "checks", "criticals", "explanations")
# Conditions that the conventions in force leave on one side, with the reason.
ONE_SIDED = {
    "acidosisJoinedAbove": "from HCO3 18 on, 40 + 1.2 (HCO3 - 24) lies below 1.5 HCO3 + 8",
}


def read(path):
    return json.loads(path.read_text())


def parts_in_force(rule_set):
    """The rule files, and the conventions chosen from them: objects with arrays of entries."""
    chosen = set(rule_set["conventions"].values())
    for name in rule_set["files"]:
        rules = read(RULES / name)
        yield rules
        yield from (c for c in rules.get("conventions", []) if c["id"] in chosen)


def rows(part):
    for table in part.get("tables", []):
        for row in table["rows"]:
            yield f"{table['id']}.{row['id']}", "no" if "stops" in row else "both"


def fixed_conditions(parts):
    return {c["id"]: c["when"] for p in parts for c in p.get("conditions", []) if c["when"] in ("true", "false")}


def sides_wanted(parts):
    """What must be expected of each truth: yes, no, or both."""
    fixed = fixed_conditions(parts)
    wanted = {}
    for part in parts:
        wanted.update(rows(part))
        for entry in (e for kind in TRUTHS for e in part.get(kind, [])):
            asked = re.split(r" and ", entry["when"])[0]
            if entry["id"] in fixed:
                wanted[entry["id"]] = "yes" if fixed[entry["id"]] == "true" else "no"
            elif fixed.get(asked) == "false" or entry["id"] in ONE_SIDED:
                wanted[entry["id"]] = "no"
            else:
                wanted[entry["id"]] = "both"
    return wanted


def expectations(rule_set):
    """Every case of the set's files, as its `expect`."""
    for name in rule_set["files"]:
        path = RULES / name.replace(".json", ".cases.json")
        if path.exists():
            yield from (case["expect"] for case in read(path))


def not_covered(parts, expected):
    seen = {}
    for case in expected:
        for entry, value in case.items():
            seen.setdefault(entry, set()).add("number" if isinstance(value, (int, float)) else value)
    for entry, sides in sides_wanted(parts).items():
        missing = ({"yes", "no"} if sides == "both" else {sides}) - seen.get(entry, set())
        if missing:
            yield f"{entry}: no case expects {' or '.join(sorted(missing))}"
    for quantity in (q["id"] for p in parts for q in p.get("quantities", [])):
        if "number" not in seen.get(quantity, set()):
            yield f"{quantity}: no case expects a number"


def not_run(expected):
    """What differs between the cases in the files and those that the program ran and met."""
    lint = subprocess.run([PROGRAM, "rules", "lint"], capture_output=True, text=True)
    counts = re.search(r"(\d+) cases with (\d+) expectations, (\d+) not met", lint.stdout + lint.stderr)
    if counts is None:
        yield "the program printed no count of cases:\n" + lint.stderr
        return
    found = tuple(int(n) for n in counts.groups())
    wanted = (len(expected), sum(len(case) for case in expected), 0)
    if found != wanted:
        yield f"cases, expectations, not met: {wanted} in the files, {found} by the program"


def main():
    rule_set = read(SET)
    parts = list(parts_in_force(rule_set))
    expected = list(expectations(rule_set))
    faults = [*not_covered(parts, expected), *not_run(expected)]
    print("\n".join(faults) or f"{len(expected)} cases cover every entry")
    return 1 if faults else 0


if __name__ == "__main__":
    sys.exit(main())
