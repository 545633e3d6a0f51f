"""What periods are found from beside the story table: shear walls, Rayleigh's quotient, story stiffnesses.

Each is a part of its own, which puts its period into the row that the part for periods keeps for it.
"""

from __future__ import annotations

from workbook_templates.declare import (
    DIRECTIONS,
    STARTER,
    Block,
    Check,
    Part,
    Quantity,
    Role,
    Start,
    Table,
    always,
    by_units,
    entry,
)
from workbook_templates.parts.periods import BY_RAYLEIGH, BY_STIFFNESS, BY_WALLS, UNUSED

INPUT, CALC = Role.INPUT, Role.CALCULATION
_NAMES = "=COUNTA({name:all})"


def _wall_name(start: Start) -> str:
    return f"Wall {start.count - start.level + 1}"


def _wall_direction(start: Start) -> str:
    return DIRECTIONS[(start.count - start.level) % len(DIRECTIONS)]


WALL_ROWS = Block(
    "Shear walls",
    (
        Quantity(
            "wall_name", "Wall", "text", INPUT, symbol="wall", stored="name", width=15, starter=_wall_name
        ),
        Quantity(
            "wall_direction",
            "Direction that it resists",
            "text",
            INPUT,
            choices=DIRECTIONS,
            symbol="direction",
            stored="direction",
            starter=_wall_direction,
        ),
        entry(
            "wall_area",
            "ELF_CW.wall_areas",
            "Area of the web",
            rule="C_w",
            symbol="A_i",
            decimals=2,
            stored="area",
            starter=by_units(20.0, 2.0),
        ),
        entry(
            "wall_length",
            "ELF_CW.wall_lengths",
            "Length",
            rule="C_w",
            symbol="D_i",
            stored="length",
            starter=by_units(20.0, 6.0),
        ),
        Quantity(
            "wall_source",
            "Source of the inputs in this row",
            "text",
            INPUT,
            symbol="source",
            stored="source",
            width=24,
            starter=always(STARTER),
        ),
        Quantity(
            "C_w_wall",
            "Its share of C_w, in per cent",
            "none",
            CALC,
            "=ELF_CW({A_B},{h_n},{wall_area},{wall_length})",
            symbol="C_w, wall",
            decimals=4,
            width=13,
        ),
    ),
)

WALLS = Part(
    "walls",
    "Shear walls",
    criteria=(
        Block(
            "Base of the shear walls",
            (entry("A_B", "ELF_CW.A_B", rule="C_w", decimals=0, starter=by_units(10_000.0, 1000.0)),),
        ),
        Block(
            "Shear walls",
            (
                Quantity(
                    "C_w",
                    "Wall area over base area, in per cent: sum of the direction's walls",
                    "none",
                    CALC,
                    '=SUMPRODUCT(({wall_direction:all}="{direction}")*{C_w_wall:all})',
                    rule="C_w",
                    decimals=4,
                ),
            ),
            per_direction=True,
        ),
    ),
    tables=(
        Table(
            "Walls",
            "Shear walls",
            "the shear walls that give the approximate period, one row a wall",
            "wall",
            bands=(WALL_ROWS,),
        ),
    ),
    replaces=(
        Quantity(
            "T_a_walls",
            "By the shear walls (sheet Walls)",
            "time",
            CALC,
            f'=IF({{T_a_rule}}="{BY_WALLS}",ELF_TA_WALLS({{h_n}},{{C_w}},{{units}}),"{UNUSED}")',
            symbol="T_a, walls",
        ),
    ),
    checks=(
        Check(
            "Every wall resists direction X or Y",
            '=COUNTIF({wall_direction:all},"X")+COUNTIF({wall_direction:all},"Y")',
            "=COUNTA({wall_name:all})",
        ),
        Check("Every wall has a share of C_w", "=COUNT({C_w_wall:all})", "=COUNTA({wall_name:all})"),
        Check(
            "Rows outside the guard rows of the shear walls",
            "=COUNTA({wall_name:wide})-COUNTA({wall_name:all})-1",
            "=0",
        ),
    ),
    brought_by=(f"T_a_rule = {BY_WALLS}",),
    requires=("periods",),
)

SWAY = Block(
    "For Rayleigh's quotient",
    (
        entry(
            "f_x",
            "ELF_RAYLEIGH.forces",
            "Lateral force of this analysis (any set, not the design forces)",
            rule="T_rayleigh",
            starter=by_units(20.0, 90.0, per_level=True),
            width=14,
        ),
        entry(
            "delta_f",
            "ELF_RAYLEIGH.displacements",
            "Elastic displacement under all forces f_x",
            rule="T_rayleigh",
            starter=by_units(0.25, 6.0, per_level=True),
            width=14,
        ),
    ),
    per_direction=True,
)

RAYLEIGH = Part(
    "rayleigh",
    "Rayleigh's quotient",
    bands=(SWAY,),
    replaces=(
        Quantity(
            "T_rayleigh",
            "By Rayleigh's quotient (f_x and delta_f in the story table)",
            "time",
            CALC,
            "=ELF_RAYLEIGH({w_x:all},{f_x:all},{delta_f:all},{units})",
            symbol="T, Rayleigh",
        ),
    ),
    checks=(
        Check("Every level has a force for the period", "=COUNT({f_x:all})", _NAMES, per_direction=True),
        Check("Every level has its displacement", "=COUNT({delta_f:all})", _NAMES, per_direction=True),
    ),
    needs=tuple(f"{key}_{d}" for key in ("f_x", "delta_f") for d in DIRECTIONS),
    brought_by=(f"T_source = {BY_RAYLEIGH}",),
    requires=("periods",),
)

_MODEL = "{w_x:all},{K_x:all},{h_x:all}"
STIFFNESS = Part(
    "stiffness_period",
    "Period from story stiffness",
    criteria=(
        Block(
            "First mode of the story stiffnesses",
            (
                Quantity(
                    "first_mode_share",
                    "Part of the weight that moves in the first mode",
                    "none",
                    CALC,
                    f"=ELF_MODE_MASS(1,{_MODEL})",
                    symbol="W_1/W",
                ),
            ),
            per_direction=True,
        ),
    ),
    replaces=(
        Quantity(
            "T_stiffness",
            "First mode of the story stiffnesses (K_x in the story table)",
            "time",
            CALC,
            f"=ELF_MODE_PERIOD(1,{_MODEL},{{units}})",
            symbol="T, stiffness",
        ),
    ),
    brought_by=(f"T_source = {BY_STIFFNESS}",),
    requires=("periods", "stiffness"),
)
