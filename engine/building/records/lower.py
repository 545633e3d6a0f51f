"""The lower part of the two-stage procedure: its entries of a direction, and what they say together."""

from __future__ import annotations

from collections.abc import Mapping, Sequence
from dataclasses import dataclass
from typing import Any, Final

from engine.building.records.fields import AT_LEAST_1, POSITIVE, checked, is_flag, number, word
from engine.errors import ImpossibleValue, MissingValue
from engine.period import PERIOD_SYSTEMS
from engine.two_stage import PROCEDURES


@dataclass(frozen=True, kw_only=True)
class LowerEntries:
    """System, period and displacements [in or mm] of the lower part, periods [s] of the whole and the upper.

    All but the computed period of the lower part are needed where rows of the lower part are given.
    """

    R_lower: float = number(AT_LEAST_1, None)
    rho_lower: float = number(AT_LEAST_1, None)
    period_system_lower: str = word(PERIOD_SYSTEMS, None)
    T_lower_computed: float | None = number(POSITIVE, None)
    delta_upper: float = number(POSITIVE, None)
    delta_lower: float = number(POSITIVE, None)
    T_whole: float = number(POSITIVE, None)
    T_upper: float = number(POSITIVE, None)
    upper_procedure: str = word(PROCEDURES, PROCEDURES[0])
    lower_procedure: str = word(PROCEDURES, PROCEDURES[0])
    transition_discontinuity: bool = checked(is_flag, False)


NEEDED: Final = (
    *("R_lower", "rho_lower", "period_system_lower", "delta_upper", "delta_lower", "T_whole", "T_upper"),
)


def check_lower(rows: Sequence[Any], base: float | None, directions: Mapping[str, LowerEntries]) -> None:
    """Refuse a lower part without its base or an entry of a direction, or with a level not above its base."""
    if not rows:
        return
    if base is None:
        raise MissingValue("site.lower_base", None, "must be given beside rows of lower")
    for name, given in directions.items():
        for key in NEEDED:
            if getattr(given, key) is None:
                raise MissingValue(f"direction.{name}.{key}", None, "must be given beside rows of lower")
    for place, row in enumerate(rows, start=1):
        if row.elevation <= base:
            label = f'lower {place} ("{row.name}"): elevation'
            raise ImpossibleValue(label, row.elevation, f"must be above the lower base at {base:g}")
    if not any(row.weight for row in rows):
        raise ImpossibleValue("lower", "all weights 0", "at least one level must have a weight above 0")
