"""SciPy's own answers, where its definitions and ours are the same."""
import warnings

from scipy import stats


def exact_p(expected):
    """Exact where nothing is tied; SciPy has no conditional law."""
    if expected.test == "sign" and not expected.is_groups:
        return _binomial_p(expected)
    if not expected.is_untied():
        return None
    if expected.is_groups:
        return _mann_whitney(expected, "exact")
    if len(expected.differences) > 50:
        return None
    return _wilcoxon(expected, "exact")


def approximate_p(expected):
    """None where SciPy lets the continuity step pass the null, or has no variance to divide by."""
    mean, variance = expected.moments()
    if variance <= 0 or abs(float(expected.law.statistic) - mean) <= 0.5:
        return None
    if expected.is_groups:
        return _mann_whitney(expected, "asymptotic")
    return None if expected.test == "sign" else _wilcoxon(expected, "approx")


def statistic(expected):
    """The statistic from scipy.stats.rankdata."""
    values = [float(v) for v in expected.shifted()]
    if expected.is_groups:
        m = len(values)
        return stats.rankdata(values + [float(v) for v in expected.second])[:m].sum() - m * (m + 1) / 2
    if expected.test == "sign":
        return float(sum(v > 0 for v in values))
    kept = values if expected.zeros == "pratt" else [v for v in values if v != 0]
    ranks = stats.rankdata([abs(v) for v in kept]) if kept else []
    return float(sum(rank for rank, v in zip(ranks, kept) if v > 0))


def _alternative(expected):
    return {"two-sided": "two-sided", "higher": "greater", "lower": "less"}[expected.side]


def _binomial_p(expected):
    values = [v for v in expected.shifted() if v != 0]
    if not values:
        return None
    return stats.binomtest(sum(v > 0 for v in values), len(values), 0.5, _alternative(expected)).pvalue


def _mann_whitney(expected, method):
    first = [float(v) for v in expected.shifted()]
    second = [float(v) for v in expected.second]
    return stats.mannwhitneyu(first, second, alternative=_alternative(expected), method=method).pvalue


def _wilcoxon(expected, mode):
    zero_method = "pratt" if expected.zeros == "pratt" else "wilcox"
    with warnings.catch_warnings():
        warnings.simplefilter("ignore")  # it warns of small samples
        return stats.wilcoxon([float(v) for v in expected.shifted()], zero_method=zero_method, correction=True,
                              alternative=_alternative(expected), mode=mode).pvalue
