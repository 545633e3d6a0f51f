"""Criteria of COUNTIF and its kin: a comparison, a text with wildcards, or a plain value.

``?`` stands for one character, ``*`` for any number of them, ``~`` before one of the three takes it
literally. Texts are compared whole and without regard to case; a criterion that is or spells a number meets
numbers and, where it asks for equality, texts that spell the same number.
"""

from __future__ import annotations

import re
from collections.abc import Callable
from functools import lru_cache
from typing import Final, TypeAlias

from xlbridge.headless.coercion import parse_number
from xlbridge.headless.operands import NotEvaluated
from xlbridge.values import ERROR_CODES, CellError, Scalar

Test: TypeAlias = Callable[[Scalar], bool]
_OPERATOR: Final = re.compile(r"(<=|>=|<>|<|>|=)?(.*)", re.DOTALL)
_HOLDS: Final[dict[str, Callable[[int], bool]]] = {
    "<": lambda order: order < 0,
    "<=": lambda order: order <= 0,
    ">": lambda order: order > 0,
    ">=": lambda order: order >= 0,
}


def criterion(value: Scalar) -> Test:
    """Return the test a criterion stands for; a blank cell as criterion means 0."""
    if isinstance(value, CellError):
        raise NotEvaluated("an error value as criterion")
    if isinstance(value, str):
        return _written(value)
    wanted = 0.0 if value is None else value
    if isinstance(wanted, float):
        return lambda cell: _as_number(cell) == wanted
    return lambda cell: type(cell) is type(wanted) and cell == wanted


@lru_cache(maxsize=512)
def _written(words: str) -> Test:
    match = _OPERATOR.fullmatch(words)
    operator, rest = (match[1] or "", match[2]) if match else ("", words)
    if operator in _HOLDS:
        return _ordered(operator, rest)
    equal = _equal(rest, blank_text=operator == "")
    return (lambda cell: not equal(cell)) if operator == "<>" else equal


def _equal(rest: str, blank_text: bool) -> Test:
    if rest == "":
        return lambda cell: cell is None or (blank_text and cell == "")
    if rest.upper() in ("TRUE", "FALSE"):
        return lambda cell: isinstance(cell, bool) and cell == (rest.upper() == "TRUE")
    if rest.upper() in ERROR_CODES:
        return lambda cell: cell == CellError(rest.upper())
    wanted = parse_number(rest)
    if wanted is not None:
        return lambda cell: _as_number(cell) == wanted
    pattern = wildcard(rest)
    return lambda cell: isinstance(cell, str) and pattern.fullmatch(cell) is not None


def _as_number(cell: Scalar) -> float | None:
    return parse_number(cell) if isinstance(cell, str) else cell if type(cell) is float else None


def _ordered(operator: str, rest: str) -> Test:
    holds, wanted = _HOLDS[operator], parse_number(rest)
    if wanted is not None:
        return lambda cell: type(cell) is float and holds((cell > wanted) - (cell < wanted))
    limit = rest.lower()
    return lambda cell: isinstance(cell, str) and holds((cell.lower() > limit) - (cell.lower() < limit))


@lru_cache(maxsize=512)
def wildcard(words: str) -> re.Pattern[str]:
    """Return the pattern of a text with wildcards."""
    parts = re.findall(r"~[?*~]|.", words, re.DOTALL)
    signs = {"?": ".", "*": ".*"}
    escaped = (re.escape(part[1:] if len(part) > 1 else part) for part in parts)
    pattern = "".join(signs.get(part, literal) for part, literal in zip(parts, escaped, strict=True))
    return re.compile(pattern, re.IGNORECASE | re.DOTALL)


def has_wildcards(words: str) -> bool:
    """Return whether a text means more than itself in a criterion."""
    return any(sign in words for sign in "?*~")
