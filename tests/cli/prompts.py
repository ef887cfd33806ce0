"""What a person at a terminal meets who types `isohydric check` alone: a pseudo-terminal plays the keyboard.

    prompts.py PROGRAM
"""
import os
import pty
import select
import subprocess
import sys
import tempfile
import time

END = "\x04"  # Ctrl-D
faults = []


class Terminal:
    """The program with a pseudo-terminal at standard input and error; standard output is a pipe."""

    def __init__(self, program, *arguments):
        self.master, slave = pty.openpty()
        self.home = tempfile.TemporaryDirectory()
        self.process = subprocess.Popen([program, "check", *arguments], stdin=slave, stderr=slave,
                                        stdout=subprocess.PIPE, env={"HOME": self.home.name})
        os.close(slave)
        self.screen = ""

    def wait_for(self, text, since=0):
        limit = time.monotonic() + 60
        while text not in self.screen[since:]:
            ready, _, _ = select.select([self.master], [], [], max(0, limit - time.monotonic()))
            try:
                got = os.read(self.master, 4096) if ready else b""
            except OSError:  # Linux: the other end is closed
                got = b""
            if not got:
                raise AssertionError(f"waited for {text!r}, the screen shows:\n{self.screen}")
            self.screen += got.decode("utf-8").replace("\r\n", "\n")

    def answer(self, question, text):
        """Types an answer once the question stands on the screen."""
        since = len(self.screen)
        if question not in self.screen[self.screen.rfind("\n") + 1:]:
            self.wait_for(question, since)
        self.wait_for(": ", max(0, self.screen.rfind(question)))
        os.write(self.master, (text if text == END else text + "\n").encode())
        if text != END:
            self.wait_for("\n", len(self.screen))

    def finish(self):
        out = self.process.stdout.read().decode("utf-8")
        code = self.process.wait(60)
        try:
            self.screen += os.read(self.master, 65536).decode("utf-8").replace("\r\n", "\n")
        except OSError:
            pass
        os.close(self.master)
        self.home.cleanup()
        return out, code


def expect(truth, what, screen):
    if not truth:
        faults.append(f"{what}\nthe screen shows:\n{screen}")


def a_panel(program):
    terminal = Terminal(program)
    terminal.answer("Specimen of the gas", "venus")
    expect("context-value" in terminal.screen or "venous" in terminal.screen, "an unknown specimen is explained",
           terminal.screen)
    terminal.answer("Specimen of the gas", "arterial")
    terminal.answer("pH, usually", "7.21")
    terminal.answer("pCO2, usually", "3,9")       # kPa, or mmHg? asked again
    terminal.answer("pCO2, usually", "3,9 kPa")
    terminal.answer("bicarbonate (HCO3), usually", "")
    terminal.answer("pO2, usually", "")
    terminal.answer("sodium (Na), usually", "13O")  # a letter O
    terminal.answer("sodium (Na), usually", "138")
    terminal.answer("potassium (K), usually", "")
    terminal.answer("chloride (Cl), usually", "98")
    for name in ("total CO2", "albumin", "lactate", "beta-hydroxybutyrate", "glucose", "phosphate", "ionised calcium",
                 "magnesium"):
        terminal.answer(name, "")
    terminal.answer("Onset", "acute")
    out, code = terminal.finish()
    expect(code == 0, f"exit {code}", terminal.screen)
    expect("metabolic acidosis" in out and "arterial, " in out and "onset acute" in out, f"the report: {out}", terminal.screen)
    expect("mmHg or kPa" in terminal.screen, "the units of pCO2 are offered", terminal.screen)
    expect(terminal.screen.count("pCO2, usually") == 2, "pCO2 is asked again once", terminal.screen)
    expect(terminal.screen.count("sodium (Na)") == 2, "sodium is asked again once", terminal.screen)


def ended_early(program):
    terminal = Terminal(program, "--specimen", "arterial", "--onset", "chronic")
    terminal.answer("pH, usually", "7.35")
    terminal.answer("pCO2, usually", "60 mmHg")
    terminal.answer("bicarbonate (HCO3), usually", END)
    out, code = terminal.finish()
    expect(code == 0 and "respiratory acidosis" in out, f"Ctrl-D interprets what was given: {code}, {out}", terminal.screen)
    expect("Specimen of" not in terminal.screen and "Onset" not in terminal.screen, "nothing is asked twice",
           terminal.screen)


def nothing_given(program):
    terminal = Terminal(program)
    terminal.answer("Specimen of the gas", END)
    out, code = terminal.finish()
    expect(code == 1 and not out, f"nothing given: {code}, {out}", terminal.screen)
    expect("nothing to interpret" in terminal.screen, "that is said", terminal.screen)


def wrong_option(program):
    terminal = Terminal(program, "--age", "old")
    out, code = terminal.finish()
    expect(code == 1 and not out and "context-value" in terminal.screen, f"a wrong option is said first: {code}",
           terminal.screen)


for scene in (a_panel, ended_early, nothing_given, wrong_option):
    try:
        scene(sys.argv[1])
    except AssertionError as error:
        faults.append(f"{scene.__name__}: {error}")
print("\n".join(faults) or "four sessions")
sys.exit(1 if faults else 0)
