"""Weight take-off: the seismic weight of every level as the sum of rows, each with what counts of it."""

from __future__ import annotations

from workbook_templates.declare import (
    STARTER,
    Block,
    Check,
    Part,
    Quantity,
    Role,
    Table,
    always,
    by_units,
    level_name,
)
from xlbridge.catalogue.entry import NOT_NEGATIVE

INPUT, CALC, RESULT = Role.INPUT, Role.CALCULATION, Role.RESULT

KINDS = ("dead", "partition", "storage", "garage storage", "snow", "equipment", "landscaping")
_COUNTS = (
    "=IF(ISNUMBER({weight_amount}),0,IF(ISBLANK({weight_load}),NA(),"
    'IF({weight_kind}="partition",ELF_PARTITION_SHARE({weight_load},{units}),'
    'IF({weight_kind}="storage",ELF_STORAGE_SHARE({weight_load},"counted"),'
    'IF({weight_kind}="garage storage",ELF_STORAGE_SHARE({weight_load},"public garage or open parking"),'
    'IF({weight_kind}="snow",ELF_SNOW_SHARE({weight_load},{edition},{units}),'
    'IF(OR({weight_kind}="dead",{weight_kind}="equipment",{weight_kind}="landscaping"),{weight_load},NA())'
    "))))))"
)

ROWS = Block(
    "What stands on the level",
    (
        Quantity(
            "weight_level",
            "Level",
            "text",
            INPUT,
            symbol="level",
            stored="level",
            width=15,
            starter=level_name,
        ),
        Quantity(
            "weight_what",
            "What it is",
            "text",
            INPUT,
            symbol="what",
            stored="what",
            width=34,
            starter=always("all of the level"),
        ),
        Quantity(
            "weight_kind",
            "Kind of load",
            "text",
            INPUT,
            symbol="kind",
            stored="kind",
            choices=KINDS,
            width=17,
            starter=always("dead"),
        ),
        Quantity(
            "weight_area",
            "Area",
            "area",
            INPUT,
            span=NOT_NEGATIVE,
            symbol="A",
            stored="area",
            decimals=0,
            starter=by_units(10_000.0, 1000.0),
        ),
        Quantity(
            "weight_load",
            "Load on each unit of area",
            "unit load",
            INPUT,
            span=NOT_NEGATIVE,
            symbol="q",
            stored="load",
            starter=by_units(100.0, 4.5),
            decimals=2,
        ),
        Quantity(
            "weight_amount",
            "Line or point: its weight, as it counts",
            "force",
            INPUT,
            span=NOT_NEGATIVE,
            symbol="w",
            stored="amount",
            width=13,
        ),
        Quantity(
            "weight_source",
            "Source of the inputs in this row",
            "text",
            INPUT,
            symbol="source",
            stored="source",
            width=24,
            starter=always(STARTER),
        ),
    ),
)

TAKEN = Block(
    "What counts",
    (
        Quantity(
            "load_counts",
            "Load that counts (0: a weight is entered)",
            "unit load",
            CALC,
            _COUNTS,
            rule="W",
            symbol="q_E",
            decimals=2,
            width=13,
        ),
        Quantity(
            "row_weight",
            "Weight",
            "force",
            RESULT,
            "=IF(ISBLANK({weight_amount}),ELF_AREA_WEIGHT({weight_area},{load_counts},{units}),{weight_amount})",
            symbol="w_i",
            total="sum",
            width=13,
        ),
        Quantity(
            "weight_place",
            "Is there such a level?",
            "text",
            Role.VERDICT,
            '=IF(SUMPRODUCT(1*({name:all}={weight_level}))=1,"✓ one level","✗ not one level")',
            symbol="level found",
            width=17,
        ),
    ),
)

LEVEL_SUMS = Block(
    "Weight take-off",
    (
        Quantity(
            "rows_weight",
            "Sum of its rows on the sheet Weights",
            "force",
            CALC,
            "=SUMPRODUCT(({weight_level:all}={name})*{row_weight:all})",
            rule="W",
            symbol="w_rows",
            total="sum",
            width=13,
        ),
        Quantity(
            "rows_storage",
            "Storage in it",
            "force",
            CALC,
            '=SUMPRODUCT(({weight_level:all}={name})*({weight_kind:all}="storage")*{row_weight:all})',
            rule="W_storage",
            symbol="w_storage",
        ),
        Quantity(
            "storage_status",
            "Storage of at most 5 % of the rest",
            "text",
            CALC,
            '=IF({rows_storage}=0,"-",IF({rows_storage}>={rows_weight},"counts",'
            "IF(ELF_STORAGE_RATIO({rows_storage},{rows_weight}-{rows_storage})<=0.05*(1+1E-12),"
            '"may be left out","counts")))',
            rule="W_storage",
            symbol="storage",
            width=16,
        ),
    ),
)

WEIGHT = Quantity("w_x", "Seismic weight", "force", CALC, "={rows_weight}", rule="W", total="sum")

CHECKS = (
    Check(
        "Sum of the rows of the weight take-off is W",
        "={row_weight:total}",
        "={W}",
        tolerance=1e-9,
        unit="force",
    ),
    Check(
        "Rows of the weight take-off that name one level of the story table",
        '=COUNTIF({weight_place:all},"✓ one level")',
        "=COUNTA({weight_level:all})",
    ),
    Check(
        "Levels with a typed weight that is not the sum of their rows",
        "=SUMPRODUCT(1*(ABS({w_x:all}-{rows_weight:all})>1E-9*{rows_weight:all}))",
        "=0",
    ),
    Check(
        "Rows of the weight take-off with both an area or load and a weight of their own",
        "=SUMPRODUCT(ISNUMBER({weight_amount:all})*(ISNUMBER({weight_area:all})+ISNUMBER({weight_load:all})>0))",
        "=0",
    ),
    Check(
        "Rows outside the guard rows of the weight take-off",
        "=COUNTA({weight_level:wide})-COUNTA({weight_level:all})-2",
        "=0",
    ),
    Check("Levels without rows in the weight take-off", "=COUNTIF({rows_weight:all},0)", "=0", warning=True),
)

PART = Part(
    "weights",
    "Weight take-off",
    bands=(LEVEL_SUMS,),
    tables=(
        Table(
            "Weights",
            "Weight take-off",
            "what stands on each level and what counts of it, row by row",
            "weight",
            bands=(ROWS, TAKEN),
        ),
    ),
    replaces=(WEIGHT,),
    checks=CHECKS,
)
