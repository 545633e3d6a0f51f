"""(a) Every formula cell evaluated on its own and compared with the value that the file stores."""

from __future__ import annotations

from math import isclose
from typing import Final

from xlbridge.audit.finding import Checked, NotChecked, Observation, Place
from xlbridge.audit.subject import Subject
from xlbridge.headless.evaluate import CellResult
from xlbridge.values import CellError, Scalar

#: a spreadsheet program may sum in another order and print 15 digits; a fault moves more than this
TOLERANCE: Final = 1e-9


def check(subject: Subject) -> Checked:
    """Compare every formula cell with its stored value."""
    cells = subject.results.cells
    seen = (_observed(subject, result) for result in cells if result.reason is None)
    return Checked(
        "cells",
        len(cells),
        tuple(observation for observation in seen if observation),
        tuple(
            NotChecked("formula", result.reason, Place.of(result.cell)) for result in cells if result.reason
        ),
    )


def agree(stored: Scalar, value: Scalar) -> bool:
    """Whether a stored value is the one that was evaluated; a formula that gives a blank shows 0."""
    if isinstance(value, float | None) and isinstance(stored, float) and not isinstance(stored, bool):
        return isclose(stored, value or 0.0, rel_tol=TOLERANCE, abs_tol=TOLERANCE)
    return type(stored) is type(value) and stored == value


def _observed(subject: Subject, result: CellResult) -> Observation | None:
    stored, value, place = subject.book.stored(result.cell), result.value, Place.of(result.cell)
    if stored is None and value not in (None, ""):
        words = "no value is stored for the formula"
        return Observation("no_stored_value", place, words, recomputed=value, cause="no value")
    if isinstance(value, CellError):
        words = f"{value.code}: {value.reason}" if value.reason else f"the formula gives {value.code}"
        return Observation("error_value", place, words, stored=stored, recomputed=value, cause=words)
    if stored is not None and not agree(stored, value):
        words = f"the file stores {_shown(stored)}, the formula gives {_shown(value)}"
        return Observation("stale_value", place, words, stored=stored, recomputed=value, cause="stale")
    return None


def _shown(value: Scalar) -> str:
    return f"{value:.15g}" if isinstance(value, float) else "a blank" if value is None else str(value)
