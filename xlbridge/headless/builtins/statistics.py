"""Spread, order and regression of numbers."""

from __future__ import annotations

import math
from collections import Counter
from collections.abc import Callable
from typing import Final

from xlbridge.headless.builtins.aggregate import mean
from xlbridge.headless.builtins.builtin import Builtin
from xlbridge.headless.builtins.collect import grid_of, nothing, numbers, refuse_errors
from xlbridge.headless.coercion import Fault
from xlbridge.headless.operands import NotEvaluated, Operand


def squared_deviations(values: list[float]) -> float:
    """Return the sum of squared distances from the mean."""
    centre = mean("the variance", values)
    return math.fsum((value - centre) ** 2 for value in values)


def sample_variance(*operands: Operand) -> float:
    """VAR.S: divided by one less than the count."""
    values = numbers(operands)
    return squared_deviations(values) / (len(values) - 1) if len(values) > 1 else nothing("VAR.S")


def population_variance(*operands: Operand) -> float:
    """VAR.P: divided by the count."""
    values = numbers(operands)
    return squared_deviations(values) / len(values) if values else nothing("VAR.P")


def sample_deviation(*operands: Operand) -> float:
    """STDEV.S."""
    return math.sqrt(sample_variance(*operands))


def population_deviation(*operands: Operand) -> float:
    """STDEV.P."""
    return math.sqrt(population_variance(*operands))


def _some(name: str, values: list[float]) -> list[float]:
    if not values:
        raise Fault("#NUM!", f"{name}: there are no numbers")
    return values


def _percentile(data: Operand, share: float) -> float:
    values = sorted(_some("PERCENTILE", numbers([data])))
    if not 0.0 <= share <= 1.0:
        raise Fault("#NUM!", f"{share:g} is not a share between 0 and 1")
    place = share * (len(values) - 1)
    below = min(int(place), len(values) - 1)
    above = min(below + 1, len(values) - 1)
    return values[below] + (place - below) * (values[above] - values[below])


def _median(*operands: Operand) -> float:
    return _percentile(((*_some("MEDIAN", numbers(operands)),),), 0.5)


def _quartile(data: Operand, quarter: float) -> float:
    return _percentile(data, int(quarter) / 4.0)


def _mode(*operands: Operand) -> float:
    counted = Counter(numbers(operands)).most_common(1)
    if not counted or counted[0][1] < 2:
        raise Fault("#N/A", "MODE: no number occurs twice")
    return counted[0][0]


def _ordered(name: str, descending: bool) -> Builtin:
    def pick(data: Operand, rank: float) -> float:
        values = sorted(numbers([data]), reverse=descending)
        if not rank.is_integer():
            raise NotEvaluated(f"whether {name} rounds the place {rank:g} up or down depends on the program")
        place = int(rank)
        if not 1 <= place <= len(values):
            raise Fault("#NUM!", f"{name}: there is no number in place {rank:g}")
        return values[place - 1]

    return Builtin(name, "gn", pick)


def _rank(value: float, data: Operand, ascending: float = 0.0) -> float:
    values = numbers([data])
    if value not in values:
        raise Fault("#N/A", f"RANK: {value:g} is not among the numbers")
    return 1.0 + sum(other < value if ascending else other > value for other in values)


def _geometric_mean(*operands: Operand) -> float:
    return math.exp(mean("GEOMEAN", [math.log(value) for value in _positive("GEOMEAN", operands)]))


def _harmonic_mean(*operands: Operand) -> float:
    return 1.0 / mean("HARMEAN", [1.0 / value for value in _positive("HARMEAN", operands)])


def _positive(name: str, operands: tuple[Operand, ...]) -> list[float]:
    values = _some(name, numbers(operands))
    if min(values) <= 0.0:
        raise Fault("#NUM!", f"{name} needs numbers above 0")
    return values


def pairs(first: Operand, second: Operand) -> tuple[list[float], list[float]]:
    """Return the places where both of two equally large ranges hold a number."""
    left, right = grid_of(first), grid_of(second)
    if len(left) * len(left[0]) != len(right) * len(right[0]):
        raise Fault("#N/A", "the two ranges have different sizes")
    refuse_errors(left)
    refuse_errors(right)
    cells = zip((cell for row in left for cell in row), (cell for row in right for cell in row), strict=True)
    kept = [(x, y) for x, y in cells if type(x) is float and type(y) is float]
    return [x for x, _ in kept], [y for _, y in kept]


def _moments(ys: Operand, xs: Operand) -> tuple[float, float, float, float, float]:
    """Return the means of x and y and the sums of xx, xy and yy about them."""
    y, x = pairs(ys, xs)
    x_mean, y_mean = mean("the regression", x), mean("the regression", y)
    xy = math.fsum((a - x_mean) * (b - y_mean) for a, b in zip(x, y, strict=True))
    return x_mean, y_mean, squared_deviations(x), xy, squared_deviations(y)


def _correlation(first: Operand, second: Operand) -> float:
    _, _, xx, xy, yy = _moments(first, second)
    return xy / math.sqrt(xx * yy)


def _slope(ys: Operand, xs: Operand) -> float:
    _, _, xx, xy, _ = _moments(ys, xs)
    return xy / xx


def _forecast(x: float, ys: Operand, xs: Operand) -> float:
    x_mean, y_mean, xx, xy, _ = _moments(ys, xs)
    return y_mean + xy / xx * (x - x_mean)


def _both(
    names: tuple[str, str], params: str, function: Callable[..., Operand], required: int | None = None
) -> list[Builtin]:
    """One function under its old and its new name."""
    return [Builtin(name, params, function, required) for name in names]


FUNCTIONS: Final = (
    Builtin("MEDIAN", "g*", _median),
    *_both(("MODE", "MODE.SNGL"), "g*", _mode),
    *_both(("STDEV", "STDEV.S"), "g*", sample_deviation),
    *_both(("STDEVP", "STDEV.P"), "g*", population_deviation),
    *_both(("VAR", "VAR.S"), "g*", sample_variance),
    *_both(("VARP", "VAR.P"), "g*", population_variance),
    Builtin("DEVSQ", "g*", lambda *operands: squared_deviations(numbers(operands))),
    _ordered("LARGE", descending=True),
    _ordered("SMALL", descending=False),
    *_both(("RANK", "RANK.EQ"), "nan", _rank, 2),
    *_both(("PERCENTILE", "PERCENTILE.INC"), "gn", _percentile),
    *_both(("QUARTILE", "QUARTILE.INC"), "gn", _quartile),
    Builtin("GEOMEAN", "g*", _geometric_mean),
    Builtin("HARMEAN", "g*", _harmonic_mean),
    Builtin("CORREL", "gg", _correlation, array=True),
    Builtin("SLOPE", "gg", _slope, array=True),
    Builtin("INTERCEPT", "gg", lambda ys, xs: _forecast(0.0, ys, xs), array=True),
    *_both(("FORECAST", "FORECAST.LINEAR"), "ngg", _forecast),
)
