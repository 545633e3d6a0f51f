"""Periods: the choice of the approximate formula, and of where a computed period comes from.

What a formula or a source needs beyond the story table is a part of its own: shear walls, the forces and
displacements for Rayleigh's quotient, the story stiffnesses (``period_sources``).
"""

from __future__ import annotations

from workbook_templates.declare import (
    Block,
    Check,
    Part,
    Quantity,
    Role,
)
from workbook_templates.parts.shared import STORIES

INPUT, LINK, CALC = Role.INPUT, Role.LINK, Role.CALCULATION
RESULT, VERDICT = Role.RESULT, Role.VERDICT

FORMULAS = BY_HEIGHT, BY_STORIES, BY_WALLS = "C_t h_n^x", "0.1 N", "shear walls"
SOURCES = ENTERED, BY_RAYLEIGH, BY_STIFFNESS = "entered", "Rayleigh", "story stiffness"
#: what a row shows that the choice leaves out
UNUSED = "-"
NO_COMPUTED = "approximate period T_a: none is computed"
_STATUS = "ELF_TA_STORIES_STATUS({N},{h_n},{frames},{units})"
_UNLESS_ENTERED = (
    f'IF({{T_source}}="{BY_RAYLEIGH}",{{T_rayleigh}},IF({{T_source}}="{BY_STIFFNESS}",{{T_stiffness}},NA()))'
)

APPROXIMATE = Block(
    "Approximate period",
    (
        Quantity(
            "T_a_rule",
            "Formula of the approximate period",
            "text",
            INPUT,
            choices=FORMULAS,
            rule="T_a",
            symbol="-",
            default=BY_HEIGHT,
        ),
        Quantity(
            "T_a_height",
            "By the height, C_t h_n^x",
            "time",
            CALC,
            "=ELF_TA({h_n},{period_system},{units})",
            symbol="T_a, height",
        ),
        Quantity(
            "frames",
            "Moment frames alone resist the force, by the row of the period table",
            "text",
            CALC,
            '=IF(OR({period_system}="steel moment frame",{period_system}="concrete moment frame"),'
            '"yes","no")',
            rule="T_a_stories",
            symbol="-",
        ),
        Quantity(
            "stories_status",
            "May the number of stories give the period?",
            "text",
            VERDICT,
            f'=IF({{T_a_rule}}="{BY_STORIES}",'
            f'SUBSTITUTE("✗ "&{_STATUS},"✗ permitted","✓ permitted"),"✓ not used")',
            symbol="-",
        ),
        Quantity(
            "T_a_stories",
            "By the number of stories, 0.1 N",
            "time",
            CALC,
            f'=IF({{T_a_rule}}="{BY_STORIES}",ELF_TA_STORIES({{N}}),"{UNUSED}")',
            symbol="T_a, stories",
        ),
        Quantity(
            "T_a_walls",
            "By the shear walls (sheet Walls)",
            "time",
            CALC,
            f'="{UNUSED}"',
            rule="T_a_walls",
            symbol="T_a, walls",
        ),
    ),
    per_direction=True,
)

COMPUTED = Block(
    "Computed period",
    (
        Quantity(
            "T_source",
            "Where the computed period comes from",
            "text",
            INPUT,
            choices=SOURCES,
            rule="T_max",
            symbol="-",
            default=ENTERED,
        ),
        Quantity(
            "T_rayleigh",
            "By Rayleigh's quotient (forces and displacements in the story table)",
            "time",
            CALC,
            f'="{UNUSED}"',
            rule="T_rayleigh",
            symbol="T, Rayleigh",
        ),
        Quantity(
            "T_stiffness",
            "First mode of the story stiffnesses (K_x in the story table)",
            "time",
            CALC,
            f'="{UNUSED}"',
            rule="modes",
            symbol="T, stiffness",
        ),
        Quantity(
            "T_calculated",
            "Computed period used; the approximate one where none is entered",
            "time",
            LINK,
            f'=IF({{T_source}}="{ENTERED}",IF(ISBLANK({{T_computed}}),{{T_a}},{{T_computed}}),{_UNLESS_ENTERED})',
            rule="T_max",
            symbol="T, computed",
        ),
        Quantity(
            "T_governs",
            "Which period governs strength",
            "text",
            CALC,
            f'=IF(AND({{T_source}}="{ENTERED}",ISBLANK({{T_computed}})),"{NO_COMPUTED}",'
            "ELF_PERIOD_GOVERNS({T_a},{C_u},{T_calculated}))",
            symbol="-",
        ),
    ),
    per_direction=True,
)

T_A = Quantity(
    "T_a",
    "Approximate period, by the formula chosen",
    "time",
    CALC,
    f'=IF({{T_a_rule}}="{BY_HEIGHT}",{{T_a_height}},IF({{T_a_rule}}="{BY_STORIES}",{{T_a_stories}},'
    f'IF({{T_a_rule}}="{BY_WALLS}",{{T_a_walls}},NA())))',
    rule="T_a",
)
T_USED = Quantity("T", "Period used for strength", "time", RESULT, "=ELF_PERIOD({T_a},{C_u},{T_calculated})")

PART = Part(
    "periods",
    "Periods",
    criteria=(APPROXIMATE, STORIES, COMPUTED),
    replaces=(T_A, T_USED),
    checks=(
        Check(
            "T_a is taken from the number of stories only where that is permitted",
            f'=({{T_a_rule}}="{BY_STORIES}")*(LEFT({{stories_status}},1)<>"✓")',
            "=0",
            per_direction=True,
        ),
        Check(
            "No period is entered where it is taken from elsewhere",
            f'=({{T_source}}<>"{ENTERED}")*ISNUMBER({{T_computed}})',
            "=0",
            per_direction=True,
            warning=True,
        ),
    ),
    brought_by=("T_a_rule", "T_source"),
)
