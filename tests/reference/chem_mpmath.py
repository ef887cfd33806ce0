"""Measures every model of isohydric::chem against mpmath at 50 digits over its domain.

usage: chem_mpmath.py DRIVER [POINTS]
Fails if an error reaches 1e-12 of the largest term, if an interval misses the value with the constants
as doubles, if a model has no formula or a formula no model, or if mpmath is missing.
"""
import itertools
import random
import subprocess
import sys

from mpmath import mp

from chem_formulas import FORMULAS, as_double, as_printed

LIMIT = 1e-12


def run(driver, *arguments, text=""):
    done = subprocess.run([driver, *arguments], input=text, capture_output=True, text=True, check=True)
    return done.stdout.splitlines()


def models_of(driver):
    models = {}
    for line in run(driver, "models"):
        name, *ends = line.split()
        ends = list(map(float, ends))
        models[name] = list(zip(ends[::2], ends[1::2]))
    return models


def points_of(name, domains, count):
    """The corners of the domain, then points spread evenly over it."""
    generator = random.Random(f"isohydric {name}")
    inside = [[generator.uniform(*domain) for domain in domains] for _ in range(count)]
    return [list(corner) for corner in itertools.product(*domains)] + inside


def measure(name, points, answers):
    """Largest error over the largest term, and the points whose interval misses."""
    worst, missed = (mp.mpf(0), None), []
    for x, answer in zip(points, answers):
        value, lower, upper = map(mp.mpf, answer.split())
        exact_x = [mp.mpf(number) for number in x]
        terms = FORMULAS[name](as_printed, *exact_x)
        scale = max(map(abs, terms))
        error = abs(value - sum(terms))
        worst = max(worst, (error / scale if scale else error, x), key=lambda pair: pair[0])
        if not lower <= sum(FORMULAS[name](as_double, *exact_x)) <= upper:
            missed.append(x)
    return worst, missed


def main():
    driver = sys.argv[1]
    count = int(sys.argv[2]) if len(sys.argv) > 2 else 200
    models = models_of(driver)
    if set(models) != set(FORMULAS):
        sys.exit(f"only one side has {sorted(set(models) ^ set(FORMULAS))}")
    good = True
    for name, domains in models.items():
        points = points_of(name, domains, count)
        questions = "".join(f"{name} {' '.join(map(repr, x))}\n" for x in points)
        answers = run(driver, text=questions)
        if len(answers) != len(points):
            sys.exit(f"{name}: {len(points)} questions, {len(answers)} answers")
        (error, where), missed = measure(name, points, answers)
        print(f"{name}: {len(points)} points, largest error {mp.nstr(error, 3)} at {where}")
        for x in missed:
            print(f"{name}: the interval misses the value at {x}")
        good = good and error < LIMIT and not missed
    sys.exit(0 if good else 1)


main()
