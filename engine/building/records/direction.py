"""Entries of one plan direction; those of a part of the package in a class of their own."""

from __future__ import annotations

from dataclasses import dataclass
from functools import partial
from typing import Final

from engine.building.records.fields import AT_LEAST_1, POSITIVE, checked, is_flag, is_text, number, word
from engine.building.records.lower import LowerEntries
from engine.diaphragm import DIAPHRAGM_TYPES, MODE_SHAPES
from engine.drift import DRIFT_STRUCTURES
from engine.period import DRIFT_PERIODS, PERIOD_FORMULAS, PERIOD_SOURCES, PERIOD_SYSTEMS
from engine.redundancy import CONFIGURATIONS
from engine.require import above, at_least, within
from engine.systems import OVERSTRENGTH_RULES
from engine.vertical import EXPONENT_RULES

DIRECTIONS: Final = ("X", "Y")
METHODS: Final = ("method 2", "method 1")
#: the forces under which displacements may be computed
DRIFT_BASES: Final = ("strength forces", "drift forces")


@dataclass(frozen=True, kw_only=True)
class MethodEntries:
    """The method of the response coefficient, where a multi-period spectrum is given."""

    C_s_method: str = word(METHODS, METHODS[0])


@dataclass(frozen=True, kw_only=True)
class SystemEntries:
    """The row of Table 12.2-1, the reliefs taken with it, and coefficients of one system above another."""

    table_system: str | None = checked(is_text, None)
    omega_reduction: str = word(OVERSTRENGTH_RULES, OVERSTRENGTH_RULES[0])
    height_increase: bool = checked(is_flag, False)
    above_R: float = number(AT_LEAST_1, 1.0)
    above_Omega_0: float = number(AT_LEAST_1, 1.0)
    above_C_d: float = number(AT_LEAST_1, 1.0)
    below_R: float = number(AT_LEAST_1, 1.0)
    below_Omega_0: float = number(AT_LEAST_1, 1.0)
    below_C_d: float = number(AT_LEAST_1, 1.0)


@dataclass(frozen=True, kw_only=True)
class DiaphragmEntries:
    """Diaphragms: collectors of light frame; the alternative procedure; flexible ones of one story (7-22)."""

    light_frame: bool = checked(is_flag, False)
    mode_shape: str | None = word(MODE_SHAPES, None)
    diaphragm_type: str | None = word(DIAPHRAGM_TYPES, None)
    R_s_entered: float | None = number(POSITIVE, None)
    c_m1: float = number(POSITIVE, 0.5)
    R_diaph: float | None = number(partial(at_least, 1), None)
    T_diaph: float | None = number(POSITIVE, None)


@dataclass(frozen=True, kw_only=True)
class PlanDirectionEntries:
    """What decides on irregularities and redundancy.

    ``TIR_max`` is the largest torsional irregularity ratio, where the levels do not give the displacements
    of the edges.
    """

    one_sided: bool = checked(is_flag, False)
    in_plane_discontinuity: bool | None = checked(is_flag, None)
    configuration: str = word(CONFIGURATIONS, CONFIGURATIONS[0])
    TIR_max: float | None = number(partial(at_least, 1), None)


@dataclass(frozen=True, kw_only=True)
class PeriodEntries:
    """Which formula gives the approximate period, and where a computed period comes from."""

    T_a_rule: str = word(PERIOD_FORMULAS, PERIOD_FORMULAS[0])
    T_source: str = word(PERIOD_SOURCES, PERIOD_SOURCES[0])


@dataclass(frozen=True, kw_only=True)
class DriftForceEntries:
    """Forces under which the displacements are computed; whether the period for drift keeps its cap."""

    drift_basis: str = word(DRIFT_BASES, DRIFT_BASES[0])
    drift_cap: str = word(DRIFT_PERIODS, DRIFT_PERIODS[0])


@dataclass(frozen=True, kw_only=True)
class Direction(
    MethodEntries,
    PeriodEntries,
    DriftForceEntries,
    LowerEntries,
    SystemEntries,
    DiaphragmEntries,
    PlanDirectionEntries,
):
    """The seismic force-resisting system of one plan direction.

    ``rho`` divides the allowable drift only where ``moment_frames_only`` is true.
    """

    system: str = checked(is_text)
    R: float = number(partial(at_least, 1))
    Omega_0: float = number(partial(at_least, 1))
    C_d: float = number(partial(at_least, 1))
    period_system: str = word(PERIOD_SYSTEMS)
    drift_structure: str = word(DRIFT_STRUCTURES)
    T_computed: float | None = number(POSITIVE, None)
    k_rule: str = word(EXPONENT_RULES, "interpolate")
    rho: float = number(partial(within, 1, 1.3), 1.0)
    moment_frames_only: bool = checked(is_flag, False)
    beta: float = number(lambda name, value: above(0, name, within(0, 1, name, value)), 1.0)
