"""Checks that num::Interval encloses: exact fractions for arithmetic and roots, mpmath at 50 digits for
the functions, and what the same operation gives in doubles.

usage: num_interval.py DRIVER [CASES]
"""
import math
import random
import sys
from fractions import Fraction

from mpmath.libmp import from_float, mpf_cmp

from num_functions import TRUE
from num_oracle import INFINITY, any_positive, ask, number

EXACT = {
    "iadd": lambda x, y: x + y,
    "isub": lambda x, y: x - y,
    "imul": lambda x, y: x * y,
    "idiv": lambda x, y: x / y if y else None,
    "ineg": lambda x: -x,
    "iabs": abs,
}
IN_DOUBLES = {
    "iadd": lambda x, y: x + y,
    "isub": lambda x, y: x - y,
    "imul": lambda x, y: x * y,
    "idiv": lambda x, y: x / y if y else None,
}
EDGES = [0.0, 5e-324, 2.2250738585072014e-308, 1e-300, 0.5, 1.0, math.nextafter(1.0, 2.0), 2.0, 10.0,
         1000.0, 1e300, 1.7976931348623157e308]


def any_end(generator):
    kind = generator.randrange(6)
    if kind == 0:
        return generator.choice((1, -1)) * generator.choice(EDGES)
    if kind == 1:
        return generator.choice((1, -1)) * any_positive(generator)
    if kind == 2:
        return generator.choice((1, -1)) * INFINITY
    return generator.uniform(-9.0, 9.0) if kind < 5 else generator.uniform(-800.0, 800.0)


def any_interval(generator):
    a = any_end(generator)
    b = a if generator.randrange(4) == 0 else any_end(generator)
    if generator.randrange(3) == 0 and abs(a) < 1e300:
        b = a + abs(a) * 2.0 ** generator.uniform(-52, 0)
    return min(a, b), max(a, b)


def members(generator, low, high):
    """Finite members: the ends, zero and one where inside, some between."""
    largest = sys.float_info.max
    start, stop = (min(max(end, -largest), largest) for end in (low, high))
    found = {start, stop, *(x for x in (0.0, 1.0) if start <= x <= stop)}
    share = generator.random()
    found.add(min(max(start * share + stop * (1.0 - share), start), stop))
    if start <= 0.0 <= stop or start > 0.0:
        found.add(min(max(any_positive(generator), start), stop))
    return sorted(found)


def encloses_fraction(low, high, exact):
    return (low == -INFINITY or Fraction(low) <= exact) and (high == INFINITY or exact <= Fraction(high))


def encloses_mpf(low, high, true):
    return mpf_cmp(from_float(low), true) <= 0 <= mpf_cmp(from_float(high), true)


def encloses_root(low, high, x):
    square = Fraction(x)
    return Fraction(max(low, 0.0)) ** 2 <= square and (high == INFINITY or square <= Fraction(high) ** 2)


def defined(name, arguments):
    """Whether the real function has a value there that the oracle can form."""
    if name in ("ilog", "ilog10"):
        return arguments[0] > 0.0
    if name == "isqrt":
        return arguments[0] >= 0.0
    if name in ("iexp", "ipow10"):
        return abs(arguments[0]) < 1e4
    if name == "ipow":
        x, y = arguments
        return x > 0.0 and abs(y) < 1e300 and abs(y * math.log(x)) < 2e4
    return True


def faults(name, low, high, arguments):
    """What the interval should have enclosed and did not."""
    if not low <= high:
        return "bounds"
    if name in EXACT:
        exact = EXACT[name](*map(Fraction, arguments))
        if exact is not None and not encloses_fraction(low, high, exact):
            return "the exact value"
    elif name == "isqrt":
        if not encloses_root(low, high, arguments[0]):
            return "the root"
    elif not encloses_mpf(low, high, TRUE[name[1:]](*arguments)):
        return "the value at 50 digits"
    if name in IN_DOUBLES:
        in_doubles = IN_DOUBLES[name](*arguments)
        if in_doubles is not None and not low <= in_doubles <= high:
            return "the result in doubles"
    return None


def check(driver, name, count):
    generator = random.Random(f"isohydric {name}")
    arity = 2 if name in IN_DOUBLES or name == "ipow" else 1
    cases = [[any_interval(generator) for _ in range(arity)] for _ in range(count)]
    bounds = ask(driver, [(name, *(end for pair in case for end in pair)) for case in cases])
    points = []
    for case, bound in zip(cases, bounds):
        low, high = map(number, bound.split())
        lists = [members(generator, *pair) for pair in case]
        tuples = [(x,) for x in lists[0]] if arity == 1 else [(x, y) for x in lists[0] for y in lists[1]]
        points += [(low, high, t) for t in tuples if defined(name, t)]
    failed = [(low, high, t, fault) for low, high, t in points if (fault := faults(name, low, high, t))]
    if name not in EXACT:
        answers = ask(driver, [(name[1:], *t) for _, _, t in points])
        for (low, high, t), answer in zip(points, answers):
            if not low <= number(answer) <= high:
                failed.append((low, high, t, "our result in doubles"))
    print(f"{name}: {len(cases)} intervals, {len(points)} members, {len(failed)} not enclosed", flush=True)
    for low, high, arguments, fault in failed[:5]:
        print(f"  [{low!r}, {high!r}] lacks {fault} of {arguments}")
    return not failed and len(points) >= count


def main():
    driver = sys.argv[1]
    count = int(sys.argv[2]) if len(sys.argv) > 2 else 6000
    names = [*EXACT, "isqrt", "iexp", "ilog", "ilog10", "ipow10", "ipow"]
    sys.exit(0 if all([check(driver, name, count) for name in names]) else 1)


main()
