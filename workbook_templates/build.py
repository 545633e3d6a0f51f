"""Build a workbook: lay out, draw every sheet, save with the same bytes for the same inputs."""

from __future__ import annotations

import io
import re
import zipfile
from collections.abc import Callable, Mapping
from datetime import datetime
from pathlib import Path
from tempfile import TemporaryDirectory
from typing import Any, Final, TypeAlias

from openpyxl import Workbook

from engine.version import __version__
from workbook_templates import layout as places
from workbook_templates import native
from workbook_templates.draw import checks, cover, criteria, figures, functions, tables
from workbook_templates.inputs import Inputs
from workbook_templates.layout import Layout
from workbook_templates.parts import cross_check
from xlbridge.headless.compute import Computed, compute, compute_into

FitOut: TypeAlias = Callable[[Workbook], object]

DEFAULT_LEVELS: Final = 6
#: written into every package, so that two builds are the same to the byte.
EPOCH = datetime(2020, 1, 1)


def build(
    given: Mapping[str, Any], level_count: int = DEFAULT_LEVELS, fit_out: FitOut | None = None
) -> bytes:
    """Return the package of the workbook for the tables of a BUILDING.toml.

    ``given`` needs ``edition`` and ``units``; what else is missing starts from marked starter values,
    ``level_count`` levels of them if no level is given. ``fit_out`` adds what a front end needs.
    """
    workbook = draw(given, level_count)
    if fit_out:
        fit_out(workbook)
    return package(workbook)


def build_native(given: Mapping[str, Any], values: native.Values, level_count: int = DEFAULT_LEVELS) -> bytes:
    """Return the same workbook in built-in functions; ``values`` are those of the one with functions."""
    return package(draw_native(given, values, level_count))


def draw(given: Mapping[str, Any], level_count: int = DEFAULT_LEVELS) -> Workbook:
    """Return the workbook as it is drawn, not yet a package."""
    return _drawn(Inputs(given, level_count))


def draw_native(
    given: Mapping[str, Any], values: native.Values, level_count: int = DEFAULT_LEVELS
) -> Workbook:
    """Return the same in built-in functions."""
    inputs = Inputs(given, level_count)
    workbook = _drawn(inputs, issue=True)
    native.rewrite(workbook, values, inputs.units)
    return workbook


def _drawn(inputs: Inputs, issue: bool = False) -> Workbook:
    layout = Layout(len(inputs.rows(places.STORY_TABLE)), inputs.parts, inputs.row_counts)
    workbook = Workbook()
    workbook.remove(workbook.worksheets[0])
    sheets = {name: workbook.create_sheet(name) for name in layout.sheets}
    cover.draw(sheets[places.COVER], layout, inputs, issue)
    criteria.draw(sheets[places.CRITERIA], layout, inputs)
    for grid in layout.grids:
        tables.draw(sheets[grid.table.sheet], layout, grid, inputs)
    checks.draw(sheets[places.CHECKS], layout, inputs)
    figures.draw(sheets, layout, inputs)
    functions.draw(sheets[places.FUNCTIONS], layout, inputs)
    return workbook


def write_workbook(
    given: Mapping[str, Any],
    target: Path,
    level_count: int = DEFAULT_LEVELS,
    force: bool = False,
    fit_out: FitOut | None = None,
) -> Computed:
    """Build a workbook, compute it headless, and write it with its values stored: numbers show anywhere."""
    with TemporaryDirectory() as folder:
        drawn = Path(folder) / f"drawn{target.suffix}"
        drawn.write_bytes(build(given, level_count, fit_out))
        return compute_into(drawn, target, force)


def write_native(
    given: Mapping[str, Any], target: Path, level_count: int = DEFAULT_LEVELS, force: bool = False
) -> Computed:
    """Write the workbook in built-in functions, once each of its cells gives what the functions give.

    The cross-check is left out: it would check built-in functions against themselves.
    """
    asked = [key for key in given.get("parts", ()) if key not in cross_check.KEYS]
    given = {**given, "parts": asked}
    with TemporaryDirectory() as folder:
        called, drawn = (Path(folder) / f"{name}{target.suffix}" for name in ("called", "drawn"))
        called.write_bytes(build(given, level_count))
        functions = compute(called)
        drawn.write_bytes(build_native(given, functions.values, level_count))
        if wrong := native.differing(functions, compute(drawn)):
            raise ValueError(f"built-in functions give another value in {', '.join(wrong[:5])}")
        return compute_into(drawn, target, force)


def package(workbook: Workbook) -> bytes:
    """Return the file of a drawn workbook: the same bytes for the same drawing."""
    workbook.properties.creator = f"Storyledger {__version__}"
    workbook.properties.created = EPOCH
    drawn = io.BytesIO()
    workbook.save(drawn)
    fixed = io.BytesIO()
    with zipfile.ZipFile(drawn) as source, zipfile.ZipFile(fixed, "w", zipfile.ZIP_DEFLATED) as target:
        for name in source.namelist():
            part = zipfile.ZipInfo(name, EPOCH.timetuple()[:6])
            part.compress_type = zipfile.ZIP_DEFLATED
            target.writestr(part, _settled(name, source.read(name)))
    return fixed.getvalue()


def _settled(name: str, data: bytes) -> bytes:
    """Mend what the library writes: the clock in the document properties, escaped line breaks in headers."""
    if name == "docProps/core.xml":
        stamp = f"{EPOCH:%Y-%m-%dT%H:%M:%SZ}".encode()
        return re.sub(rb"(<dcterms:modified[^>]*>)[^<]*", rb"\g<1>" + stamp, data)
    if name.startswith("xl/worksheets/"):
        return re.sub(rb"<oddHeader>[^<]*", lambda found: found[0].replace(b"_x000a_", b"\n"), data)
    return data
