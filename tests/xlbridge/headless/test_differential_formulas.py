"""The headless evaluator against the ``formulas`` package, on the formulas that package can read."""

from __future__ import annotations

import logging
import re
import warnings
from collections.abc import Iterator
from pathlib import Path
from typing import Any

import formulas
import numpy as np
import pytest

from tests.support.differential import differences, edge_formulas, ours, require_listed, write
from tests.support.random_formulas import Formulas, sample
from xlbridge.values import ERROR_CODES, CellError

SEED = 7
TABLE = Path(__file__).with_name("formulas_differences.toml")


@pytest.fixture(autouse=True)
def quiet() -> Iterator[None]:
    logger = logging.getLogger("schedula")
    level = logger.level
    logger.setLevel(logging.CRITICAL)
    with warnings.catch_warnings():
        warnings.simplefilter("ignore")
        yield
    logger.setLevel(level)


def readable(formula: str) -> bool:
    """Whether the package knows every function of a formula and can compile it."""
    names = re.findall(r"[A-Z][A-Z0-9.]*(?=\()", formula)
    known = formulas.get_functions()
    if formula.startswith("{") or any(name not in known for name in names):
        return False
    try:
        formulas.Parser().ast(formula)[1].compile()
    except Exception:  # whatever it raises, the formula is outside its subset
        return False
    return True


def theirs(path: Path) -> dict[tuple[str, str], Any]:
    solution = formulas.ExcelModel().loads(str(path)).finish().calculate()
    name = re.compile(rf"'\[{re.escape(path.name)}\](.+)'!([A-Z]+\d+)", re.IGNORECASE)
    found = ((name.fullmatch(str(key)), value) for key, value in solution.items())
    return {(match[1].title(), match[2]): converted(value.value[0, 0]) for match, value in found if match}


def converted(value: Any) -> Any:
    """The package's error values are texts, its numbers and logicals mostly numpy's."""
    if str(value) in ERROR_CODES:
        return CellError(str(value))
    if isinstance(value, bool | np.bool_):
        return bool(value)
    return float(value) if isinstance(value, int | float | np.number) else str(value)


def test_every_difference_from_the_package_is_listed_with_its_reason(tmp_path: Path) -> None:
    by_hand = [formula for formula in edge_formulas() if readable(formula)]
    at_random = [formula for formula in sample(Formulas(SEED).formula, 260, 200) if readable(formula)]
    assert len(by_hand) >= 500
    assert len(at_random) >= 200
    path = tmp_path / "formulas.xlsx"
    cells = write([*by_hand, *at_random], path)
    require_listed(differences(cells, ours(path), theirs(path)), TABLE)
