"""The rows of Table 12.2-1 read off the data file, without the engine's reader."""

from __future__ import annotations

import csv
from pathlib import Path

import engine.tables

LINES = (Path(engine.tables.__file__).parent / "systems.csv").read_text(encoding="utf-8").splitlines()
ROWS = list(csv.DictReader(line for line in LINES if not line.startswith("#")))
OLD = [row for row in ROWS if row["edition"] == "7-16"]
ADDED = [row for row in ROWS if row["edition"] != "7-16"]


def name(row: dict[str, str]) -> str:
    """Return the name of a row: the letter of its group and its words."""
    return f"{row['code'][0]}. {row['system']}"


def code(row: dict[str, str]) -> str:
    """Return the code of a row, which serves as a test id."""
    return row["code"]
