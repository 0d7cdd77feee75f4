"""The normal approximation: tie-corrected variance, continuity step 1/2 toward the null, never past it.

Moments without zeros: Lehmann (1975); with zeros ranked and set aside: Cureton (1967).
"""
from collections import Counter
from math import sqrt

from scipy.stats import norm


def tie_sum(values):
    return sum(t ** 3 - t for t in Counter(values).values())


def signed_rank_moments(differences, zeros):
    nonzero = [abs(d) for d in differences if d != 0]
    z = len(differences) - len(nonzero) if zeros == "pratt" else 0
    n = len(nonzero) + z
    mean = (n * (n + 1) - z * (z + 1)) / 4
    variance = (n * (n + 1) * (2 * n + 1) - z * (z + 1) * (2 * z + 1)) / 24 - tie_sum(nonzero) / 48
    return mean, variance


def sign_moments(differences):
    n = sum(d != 0 for d in differences)
    return n / 2, n / 4


def rank_sum_moments(first, second):
    m, n = len(first), len(second)
    size = m + n
    ties = tie_sum(list(first) + list(second))
    return m * n / 2, m * n / 12 * (size + 1 - ties / (size * (size - 1)))


def toward_the_null(deviation):
    """The deviation after the continuity step."""
    if abs(deviation) <= 0.5:
        return 0.0
    return deviation - 0.5 if deviation > 0 else deviation + 0.5


def p_two_sided(statistic, mean, variance):
    return min(1.0, 2 * norm.sf(abs(toward_the_null(statistic - mean)) / sqrt(variance)))


def p_in_direction(statistic, mean, variance, side):
    """One-sided p where the data lie on that side by more than the continuity step; None elsewhere."""
    deviation = statistic - mean if side == "higher" else mean - statistic
    return norm.sf((deviation - 0.5) / sqrt(variance)) if deviation > 0.5 else None
