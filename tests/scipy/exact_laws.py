"""Exact null laws in whole numbers: the second opinion that the library is held against.

Nothing here is taken from the library. Values are the decimals that doubles print to at 15 significant digits, held as
fractions; every law is conditional on the ties and zeros seen; tails are counts of equally likely arrangements.

A generating polynomial is kept as one big integer: coefficient k sits at bit k * width (Kronecker substitution), so
that multiplying by (1 + z^w) is a shift and an addition, and adding coefficients up is a remainder.
"""
from decimal import Decimal
from fractions import Fraction
from itertools import combinations, product
from math import comb


def decimal_of(value):
    """The decimal a double prints to at 15 significant digits; -0 is 0."""
    return Fraction(Decimal("%.15g" % value))


def doubled_midranks(values):
    """Twice the midrank of each value, as whole numbers."""
    order = sorted(values)
    first = {}
    last = {}
    for position, value in enumerate(order, start=1):
        first.setdefault(value, position)
        last[value] = position
    return [first[value] + last[value] for value in values]


class Law:
    """One conditional null law and where the data fall in it."""

    def __init__(self, statistic, lower, upper, total, rarest):
        self.statistic = statistic  # as a fraction
        self.lower = lower          # arrangements with a statistic at most as large
        self.upper = upper          # arrangements with a statistic at least as large
        self.total = total
        self.rarest = rarest        # arrangements in the smaller of the two end points of the law

    def count(self, side):
        """Arrangements at least this extreme; two-sided: twice the smaller tail, at most all."""
        if side == "higher":
            return self.upper
        if side == "lower":
            return self.lower
        return min(self.total, 2 * min(self.lower, self.upper))

    def p(self, side):
        return Fraction(self.count(side), self.total)

    def smallest_p(self):
        return min(Fraction(1), Fraction(2 * self.rarest, self.total))


def _coefficients_up_to(polynomial, degree, width):
    """The sum of the coefficients of z^0 .. z^degree."""
    if degree < 0:
        return 0
    kept = polynomial & ((1 << (width * (degree + 1))) - 1)
    return kept % ((1 << width) - 1)


def _coefficient(polynomial, degree, width):
    return (polynomial >> (width * degree)) & ((1 << width) - 1)


def _law_from(polynomial, observed, smallest, largest, total, width, statistic):
    lower = _coefficients_up_to(polynomial, observed, width)
    at_observed = _coefficient(polynomial, observed, width)
    ends = (_coefficient(polynomial, smallest, width), _coefficient(polynomial, largest, width))
    return Law(statistic, lower, total - lower + at_observed, total, min(ends))


def signed_scores(differences, zeros):
    """Doubled midranks of the non-zero differences, and which of them are positive."""
    if zeros == "drop":
        differences = [d for d in differences if d != 0]
    ranks = doubled_midranks([abs(d) for d in differences])
    return [(rank, d > 0) for rank, d in zip(ranks, differences) if d != 0]


def signed_rank(differences, zeros="drop"):
    scores = signed_scores(differences, zeros)
    width = len(scores) + 2
    polynomial = 1
    for rank, _ in scores:
        polynomial += polynomial << (width * rank)
    observed = sum(rank for rank, positive in scores if positive)
    largest = sum(rank for rank, _ in scores)
    return _law_from(polynomial, observed, 0, largest, 2 ** len(scores), width, Fraction(observed, 2))


def sign(differences):
    above = sum(d > 0 for d in differences)
    n = sum(d != 0 for d in differences)
    lower = sum(comb(n, k) for k in range(above + 1))
    return Law(Fraction(above), lower, 2 ** n - lower + comb(n, above), 2 ** n, 1)


def rank_sum(first, second):
    ranks = doubled_midranks(list(first) + list(second))
    m, size = len(first), len(ranks)
    width = size + 2
    chosen = [1] + [0] * m  # chosen[j]: subsets of j ranks, by their sum
    for position, rank in enumerate(ranks):
        for j in range(min(m, position + 1), 0, -1):
            chosen[j] += chosen[j - 1] << (width * rank)
    observed = sum(ranks[:m])
    ordered = sorted(ranks)
    u = Fraction(observed, 2) - Fraction(m * (m + 1), 2)
    return _law_from(chosen[m], observed, sum(ordered[:m]), sum(ordered[size - m:]), comb(size, m), width, u)


# ------------------------------------------------------------------------- plain enumeration, to check the above

def signed_rank_by_enumeration(differences, zeros="drop"):
    scores = signed_scores(differences, zeros)
    observed = sum(rank for rank, positive in scores if positive)
    sums = [sum(rank for (rank, _), taken in zip(scores, signs) if taken)
            for signs in product((False, True), repeat=len(scores))]
    return _law_by_enumeration(sums, observed, Fraction(observed, 2))


def rank_sum_by_enumeration(first, second):
    ranks = doubled_midranks(list(first) + list(second))
    m = len(first)
    observed = sum(ranks[:m])
    sums = [sum(subset) for subset in combinations(ranks, m)]
    return _law_by_enumeration(sums, observed, Fraction(observed, 2) - Fraction(m * (m + 1), 2))


def _law_by_enumeration(sums, observed, statistic):
    lower = sum(s <= observed for s in sums)
    upper = sum(s >= observed for s in sums)
    rarest = min(sums.count(min(sums)), sums.count(max(sums)))
    return Law(statistic, lower, upper, len(sums), rarest)
