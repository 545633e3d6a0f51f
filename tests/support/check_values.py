"""Check values as data: rows of tests/check_values/*.toml, evaluated and compared as printed.

A row names a function, its inputs, the expected text as printed, the source and its kind. An input may be
another call. Words are compared as they stand, numbers at the printed digits, fractions exactly, or within
the row's own tolerance, which then has a reason. A row with ``misprint`` also proves that the printed slip
is one.
"""

from __future__ import annotations

import tomllib
from collections.abc import Mapping
from fractions import Fraction
from importlib import import_module
from pathlib import Path
from typing import Any

import numpy as np

FOLDER = Path(__file__).parents[1] / "check_values"
KINDS = ("published", "derived", "common practice", "from memory")
EXACT = 1e-12


def rows() -> list[tuple[str, dict[str, Any]]]:
    """Return every row with its test id: file and row."""
    return [
        (f"{path.stem}: {row['id']}", row)
        for path in sorted(FOLDER.glob("*.toml"))
        for row in tomllib.loads(path.read_text(encoding="utf-8"))["check"]
    ]


def evaluate(row: Mapping[str, Any]) -> Any:
    """Call the row's function; inputs that are calls are evaluated first."""
    module, name = row["function"].rsplit(".", 1)
    inputs = {
        key: evaluate(value) if isinstance(value, dict) else value for key, value in row["inputs"].items()
    }
    return getattr(import_module(module), name)(**inputs)


def shortfalls(row: Mapping[str, Any], expected: str | list[str]) -> list[str]:
    """Return what differs between the engine and the expected values, as text."""
    texts = [expected] if isinstance(expected, str) else expected
    got = np.atleast_1d(evaluate(row))
    if got.shape != (len(texts),):
        return [f"{got.shape[0]} values, {len(texts)} expected"]
    if got.dtype.kind in "OU":
        return [f"got {word}, expected {text}" for word, text in zip(got, texts, strict=True) if word != text]
    return [
        f"[{place}] got {value!r}, expected {text}, relative {value / float(Fraction(text)) - 1:.2g}"
        if float(Fraction(text))
        else f"[{place}] got {value!r}, expected {text}"
        for place, (value, text) in enumerate(zip(got, texts, strict=True))
        if abs(float(value) - float(Fraction(text))) > tolerance(text, row)
    ]


def tolerance(text: str, row: Mapping[str, Any]) -> float:
    """Return half a unit of the last printed digit, save for a fraction or a tolerance of the row."""
    if "tolerance" in row:
        return float(row["tolerance"])
    if "/" in text:
        return EXACT
    decimals = len(text.partition(".")[2])
    return 0.5 * 10.0**-decimals * (1 + 1e-9)
