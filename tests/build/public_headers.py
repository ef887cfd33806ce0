"""The public headers, those that are installed: what they may include, and how much they make a compiler read.

usage: public_headers.py ROOT COMPILER HEADER ...
"""
import concurrent.futures
import os
import re
import subprocess
import sys

from faults import ROOT, finish

COMPILER, HEADERS = sys.argv[2], [os.path.relpath(header, ROOT / "lib") for header in sys.argv[3:]]
MOST_LINES = 70_000  # that are not blank; one JSON library in a header is 95,000, the standard headers of all of ours 62,000
# Matched against every file that the preprocessor opened, whoever included it.
FORBIDDEN = re.compile(r"/(?:iostream|regex|nlohmann/.*|spdlog/.*|CLI/.*|fmt/.*|boost/.*|openssl/.*)$")
OPENED = re.compile(r'^# \d+ "([^"<]+)"', re.MULTILINE)


def header_faults(header):
    run = subprocess.run([COMPILER, "-std=c++20", "-E", f"-I{ROOT / 'lib'}", "-x", "c++", ROOT / "lib" / header],
                         capture_output=True, text=True)
    if run.returncode != 0:
        return [f"{header}: {run.stderr.strip()}"]
    opened = {os.path.normpath(path) for path in OPENED.findall(run.stdout)}
    faults = [f"{header}: brings in {path}" for path in sorted(opened) if FORBIDDEN.search(path)]
    ours = {os.path.relpath(path, ROOT / "lib") for path in opened if path.startswith(f"{ROOT}/lib/")}
    faults += [f"{header}: includes {other}, which is not public" for other in sorted(ours - set(HEADERS))]
    lines = sum(1 for line in run.stdout.splitlines() if line.strip() and not line.startswith("#"))
    if lines > MOST_LINES:
        faults.append(f"{header}: {lines} preprocessed lines, {MOST_LINES} allowed")
    return faults


with concurrent.futures.ThreadPoolExecutor(2) as pool:
    results = list(pool.map(header_faults, HEADERS))
finish([fault for faults in results for fault in faults], len(HEADERS), "public headers")
