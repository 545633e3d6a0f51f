"""Modal quantities asked for a cell at a time, beside one bare eigenproblem of the same building."""

from __future__ import annotations

from typing import Any

import numpy as np
import scipy.linalg

from engine.dynamics import eigen
from tests.support.shear_buildings import stiffness_matrix
from tests.support.sheet_cases import column
from xlbridge import adapter
from xlbridge.catalogue import CATALOGUE

TARGET = "target at most 300 eigenproblems, where one a cell is 1,200"


def test_a_sheet_of_shapes(full: bool, figure: Any, best: Any) -> None:
    levels, modes = (60, 20) if full else (6, 3)
    heights = [12.0 * (n + 1) for n in range(levels)]
    weights = [300.0 + n for n in range(levels)]
    stiffnesses = [4000.0 - 30.0 * n for n in range(levels)]
    model = [column(weights), column(stiffnesses), column(heights)]
    entry = CATALOGUE["ELF_MODE_SHAPE"]

    def sheet() -> Any:
        eigen._solved.cache_clear()
        return [[adapter.call(entry, [m + 1.0, h, *model]) for m in range(modes)] for h in heights]

    def bare() -> Any:
        return scipy.linalg.eigh(stiffness_matrix(stiffnesses), np.diag(weights))

    _, vectors = bare()
    unit = vectors / np.take_along_axis(vectors, np.abs(vectors).argmax(axis=0)[None], axis=0)
    assert np.allclose(np.abs(sheet()), np.abs(unit[:, :modes]), atol=1e-9)
    once, cells = best(bare, sheet, rounds=5)
    figure(f"phi of {levels} levels in {modes} modes, a cell each, to one eigenproblem", cells / once, TARGET)
    figure("  the same, microseconds a cell", cells / (levels * modes) * 1e6, "no target")
