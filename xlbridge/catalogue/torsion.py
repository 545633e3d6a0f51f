"""Worksheet functions of torsion."""

from __future__ import annotations

from engine import torsion
from xlbridge.catalogue.common import SDC, TIR, edition, forces, h_x, heights
from xlbridge.catalogue.entry import (
    NOT_NEGATIVE,
    POSITIVE,
    Argument,
    Case,
    Example,
    Kind,
    Result,
    SheetFunction,
    Span,
)

d_max = Argument("d_max", "displacement", "Largest displacement at level x, found with A_x = 1", POSITIVE)
d_avg = Argument("d_avg", "displacement", "Average of the extreme points at level x", POSITIVE)
x_R = Argument("x_R", "length", "Place of the centre of rigidity of the story")
rigidities = Argument(
    "rigidities", "none", "Relative rigidities of the walls", POSITIVE, Kind.LEVELS, symbol="R_j", each="wall"
)
R_i = Argument("R_i", "none", "Relative rigidity of the wall", POSITIVE)
_ABOVE = "({heights}>={h_x}*(1-1E-9))"
_AX = "MIN(MAX(({d_max}/(1.2*{d_avg}))^2,1),3)"
_CATEGORIES = ",".join(f'{{SDC}}="{c}"' for c in torsion.TORSIONAL_CATEGORIES)

FUNCTIONS = (
    SheetFunction(
        name="ELF_ECC",
        summary="Eccentricity between the centre of mass and the centre of rigidity, signed.",
        category="Torsion",
        rule="M_t",
        arguments=(
            Argument("x_M", "length", "Place of the centre of mass"),
            Argument("x_R", "length", "Place of the centre of rigidity on the same axis"),
        ),
        result=Result("e", "length", "eccentricity"),
        function=torsion.inherent_eccentricity,
        expression="{x_M} - {x_R}",
        native="{x_M}-{x_R}",
        example=Example({"x_M": 30.0, "x_R": 24.0}, "6"),
    ),
    SheetFunction(
        name="ELF_ECC_ACC",
        summary="Accidental offset of the centre of mass, to either side.",
        category="Torsion",
        rule="M_ta",
        arguments=(Argument("L_perp", "length", "Plan dimension perpendicular to the force", POSITIVE),),
        result=Result("e_acc", "length", "accidental eccentricity"),
        function=torsion.accidental_eccentricity,
        expression="0.05·{L_perp}",
        native="0.05*{L_perp}",
        example=Example({"L_perp": 90.0}, "4.5"),
    ),
    SheetFunction(
        name="ELF_MT",
        summary="Inherent torsion of the story below a level, about the story's centre of rigidity.",
        category="Torsion",
        rule="M_t",
        arguments=(
            h_x,
            x_R,
            forces,
            Argument(
                "centers",
                "length",
                "Places of the centres of mass of all levels, or eccentricities with x_R = 0",
                kind=Kind.LEVELS,
                symbol="x_Mi",
            ),
            heights,
        ),
        result=Result("M_t", "moment", "inherent torsion"),
        function=torsion.inherent_moment,
        expression="Σ {forces}·({centers} - {x_R}) over levels with {heights} ≥ {h_x}",
        native=f"SUMPRODUCT({_ABOVE}*{{forces}}*({{centers}}-{{x_R}}))",
        example=Example(
            {"h_x": 12.0, "x_R": 24.0, "forces": [40, 60], "centers": [30, 31], "heights": [12, 24]}, "660"
        ),
    ),
    SheetFunction(
        name="ELF_MTA",
        summary="Accidental torsion of the story below a level, to be taken with either sign.",
        category="Torsion",
        rule="M_ta",
        arguments=(
            h_x,
            forces,
            Argument(
                "dimensions",
                "length",
                "Plan dimensions of all levels perpendicular to the force",
                POSITIVE,
                Kind.LEVELS,
                symbol="L_i",
            ),
            Argument(
                "amplifications",
                "none",
                "Factors A_x of all levels, 1 where none applies",
                Span(1, 3),
                Kind.LEVELS,
                symbol="A_i",
            ),
            heights,
        ),
        result=Result("M_ta", "moment", "accidental torsion"),
        function=torsion.accidental_moment,
        expression="0.05·Σ {forces}·{dimensions}·{amplifications} over levels with {heights} ≥ {h_x}",
        native=f"0.05*SUMPRODUCT({_ABOVE}*{{forces}}*{{dimensions}}*{{amplifications}})",
        example=Example(
            {
                "h_x": 12.0,
                "forces": [40, 60],
                "dimensions": [80, 80],
                "amplifications": [1, 1.5],
                "heights": [12, 24],
            },
            "520",
        ),
    ),
    SheetFunction(
        name="ELF_MTA_SCOPE",
        summary="Where accidental torsion counts: in the test of irregularity alone, or in forces too.",
        category="Torsion",
        rule="M_ta_scope",
        arguments=(TIR, SDC, edition),
        result=Result("scope", "text", "where accidental torsion counts"),
        function=torsion.accidental_scope,
        expression="TIR = {TIR} against 1.2 (C to F) or 1.4 (B), Seismic Design Category {SDC}, {edition}",
        example=Example({"TIR": 1.3, "SDC": "D", "edition": "7-16"}, "in forces and drifts as well"),
    ),
    SheetFunction(
        name="ELF_TIR",
        summary="Torsional irregularity ratio of a story from the drifts at two opposite edges.",
        category="Torsion",
        rule="TIR",
        arguments=(
            Argument("Delta_1", "displacement", "Story drift at one edge, found with A_x = 1"),
            Argument("Delta_2", "displacement", "Story drift at the opposite edge, same sign convention"),
        ),
        result=Result("TIR", "none", "torsional irregularity ratio"),
        function=torsion.irregularity_ratio,
        expression="max(|{Delta_1}|; |{Delta_2}|)/|({Delta_1} + {Delta_2})/2|",
        native="MAX(ABS({Delta_1}),ABS({Delta_2}))/(ABS({Delta_1}+{Delta_2})/2)",
        example=Example({"Delta_1": 0.3, "Delta_2": 0.2}, "1.2"),
    ),
    SheetFunction(
        name="ELF_AX",
        summary="Torsional amplification factor of a level, between 1 and 3.",
        category="Torsion",
        rule="A_x",
        arguments=(d_max, d_avg),
        result=Result("A_x", "none", "torsional amplification factor"),
        function=torsion.amplification,
        expression="min(max(({d_max}/(1.2·{d_avg}))²; 1); 3)",
        native=_AX,
        example=Example({"d_max": 1.4, "d_avg": 1.0}, "1.361"),
    ),
    SheetFunction(
        name="ELF_AX_APPLIED",
        summary="Torsional amplification factor where it applies, else 1.",
        category="Torsion",
        rule="A_x",
        arguments=(d_max, d_avg, TIR, SDC),
        result=Result("A_x", "none", "torsional amplification factor that applies"),
        function=torsion.applied_amplification,
        cases=(
            Case(
                "min(max(({d_max}/(1.2·{d_avg}))²; 1); 3)",
                "{TIR} > 1.2 and the Seismic Design Category, {SDC}, is C to F",
                lambda TIR, SDC: TIR > 1.2 * (1 + 1e-12) and SDC in "CDEF",
            ),
            Case("1", "{TIR} ≤ 1.2 or the Seismic Design Category, {SDC}, is A or B", lambda: True),
        ),
        native=f"IF(AND({{TIR}}>1.2*(1+1E-12),OR({_CATEGORIES})),{_AX},1)",
        example=Example({"d_max": 1.4, "d_avg": 1.0, "TIR": 1.3, "SDC": "D"}, "1.361"),
    ),
    SheetFunction(
        name="ELF_RIGIDITY_CENTER",
        summary="Centre of rigidity of the walls that resist one direction.",
        category="Torsion",
        rule="wall_shares",
        arguments=(
            rigidities,
            Argument(
                "positions",
                "length",
                "Places of the walls across the direction",
                kind=Kind.LEVELS,
                symbol="x_j",
                each="wall",
            ),
        ),
        result=Result("x_R", "length", "centre of rigidity"),
        function=torsion.center_of_rigidity,
        expression="Σ({rigidities}·{positions})/Σ {rigidities}",
        native="SUMPRODUCT({rigidities}*{positions})/SUM({rigidities})",
        example=Example({"rigidities": [6, 4], "positions": [0, 60]}, "24"),
    ),
    SheetFunction(
        name="ELF_RIGIDITY_POLAR",
        summary="Polar rigidity of the walls of both directions about the centre of rigidity.",
        category="Torsion",
        rule="wall_shares",
        arguments=(
            rigidities,
            Argument(
                "distances",
                "length",
                "Distances of the walls from the centre of rigidity",
                kind=Kind.LEVELS,
                symbol="d_j",
                each="wall",
            ),
        ),
        result=Result("J", "none", "polar rigidity, rigidity times length squared"),
        function=torsion.polar_rigidity,
        expression="Σ({rigidities}·{distances}²)",
        native="SUMPRODUCT({rigidities}*{distances}^2)",
        example=Example({"rigidities": [6, 4, 4, 4], "distances": [-24, 36, 20, -20]}, "11840"),
    ),
    SheetFunction(
        name="ELF_WALL_DIRECT",
        summary="Share of a wall in the story shear, without torsion.",
        category="Torsion",
        rule="wall_shares",
        arguments=(Argument("V", "force", "Story shear of the direction", NOT_NEGATIVE), R_i, rigidities),
        result=Result("V_i", "force", "direct shear of the wall"),
        function=torsion.direct_shear,
        expression="{V}·{R_i}/Σ {rigidities}",
        native="{V}*{R_i}/SUM({rigidities})",
        example=Example({"V": 100.0, "R_i": 4.5, "rigidities": [4.5, 5.5]}, "45"),
    ),
    SheetFunction(
        name="ELF_WALL_TORSION",
        summary="Shear of a wall from torsion about the centre of rigidity, signed.",
        category="Torsion",
        rule="wall_shares",
        arguments=(
            Argument("M_t", "moment", "Torsion of the story"),
            R_i,
            Argument("d_i", "length", "Distance of the wall from the centre of rigidity"),
            Argument("J", "none", "Polar rigidity of all walls", POSITIVE),
        ),
        result=Result("V_i", "force", "torsional shear of the wall"),
        function=torsion.torsional_shear,
        expression="{M_t}·{R_i}·{d_i}/{J}",
        native="{M_t}*{R_i}*{d_i}/{J}",
        example=Example({"M_t": 900.0, "R_i": 4.5, "d_i": 49.5, "J": 27248.0}, "7.36"),
        note="Relief by a torsion that may also act the other way does not count: take the worse sign.",
    ),
)
