"""Entries that hold for the whole building; those of a part of the package in a class of their own."""

from __future__ import annotations

from dataclasses import dataclass
from typing import Final

from engine.building.records.fields import (
    ANY,
    NOT_NEGATIVE,
    POSITIVE,
    SHARE,
    checked,
    is_count,
    is_flag,
    number,
    word,
)
from engine.dynamics import COMBINATIONS
from engine.hazard import LONG_EXCEPTIONS, READINGS, SHORT_EXCEPTIONS, TABLE_SITE_CLASSES, TAILS
from engine.irregularity import DIAPHRAGMS
from engine.load_effects import VERTICAL_CASES
from engine.occupancy import DESIGN_CATEGORIES, RISK_CATEGORIES
from engine.require import above, within

#: what the rows of a spectrum hold
ORDINATES_GIVEN: Final = ("MCE_R", "design")


@dataclass(frozen=True, kw_only=True)
class MotionEntries:
    """Ground motion [g]: S_DS and S_D1, or what they are worked out of.

    7-16: ``S_S`` and ``site_class`` with S_1; 7-22: ``S_MS`` and ``S_M1``; both: rows of a spectrum with the
    shear wave velocity ``v_s`` [ft/s or m/s]. Once prepared, S_DS and S_D1 are numbers.
    """

    S_DS: float = number(POSITIVE, None)
    S_D1: float = number(POSITIVE, None)
    S_S: float | None = number(NOT_NEGATIVE, None)
    site_class: str | None = word(TABLE_SITE_CLASSES, None)
    isolated: bool = checked(is_flag, False)
    short_exception: str = word(SHORT_EXCEPTIONS, SHORT_EXCEPTIONS[0])
    long_exception: str = word(LONG_EXCEPTIONS, LONG_EXCEPTIONS[0])
    S_MS: float | None = number(POSITIVE, None)
    S_M1: float | None = number(POSITIVE, None)
    ordinates_given: str = word(ORDINATES_GIVEN, ORDINATES_GIVEN[0])
    v_s: float | None = number(POSITIVE, None)
    reading: str = word(READINGS, READINGS[0])
    tail: str = word(TAILS, TAILS[0])
    S_DS_mapped: float | None = number(POSITIVE, None)
    S_D1_mapped: float | None = number(POSITIVE, None)


@dataclass(frozen=True, kw_only=True)
class ShortBuildingEntries:
    """Number of stories above the base, and the answers on which the S_DS of C_s may be capped."""

    N: float | None = number(is_count, None)
    regular: bool | None = checked(is_flag, None)
    redundant: bool | None = checked(is_flag, None)
    soft_site: bool | None = checked(is_flag, None)


@dataclass(frozen=True, kw_only=True)
class CategoryEntries:
    """What decides on Table 11.6-1 alone, where the Seismic Design Category is worked out."""

    short_table_alone: bool | None = checked(is_flag, None)
    rigid_diaphragms: bool | None = checked(is_flag, None)


@dataclass(frozen=True, kw_only=True)
class PlanEntries:
    """The Seismic Design Category, and what the plans show of irregularities."""

    SDC: str | None = word(DESIGN_CATEGORIES, None)
    diaphragms: str = word(DIAPHRAGMS, DIAPHRAGMS[0])
    drift_exception: bool = checked(is_flag, False)
    reentrant_ratio: float | None = number(NOT_NEGATIVE, None)
    diaphragm_opening: float | None = number(SHARE, None)
    diaphragm_change: float | None = number(NOT_NEGATIVE, None)
    out_of_plane_offset: bool | None = checked(is_flag, None)
    nonparallel_system: bool | None = checked(is_flag, None)


@dataclass(frozen=True, kw_only=True)
class PeriodSiteEntries:
    """Area of the base [ft2 or m2], for the period of shear walls."""

    A_B: float | None = number(POSITIVE, None)


@dataclass(frozen=True, kw_only=True)
class LoadEntries:
    """How the vertical seismic effect is taken; ``S_av`` [g] is the ordinate of a vertical spectrum."""

    vertical_case: str | None = word(VERTICAL_CASES, None)
    S_av: float | None = number(POSITIVE, None)


@dataclass(frozen=True, kw_only=True)
class ModalEntries:
    """How the modal comparison combines modes."""

    combination: str = word(COMBINATIONS, COMBINATIONS[1])
    damping: float = number(lambda name, value: above(0, name, within(0, 1, name, value)), 0.05)


@dataclass(frozen=True, kw_only=True)
class Site(
    MotionEntries,
    ShortBuildingEntries,
    PeriodSiteEntries,
    CategoryEntries,
    PlanEntries,
    LoadEntries,
    ModalEntries,
):
    """What holds for the building: S_1 [g], T_L [s], Risk Category, elevation of the base [ft or m]."""

    S_1: float = number(NOT_NEGATIVE)
    T_L: float = number(POSITIVE)
    risk_category: str = word(RISK_CATEGORIES)
    base_elevation: float = number(ANY, 0.0)
    lower_base: float | None = number(ANY, None)
