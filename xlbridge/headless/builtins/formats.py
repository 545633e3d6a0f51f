"""The number formats of TEXT that are evaluated; every other one is refused.

Plain numbers ``0``, ``0.00``, ``#,##0.0##``, percent ``0.0%``, powers of ten ``0.00E+00``, ``General``,
``@``, and dates made of d, m and y; all with quoted text before and behind.
"""

from __future__ import annotations

import re
from typing import Final

from xlbridge.headless.builtins.rounding import decimal, rounded
from xlbridge.headless.coercion import Fault, general, parse_number, text
from xlbridge.headless.day_numbers import calendar_date
from xlbridge.headless.operands import NotEvaluated
from xlbridge.values import Scalar

_NUMBER: Final = re.compile(
    r'(?P<before>(?:"[^"]*"| )*)(?P<comma>#,##)?(?P<whole>#?0*)(?P<point>\.(?P<fixed>0*)(?P<free>#*))?'
    r'(?P<power>E\+(?P<digits>0+))?(?P<percent>%)?(?P<behind>(?:"[^"]*"| )*)'
)
_DATE: Final = re.compile(r'(?:y+|m+|d+|[-/., ]|"[^"]*")+', re.IGNORECASE)
_TOKEN: Final = re.compile(r'y+|m+|d+|"[^"]*"|.', re.IGNORECASE)
_MONTHS: Final = (
    "January",
    "February",
    "March",
    "April",
    "May",
    "June",
    "July",
    "August",
    "September",
    "October",
    "November",
    "December",
)
_DAYS: Final = ("Sunday", "Monday", "Tuesday", "Wednesday", "Thursday", "Friday", "Saturday")


def formatted(value: Scalar, pattern: str) -> str:
    """Return a value as TEXT shows it; text that is no number, and logicals, are shown as they are."""
    found = parse_number(value) if isinstance(value, str) else value
    if (found is None and isinstance(value, str)) or isinstance(found, bool):
        return text(value)
    shown = 0.0 if found is None else found
    if not isinstance(shown, float):
        raise NotEvaluated("TEXT of this kind of value")
    return _shown(shown, pattern)


def _shown(value: float, pattern: str) -> str:
    if pattern.lower() in ("general", "@"):
        return general(value)
    if (number := _NUMBER.fullmatch(pattern)) and (number["whole"] or number["comma"]):
        return _number(value, number)
    if pattern.strip() and _DATE.fullmatch(pattern):
        return _date(value, pattern)
    raise NotEvaluated(f"the number format {pattern!r} of TEXT")


def _number(value: float, form: re.Match[str]) -> str:
    places = (len(form["fixed"] or ""), len(form["free"] or ""))
    if form["power"]:
        body = _scientific(abs(value), form, places)
    else:
        body = _decimal(abs(value) * (100.0 if form["percent"] else 1.0), form, places)
    sign = "-" if value < 0.0 and any(digit in body for digit in "123456789") else ""
    return sign + _words(form["before"]) + body + ("%" if form["percent"] else "") + _words(form["behind"])


def _decimal(size: float, form: re.Match[str], places: tuple[int, int]) -> str:
    digits = format(decimal(rounded(size, sum(places))), f"{',' if form['comma'] else ''}.{sum(places)}f")
    whole, _, fraction = digits.partition(".")
    least = form["whole"].count("0")
    whole = whole.zfill(least) if not form["comma"] else whole
    if least == 0 and whole == "0":
        whole = ""
    return whole + _fraction(fraction, form, places)


def _fraction(fraction: str, form: re.Match[str], places: tuple[int, int]) -> str:
    kept = fraction[: places[0]] + fraction[places[0] :].rstrip("0")
    return f".{kept}" if form["point"] else ""


def _scientific(size: float, form: re.Match[str], places: tuple[int, int]) -> str:
    if form["whole"] != "0" or form["comma"] or form["percent"]:
        raise NotEvaluated("this number format of TEXT with a power of ten")
    shown = rounded(size, sum(places) - (decimal(size).adjusted() if size else 0))
    mantissa, exponent = f"{shown:.{sum(places)}E}".split("E")
    power = exponent[0] + str(abs(int(exponent))).zfill(len(form["digits"]))
    whole, _, fraction = mantissa.partition(".")
    return f"{whole}{_fraction(fraction, form, places)}E{power}"


def _words(quoted: str) -> str:
    return quoted.replace('"', "")


def _date(value: float, pattern: str) -> str:
    found = calendar_date(value)
    if found is None:
        raise Fault("#VALUE!", f"TEXT: {value:g} is not a day of the calendar")
    year, month, day = found
    shown = {
        "yy": f"{year % 100:02d}",
        "yyyy": str(year),
        "m": str(month),
        "mm": f"{month:02d}",
        "mmm": _MONTHS[month - 1][:3],
        "mmmm": _MONTHS[month - 1],
        "d": str(day),
        "dd": f"{day:02d}",
        "ddd": _DAYS[(int(value) - 1) % 7][:3],
        "dddd": _DAYS[(int(value) - 1) % 7],
    }
    return "".join(_date_part(token, shown, pattern) for token in _TOKEN.findall(pattern))


def _date_part(token: str, shown: dict[str, str], pattern: str) -> str:
    if token[0].lower() not in "ymd":
        return _words(token)
    if token.lower() not in shown:
        raise NotEvaluated(f"the number format {pattern!r} of TEXT")
    return shown[token.lower()]
