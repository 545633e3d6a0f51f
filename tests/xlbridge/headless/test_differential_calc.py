"""The headless evaluator against LibreOffice Calc, an independent spreadsheet program, formula by formula."""

from __future__ import annotations

import re
from pathlib import Path
from typing import Any, NamedTuple

import pytest

from tests.support.differential import Refused, differences, edge_formulas, ours, require_listed, write
from tests.support.office import Office
from tests.support.random_formulas import Formulas, sample
from xlbridge.headless.builtins import BUILTINS, VOLATILE
from xlbridge.values import CellError

SEED = 20240712
TABLE = Path(__file__).with_name("calc_differences.toml")
#: LibreOffice has these from 24.8 on; the comparison with the formulas package covers them.
LATER_IN_CALC = ("XLOOKUP", "XMATCH")


class Compared(NamedTuple):
    by_hand: list[str]
    at_random: list[str]
    ours: dict[str, list[Any]]
    differences: dict[str, tuple[list[Any], list[Any]]]


@pytest.fixture(scope="module")
def compared(office: Office, tmp_path_factory: pytest.TempPathFactory) -> Compared:
    path = tmp_path_factory.mktemp("calc") / "formulas.xlsx"
    source = Formulas(SEED)
    by_hand = [formula for formula in edge_formulas() if not any(name in formula for name in LATER_IN_CALC)]
    at_random = sample(source.formula, 600) + sample(source.array_formula, 120)
    cells = write([*by_hand, *at_random], path)
    mine = ours(path)
    found = differences(cells, mine, office.values(path))
    return Compared(by_hand, at_random, {f: [mine[p] for p in places] for f, places in cells.items()}, found)


def test_every_difference_from_calc_is_listed_with_its_reason(compared: Compared) -> None:
    require_listed(compared.differences, TABLE)


def test_enough_is_compared(compared: Compared) -> None:
    assert len(compared.at_random) >= 700
    assert len(compared.by_hand) >= 600
    values = [value for formula in compared.at_random for value in compared.ours[formula]]
    assert not any(isinstance(value, Refused) for value in values)
    assert sum(isinstance(value, CellError) for value in values) < 0.2 * len(values)


def test_every_function_is_compared(compared: Compared) -> None:
    used = set(re.findall(r"[A-Z][A-Z0-9.]*(?=\()", " ".join([*compared.by_hand, *compared.at_random])))
    assert BUILTINS.keys() - VOLATILE.keys() - used == set(LATER_IN_CALC)
