"""Counts what was compared and keeps what disagreed."""
from collections import Counter
from fractions import Fraction

SHOWN = 25


class Tally:
    def __init__(self):
        self.compared = Counter()
        self.failures = []

    def number(self, quantity, where, expected, got, relative):
        """Both absent, or both present and within a relative distance; fractions are compared without rounding."""
        self.compared[quantity] += 1
        if expected is None or got is None:
            agree = expected is None and got is None
        else:
            agree = got == got and abs(Fraction(got) - Fraction(expected)) <= Fraction(relative) * abs(expected)
        if not agree:
            shown = None if expected is None else float(expected)
            self.failures.append("%s: expected %r, got %r in %r" % (quantity, shown, got, where))

    def holds(self, quantity, where, condition, what):
        self.compared[quantity] += 1
        if not condition:
            self.failures.append("%s: %s in %r" % (quantity, what, where))

    def report(self):
        for quantity, count in sorted(self.compared.items()):
            print("%-44s %7d compared" % (quantity, count))
        for failure in self.failures[:SHOWN]:
            print("DISAGREES " + failure)
        print("%d comparisons, %d disagree" % (sum(self.compared.values()), len(self.failures)))
        return 1 if self.failures or not self.compared else 0
