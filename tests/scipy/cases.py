"""Random cases: small, tied, skewed and incomplete, as wards and laboratories keep them. One seed, one list of cases."""
import random

LEVELS = ("0.95", "0.95", "0.9", "0.99", "0.8", "0.5", "0.999")
SIDES = ("two-sided", "two-sided", "higher", "lower")


class Case:
    """Data as doubles (None is a blank cell) and settings as words."""

    def __init__(self, study, data, settings):
        self.study = study
        self.data = data
        self.settings = settings

    def __repr__(self):
        return "%s %r %r" % (self.study, self.data, self.settings)

    def setting(self, name, default):
        return self.settings.get(name, default)


def cases(seed, count):
    source = random.Random(seed)
    make = (_single, _pairs, _pairs, _groups, _groups)
    return [source.choice(make)(source) for _ in range(count)]


def _size(source):
    return source.randint(1, 12) if source.random() < 0.9 else source.randint(13, 24)


def _spread(source):
    """A way to draw values: few levels, decimals with ties, skewed, or as good as untied."""
    step, levels = source.choice(((1, 3), (1, 6), (0.1, 15), (0.25, 8), (5, 10), (0.01, 4000), (0.001, 10 ** 6),
                                  (100000, 7), (1e-7, 12)))
    shift = source.choice((0, 0, -levels // 2, levels))
    if source.random() < 0.3:
        return lambda: _decimal(step, shift + int(levels * source.random() ** 3))
    return lambda: _decimal(step, shift + source.randint(0, levels))


def _decimal(step, steps):
    return float("%.15g" % (step * steps))


def _values(source, draw, size, blanks):
    values = [draw() for _ in range(size)]
    for _ in range(blanks):
        values.insert(source.randint(0, len(values)), None)
    return values


def _settings(source):
    settings = {"level": source.choice(LEVELS), "side": source.choice(SIDES),
                "interval": source.choice(("matching", "table")),
                "method": source.choice(("auto", "exact", "approximate"))}
    if source.random() < 0.3:
        settings["margin"] = source.choice(("1", "-0.5", "0.1", "2.25", "-3"))
    return settings


def _one_sample_settings(source):
    settings = _settings(source)
    settings["test"] = source.choice(("signed rank", "signed rank", "sign"))
    settings["zeros"] = source.choice(("drop", "pratt"))
    return settings


def _single(source):
    draw = _spread(source)
    values = _values(source, draw, _size(source), source.choice((0, 0, 1, 3)))
    return Case("single", {"values": values, "reference": [draw()]}, _one_sample_settings(source))


def _pairs(source):
    draw = _spread(source)
    size = _size(source)
    before = [draw() for _ in range(size)]
    after = [b if source.random() < 0.15 else draw() for b in before]
    for column in (before, after):
        if size > 1 and source.random() < 0.3:
            column[source.randrange(1, size)] = None
    if all(b is None or a is None for b, a in zip(before, after)):
        after = [draw() for _ in before]
        before = [draw() for _ in before]
    return Case("pairs", {"before": before, "after": after}, _one_sample_settings(source))


def _groups(source):
    draw = _spread(source)
    settings = _settings(source)
    settings["chance interval"] = source.choice(("placement", "newcombe"))
    first = _values(source, draw, _size(source), source.choice((0, 0, 2)))
    lift = source.choice((0, 0, draw()))
    second = [None if v is None else _decimal(1, v + lift)
              for v in _values(source, draw, _size(source), source.choice((0, 0, 1)))]
    return Case("groups", {"first": first, "second": second}, settings)
