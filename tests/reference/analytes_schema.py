"""rules/analytes.json against its JSON Schema, by an outside validator: the shipped list is valid, and damage is not.

Each damage is one that the program's own reader refuses too (tests/panel/catalogue_faults_test.cpp).
"""

import copy
import json
import pathlib
import sys

import jsonschema

RULES = pathlib.Path(sys.argv[1]) / "rules"


def entry(document, analyte):
    return next(item for item in document["analytes"] if item["id"] == analyte)


def rename(document, analyte, old, new):
    entry(document, analyte)[new] = entry(document, analyte).pop(old)


DAMAGES = {
    "an unknown analyte": lambda d: entry(d, "Na").update(id="Natrium"),
    "a missing analyte": lambda d: d["analytes"].pop(),
    "a misspelt key": lambda d: rename(d, "Na", "label", "lable"),
    "decimals as text": lambda d: entry(d, "Na").update(decimals="0"),
    "decimals with a fraction": lambda d: entry(d, "Na").update(decimals=0.5),
    "a charge of seven": lambda d: entry(d, "Na").update(charge=7),
    "a name that no expression can hold": lambda d: entry(d, "pCO2").update({"as": "pCO2 measured"}),
    "an unknown molar mass": lambda d: entry(d, "glucose")["customary"][0].update(molarMass="glucos"),
    "an unknown preset": lambda d: entry(d, "Na").update(presets=["metric"]),
    "an unknown specimen": lambda d: entry(d, "Na")["aliases"].append({"name": "aNa", "specimen": "aortic"}),
    "limits without high": lambda d: entry(d, "Na")["plausible"].pop("high"),
    "a LOINC code without hyphen": lambda d: entry(d, "Na")["loinc"].append("29512"),
    "a date in words": lambda d: entry(d, "Na").update(reviewed="1 Dec 2026"),
    "a source without place": lambda d: entry(d, "Na").update(source={"ref": "loinc"}),
    "common practice with a place": lambda d: entry(d, "Na").update(source={"ref": "common-practice", "at": "p. 3"}),
    "no list": lambda d: d.pop("analytes"),
}


def main():
    schema = json.loads((RULES / "schema" / "analytes.schema.json").read_text())
    jsonschema.Draft202012Validator.check_schema(schema)
    validator = jsonschema.Draft202012Validator(schema)
    shipped = json.loads((RULES / "analytes.json").read_text())
    faults = [f"shipped list: {error.message}" for error in validator.iter_errors(shipped)]
    for name, damage in DAMAGES.items():
        damaged = copy.deepcopy(shipped)
        damage(damaged)
        if validator.is_valid(damaged):
            faults.append(f"not refused: {name}")
    print("\n".join(faults) or f"valid; {len(DAMAGES)} damages refused")
    return 1 if faults else 0


if __name__ == "__main__":
    sys.exit(main())
