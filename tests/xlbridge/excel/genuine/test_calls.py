"""Every worksheet function through ``XLPython().CallUDF``, against the adapter called directly."""

from __future__ import annotations

from collections.abc import Iterator
from decimal import Decimal
from typing import Any

import pytest
import xlwings as xw

from engine.version import __version__
from tests.support.windows_stubs import ERRORS, MISSING, ComRange, ComTime, column, excel_call, row
from xlbridge import adapter
from xlbridge.catalogue import CATALOGUE
from xlbridge.catalogue.entry import Kind, SheetFunction
from xlbridge.excel import functions
from xlbridge.values import OMITTED, CellError

MODULE = "xlbridge.excel.functions"
#: name -> the value as COM hands it over, and as the adapter takes it
CELLS: dict[str, tuple[Any, Any]] = {
    "blank": (None, None),
    "text of no characters": ("", ""),
    "text": ("roof", "roof"),
    "text that looks like a number": ("12", "12"),
    "text that looks like an error": ("#N/A", "#N/A"),
    "true": (True, True),
    "currency": (Decimal("12.5"), 12.5),
    "date": (ComTime(2024, 7, 22, 12), 45495.5),
    "negative": (-1.0, -1.0),
    "zero": (0.0, 0.0),
    **{code: (number, CellError(code)) for code, number in ERRORS.items()},
}
ENTRIES = list(CATALOGUE.values())
PLACES = [(entry, place) for entry in ENTRIES for place in range(len(entry.arguments))]


def identifier(value: object) -> str | None:
    return value.name if isinstance(value, SheetFunction) else None


def example(entry: SheetFunction) -> list[Any]:
    """The example's arguments as the adapter takes them."""
    return [_given(entry.example.arguments.get(argument.name, OMITTED)) for argument in entry.arguments]


def _given(value: Any) -> Any:
    if isinstance(value, list):
        return tuple((float(cell),) for cell in value)
    return float(value) if isinstance(value, int) else value


def as_com(value: Any) -> Any:
    """The same argument as Excel hands it over: a range, or nothing."""
    if value is OMITTED:
        return MISSING
    return ComRange(value if not isinstance(value, tuple) or len(value) > 1 else value[0][0])


def same(found: Any, expected: Any) -> None:
    """What comes back is the adapter's value in Excel's terms."""
    if isinstance(expected, tuple):
        rows = found if isinstance(found[0], list) else [found]
        assert len(rows) == len(expected)
        for cells, wanted in zip(rows, expected, strict=True):
            for cell, want in zip(cells, wanted, strict=True):
                same(cell, want)
    elif isinstance(expected, CellError):
        assert isinstance(found, str)
        assert found.partition(" ")[0] == expected.code
        if expected.reason:
            assert found == f"{expected.code} {expected.reason}"
    else:
        assert type(found) is type(expected)
        assert found == expected


def test_the_decorators_are_the_real_ones() -> None:
    assert xw.func is xw.udfs.xlfunc
    for entry in ENTRIES:
        known = getattr(functions, entry.name).__xlfunc__
        assert [a["name"] for a in known["args"]] == [a.name for a in entry.arguments]
        assert [a["optional"] is OMITTED for a in known["args"] if "optional" in a] == [
            True for a in entry.arguments if a.optional
        ]
        assert known["volatile"] is False
        assert all(len(text) <= 255 for text in (known["ret"]["doc"], *(a["doc"] for a in known["args"])))


@pytest.mark.parametrize("entry", ENTRIES, ids=identifier)
def test_the_example_gives_the_adapters_value(entry: SheetFunction) -> None:
    arguments = example(entry)
    expected = adapter.call(entry, arguments)
    assert not isinstance(expected, CellError)
    same(excel_call(MODULE, entry.name, *map(as_com, arguments)), expected)


@pytest.mark.parametrize("entry", ENTRIES, ids=identifier)
def test_values_instead_of_references(entry: SheetFunction) -> None:
    arguments = example(entry)
    plain = [MISSING if value is OMITTED else value for value in arguments]
    same(excel_call(MODULE, entry.name, *plain), adapter.call(entry, arguments))


@pytest.mark.parametrize("entry", ENTRIES, ids=identifier)
def test_levels_in_a_row_and_as_a_row_of_constants(entry: SheetFunction) -> None:
    arguments = example(entry)
    expected = adapter.call(entry, arguments)
    lying = [tuple(cell for (cell,) in value) if isinstance(value, tuple) else value for value in arguments]
    as_rows = [row(*value) if isinstance(value, tuple) else as_com(value) for value in lying]
    constants = [value if isinstance(value, tuple) else as_com(value) for value in lying]
    same(excel_call(MODULE, entry.name, *as_rows), expected)
    same(excel_call(MODULE, entry.name, *constants), expected)


@pytest.mark.parametrize("content", CELLS)
@pytest.mark.parametrize(("entry", "place"), PLACES, ids=identifier)
def test_any_content_in_any_argument(entry: SheetFunction, place: int, content: str) -> None:
    handed, meant = CELLS[content]
    arguments = example(entry)
    if isinstance(arguments[place], tuple):
        rest = arguments[place][1:]
        cell, arguments[place] = ComRange(((handed,), *rest)), ((meant,), *rest)
    else:
        cell, arguments[place] = ComRange(handed), meant
    given = list(map(as_com, arguments))
    given[place] = cell
    same(excel_call(MODULE, entry.name, *given), adapter.call(entry, arguments))


def ranges(entry: SheetFunction) -> Iterator[tuple[int, Any]]:
    for place, (argument, value) in enumerate(zip(entry.arguments, example(entry), strict=True)):
        if argument.kind is Kind.NUMBER and value is not OMITTED:
            yield place, value


@pytest.mark.parametrize("entry", [e for e in ENTRIES if any(ranges(e))], ids=identifier)
@pytest.mark.parametrize("make", [column, row])
def test_a_range_gives_a_value_a_cell_and_bad_cells_their_own_error(entry: SheetFunction, make: Any) -> None:
    for place, value in ranges(entry):
        arguments = example(entry)
        cells = (value, ERRORS["#DIV/0!"], "text", value, None)
        meant = (value, CellError("#DIV/0!"), "text", value, None)
        arguments[place] = tuple((cell,) for cell in meant) if make is column else (meant,)
        given = list(map(as_com, arguments))
        given[place] = make(*cells)
        found = excel_call(MODULE, entry.name, *given)
        expected = adapter.call(entry, arguments)
        same(found, expected)
        flat = [cell[0] for cell in found] if make is column else found
        assert type(flat[0]) in (float, str)
        assert flat[1].startswith("#DIV/0!")
        assert flat[2].startswith("#VALUE!")
        assert flat[4].startswith("#VALUE!")


@pytest.mark.parametrize(
    ("entry", "place"), [(e, p) for e, p in PLACES if e.arguments[p].optional], ids=identifier
)
def test_an_argument_left_out_is_not_a_blank_cell(entry: SheetFunction, place: int) -> None:
    left_out, blank = example(entry), example(entry)
    left_out[place], blank[place] = OMITTED, None
    assert not isinstance(adapter.call(entry, left_out), CellError)
    same(excel_call(MODULE, entry.name, *map(as_com, left_out)), adapter.call(entry, left_out))
    found = excel_call(MODULE, entry.name, *map(as_com, blank))
    assert found.startswith("#VALUE! ")


@pytest.mark.parametrize("entry", ENTRIES, ids=identifier)
def test_nothing_handed_back_is_blank_or_no_number(entry: SheetFunction) -> None:
    for content in (None, "", float("nan"), float("inf"), float("-inf")):
        found = excel_call(MODULE, entry.name, *(content for _ in entry.arguments))
        assert isinstance(found, str)
        assert found.startswith("#")


def test_a_whole_number_from_a_macro_is_a_number() -> None:
    assert excel_call(MODULE, "ELF_EXPONENT", 1) == excel_call(MODULE, "ELF_EXPONENT", 1.0) == 1.25


def test_an_error_value_of_tomorrow_is_an_error() -> None:
    assert excel_call(MODULE, "ELF_EXPONENT", 0x800A0000 - 2**32 + 2099).startswith("#VALUE!")


def test_a_kind_of_value_that_no_cell_has_is_an_error() -> None:
    assert excel_call(MODULE, "ELF_EXPONENT", object()).startswith("#VALUE!")


def test_the_versions_are_those_that_run_here() -> None:
    module = "xlbridge.excel.versions"
    assert excel_call(module, "STORYLEDGER_VERSION", "storyledger") == __version__
    assert excel_call(module, "STORYLEDGER_VERSION", as_com("xlwings")) == xw.__version__
    assert excel_call(module, "STORYLEDGER_VERSION", "numpy").startswith("#N/A ")
