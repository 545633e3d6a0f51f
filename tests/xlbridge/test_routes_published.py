"""Published and hand-worked values through formulas in cells: a workbook for each file of check values.

Each row of a file is a sheet of its workbook, laid out as a table: a column for each input, its numbers below
its symbol, columns of intermediate formulas where an input is itself a result, and a column of results, one
formula a row and once more as an array formula. Compared at the printed digits, and with the formulas called
from Python. The sources stand in the files and beside the results.
"""

from __future__ import annotations

from collections.abc import Mapping
from fractions import Fraction
from pathlib import Path
from typing import Any

import numpy as np
import pytest
from openpyxl import Workbook
from openpyxl.utils import get_column_letter
from openpyxl.worksheet.formula import ArrayFormula
from openpyxl.worksheet.worksheet import Worksheet

from tests.support.check_values import evaluate, rows, tolerance
from xlbridge.catalogue import CATALOGUE
from xlbridge.catalogue.entry import Kind, SheetFunction
from xlbridge.headless.compute import compute
from xlbridge.values import Scalar

TOP = 3
#: a formula is named by its concept, whatever file of the concept it stands in
BY_FORMULA = {
    f"{'.'.join(e.function.__module__.split('.')[:2])}.{e.function.__name__}": e for e in CATALOGUE.values()
}
#: the factors of all levels at once are a column of single factors in a worksheet
COLUMN = {"engine.vertical.distribution_factors": ("ELF_CVX", {"w_x": "weights", "h_x": "heights"})}
NOT_IN_CELLS = {
    "engine.period.period_limit": "the product of two cells, inside ELF_PERIOD",
    "engine.diaphragm.unlimited_force": "one of three values inside ELF_FPX, with no function of its own",
    "engine.diaphragm.minimum_force": "one of three values inside ELF_FPX, with no function of its own",
    "engine.diaphragm.maximum_force": "one of three values inside ELF_FPX, with no function of its own",
}
ROWS = {name: row for name, row in rows() if row["function"] not in NOT_IN_CELLS}
BOOKS = sorted({name.partition(": ")[0] for name in ROWS})


class Table:
    """One sheet: columns from left to right, each with its heading and its cells."""

    def __init__(self, sheet: Worksheet, row: Mapping[str, Any]) -> None:
        self.sheet, self.columns = sheet, 0
        sheet["A1"] = row["source"]
        self.results = self.lay(row)

    def put(self, heading: str, values: list[Any]) -> list[str]:
        """Write a column; return its addresses."""
        self.columns += 1
        letter = get_column_letter(self.columns)
        self.sheet[f"{letter}2"] = heading
        for place, value in enumerate(values, TOP):
            self.sheet[f"{letter}{place}"] = value
        return [f"${letter}${place}" for place in range(TOP, TOP + len(values))]

    def lay(self, row: Mapping[str, Any]) -> list[str]:
        """Write the inputs of a call and its formulas; return the addresses of the results."""
        places = {name: self.input(name, value) for name, value in row["inputs"].items()}
        if row["function"] in COLUMN:
            name, copies = COLUMN[row["function"]]
            entry = CATALOGUE[name]
            places |= {copy: places[of] for copy, of in copies.items()}
        else:
            entry = BY_FORMULA[row["function"]]
        return self.formulas(entry, places)

    def input(self, name: str, value: Any) -> list[str]:
        if isinstance(value, dict):
            return self.lay(value)
        return self.put(name, value if isinstance(value, list) else [value])

    def formulas(self, entry: SheetFunction, places: Mapping[str, list[str]]) -> list[str]:
        """One formula a row, then one array formula for all of them."""
        whole = {a.name for a in entry.arguments if a.kind is Kind.LEVELS}
        count = max((len(cells) for name, cells in places.items() if name not in whole), default=1)
        results = self.put(entry.name, [call(entry, places, whole, n) for n in range(count)])
        letter, bottom = get_column_letter(self.columns + 1), TOP + count - 1
        area = f"{letter}{TOP}:{letter}{bottom}"
        ranged = call(entry, places, {*whole, *(name for name, c in places.items() if len(c) > 1)}, 0)
        self.put(f"{entry.name} as one array", [ArrayFormula(area, ranged)])
        return results


def call(entry: SheetFunction, places: Mapping[str, list[str]], ranged: set[str], row: int) -> str:
    """The formula of one row; arguments in ``ranged`` are whole columns."""
    texts = [
        f"{cells[0]}:{cells[-1]}" if name in ranged else cells[row if len(cells) > 1 else 0]
        for name, cells in ((a.name, places[a.name]) for a in entry.arguments if a.name in places)
    ]
    return f"={entry.name}({','.join(texts)})"


@pytest.fixture(scope="module")
def found(tmp_path_factory: pytest.TempPathFactory) -> dict[str, list[list[Scalar]]]:
    """The results of every row: of single formulas, and of the array formula beside them."""
    folder, results = tmp_path_factory.mktemp("published"), {}
    for stem in BOOKS:
        workbook, tables = Workbook(), {}
        workbook.remove(workbook.worksheets[0])
        for name in (name for name in ROWS if name.startswith(f"{stem}: ")):
            sheet = workbook.create_sheet(f"Check {len(tables) + 1}")
            tables[name] = sheet.title, Table(sheet, ROWS[name])
        path = Path(folder) / f"{stem}.xlsx"
        workbook.save(path)
        computed = compute(path)
        assert computed.not_evaluated == []
        for name, (title, table) in tables.items():
            results[name] = [
                [computed.values[title, f"{letter}{TOP + n}"] for n in range(len(table.results))]
                for letter in map(get_column_letter, (table.columns - 1, table.columns))
            ]
    return results


def texts(row: Mapping[str, Any], key: str = "expected") -> list[str]:
    return [row[key]] if isinstance(row[key], str) else row[key]


def agree(values: list[Scalar], printed: list[str], row: Mapping[str, Any]) -> bool:
    assert len(values) == len(printed)
    return all(
        value == text
        if isinstance(value, str)
        else isinstance(value, float) and abs(value - float(Fraction(text))) <= tolerance(text, row)
        for value, text in zip(values, printed, strict=True)
    )


@pytest.mark.parametrize("name", ROWS)
def test_cells_give_the_printed_values(name: str, found: Any) -> None:
    row, (single, array) = ROWS[name], found[name]
    assert row["source"]
    assert agree(single, texts(row), row), single
    assert array == (single if isinstance(single[0], str) else pytest.approx(single, rel=1e-14))


@pytest.mark.parametrize("name", ROWS)
def test_cells_give_the_value_that_python_gives(name: str, found: Any) -> None:
    values = np.atleast_1d(evaluate(ROWS[name])).tolist()
    assert found[name][0] == (values if isinstance(values[0], str) else pytest.approx(values, rel=1e-12))


@pytest.mark.parametrize("name", [name for name, row in ROWS.items() if "misprint" in row])
def test_a_misprint_is_not_reproduced(name: str, found: Any) -> None:
    row = ROWS[name]
    assert row["reason"]
    assert not agree(found[name][0], texts(row, "misprint"), row)


def test_the_printed_examples_are_there() -> None:
    assert len(ROWS) > 80
    assert {BY_FORMULA[row["function"]].name for row in ROWS.values() if row["function"] in BY_FORMULA} == {
        entry.name for entry in CATALOGUE.values() if entry.name != "ELF_SYSTEM_SOURCE"
    }
    assert all("misprint" not in row or row["reason"] for row in ROWS.values())


def test_another_digit_is_seen(found: Any) -> None:
    name = next(name for name in ROWS if name == "masonry_five_story: V_x")
    values = found[name][0]
    assert agree(values, texts(ROWS[name]), ROWS[name])
    for place in range(len(values)):
        wrong = [value + 0.1 * (n == place) for n, value in enumerate(values)]
        assert not agree(wrong, texts(ROWS[name]), ROWS[name])
