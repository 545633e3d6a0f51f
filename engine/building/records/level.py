"""Entries of one level of the story table."""

from __future__ import annotations

from dataclasses import dataclass, fields
from typing import Final

from engine.building.records.fields import ANY, NOT_NEGATIVE, POSITIVE, checked, is_text, number, word
from engine.require import YES_NO


@dataclass(frozen=True, slots=True, kw_only=True)
class Level:
    """One level: elevation [ft or m], weight and P_x [kip or kN], elastic displacements [in or mm].

    The weight is left out where rows of the take-off give it. ``d_1`` and ``d_2`` are those of opposite
    edges with A_x = 1; ``x_M`` and ``x_R`` the centres of mass and rigidity on one axis. ``K_x``,
    ``strength`` and ``L_sys`` belong to the story below the level. ``delta_f`` are the displacements under
    the lateral forces ``f_x`` [kip or kN], for the period. ``source`` says in words where the numbers come
    from.
    """

    name: str = checked(is_text)
    elevation: float = number(ANY)
    weight: float | None = number(NOT_NEGATIVE, None)
    P_x: float | None = number(NOT_NEGATIVE, None)
    delta_xe_X: float | None = number(ANY, None)
    delta_xe_Y: float | None = number(ANY, None)
    w_px: float | None = number(NOT_NEGATIVE, None)
    L_perp_X: float | None = number(POSITIVE, None)
    L_perp_Y: float | None = number(POSITIVE, None)
    d_1_X: float | None = number(ANY, None)
    d_1_Y: float | None = number(ANY, None)
    d_2_X: float | None = number(ANY, None)
    d_2_Y: float | None = number(ANY, None)
    x_M_X: float | None = number(ANY, None)
    x_M_Y: float | None = number(ANY, None)
    x_R_X: float | None = number(ANY, None)
    x_R_Y: float | None = number(ANY, None)
    K_x_X: float | None = number(POSITIVE, None)
    K_x_Y: float | None = number(POSITIVE, None)
    strength_X: float | None = number(POSITIVE, None)
    strength_Y: float | None = number(POSITIVE, None)
    L_sys_X: float | None = number(POSITIVE, None)
    L_sys_Y: float | None = number(POSITIVE, None)
    f_x_X: float | None = number(NOT_NEGATIVE, None)
    f_x_Y: float | None = number(NOT_NEGATIVE, None)
    delta_f_X: float | None = number(NOT_NEGATIVE, None)
    delta_f_Y: float | None = number(NOT_NEGATIVE, None)
    F_transfer_X: float | None = number(NOT_NEGATIVE, None)
    F_transfer_Y: float | None = number(NOT_NEGATIVE, None)
    offset_X: str | None = word(YES_NO, None)
    offset_Y: str | None = word(YES_NO, None)
    E_story_X: float | None = number(NOT_NEGATIVE, None)
    E_story_Y: float | None = number(NOT_NEGATIVE, None)
    E_sum_X: float | None = number(NOT_NEGATIVE, None)
    E_sum_Y: float | None = number(NOT_NEGATIVE, None)
    E_low_X: float | None = number(NOT_NEGATIVE, None)
    E_low_Y: float | None = number(NOT_NEGATIVE, None)
    delta_MDD_X: float | None = number(NOT_NEGATIVE, None)
    delta_MDD_Y: float | None = number(NOT_NEGATIVE, None)
    Delta_ADVE_X: float | None = number(POSITIVE, None)
    Delta_ADVE_Y: float | None = number(POSITIVE, None)
    delta_max_X: float | None = number(NOT_NEGATIVE, None)
    delta_max_Y: float | None = number(NOT_NEGATIVE, None)
    delta_di_X: float | None = number(NOT_NEGATIVE, None)
    delta_di_Y: float | None = number(NOT_NEGATIVE, None)
    delta_M2_X: float | None = number(NOT_NEGATIVE, None)
    delta_M2_Y: float | None = number(NOT_NEGATIVE, None)
    gap_X: float | None = number(NOT_NEGATIVE, None)
    gap_Y: float | None = number(NOT_NEGATIVE, None)
    source: str | None = checked(is_text, None)


#: entries that bring the separation along
SEPARATION_ENTRIES: Final = tuple(
    f"{key}_{direction}" for key in ("delta_max", "delta_di", "delta_M2", "gap") for direction in "XY"
)
#: entries that one level may have without the others
SINGLE: Final = (
    *("weight", "source", *SEPARATION_ENTRIES[-4:]),
    *("F_transfer_X", "F_transfer_Y", "offset_X", "offset_Y"),
)
#: entries that stand at every level or at none
LEVEL_OPTIONS: Final = tuple(
    entry.name for entry in fields(Level) if entry.default is None and entry.name not in SINGLE
)


def level_label(place: int, name: object) -> str:
    """Name a level in a message, counted from 1 as listed."""
    return f'level {place} ("{name}")'
