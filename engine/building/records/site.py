"""Entries that hold for the whole building; those of a part of the package in a class of their own."""

from __future__ import annotations

from dataclasses import dataclass

from engine.building.records.fields import ANY, NOT_NEGATIVE, POSITIVE, SHARE, checked, is_flag, number, word
from engine.irregularity import DIAPHRAGMS
from engine.occupancy import DESIGN_CATEGORIES, RISK_CATEGORIES


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
class Site(PlanEntries):
    """What holds for the building: ground motion [g, s], Risk Category, elevation of the base [ft or m]."""

    S_DS: float = number(POSITIVE)
    S_D1: float = number(POSITIVE)
    S_1: float = number(NOT_NEGATIVE)
    T_L: float = number(POSITIVE)
    risk_category: str = word(RISK_CATEGORIES)
    base_elevation: float = number(ANY, 0.0)
