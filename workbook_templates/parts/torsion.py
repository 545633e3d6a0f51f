"""Torsion: drifts of opposite edges and accidental torsion; inherent torsion is a part of its own."""

from __future__ import annotations

from workbook_templates.declare import (
    DIRECTIONS,
    YES_NO,
    Block,
    Check,
    Figure,
    Headline,
    Part,
    Quantity,
    Role,
    by_units,
    entry,
)
from workbook_templates.parts.shared import CATEGORY, entails, signed
from xlbridge.catalogue.entry import ANY

INPUT, LINK, CALC = Role.INPUT, Role.LINK, Role.CALCULATION
RESULT, VERDICT = Role.RESULT, Role.VERDICT
_STATUS = "ELF_TORSION_STATUS({{{TIR}}},{{diaphragms}},{{one_sided}},{{edition}})"

BUILDING = Block(
    "Torsion",
    (
        entry(
            "diaphragms",
            "ELF_TORSION_STATUS.diaphragm",
            rule="flexible_diaphragm",
            symbol="-",
            default="rigid or semirigid",
        ),
        Quantity(
            "TIR_building",
            "Largest torsional irregularity ratio of both directions",
            "none",
            CALC,
            "=MAX(TIR_max_X,TIR_max_Y)",
            rule="TIR",
            symbol="TIR",
        ),
        Quantity(
            "M_ta_scope",
            "Where accidental torsion counts (rigid or semirigid diaphragms)",
            "text",
            CALC,
            "=ELF_MTA_SCOPE({TIR_building},{SDC},{edition})",
            symbol="-",
        ),
    ),
)

BY_DIRECTION = Block(
    "Torsional irregularity",
    (
        Quantity(
            "one_sided",
            "More than 75 % of a story's strength at or on one side of the centre of mass (7-22)",
            "text",
            INPUT,
            choices=YES_NO,
            rule="TIR",
            symbol="-",
            default=False,
        ),
        Quantity(
            "TIR_max",
            "Largest ratio of the stories; 1 for flexible diaphragms",
            "none",
            LINK,
            '=IF({diaphragms}="flexible",1,IF({diaphragms}="rigid or semirigid",{TIR:total},NA()))',
            rule="TIR",
            symbol="TIR, largest",
        ),
        Quantity(
            "torsion_type",
            "Type of torsional irregularity",
            "text",
            CALC,
            f"={_STATUS.format(TIR='TIR_max')}",
            symbol="-",
        ),
        entails(
            "torsion",
            'LEFT({torsion_type},4)<>"Type"',
            'IF(OR(ISNUMBER(SEARCH("extreme",{torsion_type})),ISNUMBER(SEARCH("above 1.4",{torsion_type}))),'
            '"extreme torsional","torsional")',
            lines=11,
        ),
    ),
    per_direction=True,
)

EDGES = Block(
    "Torsion",
    (
        entry("L_perp", "ELF_ECC_ACC.L_perp", starter=by_units(100.0, 30.0), rule="M_ta"),
        Quantity(
            "d_1",
            "Elastic displacement, edge 1, A_x = 1",
            "displacement",
            INPUT,
            span=ANY,
            rule="TIR",
            starter=by_units(0.27, 6.5, per_level=True),
            width=12,
        ),
        Quantity(
            "d_2",
            "Elastic displacement, opposite edge",
            "displacement",
            INPUT,
            span=ANY,
            rule="TIR",
            starter=by_units(0.24, 5.7, per_level=True),
            width=12,
        ),
        Quantity(
            "Delta_1",
            "Elastic drift, edge 1",
            "displacement",
            CALC,
            "={d_1}-ELF_BELOW({h_x},{d_1:all},{h_x:all})",
            rule="TIR",
        ),
        Quantity(
            "Delta_2",
            "Elastic drift, edge 2",
            "displacement",
            CALC,
            "={d_2}-ELF_BELOW({h_x},{d_2:all},{h_x:all})",
            rule="TIR",
        ),
        Quantity("TIR", "Ratio of edge drifts", "none", RESULT, "=ELF_TIR({Delta_1},{Delta_2})", total="max"),
        Quantity(
            "torsion_status",
            "Type of irregularity",
            "text",
            VERDICT,
            signed(_STATUS.format(TIR="TIR")),
            symbol="torsion",
            width=32,
        ),
        Quantity("e_acc", "Accidental offset", "length", CALC, "=ELF_ECC_ACC({L_perp})"),
        Quantity(
            "d_max",
            "Largest of both edges",
            "displacement",
            CALC,
            "=MAX(ABS({d_1}),ABS({d_2}))",
            rule="A_x",
        ),
        Quantity("d_avg", "Mean of both edges", "displacement", CALC, "=ABS({d_1}+{d_2})/2", rule="A_x"),
        Quantity(
            "A_x_full",
            "Amplification by the equation",
            "none",
            CALC,
            "=ELF_AX({d_max},{d_avg})",
            symbol="A_x, equation",
            width=12,
        ),
        Quantity(
            "A_x",
            "Amplification that applies",
            "none",
            RESULT,
            "=ELF_AX_APPLIED({d_max},{d_avg},{TIR_building},{SDC})",
            total="max",
            width=12,
        ),
        Quantity(
            "M_ta",
            "Accidental torsion of the story, ±",
            "moment",
            RESULT,
            "=ELF_MTA({h_x},{F_x:all},{L_perp:all},{A_x:all},{h_x:all})",
            width=13,
        ),
    ),
    per_direction=True,
)

CENTRES = Block(
    "Inherent torsion",
    (
        entry("x_M", "ELF_ECC.x_M", "Centre of mass", rule="M_t", starter=by_units(50.0, 15.0)),
        entry("x_R", "ELF_ECC.x_R", "Centre of rigidity", rule="M_t", starter=by_units(46.0, 13.8)),
        Quantity("e", "Eccentricity", "length", CALC, "=ELF_ECC({x_M},{x_R})"),
        Quantity(
            "M_t",
            "Inherent torsion of the story",
            "moment",
            RESULT,
            "=ELF_MT({h_x},{x_R},{F_x:all},{x_M:all},{h_x:all})",
            width=13,
        ),
    ),
    per_direction=True,
)

_NAMES = "=COUNTA({name:all})"
PART = Part(
    "torsion",
    "Torsion",
    criteria=(CATEGORY, BUILDING, BY_DIRECTION),
    bands=(EDGES,),
    checks=(
        Check("Every level has displacements of edge 1", "=COUNT({d_1:all})", _NAMES, per_direction=True),
        Check("Every level has displacements of edge 2", "=COUNT({d_2:all})", _NAMES, per_direction=True),
        Check(
            "Largest torsional irregularity ratio is not above 1.2",
            "={TIR_max}",
            "=1.2",
            "at most",
            tolerance=1e-12,
            per_direction=True,
            warning=True,
            decimals=3,
        ),
    ),
    headlines=(Headline("Largest ratio of edge drifts", "none", "={TIR:total}"),),
    figures=(Figure("TIR", "Torsional irregularity ratio TIR", limit=1.2),),
    needs=tuple(f"{key}_{d}" for key in ("L_perp", "d_1", "d_2") for d in DIRECTIONS),
)

INHERENT = Part(
    "inherent_torsion",
    "Inherent torsion",
    bands=(CENTRES,),
    checks=(
        Check("Every level has its centre of mass", "=COUNT({x_M:all})", _NAMES, per_direction=True),
        Check("Every story has its centre of rigidity", "=COUNT({x_R:all})", _NAMES, per_direction=True),
    ),
    needs=tuple(f"{key}_{d}" for key in ("x_M", "x_R") for d in DIRECTIONS),
)
