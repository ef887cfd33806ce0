"""Whatever the program writes to standard output begins and ends with the caution; JSON in its first and last member.

    caution.py PROGRAM
"""
import json
import subprocess
import sys

PANEL = ["pH=7.21", "pCO2=29mmHg", "Na=138", "Cl=98"]
RUNS = [["--help"], ["--version"], ["check", "--help"], ["rules", "--help"], ["rules", "list", "--help"],
        ["rules", "show", "--help"], ["rules", "lint", "--help"], ["check", *PANEL], ["check", *PANEL, "--full"],
        ["check", "pH=6.9", "pCO2=60mmHg", "HCO3=40"], ["rules", "list"], ["rules", "list", "--kind", "group"],
        ["rules", "show", "anionGap"], ["rules", "show", "acidosis-response"], ["rules", "lint"]]


def output(program, arguments):
    return subprocess.run([program, *arguments], capture_output=True, text=True, check=False).stdout


def main(program):
    document = json.loads(output(program, ["check", *PANEL, "--format", "json"]))
    caution = document["caution"]
    faults = []
    if list(document)[0] != "caution" or list(document)[-1] != "caution_end" or document["caution_end"] != caution:
        faults.append("json: the caution is not first and last")
    if "Not a diagnostic device" not in caution:
        faults.append("json: that is no caution")
    for arguments in RUNS:
        text = " ".join(output(program, arguments).split())
        if not (text.startswith(caution) and text.endswith(caution) and len(text) > 2 * len(caution)):
            faults.append(f"{' '.join(arguments)}: does not begin and end with the caution")
    print("\n".join(faults) or f"{len(RUNS) + 1} outputs")
    return 1 if faults else 0


sys.exit(main(sys.argv[1]))
