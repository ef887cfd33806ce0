"""The examples of README.md run: every line of a `sh` or `console` block that begins with the program's name.

    readme_examples.py PROGRAM ROOT
"""
import pathlib
import re
import subprocess
import sys
import tempfile


def examples(text):
    for block in re.findall(r"```(?:sh|console)\n(.*?)```", text, re.S):
        for line in block.splitlines():
            command = line.removeprefix("$ ")
            if command.startswith("isohydric "):
                yield command


def main(program, root):
    faults = []
    commands = list(examples((pathlib.Path(root) / "README.md").read_text(encoding="utf-8")))
    with tempfile.TemporaryDirectory() as home:
        # The set that the examples call their own: it extends the shipped one and changes nothing.
        own = pathlib.Path(home, "our-laboratory.json")
        own.write_text('{"id": "our-laboratory", "version": "1", "title": "Ours", "extends": "sets/default.json",\n'
                       ' "files": [], "conventions": {}, "replace": [], "remove": [],\n'
                       ' "approved": {"role": "", "date": ""}}\n', encoding="utf-8")
        pathlib.Path(home, "panel.json").write_text('{"panel": {"pH": "7.40", "pCO2": "40 mmHg"}}', encoding="utf-8")
        environment = {"PATH": f"{pathlib.Path(program).parent}:/usr/bin:/bin", "HOME": home}
        for command in commands:
            done = subprocess.run(["bash", "-c", command], cwd=home, env=environment, stdin=subprocess.DEVNULL,
                                  capture_output=True, text=True, check=False)
            if done.returncode != 0:
                faults.append(f"{command}\nexit {done.returncode}\n{done.stderr}")
    if len(commands) < 4:
        faults.append(f"README.md has only {len(commands)} examples")
    print("\n".join(faults) or f"{len(commands)} examples")
    return 1 if faults else 0


sys.exit(main(sys.argv[1], sys.argv[2]))
