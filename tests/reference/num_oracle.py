"""What the Python oracles of isohydric::num share: the driver's protocol and how an error is counted."""
import random
import struct
import subprocess
import sys

INFINITY = float("inf")


def bits(x):
    return struct.pack(">d", x).hex()


def number(text):
    return struct.unpack(">d", bytes.fromhex(text))[0]


def from_pattern(pattern):
    return struct.unpack("<d", struct.pack("<Q", pattern))[0]


def ask(driver, questions):
    """One answer line for each question (name, numbers...)."""
    lines = "".join(f"{name} {' '.join(map(bits, numbers))}\n" for name, *numbers in questions)
    done = subprocess.run([driver], input=lines, capture_output=True, text=True, check=True)
    answers = done.stdout.splitlines()
    if len(answers) != len(questions):
        sys.exit(f"{len(questions)} questions, {len(answers)} answers")
    return answers


def beside(x, reach=3):
    """x and its nearest neighbours among the doubles."""
    around = [x]
    for direction in (-INFINITY, INFINITY):
        neighbour = x
        for _ in range(reach):
            neighbour = next_after(neighbour, direction)
            around.append(neighbour)
    return around


def next_after(x, towards):
    if x == towards:
        return x
    if x == 0:
        return 5e-324 if towards > 0 else -5e-324
    pattern = struct.unpack("<q", struct.pack("<d", x))[0]
    pattern += 1 if (towards > x) == (x > 0) else -1
    return struct.unpack("<d", struct.pack("<q", pattern))[0]


def any_positive(generator: random.Random):
    """A positive finite double of any size, subnormal ones included."""
    return from_pattern(generator.randrange(1, 0x7FF0000000000000))
