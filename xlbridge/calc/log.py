"""The log of failed calls: each reason once, in a file that a user can find and send."""

from __future__ import annotations

import os
from datetime import UTC, datetime
from pathlib import Path
from typing import Final

from xlbridge.values import CellError

#: the variable that names another file
VARIABLE: Final = "STORYLEDGER_CALC_LOG"
#: distinct reasons that are written before the log falls silent
AT_MOST: Final = 1000

_noted: set[tuple[str, str]] = set()


def path() -> Path:
    """Return the file: in the folder ``.storyledger`` of the user's home, or where the variable says."""
    return Path(os.environ.get(VARIABLE) or Path.home() / ".storyledger" / "calc.log")


def note(name: str, error: CellError) -> None:
    """Write why a call failed, once; a log that can not be written never fails a cell."""
    key = (name, f"{error.code} {error.reason}")
    if key in _noted or len(_noted) >= AT_MOST:
        return
    _noted.add(key)
    write(f"{error.code} because {error.reason or name}")


def write(text: str) -> None:
    """Add a line with the time to the log."""
    try:
        file = path()
        file.parent.mkdir(parents=True, exist_ok=True)
        with file.open("a", encoding="utf-8") as log:
            log.write(f"{datetime.now(UTC):%Y-%m-%d %H:%M:%SZ}  {text}\n")
    except OSError:
        pass
