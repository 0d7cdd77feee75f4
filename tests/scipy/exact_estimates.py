"""Estimates and confidence limits by materialising every breakpoint and scanning every gap between them.

Hodges & Lehmann (1963) for the estimates. Limits "matching" invert the exact conditional test: the lower limit is the
infimum of the margins, breakpoints left aside, whose upper tail exceeds a; no monotonicity is assumed. Limits "table"
are the classical closed order statistics of the untied law.
"""
from fractions import Fraction
from math import comb

import exact_laws as laws


def median(values):
    ordered = sorted(values)
    half = len(ordered) // 2
    if len(ordered) % 2:
        return ordered[half]
    return (ordered[half - 1] + ordered[half]) / 2


def walsh_averages(differences):
    return [(a + b) / 2 for i, a in enumerate(differences) for b in differences[i:]]


def pairwise_differences(first, second):
    return [x - y for x in first for y in second]


class SignedRank:
    """One sample of differences under the signed rank test."""

    def __init__(self, differences, zeros="drop"):
        self.differences = differences
        self.zeros = zeros

    def breakpoints(self):
        return walsh_averages(self.differences)

    def law(self, margin):
        return laws.signed_rank([d - margin for d in self.differences], self.zeros)

    def untied_law(self):
        n = len(self.differences)
        return [2 ** n, _untied_signed_rank_counts(n)]


class Sign:
    """One sample of differences under the sign test."""

    def __init__(self, differences):
        self.differences = differences

    def breakpoints(self):
        return list(self.differences)

    def law(self, margin):
        return laws.sign([d - margin for d in self.differences])

    def untied_law(self):
        n = len(self.differences)
        return [2 ** n, [comb(n, k) for k in range(n + 1)]]


class RankSum:
    """Two samples under the rank sum test."""

    def __init__(self, first, second):
        self.first = first
        self.second = second

    def breakpoints(self):
        return pairwise_differences(self.first, self.second)

    def law(self, margin):
        return laws.rank_sum([x - margin for x in self.first], self.second)

    def untied_law(self):
        m, n = len(self.first), len(self.second)
        return [comb(m + n, m), _untied_rank_sum_counts(m, n)]


def estimate(design):
    return median(design.breakpoints())


class Limits:
    """lower, upper: fractions or None; confidence: a fraction or None."""

    def __init__(self, lower, upper, confidence):
        self.lower = lower
        self.upper = upper
        self.confidence = confidence


def matching_limits(design, level, side):
    points = sorted(set(design.breakpoints()))
    gaps = _gap_middles(points)
    tails = [design.law(middle) for middle in gaps]
    a = 1 - level if side != "two-sided" else (1 - level) / 2
    lower = upper = None
    if side != "lower":
        lower = _lower_limit(points, [law.p("higher") > a for law in tails])
    if side != "higher":
        upper = _upper_limit(points, [law.p("lower") > a for law in tails])
    return Limits(lower, upper, _confidence(gaps, tails, lower, upper, side))


def table_limits(design, level, side):
    total, counts = design.untied_law()
    values = sorted(design.breakpoints())
    alpha = 1 - level
    sides = 2 if side == "two-sided" else 1
    k, below = 0, 0
    while k < len(counts) and Fraction(sides * (below + counts[k]), total) <= alpha:
        below += counts[k]
        k += 1
    if k == 0:
        return Limits(None, None, None)
    lower = values[k - 1] if side != "lower" else None
    upper = values[len(values) - k] if side != "higher" else None
    return Limits(lower, upper, 1 - Fraction(sides * below, total))


def largest_level(design, side):
    """The largest level at which finite limits exist."""
    total, _ = design.untied_law()
    return 1 - Fraction(2 if side == "two-sided" else 1, total)


def _gap_middles(points):
    inner = [(a + b) / 2 for a, b in zip(points, points[1:])]
    return [points[0] - 1] + inner + [points[-1] + 1]


def _lower_limit(points, accepted):
    first = accepted.index(True)
    return None if first == 0 else points[first - 1]


def _upper_limit(points, accepted):
    last = len(accepted) - 1 - accepted[::-1].index(True)
    return None if last == len(accepted) - 1 else points[last]


def _confidence(gaps, tails, lower, upper, side):
    outside = [law.p(side) for middle, law in zip(gaps, tails)
               if (lower is not None and middle < lower) or (upper is not None and middle > upper)]
    wanted = {"two-sided": (lower, upper), "higher": (lower,), "lower": (upper,)}[side]
    if None in wanted:
        return None
    return 1 - max(outside)


def _untied_signed_rank_counts(n):
    counts = [1]
    for rank in range(1, n + 1):
        longer = counts + [0] * rank
        for k, count in enumerate(counts):
            longer[k + rank] += count
        counts = longer
    return counts


def _untied_rank_sum_counts(m, n):
    """counts[u] of U = u, by the recurrence of Mann & Whitney (1947)."""
    row = [[1] for _ in range(n + 1)]
    for i in range(1, m + 1):
        new = [[1]]
        for j in range(1, n + 1):
            counts = [0] * (i * j + 1)
            for u, count in enumerate(row[j]):      # the largest is one of the second: U unchanged
                counts[u + j] += count
            for u, count in enumerate(new[j - 1]):
                counts[u] += count
            new.append(counts)
        row = new
    return row[n]
