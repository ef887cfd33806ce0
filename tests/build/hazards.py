"""The hazards of SAFETY.md against the tests that stand for them: every test that the table names exists, every test of a
hazard stands in the table, and the table has at least twenty rows."""
import re

from faults import finish, line_of, text_files

TEST_CASE = re.compile(r'TEST_CASE\(\s*((?:"(?:[^"\\]|\\.)*"\s*)+)\)')
ROW = re.compile(r"^\| \d+ \|.*\| `([^`]*)` \|$", re.MULTILINE)
LEAST_ROWS = 20

tests = set()
for _, text in text_files("tests", ".cpp"):
    for case in TEST_CASE.finditer(text):
        tests.add("".join(re.findall(r'"((?:[^"\\]|\\.)*)"', case[1])))
hazards = {name for name in tests if name.startswith("hazard: ")}

path, safety = next((path, text) for path, text in text_files(".", ".md") if path.name == "SAFETY.md")
rows = [(line_of(safety, row.start()), row[1]) for row in ROW.finditer(safety)]
named = {name for _, name in rows}

faults = [f"SAFETY.md:{line}: there is no test \"{name}\"" for line, name in rows if name not in tests]
faults += [f"SAFETY.md: no row names the test \"{name}\"" for name in sorted(hazards - named)]
if len(rows) < LEAST_ROWS:
    faults.append(f"SAFETY.md: {len(rows)} hazards, at least {LEAST_ROWS} are wanted")
finish(faults, len(rows), "hazards")
