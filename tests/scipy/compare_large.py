"""Tiny p values, large and unbalanced samples, and the four law calls, against whole-number arithmetic."""
import random
from fractions import Fraction

import exact_laws as laws
from compare_cases import EXACT
from exact_estimates import RankSum, SignedRank

SIDES = {0: "two-sided", 1: "higher", -1: "lower"}


def compare(library, seed, tally):
    for name, study, data, settings in _large_cases(random.Random(seed)):
        _compare_case(library, name, study, data, settings, tally)
    _compare_tails(library, random.Random(seed), tally)
    _compare_criticals(library, random.Random(seed), tally)


def _large_cases(source):
    def tied(size, levels, shift=0):
        return [float(source.randint(0, levels) + shift) for _ in range(size)]

    yield "60 positives", "single", [float(i + 1) for i in range(60)], {}
    yield "40 v 40 separated", "groups", ([float(i) for i in range(40)], [float(i + 100) for i in range(40)]), {}
    yield "62 tied", "single", tied(62, 6, -2), {}
    yield "63 tied", "single", tied(63, 6, -2), {"zeros": "pratt"}
    yield "64 untied", "single", [float(i * 2 - 41) for i in range(64)], {}
    yield "150 tied", "single", tied(150, 20, -8), {}
    yield "150 tied, zeros ranked", "single", tied(150, 5, -2), {"zeros": "pratt"}
    yield "30 v 34 tied", "groups", (tied(30, 9), tied(34, 9, 1)), {}
    yield "50 v 50 tied", "groups", (tied(50, 12), tied(50, 12, 3)), {}
    yield "40 v 40 tied, far apart", "groups", (tied(40, 3), tied(40, 3, 3)), {}
    yield "5 v 300", "groups", (tied(5, 1000, 700), tied(300, 1000)), {}
    yield "1 v 80", "groups", (tied(1, 50), tied(80, 50)), {}
    for levels in (3, 4, 5, 7, 11):  # few levels make a lattice of peaks far from the centre of a transform
        weights = [source.random() ** 2 + 0.02 for _ in range(levels)]
        groups = [[float(v) for v in source.choices(range(levels), weights, k=source.randint(90, 115))] for _ in "12"]
        yield "%d v %d on %d levels" % (len(groups[0]), len(groups[1]), levels), "groups", groups, {}


def _compare_case(library, name, study, data, settings, tally):
    if study == "single":
        law = laws.signed_rank([laws.decimal_of(v) for v in data], settings.get("zeros", "drop"))
        arguments = {"values": data, "reference": [0.0]}
    else:
        law = laws.rank_sum(*([laws.decimal_of(v) for v in group] for group in data))
        arguments = dict(zip(("first", "second"), data))
    for side in SIDES.values():
        with library.ask(study, arguments, dict(settings, side=side, method="exact")) as inquiry:
            p = inquiry.number("p")
            tally.holds("large cases are exact", (name, side), inquiry.text("method").startswith("exact"), "it is not")
            tally.number("p exact, large or tiny", (name, side), law.p(side), p, EXACT)
            stated = inquiry.number("accuracy")
            tally.number("p within its stated accuracy", (name, side), law.p(side), p, max(stated or 0, 1e-16))


def _compare_tails(library, source, tally):
    for _ in range(300):
        n = source.randint(1, 70)
        t = source.randint(0, n * (n + 1) // 2)
        law = _signed_rank_law(n, t)
        for number, side in SIDES.items():
            got = library.law("rks_signed_rank_tail", n, float(t), number)
            tally.number("signed rank tail", (n, t, side), law.p(side), got, EXACT)
    for _ in range(120):
        m, n = source.randint(1, 30), source.randint(1, 30)
        counts = _rank_sum_counts(m, n)
        u = source.randint(0, m * n)
        for number, side in SIDES.items():
            got = library.law("rks_rank_sum_tail", m, n, float(u), number)
            tally.number("rank sum tail", (m, n, u, side), _tail(counts, u, side), got, EXACT)


def _compare_criticals(library, source, tally):
    for _ in range(200):
        alpha = source.choice(("0.05", "0.025", "0.01", "0.1", "0.2", "0.001", "0.5", "0.3"))
        n, m = source.randint(1, 14), source.randint(1, 14)
        for number, side in SIDES.items():
            counts = _signed_rank_counts(n)
            got = library.law("rks_signed_rank_critical", n, float(alpha), number)
            _compare_critical("signed rank critical", (n, alpha, side), counts, alpha, side, got, tally)
            counts = _rank_sum_counts(m, n)
            got = library.law("rks_rank_sum_critical", m, n, float(alpha), number)
            _compare_critical("rank sum critical", (m, n, alpha, side), counts, alpha, side, got, tally)


def _compare_critical(quantity, where, counts, alpha, side, got, tally):
    reached = [s for s in range(len(counts)) if _tail(counts, s, side) <= Fraction(alpha)]
    if side == "two-sided":
        reached = [s for s in reached if 2 * s <= len(counts) - 1]
    wanted = None if not reached else min(reached) if side == "higher" else max(reached)
    tally.number(quantity, where, wanted, None if got != got else got, 0)


def _signed_rank_law(n, t):
    """The untied law at T+ = t, from differences built to have it: the largest ranks that still fit are positive."""
    differences, left = [], t
    for rank in range(n, 0, -1):
        positive = rank <= left
        left -= rank if positive else 0
        differences.append(Fraction(rank if positive else -rank))
    return laws.signed_rank(differences)


def _signed_rank_counts(n):
    return SignedRank([Fraction(0)] * n).untied_law()[1]


def _rank_sum_counts(m, n):
    return RankSum([0] * m, [0] * n).untied_law()[1]


def _tail(counts, statistic, side):
    lower, upper, total = sum(counts[:statistic + 1]), sum(counts[statistic:]), sum(counts)
    if side == "two-sided":
        return min(Fraction(1), Fraction(2 * min(lower, upper), total))
    return Fraction(upper if side == "higher" else lower, total)
