"""Worksheet functions of the fundamental period."""

from __future__ import annotations

from itertools import pairwise

from engine import period
from engine.tables import table
from xlbridge.catalogue.common import S_D1, question, units
from xlbridge.catalogue.entry import (
    POSITIVE,
    Argument,
    Case,
    Example,
    Kind,
    Result,
    SheetFunction,
    Span,
    Term,
)

system = Argument(
    "system", "text", "Row of the approximate period table", kind=Kind.CHOICE, choices=period.PERIOD_SYSTEMS
)


def _C_t(system: str, units: str) -> float:
    return table("period_coefficients").entry("system", system, f"C_t_{units}")


def _x(system: str) -> float:
    return table("period_coefficients").entry("system", system, "x")


def _ta_native() -> str:
    parts = [
        f'IF({{system}}="{s}",IF({{units}}="us",{_C_t(s, "us"):g},{_C_t(s, "si"):g})*{{h_n}}^{_x(s):g},'
        for s in period.PERIOD_SYSTEMS
    ]
    return f"{''.join(parts)}NA(){')' * len(parts)}"


def _cu_native() -> str:
    """Linear between the rows of the table, constant outside it."""
    printed = table("upper_limit_coefficient")
    rows = sorted(zip(printed.column("S_D1"), printed.column("C_u"), strict=True))
    parts = [f"IF({{S_D1}}<={rows[0][0]:g},{rows[0][1]:g},"]
    for (s0, c0), (s1, c1) in pairwise(rows):
        parts.append(f"IF({{S_D1}}<={s1:g},{c0:g}+({{S_D1}}-{s0:g})*({c1 - c0:.10g})/({s1 - s0:.10g}),")
    return f"{''.join(parts)}{rows[-1][1]:g}{')' * len(parts)}"


T_a = Argument("T_a", "time", "Approximate fundamental period", POSITIVE)
T_computed = Argument("T_computed", "time", "Period from a structural analysis", POSITIVE)
h_n = Argument("h_n", "length", "Structural height, in ft (us) or m (si)", POSITIVE)
C_u = Argument("C_u", "none", "Coefficient for the upper limit on the period", Span(1))

FUNCTIONS = (
    SheetFunction(
        name="ELF_TA",
        summary="Approximate fundamental period from the height of the structure.",
        category="Period",
        rule="T_a",
        arguments=(
            h_n,
            system,
            units,
        ),
        result=Result("T_a", "time", "approximate fundamental period"),
        function=period.approximate_period,
        expression="{C_t}·{h_n}^{x}",
        native=_ta_native(),
        example=Example({"h_n": 60.0, "system": "all other", "units": "us"}, "0.43"),
        terms=(
            Term("C_t", "C_t", _C_t),
            Term("x", "x", _x),
        ),
    ),
    SheetFunction(
        name="ELF_TA_STORIES",
        summary="Approximate period 0.1 N of moment frames: at most 12 stories of 10 ft (3 m) on average.",
        category="Period",
        rule="T_a_stories",
        arguments=(Argument("N", "none", "Number of stories above the base", Span(1, 12)),),
        result=Result("T_a", "time", "approximate fundamental period"),
        function=period.approximate_period_stories,
        expression="0.1·{N}",
        native="0.1*{N}",
        example=Example({"N": 7.0}, "0.7"),
    ),
    SheetFunction(
        name="ELF_CU",
        summary="Coefficient for the upper limit on the calculated period.",
        category="Period",
        rule="C_u",
        arguments=(S_D1,),
        result=Result("C_u", "none", "coefficient for the upper limit"),
        function=period.upper_limit_coefficient,
        expression="table at S_D1 = {S_D1}, linear between its rows",
        native=_cu_native(),
        example=Example({"S_D1": 0.25}, "1.45"),
    ),
    SheetFunction(
        name="ELF_PERIOD",
        summary="Period used for strength: the computed period, at most C_u T_a.",
        category="Period",
        rule="T_max",
        arguments=(T_a, C_u, T_computed),
        result=Result("T", "time", "fundamental period"),
        function=period.design_period,
        expression="min({T_computed}; {C_u}·{T_a})",
        native="MIN({T_computed},{C_u}*{T_a})",
        example=Example({"T_a": 1.052, "C_u": 1.4, "T_computed": 2.462}, "1.473"),
    ),
    SheetFunction(
        name="ELF_TA_STORIES_STATUS",
        summary="Whether the approximate period may be taken as 0.1 N.",
        category="Period",
        rule="T_a_stories",
        arguments=(
            Argument("N", "none", "Number of stories above the base", Span(1)),
            h_n,
            question("frames", "Whether moment frames of concrete or steel alone resist the force"),
            units,
        ),
        result=Result("status", "text", "conditions of the formula"),
        function=period.stories_formula_status,
        expression="{N} stories on {h_n} ({units}), moment frames alone: {frames}",
        example=Example(
            {"N": 14.0, "h_n": 126.0, "frames": "yes", "units": "us"},
            "not permitted: more than 12 stories; average story height below 10 ft",
        ),
    ),
    SheetFunction(
        name="ELF_PERIOD_GOVERNS",
        summary="Whether the computed period or its upper limit C_u T_a is used for strength.",
        category="Period",
        rule="T_max",
        arguments=(T_a, C_u, T_computed),
        result=Result("governs", "text", "what gives the period"),
        function=period.period_bound,
        expression="what sets min({T_computed}; {C_u}·{T_a})",
        native=(
            f'IF({{T_computed}}>{{C_u}}*{{T_a}}*(1+1E-12),"{period.PERIOD_BOUNDS[1]}",'
            f'"{period.PERIOD_BOUNDS[0]}")'
        ),
        example=Example({"T_a": 1.052, "C_u": 1.4, "T_computed": 2.462}, "upper limit C_u T_a"),
    ),
    SheetFunction(
        name="ELF_PERIOD_DRIFT",
        summary="Period for drift alone: the computed one, with or without its upper limit C_u T_a.",
        category="Period",
        rule="drift_period",
        arguments=(
            *(T_a, C_u, T_computed),
            Argument(
                "cap",
                "text",
                "Whether the relief for drift is used",
                kind=Kind.CHOICE,
                choices=period.DRIFT_PERIODS,
            ),
        ),
        result=Result("T", "time", "period for drift"),
        function=period.drift_period,
        cases=(
            Case("{T_computed}", "it is taken {cap}", lambda cap: cap == "without the cap"),
            Case("min({T_computed}; {C_u}·{T_a})", "it is taken {cap}", lambda: True),
        ),
        native='IF({cap}="without the cap",{T_computed},MIN({T_computed},{C_u}*{T_a}))',
        example=Example({"T_a": 1.052, "C_u": 1.4, "T_computed": 2.462, "cap": "without the cap"}, "2.462"),
    ),
)
