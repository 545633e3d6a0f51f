"""Write the generated modules of this folder: ``python -m xlbridge.excel.generate``."""

from __future__ import annotations

import sys
from collections.abc import Mapping
from pathlib import Path
from typing import Final

from xlbridge.catalogue import CATALOGUE
from xlbridge.catalogue.entry import SheetFunction
from xlbridge.catalogue.validate import describe
from xlbridge.excel.macros import macro_module
from xlbridge.excel.module import description, python_module
from xlbridge.excel.names import faults, repeated

FOLDER: Final = Path(__file__).parent
PYTHON_FILE: Final = "functions.py"
MACRO_FILE: Final = "storyledger.bas"


def generated(catalogue: Mapping[str, SheetFunction] = CATALOGUE) -> dict[str, bytes]:
    """Return the generated files by name; refuse a name or text that Excel would misread.

    The macro module has the line ends that Excel's macro editor needs.
    """
    entries = list(catalogue.values())
    found = repeated(entry.name for entry in entries)
    for entry in entries:
        texts = [description(entry), *map(describe, entry.arguments)]
        found += faults(entry.name, [argument.name for argument in entry.arguments], texts)
    if found:
        raise ValueError("; ".join(found))
    return {
        PYTHON_FILE: python_module(entries).encode(),
        MACRO_FILE: macro_module(entries).replace("\n", "\r\n").encode("ascii"),
    }


def outdated(folder: Path = FOLDER) -> list[str]:
    """Return the names of the files in ``folder`` that differ from what would be generated."""
    return [
        name
        for name, data in generated().items()
        if not (folder / name).is_file() or (folder / name).read_bytes() != data
    ]


def main(folder: Path = FOLDER) -> None:
    """Write the files that differ and name them."""
    files = generated()
    for name in outdated(folder):
        (folder / name).write_bytes(files[name])
        sys.stdout.write(f"written: {name}\n")


if __name__ == "__main__":
    main()
