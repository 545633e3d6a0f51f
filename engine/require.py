"""Checks at the door of every formula: finite numbers inside a stated range, or an error with a reason.

Every check returns its argument as a float array (0-d for a scalar), so a formula validates and
converts in one line: ``T = above(0, "T", T)``.
"""

from __future__ import annotations

from collections.abc import Callable, Iterable, Sequence
from functools import wraps
from math import inf
from typing import Any, Final, ParamSpec, TypeAlias, TypeVar, cast

import numpy as np
from numpy.typing import ArrayLike, NDArray

from engine.errors import ImpossibleValue, MissingValue, NotApplicable, WrongType, listed

Array: TypeAlias = NDArray[np.float64]
#: what a formula returns: a float64 for scalar arguments, an array of the broadcast shape otherwise
Result: TypeAlias = Array | np.float64
#: what a formula in words returns: a text for scalar arguments, an array of texts otherwise
Words: TypeAlias = str | NDArray[np.str_]

#: two results closer than this part of themselves count as one
ROUND_OFF: Final = 1e-12
#: the words of a condition that the engineer judges
YES_NO: Final = ("yes", "no")

P = ParamSpec("P")
R = TypeVar("R")


def finite(name: str, value: ArrayLike) -> Array:
    """Return ``value`` as floats; refuse blanks, text, booleans, NaN and infinities."""
    if type(value) is float and -inf < value < inf:
        return _scalar(value)
    array = _numbers(name, value)
    if array.size and not (array.min() > -inf and array.max() < inf):
        raise ImpossibleValue(name, float(array[~np.isfinite(array)].flat[0]), "must be a finite number")
    return array


def above(bound: float, name: str, value: ArrayLike, clause: str = "") -> Array:
    """Return ``value``; refuse anything at or below ``bound``."""
    if type(value) is float and bound < value < inf:
        return _scalar(value)
    array = finite(name, value)
    if array.size and not array.min() > bound:
        raise ImpossibleValue(name, float(array.min()), f"must be above {bound:g}", clause)
    return array


def at_least(bound: float, name: str, value: ArrayLike, clause: str = "") -> Array:
    """Return ``value``; refuse anything below ``bound``."""
    if type(value) is float and bound <= value < inf:
        return _scalar(value)
    array = finite(name, value)
    if array.size and not array.min() >= bound:
        raise ImpossibleValue(name, float(array.min()), f"must be at least {bound:g}", clause)
    return array


def at_most(bound: float, name: str, value: ArrayLike, clause: str = "") -> Array:
    """Return ``value``; refuse anything above ``bound``."""
    if type(value) is float and -inf < value <= bound:
        return _scalar(value)
    array = finite(name, value)
    if array.size and not array.max() <= bound:
        raise ImpossibleValue(name, float(array.max()), f"must be at most {bound:g}", clause)
    return array


def _scalar(value: float) -> Array:
    """One number that is already known to be good: it needs no reduction, so a cell costs little."""
    return cast(Array, np.float64(value))


def within(low: float, high: float, name: str, value: ArrayLike, clause: str = "") -> Array:
    """Return ``value``; refuse anything below ``low`` or above ``high``."""
    array = _numbers(name, value)
    if array.size and not (array.min() >= low and array.max() <= high):
        at_most(high, name, at_least(low, name, array, clause), clause)
    return array


def whole(name: str, value: ArrayLike) -> Array:
    """Return a number of things; refuse one below 1 or not whole."""
    array = at_least(1, name, value)
    if (np.mod(array, 1) != 0).any():
        raise ImpossibleValue(name, float(array[np.mod(array, 1) != 0].flat[0]), "must be a whole number")
    return array


def choice(name: str, value: object, allowed: Iterable[str], clause: str = "") -> str:
    """Return ``value`` if it is one of the allowed words (exact spelling)."""
    words = tuple(allowed)
    among = listed(words)
    if value is None or value == "":
        raise MissingValue(name, None, f"must be one of {among}", clause)
    if not isinstance(value, str):
        raise WrongType(name, value, f"must be text, one of {among}", clause)
    if value not in words:
        raise NotApplicable(name, value, f"must be one of {among}", clause)
    return value


def yes(name: str, value: object, clause: str = "") -> bool:
    """Tell whether a condition is answered "yes"; refuse anything but "yes" and "no"."""
    return choice(name, value, YES_NO, clause) == "yes"


def formula(function: Callable[P, R]) -> Callable[P, R]:
    """Decorate a formula: shapes that do not fit are refused with a reason, 0-d results become scalars."""

    @wraps(function)
    def checked(*args: P.args, **kwargs: P.kwargs) -> R:
        try:
            result = function(*args, **kwargs)
        except ValueError as error:
            if "broadcast" not in str(error):
                raise
            raise WrongType("arguments", str(error), "the shapes must fit together") from None
        return cast(R, result[()]) if isinstance(result, np.ndarray) else result

    return checked


def agree(value: ArrayLike, other: ArrayLike) -> NDArray[np.bool_]:
    """Tell where two results are one but for round-off, so that a tie reads the same in any order of sums."""
    return np.isclose(value, other, rtol=ROUND_OFF, atol=0.0)


def exceeds(value: ArrayLike, limit: ArrayLike) -> NDArray[np.bool_]:
    """Tell where a value is above a limit by more than round-off."""
    return (np.asarray(value) > limit) & ~agree(value, limit)


def short_of(value: ArrayLike, limit: ArrayLike) -> NDArray[np.bool_]:
    """Tell where a value is below a limit by more than round-off."""
    return (np.asarray(value) < limit) & ~agree(value, limit)


def worded(texts: Sequence[str], index: ArrayLike) -> Words:
    """Return the text at each index: a plain text for one index."""
    place = np.asarray(index, dtype=np.intp)
    return texts[int(place)] if place.ndim == 0 else np.array(texts)[place]


def reasons(texts: Sequence[str], holds: Sequence[ArrayLike], otherwise: str, lead: str = "") -> Words:
    """Return ``lead`` and the texts whose conditions hold, joined; ``otherwise`` where none does."""
    flags = np.broadcast_arrays(*(np.asarray(flag, dtype=np.bool_) for flag in holds))
    joined = [
        "; ".join(text for text, flag in zip(texts, case, strict=True) if flag)
        for case in zip(*(flag.flat for flag in flags), strict=True)
    ]
    found = [f"{lead}{text}" if text else otherwise for text in joined]
    return np.array(found).reshape(flags[0].shape) if flags[0].ndim else found[0]


def _numbers(name: str, value: ArrayLike) -> Array:
    try:
        array = np.asarray(value)
    except ValueError:
        raise WrongType(name, value, "must be rows of one length") from None
    if array.dtype.kind not in "fiu" or (isinstance(value, list | tuple) and _has_a_flag(value)):
        raise (MissingValue if value is None else WrongType)(name, value, "must be a number")
    return array.astype(np.float64, copy=False)


def _has_a_flag(rows: Sequence[Any]) -> bool:
    """Whether True or False stands among numbers, where an array would make 1 or 0 of it."""
    return any(
        _has_a_flag(v) if isinstance(v, list | tuple) else isinstance(v, bool | np.bool_) for v in rows
    )
