"""Days as numbers: the 1900 date system.

Day 1 is 1 January 1900 and day 60 the 29 February that never was.
"""

from __future__ import annotations

from datetime import date
from typing import Final

_DAY_ZERO: Final = date(1899, 12, 30).toordinal()  # from March 1900 on
_LEAP_DAY: Final = 60
_LAST_DAY: Final = 2958465  # 31 December 9999


def calendar_date(day_number: float) -> tuple[int, int, int] | None:
    """Return year, month and day of a day number; None outside the calendar."""
    if not 0.0 <= day_number < _LAST_DAY + 1:
        return None
    day = int(day_number)
    if day in (0, _LEAP_DAY):
        return (1900, 2, 29) if day else (1900, 1, 0)
    found = date.fromordinal(_DAY_ZERO + day + (day < _LEAP_DAY))
    return found.year, found.month, found.day


def day_number(year: int, month: int, day: int) -> float | None:
    """Return the number of a day; months and days beyond their range run on. None outside the calendar."""
    carry, index = divmod(month - 1, 12)
    if not 1900 <= year + carry <= 9999:
        return None
    first = date(year + carry, index + 1, 1).toordinal() - _DAY_ZERO
    number = first - (first <= _LEAP_DAY) + day - 1
    return float(number) if 0 <= number <= _LAST_DAY else None
