"""What the page shows: merges, squeezed columns and rows, print areas, headings, cautions, figures."""

from __future__ import annotations

import re
from collections import Counter
from collections.abc import Iterator
from typing import Any, Final

from openpyxl.worksheet.worksheet import Worksheet

from xlbridge.audit import notation
from xlbridge.audit.finding import Observation, Place
from xlbridge.audit.manifest.labels import plain
from xlbridge.audit.manifest.number_formats import sections
from xlbridge.audit.manifest.pairing import CellPair, Pairing, SheetSides
from xlbridge.audit.merged import swallowed
from xlbridge.headless.operands import NotEvaluated
from xlbridge.headless.references import Cell, column_letters, parse_bounds
from xlbridge.headless.shapes import parse

#: width of a column without one of its own, in characters of the standard text
STANDARD_WIDTH: Final = 8.43
STANDARD_SIZE: Final = 11.0
#: of the width in the template: below this a text is cut off
CUT: Final = 0.4
#: of the size of its text: a row lower than this cuts it off
LOW: Final = 0.75
#: points; no text of the template is larger
LARGEST: Final = 15.0
_SIZE: Final = re.compile(r"&\d+")
_LINES: Final = re.compile(r"\$?(\d+):\$?(\d+)")


def check(pairing: Pairing) -> Iterator[Observation]:
    """Compare each sheet that both have."""
    for cell, area in sorted(swallowed(pairing.book).items()):
        if (twin := pairing.alignment.to_twin(cell)) and _matters(pairing, twin):
            words = f"{cell.address} lies under the merged cells {area}"
            yield Observation("cells_merged", Place.of(cell), words, cause=f"{cell.sheet} {area}")
    by_sheet: dict[str, list[CellPair]] = {}
    for pair in pairing.cells:
        by_sheet.setdefault(pair.cell.sheet, []).append(pair)
    for sides in pairing.sheets:
        cells = by_sheet.get(sides.pair.twin, [])
        yield from _squeezed_columns(pairing, sides, cells)
        yield from _squeezed_rows(sides, cells)
        yield from _printed(sides, cells)
        yield from _figures(pairing, sides)


def _matters(pairing: Pairing, cell: Cell) -> bool:
    position = cell.row, cell.column
    filled = position in pairing.twin.formulas[cell.sheet] or position in pairing.twin.constants[cell.sheet]
    return filled or cell in pairing.own.entries


def _widths(sheet: Worksheet) -> dict[int, float]:
    """The widths that columns have of their own; hidden ones count as none."""
    found: dict[int, float] = {}
    for dimension in sheet.column_dimensions.values():
        dimension.reindex()
        for column in range(dimension.min or 0, min(dimension.max or 0, 512) + 1):
            if dimension.customWidth and not dimension.hidden:
                found[column] = dimension.width
    return found


def _squeezed_columns(pairing: Pairing, sides: SheetSides, cells: list[CellPair]) -> Iterator[Observation]:
    mine, there = _widths(sides.twin), _widths(sides.found)
    standard = sides.found.sheet_format.defaultColWidth or STANDARD_WIDTH
    narrow = {
        found: there.get(found, standard)
        for line, found in sides.pair.columns.pairs.items()
        if line in mine
        and there.get(found, standard) < mine[line] - 0.5
        and not sides.found.column_dimensions[column_letters(found)].hidden
    }
    for column, width in narrow.items():
        expected = mine[sides.pair.columns.back[column]]
        here = [pair for pair in cells if pair.place.column == column and pair.is_filled]
        bad = here if width < CUT * expected else [p for p in here if _needs(pairing, p) > width]
        for pair in bad:
            words = f"column {column_letters(column)} is {width:.3g} wide, in the template {expected:.3g}"
            cause = f"{pair.place.sheet} column {column}"
            yield Observation("column_squeezed", Place.of(pair.place), words, cause=cause)


def _needs(pairing: Pairing, pair: CellPair) -> float:
    """The width that a number takes in its format; a text takes none, it wraps or runs on."""
    value, found = pairing.value(pair.place), pair.found
    decimals = sections(found.number_format)[0].decimals if found else None
    if not isinstance(value, float) or isinstance(value, bool) or found is None or decimals is None:
        return 0.0
    text = f"{value:,.{decimals}f}"
    return len(text) * float(found.font.sz or STANDARD_SIZE) / STANDARD_SIZE


def _squeezed_rows(sides: SheetSides, cells: list[CellPair]) -> Iterator[Observation]:
    low = {
        row: dimension.height
        for row, dimension in sides.found.row_dimensions.items()
        if dimension.height is not None and dimension.height < LARGEST and not dimension.hidden
    }
    for pair in (pair for pair in cells if pair.place.row in low and pair.is_filled):
        height = low[pair.place.row]
        size = float(pair.found.font.sz or STANDARD_SIZE) if pair.found else 0.0
        if height < LOW * size:
            words = f"row {pair.place.row} is {height:.3g} points high, its text {size:.3g}"
            cause = f"{pair.place.sheet} row {pair.place.row}"
            yield Observation("column_squeezed", Place.of(pair.place), words, cause=cause)


def _printed(sides: SheetSides, cells: list[CellPair]) -> Iterator[Observation]:
    place = Place(sides.pair.title)
    areas = [parse_bounds(part) for part in _areas(sides.found.print_area)]
    cut = [p for p in cells if areas and not any(a.contains(p.place.row, p.place.column) for a in areas)]
    if cut:
        words = f"the print area leaves out {len(cut)} cells, {cut[0].place.address} the first of them"
        yield Observation("print_area_cuts", place, words, found=str(sides.found.print_area))
    if missing := _title_rows(sides.twin, sides) - _title_rows(sides.found, None):
        words = f"row {min(missing)} of the headings is not repeated on every page"
        yield Observation("headings_not_printed", place, words, found=str(sides.found.print_title_rows))
    expected, printed = _header(sides.twin), _header(sides.found)
    caution = max(expected.split("\n"), key=len)
    if plain(caution) not in plain(printed):
        words = "the caution is not on the printed pages"
        yield Observation("caution_changed", place, words, caution, printed, cause="printed")


def _header(sheet: Worksheet) -> str:
    """What is printed on top of each page: its three parts, a line each, without their size."""
    header = sheet.oddHeader
    parts = (header.left, header.center, header.right) if header else ()
    return "\n".join(plain(_SIZE.sub("", str(part.text or ""))) for part in parts if part)


def _areas(text: Any) -> list[str]:
    """The addresses of a print area, without the sheet that each is written behind."""
    parts = text if isinstance(text, list) else re.split(r",(?=(?:[^']*'[^']*')*[^']*$)", str(text or ""))
    addresses = (part.rpartition("!")[2].replace("$", "") for part in parts)
    return [a for a in addresses if re.fullmatch(r"[A-Za-z]{1,3}\d{1,7}(:[A-Za-z]{1,3}\d{1,7})?", a)]


def _title_rows(sheet: Worksheet, sides: SheetSides | None) -> set[int]:
    """The rows repeated in print; with ``sides`` those of the twin where the workbook has them now."""
    found = _LINES.fullmatch(str(sheet.print_title_rows or ""))
    rows = range(int(found[1]), int(found[2]) + 1) if found else range(0)
    return {sides.pair.rows.pairs[row] for row in rows if row in sides.pair.rows.pairs} if sides else {*rows}


def _figures(pairing: Pairing, sides: SheetSides) -> Iterator[Observation]:
    """Each line that the twin draws is drawn from the same cells."""
    expected = Counter(tuple(_moved(pairing, sides, text) for text in line) for line in _drawn(sides.twin))
    found = Counter(tuple(_canonical(text) for text in line) for line in _drawn(sides.found))
    for line in (expected - found).elements():
        words = f"no chart draws {line[0]} over {line[1]}" if line[1] else f"no chart draws {line[0]}"
        yield Observation("figure_changed", Place(sides.pair.title), words, " ".join(line), cause="figures")


def _drawn(sheet: Worksheet) -> Iterator[tuple[str, str]]:
    """The cells of each line: its values, and what they stand over."""
    for chart in getattr(sheet, "_charts", []):
        for series in (s for part in (chart, *getattr(chart, "_charts", [])[1:]) for s in part.series):
            values, over = series.yVal or series.val, series.xVal or series.cat
            yield _text(values), _text(over)


def _text(source: Any) -> str:
    reference = getattr(source, "numRef", None) or getattr(source, "strRef", None) if source else None
    return str(reference.f) if reference is not None else ""


def _moved(pairing: Pairing, sides: SheetSides, text: str) -> str:
    if not text:
        return ""
    node = notation.moved(parse(text), sides.pair.twin, pairing.alignment.area_from_twin)
    return notation.canonical(node, sides.pair.title)


def _canonical(text: str) -> str:
    try:
        return notation.canonical(parse(text), "") if text else ""
    except NotEvaluated:
        return text
