"""Write the blank workbooks that are kept in the project: ``python -m workbook_templates.generate``.

Two runs give the same bytes, so a difference after a run means that a template changed.
"""

from __future__ import annotations

from itertools import product
from pathlib import Path

from engine.editions import EDITIONS
from engine.units import SYSTEMS
from workbook_templates.build import write_workbook

FOLDER = Path(__file__).parent / "blank"


def generate(folder: Path) -> list[Path]:
    """Write a blank workbook for each edition and unit system; return the files."""
    made = []
    for edition, units in product(EDITIONS, SYSTEMS):
        made.append(folder / f"story_{edition}_{units}.xlsx")
        write_workbook({"edition": edition, "units": units}, made[-1], force=True)
    return made


if __name__ == "__main__":
    for path in generate(FOLDER):
        print(path.name)
