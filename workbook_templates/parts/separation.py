"""Separation from other structures and property lines, and displacements at the MCE."""

from __future__ import annotations

from workbook_templates.declare import Block, Check, Part, Quantity, Role, by_units
from xlbridge.catalogue.entry import NOT_NEGATIVE

INPUT, CALC = Role.INPUT, Role.CALCULATION

GAPS = Block(
    "Separation",
    (
        Quantity(
            "delta_max",
            "Largest elastic displacement, torsion included",
            "displacement",
            INPUT,
            span=NOT_NEGATIVE,
            rule="delta_M",
            symbol="delta_max, gap",
            linked="=ABS({delta_xe})",
            width=12,
        ),
        Quantity(
            "delta_di",
            "Deflection of the diaphragm there",
            "displacement",
            INPUT,
            span=NOT_NEGATIVE,
            rule="delta_M",
            default=0.0,
        ),
        Quantity(
            "delta_M2",
            "Displacement of the other structure (blank: property line)",
            "displacement",
            INPUT,
            span=NOT_NEGATIVE,
            rule="delta_MT",
            width=13,
            starter=by_units(0.5, 12.0, per_level=True),
        ),
        Quantity(
            "gap",
            "Clear distance (blank: nothing there)",
            "displacement",
            INPUT,
            span=NOT_NEGATIVE,
            rule="delta_MT",
            width=13,
            starter=by_units(2.0, 50.0, per_level=True),
        ),
        Quantity(
            "delta_M",
            "Displacement for separation",
            "displacement",
            CALC,
            "=ELF_DELTA_M({delta_max},{delta_di},{C_d},{I_e},{edition})",
        ),
        Quantity(
            "delta_MT",
            "Least distance",
            "displacement",
            Role.RESULT,
            "=IF(ISBLANK({delta_M2}),{delta_M},ELF_DELTA_MT({delta_M},{delta_M2}))",
        ),
        Quantity(
            "gap_status",
            "Separation",
            "text",
            Role.VERDICT,
            '=IF(ISBLANK({gap}),"-",SUBSTITUTE("✓ "&ELF_GAP_STATUS({gap},{delta_MT}),"✓ too","✗ too"))',
            symbol="separation",
            width=16,
        ),
        Quantity(
            "delta_MCE",
            "Displacement at the MCE, for members between structures",
            "displacement",
            CALC,
            "=ELF_DELTA_MCE({delta_max},{delta_di},{R},{I_e})",
            width=13,
        ),
    ),
    per_direction=True,
)

PART = Part(
    "separation",
    "Separation",
    bands=(GAPS,),
    checks=(
        Check(
            "Gaps that are too narrow",
            '=SUMPRODUCT(1*(LEFT({gap_status:all},1)="✗"))',
            "=0",
            per_direction=True,
        ),
        Check(
            "Levels with another structure and no clear distance",
            '=SUMPRODUCT(({delta_M2:all}<>"")*({gap:all}=""))',
            "=0",
            per_direction=True,
        ),
    ),
    brought_by=tuple(f"{key}_{d}" for key in ("gap", "delta_max", "delta_M2", "delta_di") for d in "XY"),
    requires=("drift",),
)
