"""Worksheet functions of irregularities: ratios, verdicts with the type of the edition, consequences."""

from __future__ import annotations

from dataclasses import replace

from engine import irregularity
from engine.irregularity.horizontal import DIAPHRAGMS
from engine.require import YES_NO
from xlbridge.catalogue.common import SDC, TIR, edition, h_x, heights, weights
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


def _story(name: str, unit: str, text: str, symbol: str) -> Argument:
    return Argument(name, unit, text, POSITIVE, Kind.LEVELS, symbol=symbol)


h_top = replace(h_x, text="Height of the level on top of the story, above the base")
stiffnesses = _story("stiffnesses", "stiffness", "Lateral stiffnesses of all stories", "K_i")
strengths = _story("strengths", "force", "Lateral strengths of all stories", "strength_i")
dimensions = _story("dimensions", "length", "Dimensions of the force-resisting system, by story", "L_i")
drift_ratios = _story("drift_ratios", "none", "Story drift ratios, torsion left out", "r_i")
drift_exception = Argument(
    "drift_exception",
    "text",
    "No story drift ratio above 1.3 times that of the story above (12.3.2.2)",
    kind=Kind.CHOICE,
    choices=YES_NO,
)
_VERDICT = Result("verdict", "text", "type of irregularity, or none")
_STIFFNESSES = {"h_x": 12.0, "stiffnesses": [65, 100, 90, 80], "heights": [12, 24, 36, 48]}
_WEIGHTS = {"h_x": 24.0, "weights": [400, 640, 300], "heights": [12, 24, 36]}
_STRENGTHS = {"h_x": 12.0, "strengths": [64, 100, 90], "heights": [12, 24, 36]}
_DIMENSIONS = {"h_x": 12.0, "dimensions": [80, 60, 60], "heights": [12, 24, 36]}
_EXCEPTIONS = {"drift_exception": "no", "SDC": "D", "edition": "7-16"}
_OVER_ABOVE = Term("ratio", "K_x/K_above", irregularity.stiffness_ratio)
_OVER_THREE = Term("three", "K_x/K_mean of three above", irregularity.stiffness_ratio_of_three)
_WEIGHT = Term("ratio", "w_x/w_neighbour", irregularity.weight_ratio)
_STRENGTH = Term("ratio", "strength_x/strength_above", irregularity.strength_ratio)
_DIMENSION = Term("ratio", "L_x/L_neighbour", irregularity.dimension_ratio)

RATIOS = (
    SheetFunction(
        name="ELF_SOFT_RATIO",
        summary="Stiffness of a story over that of the story above; 1 at the top.",
        category="Irregularity",
        rule="soft_story",
        arguments=(h_top, stiffnesses, heights),
        result=Result("K_x/K_above", "none", "ratio of stiffnesses"),
        function=irregularity.stiffness_ratio,
        expression="{stiffnesses} at {h_x} over that at the next higher of {heights}; 1 at the top",
        example=Example(_STIFFNESSES, "0.65"),
    ),
    SheetFunction(
        name="ELF_SOFT_RATIO_THREE",
        summary="Stiffness of a story over the mean of three stories above; 1 where fewer stand above.",
        category="Irregularity",
        rule="soft_story",
        arguments=(h_top, stiffnesses, heights),
        result=Result("K_x/K_mean", "none", "ratio of stiffnesses"),
        function=irregularity.stiffness_ratio_of_three,
        expression="{stiffnesses} at {h_x} over the mean at the next three of {heights}; 1 if fewer",
        example=Example(_STIFFNESSES, "0.722"),
        note="Where fewer than three stories stand above, only the story above is compared: common practice.",
    ),
    SheetFunction(
        name="ELF_WEAK_RATIO",
        summary="Strength of a story over that of the story above; 1 at the top.",
        category="Irregularity",
        rule="weak_story",
        arguments=(h_top, strengths, heights),
        result=Result("strength ratio", "none", "ratio of strengths"),
        function=irregularity.strength_ratio,
        expression="{strengths} at {h_x} over that at the next higher of {heights}; 1 at the top",
        example=Example(_STRENGTHS, "0.64"),
    ),
    SheetFunction(
        name="ELF_WEIGHT_RATIO",
        summary="Weight of a level over the lighter one of its neighbours; a lighter roof is left out.",
        category="Irregularity",
        rule="weight_irregularity",
        arguments=(h_x, weights, heights),
        result=Result("w_x/w_neighbour", "none", "ratio of weights"),
        function=irregularity.weight_ratio,
        expression="{weights} at {h_x} over the lighter one at the next of {heights}",
        example=Example(_WEIGHTS, "1.6"),
    ),
    SheetFunction(
        name="ELF_GEOMETRY_RATIO",
        summary="Dimension of the force-resisting system in a story over the smaller one of its neighbours.",
        category="Irregularity",
        rule="geometric",
        arguments=(h_top, dimensions, heights),
        result=Result("L_x/L_neighbour", "none", "ratio of dimensions"),
        function=irregularity.dimension_ratio,
        expression="{dimensions} at {h_x} over the smaller one at the next of {heights}",
        example=Example(_DIMENSIONS, "1.333"),
    ),
    SheetFunction(
        name="ELF_DRIFT_RATIO_ABOVE",
        summary="Story drift ratio over that of the story above; 1 for the top two stories.",
        category="Irregularity",
        rule="drift_exception",
        arguments=(h_top, drift_ratios, heights),
        result=Result("r_x/r_above", "none", "ratio of story drift ratios"),
        function=irregularity.drift_comparison,
        expression="{drift_ratios} at {h_x} over that at the next higher of {heights}; 1 for the top two",
        example=Example({"h_x": 12.0, "drift_ratios": [0.013, 0.01, 0.009], "heights": [12, 24, 36]}, "1.3"),
    ),
    SheetFunction(
        name="ELF_DRIFT_EXCEPTION",
        summary="Whether the exception by story drift ratios holds for the building: yes or no.",
        category="Irregularity",
        rule="drift_exception",
        arguments=(drift_ratios, heights),
        result=Result("exception", "text", "yes or no"),
        function=irregularity.drift_exception,
        expression="no {drift_ratios} above 1.3 times that at the next higher of {heights}, the top two free",
        example=Example({"drift_ratios": [0.014, 0.01, 0.009], "heights": [12, 24, 36]}, "no"),
    ),
    SheetFunction(
        name="ELF_REENTRANT_RATIO",
        summary="Smaller one of both projections beyond a re-entrant corner, in parts of the plan dimension.",
        category="Irregularity",
        rule="reentrant",
        arguments=(
            Argument("p_x", "length", "Projection beyond the corner along x", NOT_NEGATIVE),
            Argument("p_y", "length", "Projection beyond the corner along y", NOT_NEGATIVE),
            Argument("L_x", "length", "Plan dimension along x", POSITIVE),
            Argument("L_y", "length", "Plan dimension along y", POSITIVE),
        ),
        result=Result("p/L", "none", "projection in parts of the plan dimension"),
        function=irregularity.reentrant_ratio,
        expression="min({p_x}/{L_x}; {p_y}/{L_y})",
        native="MIN({p_x}/{L_x},{p_y}/{L_y})",
        example=Example({"p_x": 30.0, "p_y": 16.0, "L_x": 120.0, "L_y": 80.0}, "0.2"),
    ),
)
VERDICTS = (
    SheetFunction(
        name="ELF_TORSION_STATUS",
        summary="Torsional irregularity of a story, with the type of the edition.",
        category="Irregularity",
        rule="TIR",
        arguments=(
            TIR,
            Argument("diaphragm", "text", "Diaphragm, by 12.3.1", kind=Kind.CHOICE, choices=DIAPHRAGMS),
            Argument(
                "one_sided",
                "text",
                "More than 75 % of a story's strength at or on one side of the centre of mass (7-22 alone)",
                kind=Kind.CHOICE,
                choices=YES_NO,
            ),
            edition,
        ),
        result=_VERDICT,
        function=irregularity.torsional_irregularity,
        expression="TIR = {TIR} against 1.2 and 1.4; diaphragm {diaphragm}; one-sided {one_sided}; {edition}",
        example=Example(
            {"TIR": 1.45, "diaphragm": "rigid or semirigid", "one_sided": "no", "edition": "7-16"},
            "Type 1b, extreme torsional",
        ),
    ),
    SheetFunction(
        name="ELF_REENTRANT_STATUS",
        summary="Re-entrant corner irregularity, with its type and limit.",
        category="Irregularity",
        rule="reentrant",
        arguments=(
            Argument("ratio", "none", "Smaller projection in parts of the plan dimension", NOT_NEGATIVE),
            edition,
        ),
        result=_VERDICT,
        function=irregularity.reentrant_irregularity,
        expression="{ratio} against the limit of {edition}",
        example=Example({"ratio": 0.18, "edition": "7-16"}, "Type 2, re-entrant corner: limit 15 %"),
    ),
    SheetFunction(
        name="ELF_DIAPHRAGM_STATUS",
        summary="Diaphragm discontinuity by openings or a change of stiffness, with its type.",
        category="Irregularity",
        rule="diaphragm_discontinuity",
        arguments=(
            Argument("opening", "none", "Open area over gross enclosed area of the diaphragm", Span(0, 1)),
            Argument(
                "change", "none", "Change of diaphragm stiffness from story to story, in parts", NOT_NEGATIVE
            ),
            edition,
        ),
        result=_VERDICT,
        function=irregularity.diaphragm_irregularity,
        expression="{opening} and {change} against 0.5, {edition}",
        example=Example(
            {"opening": 0.55, "change": 0.1, "edition": "7-22"}, "Type 3, diaphragm discontinuity"
        ),
    ),
    SheetFunction(
        name="ELF_SOFT_STATUS",
        summary="Soft story irregularity, with its type and the exception that frees it.",
        category="Irregularity",
        rule="soft_story",
        arguments=(h_top, stiffnesses, heights, drift_exception, SDC, edition),
        result=_VERDICT,
        function=irregularity.soft_story,
        expression=(
            "{ratio} against 0.70 and 0.60, {three} against 0.80 and 0.70; drift exception "
            "{drift_exception}, Seismic Design Category {SDC}, {edition}"
        ),
        example=Example({**_STIFFNESSES, **_EXCEPTIONS}, "Type 1a, soft story"),
        terms=(_OVER_ABOVE, _OVER_THREE),
    ),
    SheetFunction(
        name="ELF_WEIGHT_STATUS",
        summary="Weight irregularity, with its type and the exception that frees it; no type of 7-22.",
        category="Irregularity",
        rule="weight_irregularity",
        arguments=(h_x, weights, heights, drift_exception, SDC, edition),
        result=_VERDICT,
        function=irregularity.weight_irregularity,
        expression=(
            "{ratio} against 1.5; drift exception {drift_exception}, Seismic Design Category {SDC}, {edition}"
        ),
        example=Example({**_WEIGHTS, **_EXCEPTIONS}, "Type 2, weight"),
        terms=(_WEIGHT,),
    ),
    SheetFunction(
        name="ELF_GEOMETRY_STATUS",
        summary="Vertical geometric irregularity, with its type.",
        category="Irregularity",
        rule="geometric",
        arguments=(h_top, dimensions, heights, edition),
        result=_VERDICT,
        function=irregularity.geometric_irregularity,
        expression="{ratio} against 1.3, {edition}",
        example=Example({**_DIMENSIONS, "edition": "7-22"}, "Type 2, geometric"),
        terms=(_DIMENSION,),
    ),
    SheetFunction(
        name="ELF_WEAK_STATUS",
        summary="Weak story irregularity, with its type.",
        category="Irregularity",
        rule="weak_story",
        arguments=(h_top, strengths, heights, edition),
        result=_VERDICT,
        function=irregularity.weak_story,
        expression="{ratio} against 0.80 and 0.65, {edition}",
        example=Example({**_STRENGTHS, "edition": "7-22"}, "Type 4b, extreme weak story"),
        terms=(_STRENGTH,),
    ),
    SheetFunction(
        name="ELF_IRREGULARITY",
        summary="An irregularity that is read off the plans, with its type.",
        category="Irregularity",
        rule="judged_irregularity",
        arguments=(
            Argument("irregularity", "text", "Irregularity", kind=Kind.CHOICE, choices=irregularity.JUDGED),
            Argument("exists", "text", "Whether it exists", kind=Kind.CHOICE, choices=YES_NO),
            edition,
        ),
        result=_VERDICT,
        function=irregularity.judged_irregularity,
        expression="{irregularity}: {exists}, {edition}",
        example=Example(
            {"irregularity": "in-plane discontinuity", "exists": "yes", "edition": "7-22"},
            "Type 3, in-plane discontinuity",
        ),
    ),
    SheetFunction(
        name="ELF_CONSEQUENCE",
        summary="What an irregularity entails in a Seismic Design Category, clause by clause.",
        category="Irregularity",
        rule="consequence",
        arguments=(
            Argument(
                "irregularity", "text", "Irregularity", kind=Kind.CHOICE, choices=irregularity.IRREGULARITIES
            ),
            SDC,
            edition,
        ),
        result=Result("consequence", "text", "consequences"),
        function=irregularity.consequence,
        expression="rows of the table for {irregularity}, Seismic Design Category {SDC}, {edition}",
        example=Example(
            {"irregularity": "extreme weak story", "SDC": "D", "edition": "7-16"},
            "12.3.3.1: not permitted (from memory)",
        ),
    ),
)
FUNCTIONS = (*RATIOS, *VERDICTS)
