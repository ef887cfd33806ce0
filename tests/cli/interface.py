"""Options, commands and option values are the same in --help, in the manual pages and in the completion of bash.

    interface.py PROGRAM
"""
import pathlib
import re
import subprocess
import sys

CLI = pathlib.Path(__file__).parents[2] / "cli"
COMMANDS = ([], ["check"], ["rules"], ["rules", "list"], ["rules", "show"], ["rules", "lint"])
PAGES = {"": "isohydric.1", "check": "isohydric-check.1", "rules": "isohydric-rules.1"}
COMPLETE = """
source "$1"; shift
COMP_WORDS=(isohydric "$@"); COMP_CWORD=$#
_isohydric 2>/dev/null
printf '%s\\n' "${COMPREPLY[@]}"
"""


def helped(program, command):
    done = subprocess.run([program, *command, "--help"], capture_output=True, text=True, check=True)
    return done.stdout


def options_of(text):
    return set(re.findall(r"(?<![\w-])--[A-Za-z][\w-]*", text))


def completed(words):
    done = subprocess.run(["bash", "-c", COMPLETE, "bash", str(CLI / "completion/isohydric.bash"), *words],
                          capture_output=True, text=True, check=True)
    return set(done.stdout.split())


def manual(name):
    """A page without the escapes and font requests of roff."""
    text = (CLI / "man" / name).read_text(encoding="utf-8")
    return re.sub(r'" ?| "', "", text.replace(r"\-", "-").replace('" , "', ", "))


def words_of(help_text, option):
    """The values that the help lists after an option, up to the next option."""
    part = re.search(rf"--{option} .*?(?=\n  -|\n\n|\Z)", help_text, re.S)
    return set(re.findall(r"[a-z]+(?:-[a-z0-9]+)*", part[0].split("(")[0])) if part else set()


def main(program):
    faults = []
    for command in COMMANDS:
        said = options_of(helped(program, command))
        offered = {word for word in completed([*command, "--"]) if word.startswith("--")}
        if said != offered:
            faults.append(f"{' '.join(command) or 'isohydric'}: help and completion differ in {sorted(said ^ offered)}")
        page = PAGES[command[0] if command else ""]
        faults += [f"{page}: {option} is missing" for option in sorted(said - options_of(manual(page)))]
    for name, page in PAGES.items():
        family = [command for command in COMMANDS if (command[0] if command else "") == name]
        known = set().union(*(options_of(helped(program, command)) for command in family))
        faults += [f"{page}: {option} is no option" for option in sorted(options_of(manual(page)) - known)]
    text = helped(program, ["check"])
    for option in ("specimen", "population", "onset"):
        values = completed(["check", f"--{option}", ""])
        faults += [f"--{option}: {value} is not in the help" for value in sorted(values - words_of(text, option))]
        faults += [f"--{option}: {value} is not in the manual" for value in sorted(values)
                   if value not in manual(PAGES["check"])]
        for value in values:  # the program takes what completion offers
            done = subprocess.run([program, "check", "pH=7.4", "pCO2=40mmHg", f"--{option}", value], capture_output=True,
                                  check=False)
            if done.returncode != 0:
                faults.append(f"--{option} {value}: refused")
    analytes = {word[:-1] for word in completed(["check", ""]) if word.endswith("=")}
    ids = set(re.findall(r'"id": "(\w+)"', (CLI.parent / "rules/analytes.json").read_text(encoding="utf-8")))
    faults += [f"completion lacks {name}" for name in sorted(ids - analytes)]
    faults += [f"completion offers {name}, which is no analyte" for name in sorted(analytes - ids - {"BUN"})]
    print("\n".join(faults) or f"{len(COMMANDS)} commands agree")
    return 1 if faults else 0


sys.exit(main(sys.argv[1]))
