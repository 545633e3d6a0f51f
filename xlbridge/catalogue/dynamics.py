"""Worksheet functions of the shear building: story stiffness, its modes and what they hold of the mass."""

from __future__ import annotations

from typing import Any, Final

from engine import dynamics
from xlbridge.catalogue.common import forces, h_at, h_x, heights, units, weights
from xlbridge.catalogue.entry import (
    POSITIVE,
    Argument,
    Example,
    Kind,
    Result,
    SheetFunction,
    Span,
    Term,
)

STORIES: Final = "Story stiffness"
MODAL: Final = "Modal response"

stiffnesses = Argument(
    "stiffnesses",
    "stiffness",
    "Stiffness of the story below each level",
    POSITIVE,
    Kind.LEVELS,
    symbol="k_i",
)
displacements = Argument(
    "displacements",
    "displacement",
    "Elastic displacements of all levels under the forces",
    kind=Kind.LEVELS,
    symbol="delta_ei",
)
mode = Argument("mode", "none", "Number of the mode, whole, 1 for the longest period", Span(1), symbol="m")
modes = Argument("modes", "none", "How many modes, from the first on, whole", Span(1))
MODEL = (weights, stiffnesses, heights)

#: five equal stories in kip and in
FIVE: Final = {
    "weights": [100.0] * 5,
    "stiffnesses": [31.54] * 5,
    "heights": [12.0, 24.0, 36.0, 48.0, 60.0],
}


def _ordinates(mode: Any, weights: Any, stiffnesses: Any, heights: Any) -> Any:
    return dynamics.mode_shape(mode, heights, weights, stiffnesses, heights)


PHI = Term("phi", "phi_im", _ordinates)

FUNCTIONS = (
    SheetFunction(
        name="ELF_DELTA_XE",
        summary="Elastic displacement of a level of a shear building, from its story forces and stiffnesses.",
        category=STORIES,
        rule="story_stiffness",
        arguments=(h_at, forces, stiffnesses, heights),
        result=Result("delta_xe", "displacement", "elastic displacement"),
        function=dynamics.elastic_displacement,
        expression="Σ of V_i/{stiffnesses} up to {h_x}, V_i the sum of {forces} at and above {heights}",
        native=(
            # a blank row counts nothing, and divides by 1
            "SUMPRODUCT(({heights}>0)*({heights}<={h_x}*(1+1E-9))"
            '*SUMIF({heights},">="&{heights}*(1-1E-9),{forces})/({stiffnesses}+({heights}=0))/(({heights}=0)'
            '+COUNTIFS({heights},">="&{heights}*(1-1E-9),{heights},"<="&{heights}*(1+1E-9))))'
        ),
        example=Example(
            {
                "h_x": 24.0,
                "forces": [10.0, 20.0, 30.0],
                "stiffnesses": [60.0, 50.0, 30.0],
                "heights": [12.0, 24.0, 36.0],
            },
            "2",
        ),
        note="Levels at one height stand on one story: give each the same stiffness.",
    ),
    SheetFunction(
        name="ELF_STORY_STIFFNESS",
        summary="Stiffness of the story below a level, from story forces and the displacements they cause.",
        category=STORIES,
        rule="story_stiffness",
        arguments=(h_x, forces, displacements, heights),
        result=Result("k_x", "stiffness", "story stiffness"),
        function=dynamics.story_stiffness,
        expression="Σ of {forces} where {heights} ≥ {h_x}, over the step of {displacements} below {h_x}",
        example=Example(
            {
                "h_x": 36.0,
                "forces": [20.0, 10.0, 30.0],
                "displacements": [2.0, 1.0, 3.0],
                "heights": [24.0, 12.0, 36.0],
            },
            "30",
        ),
    ),
    SheetFunction(
        name="ELF_MODE_PERIOD",
        summary="Period of a mode of the shear building.",
        category=MODAL,
        rule="modes",
        arguments=(mode, *MODEL, units),
        result=Result("T_m", "time", "period of the mode"),
        function=dynamics.mode_period,
        expression=(
            "2π·√(Σ({weights}·{phi}²)/(g·Σ({stiffnesses}·step of {phi}²))) up {heights}, mode {mode}, {units}"
        ),
        example=Example({"mode": 1.0, **FIVE, "units": "us"}, "2.00"),
        terms=(PHI,),
    ),
    SheetFunction(
        name="ELF_MODE_SHAPE",
        summary="Ordinate of a mode's shape at a level; the largest ordinate of the mode is 1.",
        category=MODAL,
        rule="modes",
        arguments=(mode, h_x, *MODEL),
        result=Result("phi_xm", "none", "ordinate of the shape"),
        function=dynamics.mode_shape,
        expression="ordinate at {h_x} of mode {mode} of {weights} on {stiffnesses} at {heights}",
        example=Example({"mode": 1.0, "h_x": 12.0, **FIVE}, "0.285"),
    ),
    SheetFunction(
        name="ELF_MODE_PARTICIPATION",
        summary="Participation factor of a mode, for its shape with 1 as the largest ordinate.",
        category=MODAL,
        rule="modes",
        arguments=(mode, *MODEL),
        result=Result("Gamma_m", "none", "participation factor"),
        function=dynamics.mode_participation,
        expression="Σ({weights}·{phi})/Σ({weights}·{phi}²)",
        example=Example({"mode": 1.0, **FIVE}, "1.252"),
        terms=(PHI,),
    ),
    SheetFunction(
        name="ELF_MODE_MASS",
        summary="Part of the total mass that moves in a mode (effective modal mass).",
        category=MODAL,
        rule="modes",
        arguments=(mode, *MODEL),
        result=Result("W_m/W", "none", "effective modal mass over the total mass"),
        function=dynamics.mode_weight_share,
        expression="(Σ({weights}·{phi}))²/(Σ({weights}·{phi}²)·Σ({weights}))",
        example=Example({"mode": 1.0, **FIVE}, "0.8795"),
        terms=(PHI,),
    ),
    SheetFunction(
        name="ELF_MODE_MASS_SUM",
        summary="Part of the total mass that moves in the first modes together.",
        category=MODAL,
        rule="modes",
        arguments=(modes, *MODEL),
        result=Result("ΣW_m/W", "none", "effective modal mass of the modes over the total mass"),
        function=dynamics.modes_weight_share,
        expression="Σ of W_m/W, first to last of {modes}, of {weights} on {stiffnesses} at {heights}",
        example=Example({"modes": 2.0, **FIVE}, "0.967"),
    ),
    SheetFunction(
        name="ELF_MODES_NEEDED",
        summary="How many modes, from the first on, hold a given part of the mass.",
        category=MODAL,
        rule="modes",
        arguments=(
            Argument("share", "none", "Part of the mass, 0.9 for 90 %", Span(0, 1, low_open=True)),
            *MODEL,
        ),
        result=Result("N_m", "none", "number of modes"),
        function=dynamics.modes_needed,
        expression="least number of modes of {weights} on {stiffnesses} at {heights} with ΣW_m/W ≥ {share}",
        example=Example({"share": 0.9, **FIVE}, "2"),
    ),
    SheetFunction(
        name="ELF_MODES_STATUS",
        summary="Whether the first modes hold enough of the mass, in words.",
        category=MODAL,
        rule="modes",
        arguments=(modes, *MODEL, units),
        result=Result("status", "text", "consequence"),
        function=dynamics.modes_verdict,
        expression="{held}, first to last of {modes}, against 1 and 0.90; next T_m against 0.05 s, {units}",
        example=Example(
            {"modes": 2.0, **FIVE, "units": "us"},
            "at least 90 % of the weight: enough by the exception",
        ),
        terms=(Term("held", "ΣW_m/W", dynamics.modes_weight_share),),
    ),
)
