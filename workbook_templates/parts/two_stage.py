"""Two-stage procedure (12.2.3.2): a flexible upper part, the story table, on a rigid lower part.

The lower part is a table of its own (``lower_part``); the reactions of the upper part act on its top,
multiplied as the clause asks for.
"""

from __future__ import annotations

from workbook_templates.declare import (
    YES_NO,
    Block,
    Check,
    Headline,
    Part,
    Quantity,
    Role,
    Table,
    always,
    by_units,
    entry,
)
from workbook_templates.parts.lower_part import BASE, FORCES, LEVEL, LEVELS, LOWER
from xlbridge.catalogue.entry import Span

INPUT, CALC = Role.INPUT, Role.CALCULATION

CONDITIONS = Block(
    "Conditions of the two-stage procedure",
    (
        Quantity(
            "delta_upper",
            "Elastic displacement at the top of the upper part, base fixed",
            "displacement",
            INPUT,
            span=Span(0, low_open=True),
            rule="two_stage_stiffness",
            starter=by_units(2.0, 50.0),
        ),
        Quantity(
            "delta_lower",
            "Elastic displacement at the top of the lower part, with the reactions",
            "displacement",
            INPUT,
            span=Span(0, low_open=True),
            rule="two_stage_stiffness",
            starter=by_units(0.05, 1.2),
        ),
        Quantity(
            "stiffness_upper",
            "Stiffness of the upper part",
            "stiffness",
            CALC,
            "=ELF_PART_STIFFNESS({V},{delta_upper})",
            symbol="K, upper",
        ),
        Quantity(
            "stiffness_lower",
            "Stiffness of the lower part",
            "stiffness",
            CALC,
            "=ELF_PART_STIFFNESS({V_lower}+{V_reaction},{delta_lower})",
            symbol="K, lower",
        ),
        Quantity(
            "K_ratio",
            "Stiffness, lower to upper: at least 10",
            "none",
            CALC,
            "=ELF_STIFFNESS_RATIO({stiffness_lower},{stiffness_upper})",
        ),
        entry("T_whole", "ELF_PERIOD_RATIO.T_whole", rule="two_stage_period", starter=always(0.5)),
        entry("T_upper", "ELF_PERIOD_RATIO.T_upper", rule="two_stage_period", starter=always(0.48)),
        Quantity(
            "T_ratio",
            "Period, whole to upper: at most 1.1",
            "none",
            CALC,
            "=ELF_PERIOD_RATIO({T_whole},{T_upper})",
        ),
        entry(
            "upper_procedure",
            "ELF_TWO_STAGE.upper_procedure",
            rule="two_stage",
            symbol="-",
            default="equivalent lateral force",
        ),
        entry(
            "lower_procedure",
            "ELF_TWO_STAGE.lower_procedure",
            rule="two_stage",
            symbol="-",
            default="equivalent lateral force",
        ),
        Quantity(
            "two_stage_status",
            "Whether the procedure is permitted",
            "text",
            Role.VERDICT,
            '=SUBSTITUTE("✓ "&ELF_TWO_STAGE({K_ratio},{T_ratio},{upper_procedure},{lower_procedure}),'
            '"✓ not","✗ not")',
            symbol="-",
            lines=3,
        ),
        Quantity(
            "transition_discontinuity",
            "An out-of-plane offset or in-plane discontinuity at the transition",
            "text",
            INPUT,
            choices=YES_NO,
            rule="two_stage_transition",
            symbol="-",
            default=False,
        ),
        Quantity(
            "transition",
            "What the transition asks for",
            "text",
            CALC,
            "=ELF_TWO_STAGE_TRANSITION({transition_discontinuity})",
            symbol="-",
            lines=3,
        ),
    ),
    per_direction=True,
)

_NAMES = "=COUNTA({lower_name:all})"
CHECKS = (
    Check(
        "Every level of the lower part has an elevation and a weight",
        "=COUNT({lower_elevation:all})+COUNT({lower_w:all})",
        "=2*COUNTA({lower_name:all})",
    ),
    Check("Every level of the lower part lies above its base", '=COUNTIF({lower_h:all},">0")', _NAMES),
    Check(
        "The top of the lower part is the base of the upper part",
        "={lower_elevation:total}",
        "={base_elevation}",
        tolerance=1e-9,
        unit="length",
    ),
    Check(
        "Lower part: sum of C_vx is 1",
        "={lower_C_vx:total}",
        "=1",
        tolerance=1e-9,
        per_direction=True,
        decimals=4,
    ),
    Check(
        "Lower part: sum of F_x is its base shear",
        "={lower_F:total}",
        "={V_lower}",
        tolerance=1e-9,
        unit="force",
        per_direction=True,
    ),
    Check(
        "Lower part: shear at its base is its own with that of the upper part",
        "={lower_V:base}",
        "={V_lower}+{V_reaction}",
        tolerance=1e-9,
        unit="force",
        per_direction=True,
    ),
    Check(
        "Lower part: overturning at its base is the sum of F_x h_x with the reactions",
        "={lower_M:base}",
        "=SUMPRODUCT({lower_F:all}*{lower_h:all})+{M_reaction}+{V_reaction}*{h_n_lower}",
        tolerance=1e-9,
        unit="moment",
        per_direction=True,
    ),
    Check(
        "The two-stage procedure is not permitted",
        '=IF(LEFT({two_stage_status},1)="✗",1,0)',
        "=0",
        per_direction=True,
    ),
)

_TEXT = "lower part of the two-stage procedure: one row a level"
PART = Part(
    "two_stage",
    "Two-stage procedure",
    criteria=(BASE, LOWER, CONDITIONS),
    tables=(
        Table(
            "Lower",
            "Lower part",
            _TEXT,
            "lower",
            bands=(LEVEL, FORCES),
            base={"lower_name": "Base", "lower_elevation": "=lower_base", "lower_h": 0},
            start=LEVELS,
        ),
    ),
    checks=CHECKS,
    headlines=(
        Headline("Base shear of the lower part, reactions included", "force", "={lower_V:base}"),
        Headline("Overturning at the lower base", "moment", "={lower_M:base}"),
    ),
)
