"""Every refusal of a declaration, planted on a copy of a good one."""

from __future__ import annotations

from dataclasses import replace
from typing import Any

import pytest

from engine.vertical import exponent, story_force
from tests.support.sheet_cases import ENTRIES, ident
from xlbridge.catalogue import CATALOGUE, DeclarationError, gather, validate
from xlbridge.catalogue.entry import Argument, Example, Kind, Result, SheetFunction, Span, Term
from xlbridge.catalogue.validate import TEXT_LIMIT, describe, places, printed

GOOD = CATALOGUE["ELF_FX"]
WITH_OPTION = CATALOGUE["ELF_EXPONENT"]


def argument(**changes: Any) -> SheetFunction:
    """ELF_FX with its first argument changed, and its function to match a changed name."""
    first = replace(GOOD.arguments[0], **changes)
    if first.name == "V":
        return replace(GOOD, arguments=(first, *GOOD.arguments[1:]))
    taken: dict[str, Any] = {}
    exec(f"def taken({first.name}, C_vx): return {first.name} * C_vx", taken)
    return replace(GOOD, arguments=(first, *GOOD.arguments[1:]), function=taken["taken"])


def same_but_for_case(v: float, V: float) -> float:
    return v * V


T, RULE = WITH_OPTION.arguments
WRONG = {
    "small letters": (replace(GOOD, name="ELF_Fx"), "a worksheet name is"),
    "another prefix": (replace(GOOD, name="FX"), "a worksheet name is"),
    "no word after the prefix": (replace(GOOD, name="ELF_"), "a worksheet name is"),
    "digit first": (replace(GOOD, name="ELF_1X"), "a worksheet name is"),
    "another order": (
        replace(GOOD, arguments=GOOD.arguments[::-1]),
        r"arguments \['C_vx', 'V'\], but the engine function takes \['V', 'C_vx'\]",
    ),
    "an argument less": (replace(GOOD, arguments=GOOD.arguments[:1]), "but the engine function takes"),
    "differ by case": (
        replace(
            GOOD,
            arguments=(replace(GOOD.arguments[0], name="v"), GOOD.arguments[0]),
            function=same_but_for_case,
        ),
        "differ by case only",
    ),
    "not optional in the engine": (argument(optional=True), "argument V: optional flag and default"),
    "optional in the engine": (
        replace(WITH_OPTION, arguments=(T, replace(RULE, optional=False))),
        "argument rule: optional flag and default",
    ),
    "illegal name": (argument(name="_V"), "argument _V: not a legal name"),
    "name as an address": (argument(name="V1"), "argument V1: not a legal name, or it reads as a cell"),
    "name as a row and column": (argument(name="R1C1"), "reads as a cell address"),
    "name as a row": (argument(name="RC"), "reads as a cell address"),
    "unknown unit": (argument(unit="kip"), "argument V: unknown unit 'kip'"),
    "number with words": (argument(choices=("a", "b")), "argument V: a choice lists its words"),
    "choice without words": (argument(kind=Kind.CHOICE, unit="text"), "argument V: a choice lists its words"),
    "choice that is no text": (
        argument(kind=Kind.CHOICE, choices=("a",)),
        "argument V: a choice is text, nothing else is",
    ),
    "number that is text": (argument(unit="text"), "argument V: a choice is text"),
    "empty span": (argument(span=Span(2, 2)), "argument V: the allowed range is empty"),
    "no summary": (replace(GOOD, summary=""), "summary is empty"),
    "long summary": (replace(GOOD, summary="x" * (TEXT_LIMIT + 1)), "summary is empty or longer than 255"),
    "long description": (argument(text="x" * TEXT_LIMIT), "V is empty or longer than 255"),
    "unknown unit of the result": (
        replace(GOOD, result=Result("F_x", "lbf", "story force")),
        "result: unknown unit 'lbf'",
    ),
    "term and argument of one name": (
        replace(GOOD, terms=(Term("V", "V", story_force),)),
        "term 'V' has the name of an argument",
    ),
    "no expression": (replace(GOOD, expression=""), "no expression"),
    "unknown place": (replace(GOOD, expression="{C_vx}·{W}"), r"expression: unknown place \{W\}"),
    "term in the native formula": (
        replace(GOOD, native="{C_vx}*{W}", terms=(Term("W", "W", story_force),)),
        r"native: unknown place \{W\}",
    ),
    "unknown rule": (replace(GOOD, rule="F_y"), "rule 'F_y': .*not a rule of any edition"),
    "example out of range": (
        replace(GOOD, example=Example({"V": -1.0, "C_vx": 0.5}, "1")),
        "the example fails: V = -1",
    ),
    "example incomplete": (replace(GOOD, example=Example({"V": 1.0}, "1")), "the example fails: .*C_vx"),
    "example of another result": (
        replace(GOOD, example=Example({"V": 286.0, "C_vx": 0.28}, "80.2")),
        "the example gives 80.08.*, but 80.2 is declared",
    ),
    "example of other words": (
        replace(CATALOGUE["ELF_PDELTA_STATUS"], example=Example({"theta": 0.05, "theta_max": 0.2}, "other")),
        "but other is declared",
    ),
}


@pytest.mark.parametrize(("entry", "fault"), WRONG.values(), ids=WRONG)
def test_a_wrong_declaration_is_refused(entry: SheetFunction, fault: str) -> None:
    with pytest.raises(DeclarationError, match=fault) as caught:
        validate(entry)
    assert str(caught.value).startswith(f"{entry.name}: ")


@pytest.mark.parametrize("entry", ENTRIES, ids=ident)
def test_a_good_one_is_handed_back(entry: SheetFunction) -> None:
    assert validate(entry) is entry


def test_optional_arguments_come_last() -> None:
    first: Argument = replace(T, optional=True)
    second = replace(RULE, optional=False)

    def taken(T: float = 1.0, *, rule: str) -> Any:
        return exponent(T, rule)

    with pytest.raises(DeclarationError, match="optional arguments come last"):
        validate(replace(WITH_OPTION, arguments=(first, second), function=taken))


def test_a_name_is_declared_once() -> None:
    with pytest.raises(DeclarationError, match="ELF_FX: declared twice"):
        gather([GOOD, WITH_OPTION, GOOD])
    assert list(gather([GOOD, WITH_OPTION])) == ["ELF_FX", "ELF_EXPONENT"]


def test_the_catalogue_cannot_be_changed() -> None:
    with pytest.raises(TypeError):
        CATALOGUE["ELF_NEW"] = GOOD  # type: ignore[index]


@pytest.mark.parametrize(
    ("value", "like", "text"),
    [(80.08, "80.1", "80.1"), (1.0, "1", "1"), (0.04375, "0.0438", "0.0437"), ("words", "0.1", "words")],
)
def test_printed(value: Any, like: str, text: str) -> None:
    assert printed(value, like) == text


def test_places() -> None:
    assert places("{a}·{b}^{k} / Σ({a})") == {"a", "b", "k"}
    assert places("no place") == set()


def test_descriptions() -> None:
    texts = {a.name: describe(a) for a in CATALOGUE["ELF_CVX"].arguments}
    assert texts["weights"].endswith("[a force unit], one cell a level, at least 0.")
    assert texts["k"] == "Distribution exponent [no unit], at least 1 and at most 2."
    assert describe(RULE).endswith(": interpolate, two.")
    assert describe(T) == "Fundamental period [s], above 0."
