"""Worksheet functions of the vertical distribution: one level at a time, out of the ranges of all levels."""

from __future__ import annotations

from engine import vertical
from xlbridge.catalogue.common import T, forces, h_at, h_x, heights, k, weights
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

V = Argument("V", "force", "Base shear", POSITIVE)
values = Argument("values", "displacement", "Values at all levels", kind=Kind.LEVELS, symbol="d_i")

_NEXT_LOWER = "SUMPRODUCT(MAX(({heights}<{h_x}*(1-1E-9))*{heights}))"
_AT_NEXT = f"({{heights}}>={_NEXT_LOWER}*(1-1E-9))*({{heights}}<{{h_x}}*(1-1E-9))*({{heights}}>0)"

FUNCTIONS = (
    SheetFunction(
        name="ELF_EXPONENT",
        summary="Exponent k of the vertical distribution.",
        category="Vertical distribution",
        rule="exponent",
        also=("exponent_two",),
        arguments=(
            T,
            Argument(
                "rule",
                "text",
                "Between 0.5 s and 2.5 s: interpolate, or the permitted two",
                kind=Kind.CHOICE,
                choices=vertical.EXPONENT_RULES,
                optional=True,
            ),
        ),
        result=Result("k", "none", "distribution exponent"),
        function=vertical.exponent,
        cases=(
            Case("1", "{T} ≤ 0.5", lambda T: T <= 0.5),
            Case("2", "{T} ≥ 2.5", lambda T: T >= 2.5),
            Case("2", '0.5 < {T} < 2.5 and the rule is "two"', lambda rule: rule == "two"),
            Case("0.75 + 0.5·{T}", "0.5 < {T} < 2.5 and the rule is {rule}", lambda: True),
        ),
        native='IF({T}<=0.5,1,IF({T}>=2.5,2,IF({rule}="two",2,0.75+0.5*{T})))',
        example=Example({"T": 1.473}, "1.4865"),
    ),
    SheetFunction(
        name="ELF_CVX",
        summary="Vertical distribution factor of a level.",
        category="Vertical distribution",
        rule="C_vx",
        arguments=(
            Argument("w_x", "force", "Effective seismic weight of level x", NOT_NEGATIVE),
            h_x,
            weights,
            heights,
            k,
        ),
        result=Result("C_vx", "none", "vertical distribution factor"),
        function=vertical.distribution_factor,
        expression="{w_x}·{h_x}^{k} / Σ({weights}·{heights}^{k})",
        native="{w_x}*{h_x}^{k}/SUMPRODUCT({weights}*{heights}^{k})",
        example=Example(
            {
                "w_x": 400.0,
                "h_x": 60.0,
                "weights": [650.0, 600.0, 500.0, 450.0, 400.0],
                "heights": [12.0, 24.0, 36.0, 48.0, 60.0],
                "k": 1.0,
            },
            "0.280",
        ),
    ),
    SheetFunction(
        name="ELF_FX",
        summary="Lateral seismic force of a level.",
        category="Vertical distribution",
        rule="F_x",
        arguments=(V, Argument("C_vx", "none", "Vertical distribution factor", Span(0, 1))),
        result=Result("F_x", "force", "story force"),
        function=vertical.story_force,
        expression="{C_vx}·{V}",
        native="{C_vx}*{V}",
        example=Example({"V": 286.0, "C_vx": 0.280}, "80.1"),
    ),
    SheetFunction(
        name="ELF_VX",
        summary="Story shear below a level: the forces at and above it; at height 0 the base shear.",
        category="Vertical distribution",
        rule="V_x",
        arguments=(h_at, forces, heights),
        result=Result("V_x", "force", "story shear"),
        function=vertical.story_shear,
        expression="Σ of {forces} where {heights} ≥ {h_x}",
        native="SUMPRODUCT(({heights}>={h_x}*(1-1E-9))*{forces})",
        example=Example({"h_x": 48.0, "forces": [26.0, 72.1, 80.1], "heights": [12.0, 48.0, 60.0]}, "152.2"),
    ),
    SheetFunction(
        name="ELF_MX",
        summary="Overturning moment at a level, or at the base at height 0.",
        category="Vertical distribution",
        rule="M_x",
        arguments=(h_at, forces, heights),
        result=Result("M_x", "moment", "overturning moment"),
        function=vertical.overturning_moment,
        expression="Σ of {forces}·({heights} - {h_x}) above {h_x}",
        native="SUMPRODUCT(({heights}>{h_x})*{forces}*({heights}-{h_x}))",
        example=Example({"h_x": 12.0, "forces": [26.0, 72.1, 80.1], "heights": [12.0, 48.0, 60.0]}, "6440.4"),
    ),
    SheetFunction(
        name="ELF_HX",
        summary="Height of a level above the base, from elevations; a level must lie above the base.",
        category="Vertical distribution",
        rule="h_x",
        arguments=(
            Argument("z_x", "length", "Elevation of level x"),
            Argument("z_0", "length", "Elevation of the base"),
        ),
        result=Result("h_x", "length", "height above the base"),
        function=vertical.height_above_base,
        expression="{z_x} - {z_0}",
        native="{z_x}-{z_0}",
        example=Example({"z_x": 129.0, "z_0": 100.0}, "29.0"),
    ),
    SheetFunction(
        name="ELF_HSX",
        summary="Story height below a level: down to the next lower level, or to the base.",
        category="Vertical distribution",
        rule="story_height",
        arguments=(h_x, heights),
        result=Result("h_sx", "length", "story height"),
        function=vertical.story_height,
        expression="{h_x} - the next lower of {heights}, or the base",
        native=f"{{h_x}}-{_NEXT_LOWER}",
        example=Example({"h_x": 60.0, "heights": [12.0, 24.0, 36.0, 48.0, 60.0]}, "12"),
    ),
    SheetFunction(
        name="ELF_BELOW",
        summary="The value at the next lower level (a displacement, say), 0 at the base.",
        category="Vertical distribution",
        rule="story_height",
        arguments=(h_x, values, heights),
        result=Result("d_below", "displacement", "value at the level below, in the unit of the values"),
        function=vertical.value_below,
        expression="the value of {values} at the level of {heights} next below {h_x}; 0 at the base",
        native=f"IF({_NEXT_LOWER}=0,0,SUMPRODUCT({_AT_NEXT}*{{values}})/SUMPRODUCT({_AT_NEXT}))",
        example=Example({"h_x": 48.0, "values": [0.4, 1.1, 1.5], "heights": [12.0, 48.0, 60.0]}, "0.4"),
    ),
)
