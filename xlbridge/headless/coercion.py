"""From one kind of cell value to another, as a spreadsheet does it by context.

A blank is 0, "" or FALSE; a text that is a number counts as that number in arithmetic; an error ends the
evaluation of whatever it enters. Text whose number depends on the user's settings (dates, currencies) is
refused rather than guessed.
"""

from __future__ import annotations

import math
import re
from decimal import Decimal
from typing import Final

from xlbridge.headless.day_numbers import day_number
from xlbridge.headless.operands import Area, NotEvaluated, Operand
from xlbridge.values import CellError, Grid, Omitted, Scalar

#: two numbers that agree to fifteen digits are equal to a spreadsheet, and their difference is zero.
FIFTEEN_DIGITS: Final = 2.0**-48
#: no cell holds a longer text.
LONGEST: Final = 32767

_NUMBER: Final = re.compile(
    r"\s*[-+]?(?:(?:\d{1,3}(?:,\d{3})+|\d+)(?:\.\d*)?|\.\d+)(?:E[-+]?\d+)?\s*%?\s*", re.IGNORECASE | re.ASCII
)
_ISO_DATE: Final = re.compile(r"\s*(\d{4})-(\d{1,2})-(\d{1,2})\s*", re.ASCII)
_SIGNS: Final = r"[\s\d/:.,$€£¥()%+-]*"
_MONTHS: Final = "jan|feb|mar|apr|may|jun|jul|aug|sep|oct|nov|dec|january|february|march|april|june|july"
_BY_SETTINGS: Final = re.compile(
    rf"(?=.*\d){_SIGNS}(?:(?: am| pm| a| p|{_MONTHS}|august|september|october|november|december){_SIGNS})?",
    re.IGNORECASE | re.ASCII,
)


class Fault(Exception):
    """Ends the evaluation of a function or operator with an error value."""

    def __init__(self, code: str | CellError, reason: str = "") -> None:
        self.error = code if isinstance(code, CellError) else CellError(code, reason)
        super().__init__(str(self.error))


def plain(operand: Operand) -> Scalar | Grid:
    """Return the values behind an operand: a scalar for a single cell, a grid for a larger area."""
    if isinstance(operand, Area):
        grid = operand.grid
        return grid[0][0] if operand.is_cell else grid
    return None if isinstance(operand, Omitted) else operand


def number(value: Scalar) -> float:
    """Return the number a value stands for in arithmetic; an error or other text is a fault."""
    if type(value) is float:
        return value
    if value is None:
        return 0.0
    if isinstance(value, CellError):
        raise Fault(value)
    if isinstance(value, str):
        return _number_of_text(value)
    return float(value)


def text(value: Scalar) -> str:
    """Return the text a value stands for in a concatenation; an error is a fault."""
    if type(value) is str:
        return value
    if type(value) is float:
        return general(value)
    if isinstance(value, CellError):
        raise Fault(value)
    return "" if value is None else str(value).upper()


def fitting(words: str) -> str:
    """Return a text if a cell can hold it; a chain of doublings would fill the memory otherwise."""
    if len(words) > LONGEST:
        raise Fault("#VALUE!", f"the text would be longer than {LONGEST} characters")
    return words


def logical(value: Scalar) -> bool:
    """Return the truth a value stands for in a condition; text other than TRUE and FALSE is a fault."""
    if type(value) is bool:
        return value
    if isinstance(value, CellError):
        raise Fault(value)
    if isinstance(value, str):
        if value.upper() in ("TRUE", "FALSE"):
            return value.upper() == "TRUE"
        raise Fault("#VALUE!", f"{value!r} is not a logical value")
    return bool(value)


def parse_number(words: str) -> float | None:
    """Return the number a text spells (point for decimals, comma for thousands), or None.

    Refuse a text that is a number, a date or neither depending on the user's settings.
    """
    if _NUMBER.fullmatch(words):
        digits = words.strip().replace(",", "")
        found = float(digits[:-1]) / 100.0 if digits.endswith("%") else float(digits)
        return found if math.isfinite(found) else None
    if iso := _ISO_DATE.fullmatch(words):
        return day_number(*map(int, iso.groups()))
    if _BY_SETTINGS.fullmatch(words):
        raise NotEvaluated(f"whether the text {words!r} is a number, a date or text depends on settings")
    return None


def general(value: float) -> str:
    """Return a number in the General format: fifteen significant digits, an exponent where it is long."""
    if value == int(value) and abs(value) < 1e15:
        return str(int(value))
    mantissa, exponent = f"{value:.14E}".split("E")
    if -10 < int(exponent) < 20:
        shown = format(Decimal(f"{mantissa}E{exponent}"), "f")
        return shown.rstrip("0").rstrip(".") if "." in shown else shown
    return f"{mantissa.rstrip('0').rstrip('.')}E{exponent}"


def nearly_equal(left: float, right: float) -> bool:
    """Return whether two numbers agree to fifteen digits."""
    return left == right or abs(left - right) < FIFTEEN_DIGITS * min(abs(left), abs(right))


def _number_of_text(words: str) -> float:
    found = parse_number(words)
    if found is None:
        raise Fault("#VALUE!", f"{words!r} is not a number")
    return found
