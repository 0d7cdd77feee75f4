"""What the library has to answer to a case, from the exact reference alone."""
from fractions import Fraction

import chance_limits
import describe
import exact_estimates as estimates
import exact_laws as laws
import normal_law


class Expectation:
    """The decimals behind a case, its design, and the law under the margin."""

    def __init__(self, case):
        self.case = case
        self.side = case.setting("side", "two-sided")
        self.level = Fraction(case.setting("level", "0.95"))
        self.margin = Fraction(case.setting("margin", "0"))
        self.zeros = case.setting("zeros", "drop")
        self.test = case.setting("test", "signed rank")
        self.approximate = case.setting("method", "auto") == "approximate"
        self._read()
        self.law = self.design.law(self.margin)

    def _read(self):
        data = {name: [None if v is None else laws.decimal_of(v) for v in values]
                for name, values in self.case.data.items()}
        self.origin = 0  # what an estimate of 0 stands for: estimates of one group are of its centre
        self.is_groups = self.case.study == "groups"
        if self.is_groups:
            self.first = [v for v in data["first"] if v is not None]
            self.second = [v for v in data["second"] if v is not None]
            self.design = estimates.RankSum(self.first, self.second)
            return
        if self.case.study == "single":
            self.origin = data["reference"][0]
            self.differences = [v - self.origin for v in data["values"] if v is not None]
        else:
            self.differences = [a - b for b, a in zip(data["before"], data["after"]) if None not in (a, b)]
        self.design = (estimates.Sign(self.differences) if self.test == "sign"
                       else estimates.SignedRank(self.differences, self.zeros))

    def shifted(self):
        """The differences, or the first sample, as they are under the margin."""
        return [v - self.margin for v in (self.first if self.is_groups else self.differences)]

    def is_untied(self):
        """Whether the unconditional law applies: no ties, and no zeros for one sample."""
        values = self.shifted()
        if self.is_groups:
            values = values + self.second
            return len(set(values)) == len(values)
        return 0 not in values and len({abs(v) for v in values}) == len(values)

    def moments(self):
        if self.is_groups:
            return normal_law.rank_sum_moments(self.shifted(), self.second)
        if self.test == "sign":
            return normal_law.sign_moments(self.shifted())
        return normal_law.signed_rank_moments(self.shifted(), self.zeros)

    def approximate_p(self):
        """None where the variance is 0, or where the data lie against a one-sided test."""
        mean, variance = self.moments()
        if variance <= 0:
            return None
        if self.side == "two-sided":
            return normal_law.p_two_sided(float(self.law.statistic), mean, variance)
        return normal_law.p_in_direction(float(self.law.statistic), mean, variance, self.side)

    def estimate(self):
        return self.origin + estimates.estimate(self.design)

    def limits(self):
        kind = self.case.setting("interval", "matching")
        find = estimates.table_limits if kind == "table" else estimates.matching_limits
        limits = find(self.design, self.level, self.side)
        for name in ("lower", "upper"):
            if getattr(limits, name) is not None:
                setattr(limits, name, self.origin + getattr(limits, name))
        return limits

    def chance(self):
        return laws.rank_sum(self.first, self.second).statistic / (len(self.first) * len(self.second))

    def chance_of_a_rise(self):
        """The share of changes above 0, no change counted half."""
        rises = sum(Fraction(1) if d > 0 else Fraction(1, 2) if d == 0 else Fraction(0) for d in self.differences)
        return rises / len(self.differences)

    def counts(self):
        """n, missing and, for one sample, zeros."""
        arguments = [_up_to_the_last_value(v) for name, v in self.case.data.items() if name != "reference"]
        if self.case.study == "pairs":
            arguments = list(self.case.data.values())
        counts = {"n": len(self.first) + len(self.second) if self.is_groups else len(self.differences)}
        if any(values[-1] is not None for values in arguments):  # a last pair of blanks may be no pair at all
            counts["missing"] = sum(v is None for values in arguments for v in values)
        if not self.is_groups:
            counts["zeros"] = self.shifted().count(0)
        return counts

    def chance_limits(self):
        kind = self.case.setting("chance interval", "placement")
        find = chance_limits.newcombe_limits if kind == "newcombe" else chance_limits.placement_limits
        return find(self.first, self.second, float(self.level))

    def arrangements(self):
        if self.law.total >= 2 ** 63:
            return None
        return self.law.count(self.side), self.law.total

    def quartiles(self, name):
        values = self.first if name == "first" else self.second
        return [describe.quartile(values, q) for q in (1, 2, 3)]


def _up_to_the_last_value(values):
    """Blanks after the last value are no cells of the data: a reference to a whole column ends in a million of them."""
    last = max(position for position, value in enumerate(values) if value is not None)
    return values[:last + 1]
