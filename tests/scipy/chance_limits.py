"""Limits of the probability of superiority, in plain floating point from the published formulas.

placement: logit of theta* = (mn theta + 1/2)/(mn + 1) with the placement variances of DeLong et al. (1988), floored at
a quarter of Newcombe's variance, Student t with Satterthwaite degrees of freedom.
newcombe: Newcombe (2006), method 5: both limits solve |t - theta| = z sqrt(V(t)).
"""
from math import log, sqrt

from scipy import optimize, special, stats


def placements(first, second):
    """For each value, the share of the other sample that the first sample exceeds there, ties counted half."""
    def above(x, y):
        return 1.0 if x > y else 0.5 if x == y else 0.0
    of_first = [sum(above(x, y) for y in second) / len(second) for x in first]
    of_second = [sum(above(x, y) for x in first) / len(first) for y in second]
    return of_first, of_second


def newcombe_variance(t, m, n):
    s = (m + n) / 2 - 1
    return t * (1 - t) * (1 + s * (1 - t) / (2 - t) + s * t / (1 + t)) / (m * n)


def placement_limits(first, second, level):
    m, n = len(first), len(second)
    of_first, of_second = placements(first, second)
    theta = sum(of_first) / m
    variance_first = sum((v - theta) ** 2 for v in of_first) / (m - 1) / m
    variance_second = sum((v - theta) ** 2 for v in of_second) / (n - 1) / n
    variance = variance_first + variance_second
    shrunk = (m * n * theta + 0.5) / (m * n + 1)
    floored = max(variance, newcombe_variance(shrunk, m, n) / 4)
    half = student_quantile(0.5 + level / 2, _degrees(variance_first, variance_second, m, n))
    half *= sqrt(floored) / (shrunk * (1 - shrunk))
    centre = log(shrunk / (1 - shrunk))
    return special.expit(centre - half), special.expit(centre + half)


def student_quantile(probability, degrees):
    """SciPy's quantile is good to 1e-9 only: two Newton steps on its own distribution function finish it."""
    quantile = stats.t.ppf(probability, degrees)
    for _ in range(2):
        quantile -= (stats.t.cdf(quantile, degrees) - probability) / stats.t.pdf(quantile, degrees)
    return quantile


def _degrees(variance_first, variance_second, m, n):
    variance = variance_first + variance_second
    if variance == 0:
        return max(1, min(m, n) - 1)
    return max(1, variance ** 2 / (variance_first ** 2 / (m - 1) + variance_second ** 2 / (n - 1)))


def newcombe_limits(first, second, level):
    m, n = len(first), len(second)
    of_first, _ = placements(first, second)
    theta = sum(of_first) / m
    z = stats.norm.ppf(0.5 + level / 2)

    def excess(t):
        return (t - theta) ** 2 - z * z * newcombe_variance(t, m, n)
    inside = 1e-13  # at theta itself V, and with it the excess, may be 0: the root sought is the other one
    lower = optimize.brentq(excess, 0, theta - inside, xtol=1e-15) if theta > 0 else 0.0
    upper = optimize.brentq(excess, theta + inside, 1, xtol=1e-15) if theta < 1 else 1.0
    return lower, upper
