"""Rows of the tables beside the story table; ``NAMED_BY`` is the field by which a message names a row."""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import dataclass
from types import MappingProxyType
from typing import Any, ClassVar, Final

from engine.building.records.direction import DIRECTIONS
from engine.building.records.fields import (
    ANY,
    AT_LEAST_1,
    NOT_NEGATIVE,
    POSITIVE,
    checked,
    is_count,
    is_text,
    number,
    word,
)
from engine.diaphragm import WALL_DIAPHRAGMS

WEIGHT_KINDS: Final = (
    *("dead", "partition", "storage", "garage storage", "snow", "equipment", "landscaping"),
)


@dataclass(frozen=True, slots=True, kw_only=True)
class WeightRow:
    """One row of the weight take-off: a load [psf or kN/m2] on an area [ft2 or m2], or an amount [kip or kN].

    An amount is entered as it counts; of a load the part counts that its kind says.
    """

    NAMED_BY: ClassVar = "what"

    level: str = checked(is_text)
    what: str = checked(is_text)
    kind: str = word(WEIGHT_KINDS)
    area: float | None = number(NOT_NEGATIVE, None)
    load: float | None = number(NOT_NEGATIVE, None)
    amount: float | None = number(NOT_NEGATIVE, None)
    source: str | None = checked(is_text, None)


@dataclass(frozen=True, slots=True, kw_only=True)
class SpectrumRow:
    """One period [s] at which the spectrum is wanted."""

    NAMED_BY: ClassVar = ""

    T: float = number(NOT_NEGATIVE)


@dataclass(frozen=True, slots=True, kw_only=True)
class MotionRow:
    """One pair of a multi-period or site-specific spectrum: period [s] and ordinate [g]."""

    NAMED_BY: ClassVar = ""

    T: float = number(NOT_NEGATIVE)
    S_a: float = number(POSITIVE)


@dataclass(frozen=True, slots=True, kw_only=True)
class WallRow:
    """One shear wall: the plan direction it resists, its web area [ft2 or m2] and its length [ft or m]."""

    NAMED_BY: ClassVar = "name"

    name: str = checked(is_text)
    direction: str = word(DIRECTIONS)
    area: float = number(POSITIVE)
    length: float = number(POSITIVE)
    source: str | None = checked(is_text, None)


@dataclass(frozen=True, slots=True, kw_only=True)
class ModeRow:
    """One mode of the story model that the modal comparison takes in, 1 for the longest period."""

    NAMED_BY: ClassVar = ""

    number: float = number(is_count)


@dataclass(frozen=True, slots=True, kw_only=True)
class MemberRow:
    """One effect on one member, any unit: of dead, live and snow load and of the horizontal forces (signed).

    ``E_cl`` is the capacity-limited effect, as a magnitude.
    """

    NAMED_BY: ClassVar = "name"

    name: str = checked(is_text)
    direction: str = word(DIRECTIONS)
    D: float = number(ANY)
    L: float = number(ANY, 0.0)
    S: float = number(ANY, 0.0)
    Q_E: float = number(ANY)
    E_cl: float | None = number(NOT_NEGATIVE, None)
    source: str | None = checked(is_text, None)


@dataclass(frozen=True, slots=True, kw_only=True)
class AnchorRow:
    """One wall out of plane: its weight, that of an anchor [kip or kN], span of the diaphragm [ft or m]."""

    NAMED_BY: ClassVar = "name"

    name: str = checked(is_text)
    W_w: float = number(NOT_NEGATIVE)
    W_p: float = number(NOT_NEGATIVE)
    diaphragm: str = word(WALL_DIAPHRAGMS)
    L_f: float = number(NOT_NEGATIVE)
    source: str | None = checked(is_text, None)


@dataclass(frozen=True, slots=True, kw_only=True)
class LowerRow:
    """One level of the lower part of the two-stage procedure: elevation [ft or m], weight [kip or kN]."""

    NAMED_BY: ClassVar = "name"

    name: str = checked(is_text)
    elevation: float = number(ANY)
    weight: float = number(NOT_NEGATIVE)
    source: str | None = checked(is_text, None)


@dataclass(frozen=True, slots=True, kw_only=True)
class SystemRow:
    """One of several systems that act together: its coefficients in the directions in which it acts."""

    NAMED_BY: ClassVar = "name"

    name: str = checked(is_text)
    system_R_X: float | None = number(AT_LEAST_1, None)
    system_R_Y: float | None = number(AT_LEAST_1, None)
    system_Omega_0_X: float | None = number(AT_LEAST_1, None)
    system_Omega_0_Y: float | None = number(AT_LEAST_1, None)
    system_C_d_X: float | None = number(AT_LEAST_1, None)
    system_C_d_Y: float | None = number(AT_LEAST_1, None)


#: the tables of a BUILDING.toml beside the story table, with the record of a row
ROW_TABLES: Final[Mapping[str, type[Any]]] = MappingProxyType(
    {
        "weight": WeightRow,
        "spectrum": SpectrumRow,
        "multi_period": MotionRow,
        "wall": WallRow,
        "mode": ModeRow,
        "member": MemberRow,
        "anchor": AnchorRow,
        "lower": LowerRow,
        "system": SystemRow,
    }
)


def row_label(table: str, place: int, entry: Mapping[str, Any]) -> str:
    """Name a row in a message, counted from 1 as listed.

    >>> row_label("weight", 2, {"what": "roofing"}), row_label("spectrum", 1, {"T": 0.5})
    ('weight 2 ("roofing")', 'spectrum 1')
    """
    named_by = ROW_TABLES[table].NAMED_BY
    return f'{table} {place} ("{entry.get(named_by, "")}")' if named_by else f"{table} {place}"
