"""One workbook of formulas for two evaluators, and how their values are compared."""

from __future__ import annotations

import math
import re
import tomllib
from collections.abc import Mapping, Sequence
from pathlib import Path
from typing import Any

from openpyxl import Workbook
from openpyxl.worksheet.formula import ArrayFormula

from xlbridge.headless.book import Book
from xlbridge.headless.evaluate import Evaluator
from xlbridge.values import CellError

#: numbers, texts, a bit of everything, ascending numbers, numbers and errors, decimals, logicals.
DATA: Mapping[str, Sequence[Any]] = {
    "A": [1, 2.5, -3, 4, 0, 10, 7.25, 100],
    "B": ["alpha", "Beta", "gamma", "3", None, "12", "delta x", "BETA"],
    "C": [5, "text", None, True, 0.25, None, "7", 12],
    "D": [1, 2, 3, 5, 8, 13, 21, 34],
    "E": [1, "#N/A", 3, "#DIV/0!", 5, 6, 7, 8],
    "F": [0.1, 0.2, 0.3, 1.005, 2.675, -1.5, 1e-6, 123456.789],
    "G": [True, False, True, None, None, None, None, None],
}
#: how many rows and columns the result of an array formula is given.
BLOCK = 3
_LATER_FUNCTIONS = re.compile(
    r"(?<![\w.])(IFS|SWITCH|IFNA|XOR|CONCAT|TEXTJOIN|MINIFS|MAXIFS|STDEV\.[SP]|VAR\.[SP]|RANK\.EQ|"
    r"PERCENTILE\.INC|QUARTILE\.INC|MODE\.SNGL|CEILING\.MATH|FLOOR\.MATH|FORECAST\.LINEAR|DAYS|XLOOKUP|XMATCH)\("
)


def write(formulas: Sequence[str], path: Path) -> dict[str, list[tuple[str, str]]]:
    """Write the formulas, ``{=…}`` as array formulas; return the cells (sheet, address) of each."""
    book = Workbook()
    data, plain, arrays = book.active, book.create_sheet("Plain"), book.create_sheet("Arrays")
    data.title = "Data"
    for column, values in DATA.items():
        for row, value in enumerate(values, 1):
            data[f"{column}{row}"] = value
    cells: dict[str, list[tuple[str, str]]] = {}
    for row, formula in enumerate(formulas, 1):
        text = _LATER_FUNCTIONS.sub(r"_xlfn.\1(", formula)
        if formula.startswith("{"):
            top = BLOCK * row
            arrays[f"A{top}"] = ArrayFormula(f"A{top}:C{top + BLOCK - 1}", text[1:-1])
            cells[formula] = [
                ("Arrays", f"{column}{top + down}") for down in range(BLOCK) for column in "ABC"
            ]
        else:
            plain[f"A{row}"] = text
            cells[formula] = [("Plain", f"A{row}")]
    book.save(path)
    return cells


def ours(path: Path) -> dict[tuple[str, str], Any]:
    """The headless evaluator's values; a cell that is not evaluated holds the reason as an exception."""
    results = Evaluator(Book.open(path), {}).evaluate_all()
    values: dict[tuple[str, str], Any] = dict(results.values)
    refused = {(cell.sheet, cell.address): Refused(why) for cell, why in results.not_evaluated.items()}
    return values | refused


class Refused(Exception):
    """A formula that was not evaluated."""


def alike(left: Any, right: Any) -> bool:
    """Whether two values are the same: numbers to 1e-12, everything else equal and of one type."""
    if isinstance(left, float) and isinstance(right, float):
        return math.isclose(left, right, rel_tol=1e-12)
    return type(left) is type(right) and left == right


def differences(
    cells: Mapping[str, Sequence[tuple[str, str]]],
    first: Mapping[tuple[str, str], Any],
    second: Mapping[tuple[str, str], Any],
) -> dict[str, tuple[list[Any], list[Any]]]:
    """The formulas whose values differ, with both lists of values."""
    pairs = {
        formula: ([first[place] for place in places], [second.get(place) for place in places])
        for formula, places in cells.items()
    }
    return {
        formula: (left, right) for formula, (left, right) in pairs.items() if not all(map(alike, left, right))
    }


def shown(values: Sequence[Any]) -> str:
    """Values as the tables of differences write them."""
    words = [f"{value:.15g}" if isinstance(value, float) else _shown(value) for value in values]
    return words[0] if len(words) == 1 else " ".join(words)


def _shown(value: Any) -> str:
    if isinstance(value, bool | CellError):
        return str(value).upper()
    return "not evaluated" if isinstance(value, Refused) else repr(value)


def edge_formulas() -> list[str]:
    """The formulas picked by hand."""
    path = Path(__file__).parents[1] / "xlbridge" / "headless" / "edge_formulas.txt"
    return [line for line in path.read_text(encoding="utf-8").splitlines() if line[:1] in ("=", "{")]


def require_listed(found: Mapping[str, tuple[list[Any], list[Any]]], table: Path) -> None:
    """Fail on a difference that the table does not list, and on a listed one that is none (any more)."""
    listed = _listed(table)
    ours_shown = {formula: shown(left) for formula, (left, _) in found.items()}
    unlisted = {
        formula: f"ours {ours_shown[formula]}, theirs {shown(right)}"
        for formula, (_, right) in found.items()
        if formula not in listed
    }
    assert not unlisted, unlisted
    stale = sorted(listed.keys() - found.keys())
    assert not stale, f"listed, but no difference: {stale}"
    assert ours_shown == {formula: value for formula, (value, _) in listed.items()}


def _listed(path: Path) -> dict[str, tuple[str, str]]:
    """A table of known differences: formula -> (our value, reason)."""
    table = tomllib.loads(path.read_text(encoding="utf-8"))
    rows: dict[str, tuple[str, str]] = {}
    for key, group in table.items():
        assert group["reason"].strip(), key
        for formula, value in group["ours"].items():
            assert formula not in rows, f"listed twice: {formula}"
            rows[formula] = (value, group["reason"])
    return rows
