"""The reference itself against plain enumeration, before anything is measured with it."""
import random
from fractions import Fraction

import exact_laws as laws


def check(seed, tally):
    source = random.Random(seed)
    for _ in range(200):
        differences = [Fraction(source.randint(-4, 4), source.choice((1, 2))) for _ in range(source.randint(1, 9))]
        for zeros in ("drop", "pratt"):
            fast, plain = laws.signed_rank(differences, zeros), laws.signed_rank_by_enumeration(differences, zeros)
            tally.holds("reference: signed rank by enumeration", (differences, zeros), vars(fast) == vars(plain),
                        "%r against %r" % (vars(fast), vars(plain)))
        first, second = ([Fraction(source.randint(0, 5)) for _ in range(source.randint(1, 6))] for _ in range(2))
        fast, plain = laws.rank_sum(first, second), laws.rank_sum_by_enumeration(first, second)
        tally.holds("reference: rank sum by enumeration", (first, second), vars(fast) == vars(plain),
                    "%r against %r" % (vars(fast), vars(plain)))
