"""Holds every answer of the library to one random case against the exact reference and SciPy."""
import scipy_opinion
from expectation import Expectation
from library import NO_ANSWER, OK

EXACT = 1e-13       # the promise for p
ROUNDED = 1e-15     # one correctly rounded operation
FORMULA = 1e-9      # two floating-point evaluations of one formula


def compare(library, case, tally):
    expected = Expectation(case)
    with library.ask(case.study, case.data, case.settings) as inquiry:
        _compare_p(expected, inquiry, tally)
        tally.number("statistic", case, expected.law.statistic, inquiry.number("statistic"), 0)
        tally.number("statistic, SciPy rankdata", case, scipy_opinion.statistic(expected),
                     inquiry.number("statistic"), ROUNDED)
        tally.number("estimate", case, float(expected.estimate()), inquiry.number("estimate"), 0)
        _compare_limits(expected, inquiry, tally)
        _compare_counts(expected, inquiry, tally)
        if expected.is_groups:
            _compare_groups(expected, inquiry, tally)
        else:
            tally.number("chance of one sample", case, expected.chance_of_a_rise(), inquiry.number("chance"), ROUNDED)


def _compare_counts(expected, inquiry, tally):
    for name, count in expected.counts().items():
        tally.number("count: " + name, expected.case, count, inquiry.number(name), 0)


def _compare_p(expected, inquiry, tally):
    case, p = expected.case, inquiry.number("p")
    if expected.approximate:
        _compare_approximate_p(expected, p, tally)
        return
    tally.number("p exact", case, expected.law.p(expected.side), p, EXACT)
    tally.number("p within its stated accuracy", case, expected.law.p(expected.side), p, inquiry.number("accuracy"))
    opinion = scipy_opinion.exact_p(expected)
    if opinion is not None:
        tally.number("p exact, SciPy", case, opinion, p, 1e-12)
    _compare_arrangements(expected, inquiry, p, tally)
    if expected.side == "two-sided":
        tally.number("smallest p", case, expected.law.smallest_p(), inquiry.number("smallest p"), EXACT)


def _compare_approximate_p(expected, p, tally):
    case, own = expected.case, expected.approximate_p()
    if own is not None:
        tally.number("p approximate", case, own, p, FORMULA)
        opinion = scipy_opinion.approximate_p(expected)
        if opinion is not None:
            tally.number("p approximate, SciPy", case, opinion, p, FORMULA)
    elif expected.moments()[1] > 0:
        tally.holds("p approximate against the data", case, 0.5 <= p <= 1, "p %r is not in [0.5, 1]" % p)
    else:
        tally.number("p approximate, nothing varies", case, 1, p, 0)


def _compare_arrangements(expected, inquiry, p, tally):
    text = inquiry.text("arrangements")
    pair = expected.arrangements()
    wanted = "" if pair is None else "{:,} of {:,}".format(*pair)
    tally.holds("arrangements", expected.case, text == wanted, "expected %r, got %r" % (wanted, text))
    if text:
        count, total = (int(word.replace(",", "")) for word in text.split(" of "))
        tally.number("arrangements make p", expected.case, count / total, p, EXACT)


def _compare_limits(expected, inquiry, tally):
    kind = expected.case.setting("interval", "matching")
    if expected.approximate:
        return  # limits of the approximation: not those of the exact law
    limits = expected.limits()
    for name, value in (("lower", limits.lower), ("upper", limits.upper)):
        wanted = None if value is None else float(value)
        tally.number("%s, %s" % (name, kind), expected.case, wanted, inquiry.number(name), 0)
    if limits.confidence is not None:
        tally.number("confidence, " + kind, expected.case, limits.confidence, inquiry.number("confidence"), ROUNDED)


def _compare_groups(expected, inquiry, tally):
    case = expected.case
    tally.number("chance", case, expected.chance(), inquiry.number("chance"), ROUNDED)
    _compare_chance_limits(expected, inquiry, tally)
    for group in ("first", "second"):
        words = ("lower quartile ", "median ", "upper quartile ")
        for word, value in zip(words, expected.quartiles(group)):
            tally.number(word + "of a group", case, value, inquiry.number(word + group), ROUNDED)
        count = len(expected.first if group == "first" else expected.second)
        tally.number("n of a group", case, count, inquiry.number("n " + group), 0)


def _compare_chance_limits(expected, inquiry, tally):
    kind = expected.case.setting("chance interval", "placement")
    if expected.side != "two-sided" or (kind == "placement" and min(len(expected.first), len(expected.second)) < 2):
        return
    for name, value in zip(("chance lower", "chance upper"), expected.chance_limits()):
        status, got = inquiry.status_and_number(name)
        tally.holds("chance limits are given", expected.case, status in (OK, NO_ANSWER), "status %d" % status)
        tally.number("%s, %s" % (name, kind), expected.case, value, got, FORMULA)
