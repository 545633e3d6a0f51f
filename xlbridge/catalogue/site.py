"""Worksheet functions of the site: coefficients of 7-16, spectral parameters, need of a hazard analysis."""

from __future__ import annotations

from engine import hazard
from engine.require import YES_NO
from engine.tables import table
from xlbridge.catalogue.common import S_1, T
from xlbridge.catalogue.entry import (
    NOT_NEGATIVE,
    POSITIVE,
    Argument,
    Case,
    Example,
    Kind,
    Result,
    SheetFunction,
    Term,
)

S_S = Argument("S_S", "acceleration", "Mapped MCE_R spectral acceleration at short periods", NOT_NEGATIVE)
F_a = Argument("F_a", "none", "Site coefficient at short periods", POSITIVE)
T_S = Argument("T_S", "time", "Period at which the plateau of the design spectrum ends", POSITIVE)
F_v = Argument("F_v", "none", "Site coefficient at long periods", POSITIVE)
row_class = Argument(
    "site_class",
    "text",
    "Site class; F has no row",
    kind=Kind.CHOICE,
    choices=hazard.TABLE_SITE_CLASSES,
)
any_class = Argument("site_class", "text", "Site class", kind=Kind.CHOICE, choices=hazard.SITE_CLASSES)


def _exception(name: str, words: tuple[str, ...]) -> Argument:
    return Argument(name, "text", "Exception of 11.4.8 used", kind=Kind.CHOICE, choices=words)


short_exception = _exception("exception", hazard.SHORT_EXCEPTIONS)
long_exception = _exception("exception", hazard.LONG_EXCEPTIONS)
_INCREASED, _RAISED = hazard.LONG_EXCEPTIONS[1:3]


def _row(name: str, letter: str, argument: str) -> str:
    """One row of a site coefficient table in built-in functions: linear between columns, level beyond."""
    key, *columns = table(name).rows[0]
    cells = next(row for row in table(name).rows if row[key] == letter)
    if len(set(cells.values())) == 2:
        return cells[columns[0]]
    points = [(c, cells[c]) for c in columns if cells[c] != "11.4.8"]
    text = (
        points[-1][1]
        if len(points) == len(columns)
        else f"IF({{{argument}}}={points[-1][0]},{points[-1][1]},NA())"
    )
    for (low, a), (high, b) in zip(points[-2::-1], points[:0:-1], strict=True):
        line = a if a == b else f"{a}+({{{argument}}}-{low})/({high}-{low})*({b}-{a})"
        text = f"IF({{{argument}}}<{high},{line},{text})"
    return f"IF({{{argument}}}<={points[0][0]},{points[0][1]},{text})"


def _by_class(rows: dict[str, str]) -> str:
    parts = (f'IF({{site_class}}="{word}",{text},' for word, text in rows.items())
    return f"{''.join(parts)}NA(){')' * len(rows)}"


def _fa_native() -> str:
    rows = {letter: _row("site_coefficient_short", letter, "S_S") for letter in "ABCDE"}
    lifted = f'IF(AND({{exception}}="{hazard.SHORT_EXCEPTIONS[1]}",{{S_S}}>=1),{rows["C"]},{rows["E"]})'
    special = {"B not measured": "1", "D default": f"MAX(1.2,{rows['D']})", "E": lifted}
    return _by_class({word: special.get(word, rows[word[0]]) for word in hazard.TABLE_SITE_CLASSES})


def _fv_native() -> str:
    words = hazard.TABLE_SITE_CLASSES
    rows = {word: _row("site_coefficient_long", word[0], "S_1") for word in words}
    return _by_class({**rows, "B not measured": "1"})


FUNCTIONS = (
    SheetFunction(
        name="ELF_FA",
        summary="Site coefficient at short periods, by class and mapped acceleration.",
        category="Ground motion",
        rule="F_a",
        arguments=(S_S, row_class, short_exception),
        result=Result("F_a", "none", "site coefficient"),
        function=hazard.site_coefficient_short,
        expression="Table 11.4-1 for class {site_class} at S_S = {S_S}; {exception}",
        native=_fa_native(),
        example=Example({"S_S": 0.6, "site_class": "D", "exception": "none"}, "1.32"),
    ),
    SheetFunction(
        name="ELF_FV",
        summary="Site coefficient at long periods, by class and mapped acceleration.",
        category="Ground motion",
        rule="F_v",
        arguments=(S_1, row_class),
        result=Result("F_v", "none", "site coefficient"),
        function=hazard.site_coefficient_long,
        expression="Table 11.4-2 for class {site_class} at S_1 = {S_1}",
        native=_fv_native(),
        example=Example({"S_1": 0.1, "site_class": "D"}, "2.4"),
    ),
    SheetFunction(
        name="ELF_SITE_TRIGGER",
        summary="What still demands a site-specific analysis after the exceptions used, or none.",
        category="Ground motion",
        rule="hazard_analysis",
        arguments=(
            S_S,
            S_1,
            any_class,
            Argument(
                "isolated", "text", "Isolated or with damping systems", kind=Kind.CHOICE, choices=YES_NO
            ),
            _exception("short_exception", hazard.SHORT_EXCEPTIONS),
            _exception("long_exception", hazard.LONG_EXCEPTIONS),
            Argument("T", "time", "Longest period used in design, either direction", POSITIVE),
            T_S,
        ),
        result=Result("trigger", "text", "triggers that no exception lifts"),
        function=hazard.analysis_triggers,
        expression=(
            "triggers of 11.4.8 at S_S = {S_S}, S_1 = {S_1}, class {site_class}, isolated {isolated}, "
            "not lifted by {short_exception}, nor by {long_exception} with T = {T} and T_S = {T_S}"
        ),
        example=Example(
            {
                **{"S_S": 1.2, "S_1": 0.5, "site_class": "E", "isolated": "no"},
                **{"short_exception": "none", "long_exception": "exception 3: T at most T_S"},
                **{"T": 0.4, "T_S": 0.9},
            },
            "class E with S_S at least 1.0",
        ),
    ),
    SheetFunction(
        name="ELF_SMS",
        summary="MCE_R spectral acceleration at short periods for the site class.",
        category="Ground motion",
        rule="S_MS",
        arguments=(S_S, F_a),
        result=Result("S_MS", "acceleration", "MCE_R spectral acceleration"),
        function=hazard.mce_parameter_short,
        expression="{F_a}·{S_S}",
        native="{F_a}*{S_S}",
        example=Example({"S_S": 1.75, "F_a": 0.9}, "1.575"),
    ),
    SheetFunction(
        name="ELF_SM1",
        summary="MCE_R spectral acceleration at 1 s for the site class.",
        category="Ground motion",
        rule="S_M1",
        arguments=(S_1, F_v, long_exception),
        result=Result("S_M1", "acceleration", "MCE_R spectral acceleration"),
        function=hazard.mce_parameter_one_second,
        expression="{increase}·{F_v}·{S_1}",
        native=f'IF({{exception}}="{_RAISED}",1.5,1)*{{F_v}}*{{S_1}}',
        example=Example({"S_1": 0.45, "F_v": 1.4, "exception": "none"}, "0.63"),
        terms=(
            Term(
                "increase",
                "increase (1.5 by exception 2 of Supplement 3, else 1)",
                lambda exception: hazard.mce_parameter_one_second(1.0, 1.0, exception),
            ),
        ),
    ),
    SheetFunction(
        name="ELF_SDS",
        summary="Design spectral acceleration at short periods.",
        category="Ground motion",
        rule="S_DS",
        arguments=(
            Argument("S_MS", "acceleration", "MCE_R spectral acceleration at short periods", POSITIVE),
        ),
        result=Result("S_DS", "acceleration", "design spectral acceleration"),
        function=hazard.design_parameter_short,
        expression="2/3·{S_MS}",
        native="2/3*{S_MS}",
        example=Example({"S_MS": 1.5}, "1.0"),
    ),
    SheetFunction(
        name="ELF_SD1",
        summary="Design spectral acceleration at 1 s.",
        category="Ground motion",
        rule="S_D1",
        arguments=(Argument("S_M1", "acceleration", "MCE_R spectral acceleration at 1 s", POSITIVE),),
        result=Result("S_D1", "acceleration", "design spectral acceleration"),
        function=hazard.design_parameter_one_second,
        expression="2/3·{S_M1}",
        native="2/3*{S_M1}",
        example=Example({"S_M1": 0.9}, "0.6"),
    ),
    SheetFunction(
        name="ELF_CS_INCREASE",
        summary="Factor on the upper bound of C_s where exception 2 is used as first printed; 1 otherwise.",
        category="Ground motion",
        rule="C_s_increase",
        arguments=(T, T_S, long_exception),
        result=Result("factor", "none", "factor on min(plateau; cap)"),
        function=hazard.coefficient_increase,
        cases=(
            Case(
                "min(max({T}/{T_S}; 1); 1.5)",
                "the exception is {exception}",
                lambda exception: exception == _INCREASED,
            ),
            Case("1", "the exception is {exception}", lambda: True),
        ),
        native=f'IF({{exception}}="{_INCREASED}",MIN(MAX({{T}}/{{T_S}},1),1.5),1)',
        example=Example({"T": 0.75, "T_S": 0.6, "exception": _INCREASED}, "1.25"),
        note="Multiplies min(plateau; cap) before the minimums of C_s are applied.",
    ),
)
