"""The core: site, occupancy, systems, period, base shear, and the story forces over the levels."""

from __future__ import annotations

from engine.editions import EDITIONS
from engine.units import SYSTEMS
from workbook_templates.declare import (
    STARTER,
    YES_NO,
    Block,
    Check,
    Figure,
    Headline,
    Part,
    Quantity,
    Role,
    always,
    by_units,
    entry,
    level_name,
)
from xlbridge.catalogue.entry import ANY, NOT_NEGATIVE, Span

INPUT, FIXED, LINK, CALC, RESULT = Role.INPUT, Role.FIXED, Role.LINK, Role.CALCULATION, Role.RESULT

SITE = Block(
    "Site and occupancy",
    (
        Quantity("edition", "Edition of ASCE/SEI 7 (fixed)", "text", FIXED, choices=EDITIONS),
        Quantity("units", "Unit system (fixed)", "text", FIXED, choices=SYSTEMS),
        entry("S_DS", "ELF_CS.S_DS", rule="S_DS", starter=always(1.0)),
        entry("S_D1", "ELF_CS.S_D1", rule="S_D1", starter=always(0.5)),
        entry("S_1", "ELF_CS.S_1", rule="S_1", starter=always(0.4)),
        entry("T_L", "ELF_CS.T_L", rule="T_L", starter=always(8.0)),
        entry(
            "risk_category", "ELF_IE.risk_category", rule="risk_category", symbol="-", starter=always("II")
        ),
        Quantity("I_e", "Importance factor", "none", CALC, "=ELF_IE({risk_category})", decimals=2),
        Quantity("T_0", "Start of the plateau of the spectrum", "time", CALC, "=ELF_T0({S_DS},{S_D1})"),
        Quantity("T_S", "End of the plateau of the spectrum", "time", CALC, "=ELF_TS({S_DS},{S_D1})"),
        Quantity(
            "base_elevation", "Elevation of the base", "length", INPUT, span=ANY, symbol="z_0", default=0.0
        ),
        Quantity("h_n", "Structural height: highest level above the base", "length", LINK, "={h_x:total}"),
        Quantity("W", "Effective seismic weight of the building", "force", LINK, "={w_x:total}", rule="W"),
    ),
)

SYSTEM = Block(
    "Seismic force-resisting system",
    (
        Quantity("system", "System, in words", "text", INPUT, symbol="-", starter=always("to be chosen")),
        entry("R", "ELF_CS.R", rule="R", decimals=2, starter=always(3.0)),
        entry("Omega_0", "ELF_BETA.Omega_0", rule="Omega_0", decimals=2, starter=always(3.0)),
        entry("C_d", "ELF_DRIFT.C_d", rule="C_d", decimals=2, starter=always(3.0)),
        entry("rho", "ELF_DRIFT_LIMIT.rho", "Redundancy factor", rule="rho", decimals=2, default=1.0),
        Quantity(
            "moment_frames_only",
            "Moment frames alone resist the force, and SDC is D, E or F",
            "text",
            INPUT,
            choices=YES_NO,
            rule="rho_drift",
            symbol="-",
            default=False,
        ),
        entry(
            "drift_structure",
            "ELF_DRIFT_LIMIT.structure",
            rule="Delta_a",
            symbol="-",
            starter=always("all other"),
        ),
        entry(
            "beta",
            "ELF_BETA.beta",
            "Shear demand over shear capacity of the stories; 1 is permitted",
            rule="beta",
            decimals=2,
            default=1.0,
        ),
    ),
    per_direction=True,
)

PERIOD = Block(
    "Fundamental period",
    (
        entry("period_system", "ELF_TA.system", rule="T_a", symbol="-", starter=always("all other")),
        Quantity("T_a", "Approximate period", "time", CALC, "=ELF_TA({h_n},{period_system},{units})"),
        Quantity("C_u", "Coefficient for the upper limit", "none", CALC, "=ELF_CU({S_D1})"),
        Quantity("T_max", "Upper limit C_u T_a", "time", CALC, "={C_u}*{T_a}", rule="T_max"),
        Quantity(
            "T_computed",
            "Period from an analysis (blank: the approximate period is used)",
            "time",
            INPUT,
            span=Span(0, low_open=True),
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
        entry(
            "k_rule",
            "ELF_EXPONENT.rule",
            "Exponent between 0.5 s and 2.5 s",
            rule="exponent_two",
            symbol="-",
            default="interpolate",
        ),
        Quantity("k", "Exponent of the vertical distribution", "none", RESULT, "=ELF_EXPONENT({T},{k_rule})"),
    ),
    per_direction=True,
)

LEVEL = Block(
    "Levels",
    (
        Quantity(
            "name",
            "Level",
            "text",
            INPUT,
            symbol="x",
            width=15,
            starter=level_name,
        ),
        Quantity(
            "elevation",
            "Elevation",
            "length",
            INPUT,
            span=ANY,
            symbol="z_x",
            starter=by_units(13.0, 4.0, per_level=True),
        ),
        Quantity(
            "w_x",
            "Seismic weight",
            "force",
            INPUT,
            span=NOT_NEGATIVE,
            rule="W",
            total="sum",
            stored="weight",
            starter=by_units(1000.0, 4500.0),
        ),
        Quantity(
            "source",
            "Source of the inputs in this row",
            "text",
            INPUT,
            symbol="source",
            width=24,
            starter=always(STARTER),
        ),
        Quantity(
            "h_x", "Height above base", "length", CALC, "=ELF_HX({elevation},{base_elevation})", total="max"
        ),
        Quantity("h_sx", "Story height", "length", CALC, "=ELF_HSX({h_x},{h_x:all})"),
    ),
)

FORCES = Block(
    "Story forces",
    (
        Quantity(
            "C_vx",
            "Distribution factor",
            "none",
            CALC,
            "=ELF_CVX({w_x},{h_x},{w_x:all},{h_x:all},{k})",
            decimals=4,
            total="sum",
        ),
        Quantity("F_x", "Story force", "force", RESULT, "=ELF_FX({V},{C_vx})", total="sum"),
        Quantity(
            "V_x",
            "Story shear",
            "force",
            RESULT,
            "=ELF_VX({h_x},{F_x:all},{h_x:all})",
            base="=ELF_VX({h_x},{F_x:all},{h_x:all})",
        ),
        Quantity(
            "M_x",
            "Overturning moment",
            "moment",
            RESULT,
            "=ELF_MX({h_x},{F_x:all},{h_x:all})",
            base="=ELF_MX({h_x},{F_x:all},{h_x:all})",
            width=13,
        ),
    ),
    per_direction=True,
)


def same_words(key: str) -> str:
    """Return the formula that counts the texts of a level column that another cell has too.

    The words are compared as they stand: what COUNTIF would read as a pattern or an operator is masked.
    """
    cells = f"{{{key}:all}}"
    masked = cells
    for sign in "~*?":
        masked = f'SUBSTITUTE({masked},"{sign}","~{sign}")'
    return f'=SUMPRODUCT(({cells}<>"")*(COUNTIF({cells},"="&{masked})>1))'


def repeated(key: str) -> str:
    """Return the formula that counts the cells of a level column whose content another cell has too."""
    return f'=SUMPRODUCT(({{{key}:all}}<>"")*(COUNTIF({{{key}:all}},{{{key}:all}})>1))'


_NAMES = "=COUNTA({name:all})"
_NAMES_WIDE = "=COUNTA({name:wide})"
CHECKS = (
    Check("Every level has an elevation", "=COUNT({elevation:all})", _NAMES),
    Check("Every level has a seismic weight", "=COUNT({w_x:all})", _NAMES),
    Check("Every level lies above the base", '=COUNTIF({h_x:all},">0")', _NAMES),
    Check("Levels without a name", '=SUMPRODUCT(({elevation:all}<>"")*({name:all}=""))', "=0"),
    Check("Levels with a name that another level has", same_words("name"), "=0"),
    Check(
        "Levels at the elevation of another level (two roofs are legal)",
        repeated("elevation"),
        "=0",
        warning=True,
    ),
    Check(
        "Rows outside the guard rows of the story table", "=COUNTA({name:wide})-COUNTA({name:all})-2", "=0"
    ),
    Check("S_D1 is not above S_DS", "={S_D1}", "={S_DS}", "at most", unit="acceleration", warning=True),
    Check("Sum of C_vx is 1", "={C_vx:total}", "=1", tolerance=1e-9, per_direction=True, decimals=4),
    Check("Sum of F_x is V", "={F_x:total}", "={V}", tolerance=1e-9, unit="force", per_direction=True),
    Check(
        "Story shear at the base is V",
        "={V_x:base}",
        "={V}",
        tolerance=1e-9,
        unit="force",
        per_direction=True,
    ),
    Check(
        "Overturning moment at the base is the sum of F_x h_x",
        "={M_x:base}",
        "=SUMPRODUCT({F_x:all}*{h_x:all})",
        tolerance=1e-9,
        unit="moment",
        per_direction=True,
    ),
    Check("Period used is not above C_u T_a", "={T}", "={T_max}", "at most", unit="time", per_direction=True),
)

PART = Part(
    "story",
    "Story forces",
    criteria=(SITE, SYSTEM, PERIOD, BASE_SHEAR),
    bands=(LEVEL, FORCES),
    checks=CHECKS,
    headlines=(
        Headline("Base shear V", "force", "={V}"),
        Headline("Overturning at the base", "moment", "={M_x:base}"),
        Headline("Period T", "time", "={T}"),
    ),
    figures=(
        Figure("F_x", "Story forces F_x", bars=True),
        Figure("V_x", "Story shears V_x"),
    ),
)
