"""The work shown: every argument stands in the equation, terms are the engine's, the arithmetic holds."""

from __future__ import annotations

import inspect
import re
from typing import Any

import numpy as np
import pytest

from engine import base_shear, diaphragm, hazard
from tests.support.sheet_cases import ENTRIES, as_cells, example, full, ident, random_calls
from xlbridge import adapter, work
from xlbridge.catalogue import CATALOGUE
from xlbridge.catalogue.entry import Case, Kind, SheetFunction
from xlbridge.catalogue.validate import places
from xlbridge.values import OMITTED, CellError

#: decides nothing but the equation number
WITHOUT_NUMBER = {
    (name, "edition")
    for name in (
        *("ELF_CS", "ELF_CS_GOVERNS", "ELF_CS_DRIFT", "ELF_CS_DRIFT_GOVERNS", "ELF_CS_MULTI"),
        *("ELF_CS_MULTI_GOVERNS", "ELF_CS_DRIFT_MULTI", "ELF_CS_DRIFT_MULTI_GOVERNS"),
    )
}
#: written in words, since they choose between branches, look up a table or search a column
IN_WORDS = {
    *("ELF_FA", "ELF_FV", "ELF_SA_MULTI", "ELF_SA_METHOD1"),
    *("ELF_SDS_MULTI", "ELF_SD1_MULTI"),
    *("ELF_IE", "ELF_CU", "ELF_BETA"),
    *(
        "ELF_VX",
        "ELF_MX",
        "ELF_HSX",
        "ELF_BELOW",
    ),
    *(
        "ELF_SYSTEM_R",
        "ELF_SYSTEM_OMEGA",
        "ELF_SYSTEM_CD",
    ),
    *("ELF_LEAST_R_VALUE", "ELF_SDS_CAP"),
    *("ELF_MT", "ELF_MTA", "ELF_TIR", "ELF_SOFT_RATIO", "ELF_SOFT_RATIO_THREE"),
    *("ELF_WEAK_RATIO", "ELF_WEIGHT_RATIO", "ELF_GEOMETRY_RATIO", "ELF_DRIFT_RATIO_ABOVE", "ELF_RHO"),
    *(
        "ELF_RHO_USE",
        "ELF_COMBINATION_FACTOR",
    ),
    *("ELF_COLLECTOR", "ELF_ZS", "ELF_RS", "ELF_CS_HIGHER", "ELF_CPN"),
    *("ELF_DELTA_MT", "ELF_RIGIDITY_CENTER", "ELF_WALL_DIRECT"),
    # sums along the chain of stories, or over all pairs of modes
    *("ELF_DELTA_XE", "ELF_STORY_STIFFNESS", "ELF_MODE_PERIOD", "ELF_MODE_SHAPE", "ELF_MODE_PARTICIPATION"),
    *("ELF_MODE_MASS", "ELF_MODE_MASS_SUM", "ELF_MODES_NEEDED", "ELF_MODE_SHEAR"),
    *("ELF_MODE_DISPLACEMENT", "ELF_MODE_DRIFT", "ELF_CQC", "ELF_MODAL_SHEAR", "ELF_MODAL_DRIFT"),
}
ARITHMETIC = [entry for entry in ENTRIES if not entry.is_text and entry.name not in IN_WORDS]


@pytest.mark.parametrize("entry", ENTRIES, ids=ident)
def test_the_equation_names_every_argument(entry: SheetFunction) -> None:
    equation = work.equation(entry)
    assert equation.startswith(f"{entry.result.symbol} = ")
    assert "{" not in equation
    shown = places(entry.expression)
    asked = [*(t.compute for t in entry.terms if t.name in shown), *(c.holds for c in entry.cases)]
    used = {name for function in asked for name in inspect.signature(function).parameters}
    assert {term.name for term in entry.terms} <= shown
    for argument in entry.arguments:
        assert argument.name in shown | used or (entry.name, argument.name) in WITHOUT_NUMBER
        if argument.name in shown:
            assert argument.symbol in equation


@pytest.mark.parametrize("entry", ENTRIES, ids=ident)
def test_the_numbers_of_the_example_stand_in_it(entry: SheetFunction) -> None:
    cells = as_cells(entry, example(entry))
    result = adapter.call(entry, cells)
    line = work.numbers_line(entry, cells, result)
    case = work.case_of(entry, cells)
    assert line.startswith(f"{entry.result.symbol} = {work.numbers(entry, cells)} = {work.shown(result)}")
    assert line.endswith(f" = {work.shown(result)}") is not bool(entry.cases)
    assert "{" not in line
    for argument in entry.arguments:
        value = full(entry)[argument.name]
        if argument.name in places(f"{case.expression} {case.where}" if case else entry.expression):
            shown = str(value) if argument.kind is Kind.CHOICE else f"{np.ravel(value)[0]:.6g}"
            assert re.search(rf"(?<![\w.]){re.escape(shown)}(?![\w.])", line), (argument.name, line)


@pytest.mark.parametrize("entry", ENTRIES, ids=ident)
def test_a_changed_argument_changes_its_number(entry: SheetFunction) -> None:
    call = full(entry)
    case = work.case_of(entry, as_cells(entry, call))
    before = work.numbers(entry, as_cells(entry, call))
    for argument in entry.arguments:
        if argument.kind is Kind.NUMBER and argument.name in places((case or entry).expression):
            after = work.numbers(entry, as_cells(entry, {**call, argument.name: call[argument.name] * 1.01}))
            assert after != before


CASES = [(entry, case) for entry in ENTRIES for case in entry.cases]


@pytest.mark.parametrize(("entry", "case"), CASES, ids=[f"{e.name}: {c.expression}" for e, c in CASES])
def test_every_case_is_met(entry: SheetFunction, case: Case) -> None:
    """By random calls, in which the line's arithmetic gives the result: see the test of the arithmetic."""
    calls = random_calls(entry, 400, 11)
    assert any(work.case_of(entry, as_cells(entry, call)) is case for call in calls)


@pytest.mark.parametrize("entry", ENTRIES, ids=ident)
def test_nothing_is_named_twice(entry: SheetFunction) -> None:
    assert not re.search(r"(?<!\w)(\w+)( =|:)? \(?\1(?!\w)", work.equation(entry).partition(" = ")[2])


def value_of(numbers: str) -> float:
    """What the line works out to, read as arithmetic."""
    text = re.sub(r"\|([^|]*)\|", r"abs(\1)", numbers).replace(", at most 1", "")
    text = text.replace("Σ(", "np.sum(")
    text = re.sub(r"\[([^\]]*)\]", r"np.array([\1])", text)
    for ours, theirs in (("·", "*"), ("^", "**"), ("²", "**2"), (";", ",")):
        text = text.replace(ours, theirs)
    return float(eval(text, {"np": np, "abs": abs, "max": max, "min": min}))


def six_digits(call: dict[str, Any]) -> dict[str, Any]:
    """The call with every number as the line shows it."""

    def cut(value: Any) -> Any:
        if isinstance(value, list):
            return [cut(number) for number in value]
        return float(work.shown(value)) if isinstance(value, float) else value

    return {name: cut(value) for name, value in call.items()}


@pytest.mark.parametrize("entry", ARITHMETIC, ids=ident)
def test_the_arithmetic_with_the_numbers_put_in_gives_the_result(entry: SheetFunction) -> None:
    """On numbers of six digits, which are shown in full; short ranges are shown whole."""
    seen = 0
    for call in map(six_digits, random_calls(entry, 40, 7)):
        if any(isinstance(value, list) and len(value) > 4 for value in call.values()):
            continue
        cells = as_cells(entry, call)
        expected = adapter.call(entry, cells)
        assert value_of(work.numbers(entry, cells)) == pytest.approx(expected, rel=1e-3, abs=1e-9)
        seen += 1
    assert seen > 9


def test_the_terms_of_the_response_coefficient() -> None:
    entry = CATALOGUE["ELF_CS"]
    call = {**example(entry), "T": 2.0}
    plateau = base_shear.coefficient_plateau(S_DS=1.0, R=8.0, I_e=1.0)
    cap = base_shear.coefficient_cap(S_D1=0.6, T=2.0, T_L=8.0, R=8.0, I_e=1.0)
    assert [f"{v:g}" for v in (plateau, cap)] == ["0.125", "0.0375"]
    assert work.numbers(entry, as_cells(entry, call)) == "max(min(0.125; 0.0375); 0.044; 0.0375)"


def test_the_terms_of_the_others() -> None:
    def line(name: str) -> str:
        entry = CATALOGUE[name]
        return work.numbers(entry, as_cells(entry, example(entry)))

    def whole(name: str) -> str:
        entry = CATALOGUE[name]
        cells = as_cells(entry, example(entry))
        return work.numbers_line(entry, cells, adapter.call(entry, cells))

    entry = CATALOGUE["ELF_FPX"]
    given = {k: v for k, v in example(entry).items() if k not in ("S_DS", "I_e")}
    assert line("ELF_FPX").startswith(f"min(max({diaphragm.unlimited_force(**given):.6g}; 0.2·0.6·1·650)")
    assert hazard.corner_period_TS(1.0, 0.6) == 0.6
    assert line("ELF_SA") == "0.6/1.2"
    assert whole("ELF_SA") == "S_a = 0.6/1.2 = 0.5, where 0.6 < 1.2 ≤ 8"
    assert line("ELF_TA") == "0.02·60^0.75"
    assert line("ELF_DRIFT_LIMIT") == "0.02·144/1"
    assert line("ELF_BETA") == "max(0.3; 1.25/2.5), at most 1"


def test_an_argument_left_out_shows_its_default() -> None:
    entry = CATALOGUE["ELF_THETA_MAX"]
    assert work.numbers(entry, [5.5]) == work.numbers(entry, [5.5, OMITTED]) == "min(0.5/(1·5.5); 0.25)"


def test_ranges_of_which_a_cell_is_bad() -> None:
    """The work of the others is shown; a term that cannot be worked out is left open."""
    entry = CATALOGUE["ELF_CS"]
    cells = [((1.0,), (-1.0,)), 0.6, 0.6, 1.5, 8.0, 8.0, 1.0, "7-22"]
    assert work.numbers(entry, cells) == "max(min(…; 0.05); …; 0.0375)"
    entry = CATALOGUE["ELF_TA"]
    words = (("all other", "steel moment frame"),)
    assert work.numbers(entry, [60.0, words, "us"]) == "…·60^…"
    entry = CATALOGUE["ELF_DRIFT"]
    assert work.numbers(entry, [1.0, ((CellError("#N/A"),), ("x",)), 5.5, 1.0]) == "5.5·|1 - [#N/A, x]|/1"


@pytest.mark.parametrize(
    ("value", "text"),
    [
        (286.0, "286"),
        (0.123456789, "0.123457"),
        (1e-9, "1e-09"),
        (7, "7"),
        ("7-22", "7-22"),
        (CellError("#NUM!"), "#NUM!"),
        (((1.0,), (2.0,), (None,), (3.0,)), "[1, 2, 3]"),
        (((1.0, 2.0), (3.0, 4.0)), "[1, 2, 3, 4]"),
        (((1.0, 2.0, 3.0, 4.0, 5.0),), "[1, 2, …, 5]"),
        (np.array([1.0, 2.0]), "[1, 2]"),
        (np.float64(0.5), "0.5"),
        (np.array(0.5), "0.5"),
    ],
)
def test_shown(value: Any, text: str) -> None:
    assert work.shown(value) == text
