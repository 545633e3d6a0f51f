"""Worksheet functions of the periods of wall buildings and by Rayleigh's quotient."""

from __future__ import annotations

from engine import period
from engine.units import GRAVITY, SI, US
from xlbridge.catalogue.common import units, weights
from xlbridge.catalogue.entry import (
    NOT_NEGATIVE,
    POSITIVE,
    Argument,
    Example,
    Kind,
    Result,
    SheetFunction,
    Span,
    Term,
)

wall_areas = Argument(
    *("wall_areas", "area", "Web areas of the shear walls in the direction", POSITIVE, Kind.LEVELS),
    symbol="A_i",
    each="wall",
)
wall_lengths = Argument(
    *("wall_lengths", "length", "Lengths of the same walls", POSITIVE, Kind.LEVELS),
    symbol="D_i",
    each="wall",
)
forces = Argument("forces", "force", "Lateral forces on all levels", NOT_NEGATIVE, Kind.LEVELS, symbol="F_i")
displacements = Argument(
    "displacements",
    "displacement",
    "Elastic displacements under these forces, in in (us) or mm (si)",
    NOT_NEGATIVE,
    Kind.LEVELS,
    symbol="delta_i",
)


def _C_q(units: str) -> float:
    return period.C_Q[units]


def _g(units: str) -> float:
    return GRAVITY[units]


_WALL_NOTE = "The printed metric C_q does not convert: 0.0019 s/ft is used in both unit systems."
_SQUARES = "SUMPRODUCT({weights},{displacements},{displacements})"
_GRAVITY = f'IF({{units}}="{US}",9806.65/25.4,{GRAVITY[SI]:.10g})'

FUNCTIONS = (
    SheetFunction(
        name="ELF_CW",
        summary="Effective ratio of shear wall area to base area, in per cent, for the approximate period.",
        category="Period",
        rule="C_w",
        arguments=(
            Argument("A_B", "area", "Area of the base", POSITIVE),
            Argument("h_n", "length", "Structural height", POSITIVE),
            wall_areas,
            wall_lengths,
        ),
        result=Result("C_w", "none", "effective wall area ratio in per cent"),
        function=period.wall_ratio,
        expression="100/{A_B}·Σ({wall_areas}/(1 + 0.83·({h_n}/{wall_lengths})²))",
        native="100/{A_B}*SUMPRODUCT({wall_areas}/(1+0.83*({h_n}/{wall_lengths})^2))",
        example=Example(
            {"A_B": 4800.0, "h_n": 30.0, "wall_areas": [20.0, 20.0], "wall_lengths": [20.0, 30.0]},
            "0.373",
        ),
    ),
    SheetFunction(
        name="ELF_TA_WALLS",
        summary="Approximate period of structures with masonry or concrete shear walls, to 120 ft (36.6 m).",
        category="Period",
        rule="T_a_walls",
        arguments=(
            Argument(
                *("h_n", "length", "Structural height, in ft (us) or m (si, at most 36.6)"),
                Span(0, 120, low_open=True),
            ),
            Argument("C_w", "none", "Effective wall area ratio in per cent", POSITIVE),
            units,
        ),
        result=Result("T_a", "time", "approximate fundamental period"),
        function=period.wall_period,
        expression="{C_q}·{h_n}/({C_w})^0.5",
        native=f'IF({{units}}="{US}",0.0019,0.0019/0.3048)*{{h_n}}/SQRT({{C_w}})',
        example=Example({"h_n": 30.0, "C_w": 0.373, "units": "us"}, "0.0933"),
        terms=(Term("C_q", "C_q", _C_q),),
        note=_WALL_NOTE,
    ),
    SheetFunction(
        name="ELF_RAYLEIGH",
        summary="Computed period from the displacements of all levels under lateral forces.",
        category="Period",
        rule="T_rayleigh",
        arguments=(weights, forces, displacements, units),
        result=Result("T", "time", "computed fundamental period"),
        function=period.rayleigh_period,
        expression="6.28319·(Σ({weights}·{displacements}²)/({g}·Σ({forces}·{displacements})))^0.5",
        native=f"2*PI()*SQRT({_SQUARES}/({_GRAVITY}*SUMPRODUCT({{forces}},{{displacements}})))",
        example=Example(
            {
                "weights": [100.0, 100.0],
                "forces": [10.0, 20.0],
                "displacements": [0.5, 1.0],
                "units": "us",
            },
            "0.715",
        ),
        terms=(Term("g", "g", _g),),
    ),
)
