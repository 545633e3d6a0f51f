"""The sheet in which xlwings' macros look for Python: one setting a row, from the first row on."""

from __future__ import annotations

import sys
from typing import Final, NamedTuple

from xlbridge.excel.macros import PYTHON_MODULE, VERSION_MODULE

SHEET: Final = "xlwings.conf"


class Setting(NamedTuple):
    """A setting, and what it is for."""

    key: str
    value: str
    text: str


def settings() -> tuple[Setting, ...]:
    """Return what the sheet holds; on Windows the Python that runs this is the one that Excel is to start."""
    return (
        Setting(
            "Interpreter_Win",
            sys.executable if sys.platform == "win32" else "",
            'The python.exe in whose environment Storyledger is installed. `py -c "import sys; '
            'print(sys.executable)"` prints it. Left blank, Excel takes the first python on the path.',
        ),
        Setting(
            "UDF Modules",
            f"{PYTHON_MODULE};{VERSION_MODULE}",
            "The Python modules of the worksheet functions. Not to be changed.",
        ),
    )
