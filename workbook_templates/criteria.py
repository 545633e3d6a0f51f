"""The criteria sheet as data: what the site, the occupancy and the two directions bring in."""

from __future__ import annotations

from typing import Any

from engine.editions import EDITIONS
from engine.units import SYSTEMS
from workbook_templates.declare import Block, Part, Quantity, Role
from xlbridge.catalogue import CATALOGUE
from xlbridge.catalogue.entry import ANY, Argument, Span

INPUT, FIXED, LINK, CALC, RESULT = Role.INPUT, Role.FIXED, Role.LINK, Role.CALCULATION, Role.RESULT


def _argument(function: str, name: str) -> Argument:
    return next(a for a in CATALOGUE[function].arguments if a.name == name)


def _entry(key: str, feeds: str, text: str = "", **more: Any) -> Quantity:
    """An input whose allowed values are those of the argument that it feeds (``FUNCTION.argument``)."""
    a = _argument(*feeds.split("."))
    span = None if a.choices else a.span
    return Quantity(key, text or a.text, a.unit, INPUT, span=span, choices=a.choices, **more)


SITE = Block(
    "Site and occupancy",
    (
        Quantity(
            "edition",
            "Edition of ASCE/SEI 7 (fixed when the workbook is made)",
            "text",
            FIXED,
            choices=EDITIONS,
        ),
        Quantity("units", "Unit system (fixed when the workbook is made)", "text", FIXED, choices=SYSTEMS),
        _entry("S_DS", "ELF_CS.S_DS", rule="S_DS"),
        _entry("S_D1", "ELF_CS.S_D1", rule="S_D1"),
        _entry("S_1", "ELF_CS.S_1", rule="S_1"),
        _entry("T_L", "ELF_CS.T_L", rule="T_L"),
        _entry("risk_category", "ELF_IE.risk_category", rule="risk_category", symbol="-"),
        Quantity("I_e", "Importance factor", "none", CALC, "=ELF_IE({risk_category})", decimals=2),
        Quantity(
            "T_0", "Start of the plateau of the design spectrum", "time", CALC, "=ELF_T0({S_DS},{S_D1})"
        ),
        Quantity("T_S", "End of the plateau of the design spectrum", "time", CALC, "=ELF_TS({S_DS},{S_D1})"),
        Quantity("base_elevation", "Elevation of the base", "length", INPUT, span=ANY, symbol="z_0"),
        Quantity(
            "displacement_per_length",
            "Displacement units in one length unit (fixed)",
            "none",
            FIXED,
            symbol="-",
            part=Part.DRIFT,
            decimals=0,
        ),
        Quantity("h_n", "Structural height: highest level above the base", "length", LINK, "={h_x:total}"),
        Quantity("W", "Effective seismic weight of the building", "force", LINK, "={w_x:total}", rule="W"),
    ),
)

SYSTEM = Block(
    "Seismic force-resisting system",
    (
        Quantity("system", "System, in words", "text", INPUT, symbol="-"),
        _entry("R", "ELF_CS.R", rule="R", decimals=2),
        _entry("Omega_0", "ELF_BETA.Omega_0", rule="Omega_0", decimals=2),
        _entry("C_d", "ELF_DRIFT.C_d", rule="C_d", decimals=2),
        _entry("rho", "ELF_DRIFT_LIMIT.rho", "Redundancy factor", rule="rho", decimals=2),
        Quantity(
            "moment_frames_only",
            "Moment frames alone resist the force, and SDC is D, E or F",
            "text",
            INPUT,
            choices=("yes", "no"),
            rule="rho_drift",
            symbol="-",
        ),
        _entry("drift_structure", "ELF_DRIFT_LIMIT.structure", rule="Delta_a", symbol="-"),
        _entry(
            "beta",
            "ELF_BETA.beta",
            "Shear demand over shear capacity of the stories; 1 is permitted",
            rule="beta",
            decimals=2,
        ),
    ),
    per_direction=True,
)

PERIOD = Block(
    "Fundamental period",
    (
        _entry("period_system", "ELF_TA.system", rule="T_a", symbol="-"),
        Quantity("T_a", "Approximate period", "time", CALC, "=ELF_TA({h_n},{period_system},{units})"),
        Quantity("C_u", "Coefficient for the upper limit", "none", CALC, "=ELF_CU({S_D1})"),
        Quantity("T_max", "Upper limit C_u T_a", "time", CALC, "={C_u}*{T_a}", rule="T_max"),
        Quantity(
            "T_computed",
            "Period from an analysis (blank: the approximate period is used)",
            "time",
            INPUT,
            span=Span(0, low_open=True),
            optional=True,
            rule="T_max",
        ),
        Quantity(
            "T",
            "Period used for strength",
            "time",
            RESULT,
            "=IF(ISBLANK({T_computed}),{T_a},ELF_PERIOD({T_a},{C_u},{T_computed}))",
        ),
    ),
    per_direction=True,
)

_CS = "({S_DS},{S_D1},{S_1},{T},{T_L},{R},{I_e},{edition})"
BASE_SHEAR = Block(
    "Seismic response coefficient and base shear",
    (
        Quantity(
            "C_s_plateau", "On the plateau", "none", CALC, "=ELF_CS_PLATEAU({S_DS},{R},{I_e})", decimals=4
        ),
        Quantity(
            "C_s_cap", "Upper bound at T", "none", CALC, "=ELF_CS_CAP({S_D1},{T},{T_L},{R},{I_e})", decimals=4
        ),
        Quantity("C_s_min", "Lower bound", "none", CALC, "=ELF_CS_MIN({S_DS},{I_e})", decimals=4),
        Quantity(
            "C_s_min_S1",
            "Lower bound where S_1 is at least 0.6 g",
            "none",
            CALC,
            "=ELF_CS_MIN_S1({S_1},{R},{I_e})",
            decimals=4,
        ),
        Quantity("C_s", "Seismic response coefficient", "none", RESULT, f"=ELF_CS{_CS}", decimals=4),
        Quantity("governing_bound", "Which bound governs", "text", CALC, f"=ELF_CS_GOVERNS{_CS}", symbol="-"),
        Quantity("V", "Base shear", "force", RESULT, "=ELF_V({C_s},{W})"),
        _entry(
            "k_rule", "ELF_EXPONENT.rule", "Exponent between 0.5 s and 2.5 s", rule="exponent", symbol="-"
        ),
        Quantity("k", "Exponent of the vertical distribution", "none", RESULT, "=ELF_EXPONENT({T},{k_rule})"),
    ),
    per_direction=True,
)

STABILITY = Block(
    "Drift and stability limits",
    (
        Quantity(
            "rho_drift",
            "Divisor of the allowable drift",
            "none",
            CALC,
            '=IF({moment_frames_only}="yes",{rho},1)',
            rule="rho_drift",
            symbol="rho",
            part=Part.DRIFT,
            decimals=2,
        ),
        Quantity(
            "beta_used",
            "Shear ratio used, with its lower limit where the edition has one",
            "none",
            CALC,
            "=ELF_BETA({beta},{Omega_0},{edition})",
            symbol="beta",
            part=Part.DRIFT,
            decimals=3,
        ),
        Quantity(
            "theta_max",
            "Upper limit of the stability coefficient",
            "none",
            CALC,
            "=ELF_THETA_MAX({C_d},{beta_used})",
            part=Part.DRIFT,
            decimals=4,
        ),
    ),
    per_direction=True,
)

BLOCKS = (SITE, SYSTEM, PERIOD, BASE_SHEAR, STABILITY)
