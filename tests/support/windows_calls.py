"""Calls through xlwings' own Windows code, as a process: calls in, values out, both as JSON.

``python -m tests.support.windows_calls < calls.json``: each call is a name and its arguments; a range is a
list of rows, ``{"error": "#N/A"}`` an error value, ``{"omitted": true}`` an argument left out.
"""

from __future__ import annotations

import json
import sys
from typing import Any

from tests.support import windows_stubs as stubs

MODULE = "xlbridge.excel.functions"


def handed(value: Any) -> Any:
    """An argument as COM hands it over."""
    if isinstance(value, dict):
        return stubs.MISSING if "omitted" in value else stubs.ComRange(stubs.ERRORS[value["error"]])
    if isinstance(value, list):
        return stubs.ComRange(tuple(tuple(_cell(cell) for cell in row) for row in value))
    return stubs.ComRange(value)


def _cell(value: Any) -> Any:
    return stubs.ERRORS[value["error"]] if isinstance(value, dict) else value


def main() -> None:
    stubs.install()
    calls = json.load(sys.stdin)
    found = [stubs.excel_call(MODULE, name, *map(handed, arguments)) for name, arguments in calls]
    json.dump(found, sys.stdout)


if __name__ == "__main__":
    main()
