"""Every worksheet function through every front end, valid, at its edges and with each kind of bad input."""

from __future__ import annotations

import json
from collections.abc import Sequence
from pathlib import Path
from typing import Any

import numpy as np
import pytest
from openpyxl import Workbook
from openpyxl.utils import get_column_letter
from openpyxl.worksheet.formula import ArrayFormula
from openpyxl.worksheet.worksheet import Worksheet

from engine.errors import EngineError
from tests.support.command import ROOT, python
from tests.support.conformance import (
    DEPARTURES,
    FRONTS,
    KINDS,
    MANY,
    NO_CELLS,
    Call,
    agrees,
    calls,
    counts,
    table,
)
from tests.support.office import Office
from xlbridge.calc.names import for_calc
from xlbridge.catalogue import CATALOGUE
from xlbridge.headless.compute import compute
from xlbridge.values import OMITTED, CellError, Scalar, Value

CALLS = tuple(calls())
Answers = Sequence[tuple[Call, Value]]
#: what each front end gave, for the table below the results
RESULTS: dict[str, Answers] = {}
ERRORS = {"#N/A": "=NA()", "#DIV/0!": "=1/0"}


def test_no_function_and_no_kind_is_missing() -> None:
    assert {call.entry.name for call in CALLS} == set(CATALOGUE)
    assert set(counts()) == set(KINDS)
    everywhere = {call.entry.name: {c.kind for c in CALLS if c.entry is call.entry} for call in CALLS}
    for name, entry in CATALOGUE.items():
        assert {"worked example", "blank", "error value"} <= everywhere[name], name
        if any(argument.choices for argument in entry.arguments):
            assert "unknown word" in everywhere[name], name


def test_valid_calls_give_values_and_bad_ones_errors() -> None:
    for call in CALLS:
        if call.kind == "worked example":
            assert not isinstance(call.expected, CellError), call
        if call.kind in ("text that looks like a number", "number for a word", "unknown word", "error value"):
            assert errors(call.expected), call


def errors(value: Value) -> bool:
    """Whether a value, or each cell of it, is an error."""
    if isinstance(value, tuple):
        return all(errors(cell) for row in value for cell in row)
    return isinstance(value, CellError)


def test_python() -> None:
    answers = [(call, from_python(call)) for call in CALLS if call.kind not in NO_CELLS]
    check("Python", answers)


def from_python(call: Call) -> Value:
    """The engine's function called with numbers and words, errors as the cell error they stand for."""
    given = {
        argument.name: _plain(value)
        for argument, value in zip(call.entry.arguments, call.arguments, strict=True)
        if value is not OMITTED
    }
    try:
        with np.errstate(all="raise"):
            found = call.entry.function(**given)
    except EngineError as error:
        found = CellError(error.cell_code)
    except (FloatingPointError, OverflowError):
        found = CellError("#NUM!")
    if isinstance(call.expected, tuple):
        rows = len(call.expected)
        cells = [found] * rows if isinstance(found, CellError) else np.broadcast_to(found, rows).tolist()
        return tuple((cell,) for cell in cells)
    return found if isinstance(found, CellError | str) else _scalar(found)


def _scalar(found: Any) -> Scalar:
    value = np.asarray(found).item()
    return value if isinstance(value, str) else float(value)


def _plain(value: Any) -> Any:
    return [cell for (cell,) in value] if isinstance(value, tuple) else value


@pytest.fixture(scope="module")
def workbook(tmp_path_factory: pytest.TempPathFactory) -> tuple[Path, dict[int, str]]:
    """A workbook of all calls, their arguments in cells, and where each result begins."""
    book = Workbook()
    sheet, places, row = book.active, {}, 1
    for n in range(MANY):
        sheet.cell(n + 1, 40, float(n + 1))
    for number, call in enumerate(CALLS):
        places[number] = f"A{row}"
        row += _lay(sheet, row, call) + 1
    path = tmp_path_factory.mktemp("conformance") / "calls.xlsx"
    book.save(path)
    return path, places


def _lay(sheet: Worksheet, row: int, call: Call) -> int:
    """Write a call from a row on, and return how many rows it takes."""
    texts, height = [], 1
    for place, value in enumerate(call.arguments, 2):
        texts.append(_argument(sheet, row, place, value))
        rows = len(value) if isinstance(value, tuple) else 1
        height = max(height, rows if rows < MANY else 1)
    formula = f"={call.entry.name}({','.join(texts)})"
    if isinstance(call.expected, tuple):
        height = max(height, len(call.expected))
        sheet.cell(row, 1, ArrayFormula(f"A{row}:A{row + len(call.expected) - 1}", formula))
    else:
        sheet.cell(row, 1, formula)
    return height


def _argument(sheet: Worksheet, row: int, place: int, value: Any) -> str:
    if value is OMITTED:
        return ""
    if isinstance(value, tuple) and len(value) == MANY:
        return f"AN$1:AN${MANY}"
    cells = [cell for (cell,) in value] if isinstance(value, tuple) else [value]
    for n, cell in enumerate(cells):
        sheet.cell(row + n, place, ERRORS[cell.code] if isinstance(cell, CellError) else cell)
    letter = get_column_letter(place)
    return f"{letter}{row}:{letter}{row + len(cells) - 1}" if isinstance(value, tuple) else f"{letter}{row}"


def answers_of(values: dict[tuple[str, str], Scalar], places: dict[int, str]) -> Answers:
    """The results of all calls, read from the cells of the workbook."""
    found = []
    for number, call in enumerate(CALLS):
        row = int(places[number][1:])
        cells = len(call.expected) if isinstance(call.expected, tuple) else 0
        grid = tuple((values["Sheet", f"A{row + n}"],) for n in range(cells))
        found.append((call, grid if cells else values["Sheet", places[number]]))
    return found


def test_headless(workbook: tuple[Path, dict[int, str]]) -> None:
    path, places = workbook
    computed = compute(path)
    assert not computed.not_evaluated
    check("headless", answers_of(computed.values, places))


def test_calc(workbook: tuple[Path, dict[int, str]], office_with_addin: Office) -> None:
    path, places = workbook
    copy = path.with_name("calc.xlsx")
    copy.write_bytes(for_calc(path.read_bytes()))
    check("Calc", answers_of(office_with_addin.values(copy), places))


def test_excels_path() -> None:
    """xlwings' own Windows code up to the layer below Python, in a process that believes in Windows."""
    sent = json.dumps([[call.entry.name, [_sent(value) for value in call.arguments]] for call in CALLS])
    done = python("-m", "tests.support.windows_calls", cwd=ROOT, stdin=sent)
    assert done.returncode == 0, done.stderr
    found = [
        _received(value, call.expected) for value, call in zip(json.loads(done.stdout), CALLS, strict=True)
    ]
    check("Excel's path", list(zip(CALLS, found, strict=True)))


def _sent(value: Any) -> Any:
    if isinstance(value, tuple):
        return [[_sent(cell) for cell in row] for row in value]
    if isinstance(value, CellError):
        return {"error": value.code}
    return {"omitted": True} if value is OMITTED else value


def _received(value: Any, like: Value) -> Value:
    """A value as xlwings hands it back: an error is a text that starts with its code."""
    if isinstance(value, list):
        rows = value if isinstance(value[0], list) else [[cell] for cell in value]
        return tuple(tuple(_received(cell, None) for cell in row) for row in rows)
    if isinstance(value, str) and value.startswith("#"):
        return CellError(value.partition(" ")[0])
    return value


def check(front: str, answers: Answers) -> None:
    """Each call agrees, or departs as declared; the answers go into the table."""
    RESULTS[front] = answers
    wrong = [
        (call.entry.name, call.kind, call.arguments, found, call.expected)
        for call, found in answers
        if not agrees(found, _due(front, call))
    ]
    assert wrong == []
    assert len(answers) > 1000


def _due(front: str, call: Call) -> Value:
    departure = DEPARTURES.get((front, call.kind))
    return departure.gives(call) if departure else call.expected


@pytest.mark.parametrize(("front", "kind"), DEPARTURES)
def test_a_departure_is_one(front: str, kind: str) -> None:
    departure = DEPARTURES[front, kind]
    assert front in FRONTS
    assert any(not agrees(departure.gives(call), call.expected) for call in CALLS if call.kind == kind)


def test_the_matrix_is_printed_with_every_kind_and_every_front_that_ran() -> None:
    lines = list(table(RESULTS))
    assert len(lines) == 1 + len(KINDS) + len(DEPARTURES)
