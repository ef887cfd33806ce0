"""Compares num::format_decimals with Python's decimal: the shortest decimal of the double, rounded half
away from zero.

usage: num_decimals.py DRIVER [COUNT]
"""
import random
import sys
from decimal import ROUND_HALF_UP, Context, Decimal

from num_oracle import any_positive, ask

CONTEXT = Context(prec=800, rounding=ROUND_HALF_UP)


def expected(x, places):
    rounded = Decimal(repr(x)).quantize(Decimal(1).scaleb(-places), context=CONTEXT)
    return f"{rounded.copy_abs() if rounded.is_zero() else rounded:f}"


def cases(generator, count):
    fixed = [0.0, -0.0, 0.5, -0.5, 0.05, -0.04, 2.675, 1.005, 9.96, 9.95, 99.995, 999999.5, 0.99, 5e-324,
             1e21, 1e22, 1.7976931348623157e308, 7.345, 7.3549999999999995]
    found = [(x, places) for x in fixed for places in range(0, 10)]
    while len(found) < count:
        sign = generator.choice((1, -1))
        places = generator.randrange(0, 10)
        found += [(sign * generator.uniform(0.0, 200.0), places),
                  (sign * generator.randrange(0, 10 ** 6) / 10 ** generator.randrange(0, 7), places),
                  (sign * (generator.randrange(0, 10 ** 5) * 10 + 5) / 10 ** (places + 1), places),
                  (sign * any_positive(generator), places)]
    return found


def main():
    count = int(sys.argv[2]) if len(sys.argv) > 2 else 40000
    questions = cases(random.Random("isohydric decimals"), count)
    answers = ask(sys.argv[1], [("decimals", x, float(places)) for x, places in questions])
    wrong = [(x, places, answer) for (x, places), answer in zip(questions, answers)
             if answer != expected(x, places)]
    print(f"format_decimals: {len(questions)} compared, {len(wrong)} differ")
    for x, places, answer in wrong[:5]:
        print(f"  {x!r} to {places}: expected {expected(x, places)}, got {answer}")
    sys.exit(1 if wrong or len(questions) < count else 0)


main()
