"""Functions of dates, in the 1900 date system."""

from __future__ import annotations

from typing import Final

from xlbridge.headless.builtins.builtin import Builtin
from xlbridge.headless.coercion import Fault
from xlbridge.headless.day_numbers import calendar_date, day_number


def _date(year: float, month: float, day: float) -> float:
    full = int(year) + (1900 if 0 <= int(year) < 1900 else 0)
    found = day_number(full, int(month), int(day))
    if found is None:
        raise Fault("#NUM!", "the date is outside the calendar")
    return found


def _part(name: str, place: int) -> Builtin:
    def evaluate(number: float) -> float:
        found = calendar_date(number)
        if found is None:
            raise Fault("#NUM!", f"{number:g} is not a day of the calendar")
        return float(found[place])

    return Builtin(name, "n", evaluate)


FUNCTIONS: Final = (
    Builtin("DATE", "nnn", _date),
    _part("YEAR", 0),
    _part("MONTH", 1),
    _part("DAY", 2),
    Builtin("DAYS", "nn", lambda last, first: float(int(last) - int(first))),
)
