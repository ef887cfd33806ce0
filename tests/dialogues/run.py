"""Runs one dialogue: commands as a person types them, with what must come back.

    # What the dialogue shows.
    $ isohydric check pH=7.4
    lines of standard output
    ! lines of standard error
    [exit 0]

Commands run in bash at the root of the repository, `isohydric` being the program under test and HOME an empty folder.
A line `...` stands for any run of lines, `<n>` in a line for any count. Hexadecimal hashes are masked as `<sha256>`, and
the path of the repository is left out. Every command states its exit code.

    run.py PROGRAM DIALOGUE     runs one
    run.py --listed NAME ...    every dialogue of this folder is among the names, and the other way round
"""
import os
import pathlib
import re
import subprocess
import sys
import tempfile

HERE = pathlib.Path(__file__).parent
ROOT = HERE.parent.parent
HASH = re.compile(r"\b[0-9a-f]{12}\b|\b[0-9a-f]{64}\b")
EXIT = re.compile(r"\[exit (\d+)\]")


class Step:
    """One command with what it must say."""

    def __init__(self, line, command):
        self.line, self.command, self.out, self.err, self.exit = line, command, [], [], None


def read(path):
    steps = []
    for number, line in enumerate(path.read_text(encoding="utf-8").splitlines(), 1):
        ended = bool(steps) and steps[-1].exit is not None
        code = EXIT.fullmatch(line)
        if line.startswith("$ "):
            if steps and not ended:
                raise SystemExit(f"{path}:{number}: the command before has no [exit]")
            steps.append(Step(number, line[2:]))
        elif code and steps:
            steps[-1].exit = int(code[1])
        elif line.startswith("! ") or line == "!":
            steps[-1].err.append(line[2:])
        elif steps and not ended:
            steps[-1].out.append(line)
        elif line and not line.startswith("#"):
            raise SystemExit(f"{path}:{number}: text that belongs to no command")
    if not steps or steps[-1].exit is None:
        raise SystemExit(f"{path}: no command, or no [exit] at the end")
    return steps


def same(expected, found):
    return len(expected) == len(found) and all(
        re.fullmatch(re.escape(line).replace("<n>", r"\d+"), other) for line, other in zip(expected, found))


def matches(expected, found):
    """Whether the lines are those that are expected, `...` being any run of them."""
    parts = [[]]
    for line in expected:
        if line == "...":
            parts.append([])
        else:
            parts[-1].append(line)
    if len(parts) == 1:
        return same(expected, found)
    begin, end = len(parts[0]), len(found) - len(parts[-1])
    if begin > end or not same(parts[0], found[:begin]) or not same(parts[-1], found[end:]):
        return False
    for part in parts[1:-1]:  # the earliest place leaves most for those behind it
        places = range(begin, end - len(part) + 1)
        place = next((at for at in places if same(part, found[at:at + len(part)])), None)
        if place is None:
            return False
        begin = place + len(part)
    return True


def play(step, program, home):
    environment = {"PATH": f"{pathlib.Path(program).parent}:/usr/bin:/bin", "HOME": home, "LC_ALL": "C.UTF-8"}
    for name in ("LLVM_PROFILE_FILE", "ASAN_OPTIONS", "UBSAN_OPTIONS"):
        if name in os.environ:
            environment[name] = os.environ[name]
    done = subprocess.run(["bash", "-c", step.command], cwd=ROOT, env=environment, capture_output=True,
                          stdin=subprocess.DEVNULL, timeout=120)
    out, err = (HASH.sub("<sha256>", text.decode("utf-8", "replace").replace(f"{ROOT}/", "")).splitlines()
                for text in (done.stdout, done.stderr))
    return out, err, done.returncode


def run(program, path):
    faults = []
    with tempfile.TemporaryDirectory() as home:
        for step in read(path):
            out, err, code = play(step, program, home)
            for name, expected, found in (("standard output", step.out, out), ("standard error", step.err, err)):
                if not matches(expected, found):
                    faults.append(f"{path}:{step.line}: {name} of: {step.command}\n--- expected\n" +
                                  "\n".join(expected) + "\n--- found\n" + "\n".join(found))
            if code != step.exit:
                faults.append(f"{path}:{step.line}: exit {code} and not {step.exit} of: {step.command}")
    return faults


def listed(names):
    there = {path.stem for path in HERE.glob("*.txt")} - {"CMakeLists"}
    return [f"{name}: there and not run, or run and not there" for name in sorted(there ^ set(names))]


problems = listed(sys.argv[2:]) if sys.argv[1] == "--listed" else run(sys.argv[1], pathlib.Path(sys.argv[2]))
print("\n".join(problems) or "as expected")
sys.exit(1 if problems else 0)
