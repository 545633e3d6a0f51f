"""Story drift ratios: whether the exception of 12.3.2.2 for stiffness and weight holds, worked out."""

from __future__ import annotations

from workbook_templates.declare import Block, Part, Quantity, Role

CALC = Role.CALCULATION

RATIOS = Block(
    "Story drift ratios",
    (
        Quantity(
            "drift_ratio",
            "Design story drift over story height",
            "none",
            CALC,
            "={Delta}/{h_sx_drift}",
            rule="drift_exception",
            symbol="Delta/h_sx",
            decimals=5,
        ),
        Quantity(
            "drift_ratio_above",
            "Ratio over that of the story above",
            "none",
            CALC,
            "=ELF_DRIFT_RATIO_ABOVE({h_x},{drift_ratio:all},{h_x:all})",
            symbol="r_x/r_above",
        ),
    ),
    per_direction=True,
)

PART = Part(
    "drift_ratios",
    "Story drift ratios",
    criteria=(
        Block(
            "Exception by story drift ratios",
            (
                Quantity(
                    "exception_holds",
                    "No story drift ratio is above 1.3 times that of the story above",
                    "text",
                    CALC,
                    "=ELF_DRIFT_EXCEPTION({drift_ratio:all},{h_x:all})",
                    symbol="-",
                ),
            ),
            per_direction=True,
        ),
    ),
    bands=(RATIOS,),
    replaces=(
        Quantity(
            "drift_exception",
            "No story drift ratio is above 1.3 times that of the story above, both directions",
            "text",
            CALC,
            '=IF(AND(exception_holds_X="yes",exception_holds_Y="yes"),"yes","no")',
            rule="drift_exception",
            symbol="-",
        ),
    ),
    requires=("drift",),
)
