"""The JSON result has exactly the members of `isohydric.interpretation/1`, in their order and of their kinds.

    json_format.py PROGRAM ROOT
"""
import json
import subprocess
import sys

TEXT, NUMBER, LIST, TRUTH, NONE = str, (int, float), list, bool, type(None)
TOP = ["caution", "format", "engine", "rules", "panel", "context", "checks", "interpretable", "critical", "quantities",
       "findings", "disorders", "explanations", "interpretation", "would_help", "unchecked", "caution_end"]
# Members in their order; a name that begins with `?` need not be there.
SOURCE = {"ref": TEXT, "at": (str, NONE), "checked": TRUTH, "?citation": TEXT, "?note": TEXT}
VALUE = {"value": NUMBER, "unit": TEXT, "as_entered": TEXT, "?censored": TEXT, "?note": TEXT}
CONTEXT = {"specimen": TEXT, "population": TEXT, "onset": TEXT, "age_a": (*NUMBER, NONE), "altitude_m": (*NUMBER, NONE),
           "baseline_pCO2_mmHg": (*NUMBER, NONE), "baseline_HCO3_mmol_L": (*NUMBER, NONE), "assumed": LIST}
CHECK = {"id": TEXT, "outcome": TEXT, "detail": (str, NONE)}
CRITICAL = {"id": TEXT, "statement": TEXT, "value": NUMBER, "unit": TEXT, "source": LIST}
QUANTITY = {"value": (*NUMBER, NONE), "unit": TEXT, "low": (*NUMBER, NONE), "high": (*NUMBER, NONE), "from": (str, NONE),
            "source": LIST, "?interval_note": TEXT}
FINDING = {"id": TEXT, "approach": TEXT, "state": TEXT, "asserts": LIST, "statement": (str, NONE), "because": LIST,
           "needs": LIST, "consider": LIST, "repeatability": (*NUMBER, NONE), "source": LIST}
DISORDER = {"id": TEXT, "bicarbonate": TEXT, "base_excess": TEXT, "strong_ion": TEXT, "repeatability": (*NUMBER, NONE)}
EXPLANATION = {"id": TEXT, "disorders": LIST, "onset": (str, NONE), "onset_variants": LIST, "fit": TEXT,
               "miss": (*NUMBER, NONE), "compensation": (dict, NONE), "statement": TEXT, "because": LIST,
               "repeatability": (*NUMBER, NONE), "source": LIST}
BAND = {"quantity": TEXT, "state": TEXT, "measured": NUMBER, "expected_low": NUMBER, "expected_high": NUMBER,
        "unit": TEXT, "from": TEXT}
WORDS = {"outcome": {"pass", "warn", "stop", "not-applicable"}, "fit": {"fits", "early", "near"},
         "bicarbonate": {"yes", "no", "unknown", "-"}, "base_excess": {"yes", "no", "unknown", "-"},
         "strong_ion": {"yes", "no", "unknown", "-"}}
STATES = {"finding": {"yes", "no", "unknown"}, "compensation": {"within", "above", "below"}}
PANELS = [["samples/ward.json"],
          ["pH=7.40", "pCO2=40mmHg", "Na=140", "Cl=104"],
          ["pH=6.9", "pCO2=60mmHg", "HCO3=40"],
          ["Na=138", "Cl=98", "TCO2=12", "--age", "3d"],
          ["pH=7.30", "pCO2=60mmHg", "lactate=<0.5mmol/L", "--baseline-pCO2", "60", "--altitude", "1600"],
          ["pH=7.31", "pCO2=9.1kPa", "PvO2=5", "--specimen", "venous"],
          ["pH=7.46", "pCO2=28", "--units", "conventional", "--population", "pregnancy-3", "--onset", "chronic"]]
faults = []


def members(where, found, shape):
    """Order, presence and kinds of the members of one object."""
    wanted = [name.lstrip("?") for name in shape]
    if [name for name in wanted if name in found] != list(found):
        faults.append(f"{where}: members {list(found)}")
    for name, kind in shape.items():
        optional, name = name.startswith("?"), name.lstrip("?")
        if name not in found:
            if not optional:
                faults.append(f"{where}: no {name}")
        elif not isinstance(found[name], kind) or (isinstance(found[name], bool) and kind is not TRUTH):
            faults.append(f"{where}.{name}: {found[name]!r}")
        elif name in WORDS and found[name] not in WORDS[name]:
            faults.append(f"{where}.{name}: {found[name]!r} is none of its words")
    for source in found.get("source", []):
        members(where + ".source", source, SOURCE)


def one(name, document):
    if list(document) != TOP:
        faults.append(f"{name}: members {list(document)}")
    members(name + ".rules", document["rules"], {"id": TEXT, "version": TEXT, "sha256": TEXT, "approved": (dict, NONE)})
    members(name + ".context", document["context"], CONTEXT)
    for key, value in document["panel"].items():
        members(f"{name}.panel.{key}", value, VALUE)
    for key, value in document["quantities"].items():
        members(f"{name}.quantities.{key}", value, QUANTITY)
    for list_name, shape in (("checks", CHECK), ("critical", CRITICAL), ("findings", FINDING), ("disorders", DISORDER),
                             ("explanations", EXPLANATION)):
        for entry in document[list_name]:
            members(f"{name}.{list_name}.{entry.get('id')}", entry, shape)
    for finding in document["findings"]:
        if finding["state"] not in STATES["finding"] or (finding["statement"] is None) != (finding["state"] != "yes"):
            faults.append(f"{name}.{finding['id']}: {finding['state']} with statement {finding['statement']!r}")
    for explanation in document["explanations"]:
        if explanation["compensation"]:
            members(name + ".compensation", explanation["compensation"], BAND)
            if explanation["compensation"]["state"] not in STATES["compensation"]:
                faults.append(f"{name}: {explanation['compensation']}")
        if (explanation["miss"] is not None) != (explanation["fit"] == "near"):
            faults.append(f"{name}.{explanation['id']}: miss and fit")
    if not document["interpretable"] and not any(check["outcome"] == "stop" for check in document["checks"]):
        faults.append(f"{name}: not interpretable though nothing stops")
    if not document["interpretable"] and document["explanations"]:
        faults.append(f"{name}: explained though not interpretable")


def main(program, root):
    for panel in PANELS:
        done = subprocess.run([program, "check", *panel, "--format", "json"], capture_output=True, cwd=root, check=False)
        try:
            document = json.loads(done.stdout.decode("utf-8"))
        except ValueError as error:
            faults.append(f"{panel}: {error}\n{done.stderr.decode()}")
            continue
        if done.returncode != (0 if document["interpretable"] else 1) or done.stderr:
            faults.append(f"{panel}: exit {done.returncode}, {done.stderr.decode()}")
        one(" ".join(panel), document)
    print("\n".join(faults) or f"{len(PANELS)} documents")
    return 1 if faults else 0


sys.exit(main(sys.argv[1], sys.argv[2]))
