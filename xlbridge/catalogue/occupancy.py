"""Worksheet functions of the Seismic Design Category."""

from __future__ import annotations

from collections.abc import Callable
from typing import Any

from engine import occupancy
from engine.require import YES_NO
from xlbridge.catalogue.common import S_1, S_D1, S_DS, risk_category
from xlbridge.catalogue.entry import Argument, Example, Kind, Result, SheetFunction, Term
from xlbridge.catalogue.site import S_S

_SHORT = "1+({S_DS}>=0.167*(1-1E-12))+({S_DS}>=0.33*(1-1E-12))+({S_DS}>=0.5*(1-1E-12))"
_LONG = "1+({S_D1}>=0.067*(1-1E-12))+({S_D1}>=0.133*(1-1E-12))+({S_D1}>=0.2*(1-1E-12))"
_LETTERS = (
    'IF({risk_category}="IV","ACDD",'
    'IF(OR({risk_category}="I",{risk_category}="II",{risk_category}="III"),"ABCD",NA()))'
)
_EXAMPLE = {"S_DS": 0.30, "S_D1": 0.15, "S_1": 0.1, "risk_category": "II"}
_SDC = Result("SDC", "text", "Seismic Design Category")
_TABLES = (
    Term("short", "Table 11.6-1", occupancy.category_short),
    Term("long", "Table 11.6-2", occupancy.category_one_second),
)


def _condition(name: str, text: str) -> Argument:
    return Argument(name, "text", text, kind=Kind.CHOICE, choices=YES_NO)


_ALONE = Argument(
    "alone",
    "text",
    "Whether Table 11.6-1 decides alone; no if left out",
    kind=Kind.CHOICE,
    choices=YES_NO,
    optional=True,
)


def _category(
    name: str, summary: str, function: Callable[..., Any], result: str, native: str
) -> SheetFunction:
    return SheetFunction(
        name=name,
        summary=summary,
        category="Seismic design category",
        rule="SDC",
        arguments=(S_DS, S_D1, S_1, risk_category, _ALONE),
        result=_SDC if native else Result("reason", "text", "governing rule"),
        function=function,
        expression="the worse of {short} and {long}; {short} if alone ({alone}); E or F if {S_1} ≥ 0.75",
        native=native,
        example=Example(_EXAMPLE, result),
        terms=_TABLES,
    )


FUNCTIONS = (
    SheetFunction(
        name="ELF_SDC_SDS",
        summary="Seismic Design Category by the acceleration at short periods alone.",
        category="Seismic design category",
        rule="SDC_short",
        arguments=(S_DS, risk_category),
        result=_SDC,
        function=occupancy.category_short,
        expression="Table 11.6-1 at S_DS = {S_DS}, risk category {risk_category}",
        native=f"MID({_LETTERS},{_SHORT},1)",
        example=Example({"S_DS": 0.30, "risk_category": "IV"}, "C"),
    ),
    SheetFunction(
        name="ELF_SDC_SD1",
        summary="Seismic Design Category by the acceleration at 1 s alone.",
        category="Seismic design category",
        rule="SDC_one_second",
        arguments=(S_D1, risk_category),
        result=_SDC,
        function=occupancy.category_one_second,
        expression="Table 11.6-2 at S_D1 = {S_D1}, risk category {risk_category}",
        native=f"MID({_LETTERS},{_LONG},1)",
        example=Example({"S_D1": 0.15, "risk_category": "II"}, "C"),
    ),
    SheetFunction(
        name="ELF_SDC_ALONE",
        summary="Whether the table at short periods may decide alone on the Seismic Design Category.",
        category="Seismic design category",
        rule="SDC_alone",
        arguments=(
            S_1,
            _condition("T_a_below", "T_a below 0.8 T_S in both directions"),
            _condition("T_drift_below", "Period used for drift below T_S in both directions"),
            _condition("plateau_used", "C_s taken as S_DS/(R/I_e)"),
            _condition(
                "rigid_diaphragms", "Diaphragms rigid, or vertical elements at most 40 ft (12.2 m) apart"
            ),
        ),
        result=Result("alone", "text", "yes or no"),
        function=occupancy.short_table_alone,
        expression=(
            "yes if {S_1} < 0.75 and all of {T_a_below}, {T_drift_below}, {plateau_used}, "
            "{rigid_diaphragms} are yes"
        ),
        native=(
            'IF(AND({S_1}<0.75,{T_a_below}="yes",{T_drift_below}="yes",{plateau_used}="yes",'
            '{rigid_diaphragms}="yes"),"yes","no")'
        ),
        example=Example(
            {
                **{"S_1": 0.1, "T_a_below": "yes", "T_drift_below": "yes"},
                **{"plateau_used": "yes", "rigid_diaphragms": "yes"},
            },
            "yes",
        ),
    ),
    _category(
        "ELF_SDC",
        "Seismic Design Category.",
        occupancy.design_category,
        "C",
        (
            'IF({S_1}>=0.75,IF({risk_category}="IV","F",'
            'IF(OR({risk_category}="I",{risk_category}="II",{risk_category}="III"),"E",NA())),'
            f'MID({_LETTERS},MAX({_SHORT},IF({{alone}}="yes",1,{_LONG})),1))'
        ),
    ),
    _category(
        "ELF_SDC_REASON",
        "The rule or table that gives the Seismic Design Category.",
        occupancy.design_category_reason,
        "Table 11.6-2 (S_D1); Table 11.6-1 (S_DS) gives B",
        "",
    ),
    SheetFunction(
        name="ELF_SDC_A_PERMITTED",
        summary="Whether Seismic Design Category A is permitted by the mapped accelerations alone.",
        category="Seismic design category",
        rule="SDC_A",
        arguments=(S_S, S_1),
        result=Result("permitted", "text", "yes or no"),
        function=occupancy.category_A_permitted,
        expression="yes if {S_S} ≤ 0.15 and {S_1} ≤ 0.04",
        native='IF(AND({S_S}<=0.15,{S_1}<=0.04),"yes","no")',
        example=Example({"S_S": 0.12, "S_1": 0.04}, "yes"),
    ),
)
