"""Description of a sample as the spreadsheet gives it: the inclusive QUARTILE, interpolating between order statistics."""
from fractions import Fraction


def quartile(values, quarter):
    ordered = sorted(values)
    position = Fraction((len(ordered) - 1) * quarter, 4)
    whole = int(position)
    part = position - whole
    if part == 0:
        return ordered[whole]
    return ordered[whole] + part * (ordered[whole + 1] - ordered[whole])
