"""What the catalogue declares is what the engine does: names, order, spans, words, defaults, docstrings."""

from __future__ import annotations

import inspect
import re
from typing import Any

import pytest

from engine.errors import EngineError
from tests.support.sheet_cases import (
    ENTRIES,
    PLACES,
    as_cells,
    example,
    full,
    ident,
    inside,
    named,
    outside,
    placed,
    with_cell,
)
from xlbridge import adapter
from xlbridge.catalogue import CATALOGUE
from xlbridge.catalogue.entry import Argument, Kind, SheetFunction, Span
from xlbridge.catalogue.validate import printed
from xlbridge.values import CellError

#: calls that workbooks in use rely on: a change breaks their formulas
FIXED = """
ELF_EXPONENT(T, [rule])
ELF_CVX(w_x, h_x, weights, heights, k)
ELF_FX(V, C_vx)
ELF_VX(h_x, forces, heights)
ELF_MX(h_x, forces, heights)
ELF_TA(h_n, system, units)
ELF_CU(S_D1)
ELF_SA(T, S_DS, S_D1, T_L)
ELF_CS(S_DS, S_D1, S_1, T, T_L, R, I_e, edition)
ELF_FPX(w_px, h_x, forces, weights, heights, S_DS, I_e)
ELF_DRIFT(d_upper, d_lower, C_d, I_e)
ELF_DRIFT_LIMIT(h_sx, structure, risk_category, [rho])
ELF_THETA(P_x, Delta, I_e, V_x, h_sx, C_d)
ELF_THETA_MAX(C_d, [beta])
ELF_AX(d_max, d_avg)
"""
NUMBERS = [(entry, argument) for entry, argument in PLACES if argument.kind is not Kind.CHOICE]
WORDS = [(entry, argument) for entry, argument in PLACES if argument.kind is Kind.CHOICE]
OUTSIDE = [(entry, a, number) for entry, a in NUMBERS for number in outside(a)]
INSIDE = [(entry, a, number) for entry, a in NUMBERS for number in inside(a)]

UNIT_WORDS = {
    "none": "-",
    "any": "any unit",
    "time": "s",
    "acceleration": "g",
    "length": "ft or m",
    "area": "ft2 or m2",
    "velocity": "ft/s or m/s",
    "unit load": "psf or kN/m2",
    "displacement": "in or mm",
    "force": "kip or kN",
    "moment": "kip-ft or kN-m",
    "stiffness": "kip/in or kN/mm",
}
#: the formula is a ratio of lengths there: any unit serves, and the worksheet asks for the drift's
OTHER_UNIT = {("ELF_DRIFT_LIMIT", "h_sx"): "ft or m"}
#: documented by reference to another formula, or in words only
NO_UNIT = {("ELF_BELOW", "values")}


def call(entry: SheetFunction, arguments: dict[str, Any]) -> Any:
    return adapter.call(entry, as_cells(entry, arguments))


@pytest.mark.parametrize("usage", FIXED.split("\n")[1:-1])
def test_fixed_name_and_order(usage: str) -> None:
    assert CATALOGUE[usage.partition("(")[0]].usage == usage


@pytest.mark.parametrize("entry", ENTRIES, ids=ident)
def test_example_reproduces_at_its_printed_digits(entry: SheetFunction) -> None:
    found = call(entry, example(entry))
    assert type(found) is (str if entry.is_text else float)
    assert printed(found, entry.example.result) == entry.example.result


def test_numbers_outside_are_known_for_most_arguments() -> None:
    unbounded = {argument.name for _, argument in NUMBERS if not outside(argument)}
    assert unbounded == {
        *("forces", "displacements", "values", "delta_xe", "d_upper", "d_lower"),
        *("x_M", "x_R", "centers", "positions", "distances", "d_i", "M_t", "Delta_1", "Delta_2", "Delta_cm"),
        *("Q_E", "D", "E_v", "E_h", "L", "S", "delta_e", "z_x", "z_0"),
    }


@pytest.mark.parametrize(("entry", "argument", "number"), OUTSIDE, ids=ident)
def test_a_number_outside_its_span_is_refused(
    entry: SheetFunction, argument: Argument, number: float
) -> None:
    found = call(entry, placed(entry, argument.name, number))
    assert isinstance(found, CellError), found
    assert found.code in ("#NUM!", "#N/A")
    assert found.reason.startswith(f"{entry.name}: ")
    assert f"{number:.6g}" in found.reason
    assert argument.name in found.reason


@pytest.mark.parametrize(("entry", "argument", "number"), INSIDE, ids=ident)
def test_a_number_inside_its_span_is_accepted(
    entry: SheetFunction, argument: Argument, number: float
) -> None:
    found = call(entry, placed(entry, argument.name, number))
    assert not isinstance(found, CellError), found.reason


@pytest.mark.parametrize(("entry", "argument"), WORDS, ids=ident)
def test_each_word_is_accepted_and_no_other(entry: SheetFunction, argument: Argument) -> None:
    for word in argument.choices:
        assert not isinstance(adapter.call(entry, with_cell(entry, argument, word)), CellError)
    for word in ("nowhere", f"{argument.choices[0]} ", argument.choices[-1].swapcase() + "?"):
        found = adapter.call(entry, with_cell(entry, argument, word))
        assert found == CellError("#N/A")
        assert repr(word) in found.reason
        assert all(allowed in found.reason for allowed in named(argument))


@pytest.mark.parametrize("entry", [e for e in ENTRIES if e.defaults], ids=ident)
def test_an_argument_left_out_takes_its_default(entry: SheetFunction) -> None:
    left_out = {name: value for name, value in full(entry).items() if name not in entry.defaults}
    assert call(entry, left_out) == call(entry, {**left_out, **entry.defaults})
    for argument in entry.arguments:
        if argument.optional:
            others = [w for w in argument.choices if w != entry.defaults[argument.name]] or [
                n for n in (0.5, 1.3) if n in argument.span
            ]
            assert call(entry, {**left_out, argument.name: others[0]}) != call(entry, left_out)


@pytest.mark.parametrize("entry", ENTRIES, ids=ident)
def test_docstring_lists_the_arguments_with_their_units(entry: SheetFunction) -> None:
    listed = documented(entry)
    assert list(listed) == [a.name for a in entry.arguments]
    for argument in entry.arguments:
        text = listed[argument.name]
        if argument.kind is Kind.CHOICE or (entry.name, argument.name) in NO_UNIT or "as for" in text:
            continue
        unit = re.search(r"\[([^\],]+)", text)
        assert unit, text
        expected = OTHER_UNIT.get((entry.name, argument.name), UNIT_WORDS[argument.unit])
        assert unit[1].startswith(expected), text


@pytest.mark.parametrize("entry", ENTRIES, ids=ident)
def test_docstring_states_the_lower_end_of_each_span(entry: SheetFunction) -> None:
    for name, text in documented(entry).items():
        span = next(a.span for a in entry.arguments if a.name == name)
        stated = re.search(r"\][^;]*?\b(above|at least) (\d+)", text)
        if stated:
            assert span.low == float(stated[2]), text
            assert span.low_open == (stated[1] == "above"), text


def documented(entry: SheetFunction) -> dict[str, str]:
    """The lines of the Parameters section by argument; a line may stand for several."""
    doc = inspect.getdoc(entry.function) or ""
    section = re.split(r"\n(?=\S)", doc.split("Parameters\n", 1)[1], maxsplit=1)[0]
    found: dict[str, str] = {}
    for names, text in re.findall(r"(?m)^    (\w[\w, ]*): (.*(?:\n      .*)*)", section):
        found.update(dict.fromkeys(re.split(r",\s*", names), text))
    return found


@pytest.mark.parametrize(
    ("span", "text", "within", "without"),
    [
        (Span(), "any number", (-1e9, 0.0, 1e9), ()),
        (Span(0), "at least 0", (0.0, 5.0), (-1e-9,)),
        (Span(0, low_open=True), "above 0", (1e-9,), (0.0, -1.0)),
        (Span(1, 2), "at least 1 and at most 2", (1.0, 2.0), (0.999, 2.001)),
        (Span(0, 1, high_open=True), "at least 0 and below 1", (0.0, 0.999), (1.0, -0.1)),
        (Span(None, 3), "at most 3", (3.0, -1e9), (3.1,)),
    ],
)
def test_span(span: Span, text: str, within: tuple[float, ...], without: tuple[float, ...]) -> None:
    assert str(span) == text
    assert all(number in span for number in within)
    assert not any(number in span for number in without)


def test_the_engine_refuses_by_itself() -> None:
    """The spans are no wall of the adapter: the formulas refuse without it."""
    for entry, argument, number in OUTSIDE:
        with pytest.raises(EngineError):
            entry.function(**placed(entry, argument.name, number))
