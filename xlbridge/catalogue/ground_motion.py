"""Worksheet functions of the design spectrum and the importance factor."""

from __future__ import annotations

from engine import hazard, occupancy
from xlbridge.catalogue.common import S_D1, S_DS, T_L, risk_category
from xlbridge.catalogue.entry import NOT_NEGATIVE, Argument, Case, Example, Result, SheetFunction, Term

T_0 = Term("T_0", "T_0", hazard.corner_period_T0)
T_S = Term("T_S", "T_S", hazard.corner_period_TS)


def _importance_native() -> str:
    words = occupancy.RISK_CATEGORIES
    parts = (f'IF({{risk_category}}="{c}",{occupancy.importance_factor(c):g},' for c in words)
    return f"{''.join(parts)}NA(){')' * len(words)}"


FUNCTIONS = (
    SheetFunction(
        name="ELF_IE",
        summary="Importance factor of a risk category.",
        category="Ground motion",
        rule="I_e",
        arguments=(risk_category,),
        result=Result("I_e", "none", "importance factor"),
        function=occupancy.importance_factor,
        expression="table row of risk category {risk_category}",
        native=_importance_native(),
        example=Example({"risk_category": "III"}, "1.25"),
    ),
    SheetFunction(
        name="ELF_T0",
        summary="Period at which the plateau of the design spectrum begins.",
        category="Ground motion",
        rule="T_0",
        arguments=(S_DS, S_D1),
        result=Result("T_0", "time", "corner period"),
        function=hazard.corner_period_T0,
        expression="0.2·{S_D1}/{S_DS}",
        native="0.2*{S_D1}/{S_DS}",
        example=Example({"S_DS": 1.0, "S_D1": 0.6}, "0.12"),
    ),
    SheetFunction(
        name="ELF_TS",
        summary="Period at which the plateau of the design spectrum ends.",
        category="Ground motion",
        rule="T_S",
        arguments=(S_DS, S_D1),
        result=Result("T_S", "time", "corner period"),
        function=hazard.corner_period_TS,
        expression="{S_D1}/{S_DS}",
        native="{S_D1}/{S_DS}",
        example=Example({"S_DS": 1.0, "S_D1": 0.6}, "0.60"),
    ),
    SheetFunction(
        name="ELF_SA",
        summary="Design spectral acceleration of the two-period spectrum at a period.",
        category="Ground motion",
        rule="S_a",
        arguments=(Argument("T", "time", "Period, 0 allowed", NOT_NEGATIVE), S_DS, S_D1, T_L),
        result=Result("S_a", "acceleration", "design spectral acceleration"),
        function=hazard.spectral_acceleration,
        cases=(
            Case("{S_DS}·(0.4 + 0.6·{T}/{T_0})", "{T} < {T_0}", lambda T, T_0: T < T_0),
            Case("{S_DS}", "{T_0} ≤ {T} ≤ {T_S}", lambda T, T_S: T <= T_S),
            Case("{S_D1}/{T}", "{T_S} < {T} ≤ {T_L}", lambda T, T_L: T <= T_L),
            Case("{S_D1}·{T_L}/{T}²", "{T} > {T_L}", lambda: True),
        ),
        native=(
            "IF({T}<0.2*{S_D1}/{S_DS},{S_DS}*(0.4+3*{T}*{S_DS}/{S_D1}),"
            "IF({T}<={S_D1}/{S_DS},{S_DS},IF({T}<={T_L},{S_D1}/{T},{S_D1}*{T_L}/{T}^2)))"
        ),
        example=Example({"T": 1.2, "S_DS": 1.0, "S_D1": 0.6, "T_L": 8.0}, "0.50"),
        terms=(T_0, T_S),
    ),
)
