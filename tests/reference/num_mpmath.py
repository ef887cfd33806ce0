"""Measures the error of exp, log, log10, pow10 and pow against mpmath at 50 digits.

usage: num_mpmath.py DRIVER [POINTS]
Fails if an error reaches what exp_log.hpp states, always below 1 unit in the last place, or if mpmath is
missing.
"""
import math
import random
import sys

from mpmath.libmp import from_float, from_man_exp, fzero, mpf_cmp, mpf_shift, mpf_sub, to_float

from num_functions import PRECISION, TRUE
from num_oracle import INFINITY, any_positive, ask, beside, number

TWO_TO_1024 = from_man_exp(1, 1024)

# What exp_log.hpp states in units of the last place: for every result, and for normal ones.
STATED = {"exp": (0.75, 0.53), "pow10": (0.75, 0.53), "pow": (0.75, 0.53), "log": (0.501, 0.501),
          "log10": (0.501, 0.501)}
NOT_NEAREST = [126, 210]


def error_ulp(computed, true):
    """|computed - true| in units of the last place of true; infinity counts as 2^1024, and is
    right for whatever lies beyond."""
    if math.isnan(computed):
        return INFINITY
    if true == fzero:
        return 0.0 if computed == 0.0 else INFINITY
    if computed == INFINITY and mpf_cmp(true, TWO_TO_1024) >= 0:
        return 0.0
    exponent, count = true[2], true[3]
    unit = min(max(exponent + count - 53, -1074), 971)
    value = TWO_TO_1024 if computed == INFINITY else from_float(computed)
    return abs(to_float(mpf_shift(mpf_sub(value, true, PRECISION), -unit)))


def exponent_points(generator, count, low, high, step):
    """Arguments of an exponential: its whole range, small ones, clinical ones, the seams of its
    reduction (half multiples of step), the ends."""
    points = []
    for k in range(math.floor(low / step), math.ceil(high / step)):
        points += beside((k + 0.5) * step) + beside(k * step, 1)
    for end in (low, high, 0.0):
        points += beside(end, 20)
    while len(points) < count:
        points += [generator.uniform(low, high), generator.uniform(-9.0, 3.0),
                   generator.uniform(-0.4, 0.4),
                   math.copysign(2.0 ** generator.uniform(-60, 1), generator.random() - 0.5)]
    return [x for x in points if low <= x <= high]


def log_points(generator, count):
    points = []
    for k in range(-1074, 1024):
        points += beside(2.0 ** k, 2)
        points += beside(math.sqrt(2.0) * 2.0 ** k, 1)
    for k in range(-323, 309):
        points += beside(float(f"1e{k}"), 2)
    while len(points) < count:
        points += [any_positive(generator), generator.uniform(0.65, 1.5),
                   1.0 + math.copysign(2.0 ** generator.uniform(-52, -1), generator.random() - 0.5),
                   10.0 ** generator.uniform(-9, 3)]
    return [x for x in points if 0.0 < x < INFINITY]


def pow_points(generator, count):
    points = [(x, y) for x in (2.0, 10.0, 0.5, 1.0, 1.5) for y in range(-340, 340)]
    while len(points) < count:
        x = any_positive(generator)
        if x != 1.0:
            points.append((x, generator.uniform(-745.1, 709.7) / math.log(x)))
        near_one = 1.0 + math.copysign(2.0 ** generator.uniform(-50, -1), generator.random() - 0.5)
        points.append((near_one, generator.uniform(-745.1, 709.7) / math.log(near_one)))
        points.append((generator.uniform(0.0, 600.0), generator.uniform(-4.0, 4.0)))
    return [(x, y) for x, y in points if 0.0 < x and -745.1 < y * math.log(x) < 709.7]


def points_of(name, count):
    generator = random.Random(f"isohydric {name}")
    if name == "exp":
        singles = exponent_points(generator, count, -745.2, 709.79, math.log(2))
    elif name == "pow10":
        singles = exponent_points(generator, count, -323.7, 308.26, math.log10(2))
        singles += [float(n) for n in range(-323, 309)]
    elif name == "pow":
        return pow_points(generator, count)
    else:
        singles = log_points(generator, count)
    return [(x,) for x in singles]


def measure(driver, name, count):
    points = points_of(name, count + count // 20)
    if len(points) < count:
        sys.exit(f"{name}: only {len(points)} points")
    answers = ask(driver, [(name, *point) for point in points])
    worst, worst_normal = (0.0, ()), (0.0, ())
    for point, answer in zip(points, answers):
        computed = number(answer)
        found = (error_ulp(computed, TRUE[name](*point)), point)
        worst = max(worst, found)
        if abs(computed) >= sys.float_info.min:
            worst_normal = max(worst_normal, found)
    print(f"{name}: {len(points)} points, largest error {worst[0]:.4f} ulp at {worst[1]}; "
          f"among normal results {worst_normal[0]:.4f} at {worst_normal[1]}", flush=True)
    stated, stated_normal = STATED[name]
    return worst[0] < stated < 1.0 and worst_normal[0] < stated_normal


def exact_powers(driver):
    """log10 and pow10 are exact at every power of ten that a double holds, and 10^n is the nearest
    double elsewhere, but where stated."""
    whole = list(range(0, 23))
    powers = ask(driver, [("pow10", float(n)) for n in whole])
    logs = ask(driver, [("log10", float(10 ** n)) for n in whole])
    good = all(number(p) == 10 ** n and number(g) == n for n, p, g in zip(whole, powers, logs))
    every = list(range(-323, 309))
    away = [n for n, p in zip(every, ask(driver, [("pow10", float(n)) for n in every]))
            if number(p) != float(f"1e{n}")]
    print(f"10^n for n = -323..308 is the nearest double but at n = {away}")
    return good and away == NOT_NEAREST


def main():
    driver = sys.argv[1]
    count = int(sys.argv[2]) if len(sys.argv) > 2 else 200000
    results = [measure(driver, name, count) for name in TRUE]
    results.append(exact_powers(driver))
    sys.exit(0 if all(results) else 1)


main()
