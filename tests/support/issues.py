"""Issues of one workbook: the demonstration building with some of its entries changed."""

from __future__ import annotations

import json
import tomllib
from collections.abc import Callable
from pathlib import Path
from typing import Any

from engine.building import from_mapping, to_mapping
from workbook_templates.build import write_workbook
from workbook_templates.demo import building_text

Tables = dict[str, Any]
BASE: Tables = to_mapping(from_mapping(tomllib.loads(building_text())))


def issue(folder: Path, name: str, change: Callable[[Tables], object] = lambda tables: None) -> Path:
    """An issue of the demonstration building with some of its entries changed."""
    tables = json.loads(json.dumps(BASE))
    change(tables)
    write_workbook(tables, folder / name)
    return folder / name


#: what brings drift in
DRIFT = ("P_x", "delta_xe_X", "delta_xe_Y")


def without_drift(tables: Tables) -> None:
    """Leave drift out."""
    for row in tables["level"]:
        for key in DRIFT:
            del row[key]
