"""How contents show: number formats against those of the twin, and text that cannot be seen."""

from __future__ import annotations

from collections.abc import Iterator
from typing import Final

from openpyxl.styles.colors import COLOR_INDEX, Color
from openpyxl.worksheet.worksheet import Worksheet

from xlbridge.audit.finding import Observation, Place
from xlbridge.audit.manifest.number_formats import hides_text, is_coarser, misleads
from xlbridge.audit.manifest.pairing import CellPair, Content, Pairing

#: contrast of text against its fill below which it cannot be read
UNSEEN: Final = 2.0
#: points below which a text cannot be read (common practice)
SMALLEST: Final = 4
_THEME: Final = {0: "FFFFFF", 1: "000000"}


def check(pairing: Pairing) -> Iterator[Observation]:
    """Compare the look of every filled cell with that of the twin."""
    styles: dict[tuple[int, ...], bool] = {}
    for pair in pairing.cells:
        if pair.found is None or pair.found.value is None:
            continue
        if pair.found.number_format != pair.twin.number_format:
            yield from _number_format(pairing, pair, pair.found)
        style = pair.found._style  # type: ignore[attr-defined]
        key = style.fontId, style.fillId, style.alignmentId, style.protectionId
        if key not in styles:
            styles[key] = any(_tricks(pairing, pair, pair.found, doubtful=True))
        if styles[key]:
            yield from _tricks(pairing, pair, pair.found)


def _tricks(
    pairing: Pairing, pair: CellPair, content: Content, doubtful: bool = False
) -> Iterator[Observation]:
    """Settings of a cell that leave its content as it is, and yet show another or none.

    ``doubtful`` asks whether they may, for any cell of the same style.
    """
    place, cause = Place.of(pair.place), f"{pair.cell.sheet} {pair.cell.column}"
    text, fill = colours(content)
    if contrast(text, fill) < UNSEEN:
        words = f"the text has the colour {text}, the cell {fill}"
        yield Observation("text_unseen", place, words, found=text, cause=f"{text} {fill}")
    size = content.font.sz
    if size is not None and size < SMALLEST:
        words = f"the text is {size:.3g} points high"
        yield Observation("text_unseen", place, words, found=f"{size:.3g}", cause=f"{cause} small")
    if content.alignment.horizontal == "fill":
        words = "the alignment repeats the content until the cell is full: 12 shows as 121212"
        yield Observation("format_misleads", place, words, found="fill", cause=f"{cause} fill")
    formula = doubtful or pairing.book.formula(pair.place) is not None
    sheet = content.parent
    if content.protection.hidden and formula and isinstance(sheet, Worksheet) and sheet.protection.sheet:
        words = "the sheet is protected, and the cell hides its formula"
        yield Observation("formula_hidden", place, words, cause=pair.place.sheet)


def _number_format(pairing: Pairing, pair: CellPair, content: Content) -> Iterator[Observation]:
    expected, found = pair.twin.number_format, content.number_format
    value = pairing.value(pair.place)
    if isinstance(value, float) and not isinstance(value, bool):
        how = misleads(found, expected)
        kind = "format_misleads" if how else "format_coarse" if is_coarser(found, expected) else ""
    else:
        how, kind = ("it hides a text", "format_misleads") if hides_text(found) else ("", "")
    if kind:
        words = f"the number format is {found}, not {expected}: {how or 'it shows fewer digits'}"
        cause = f"{pair.cell.sheet} {pair.cell.column} {found}"
        yield Observation(kind, Place.of(pair.place), words, expected, found, stored=value, cause=cause)


def colours(content: Content) -> tuple[str, str]:
    """The colours of a cell's text and of its fill; black on white where they cannot be told."""
    fill = content.fill
    solid = fill is not None and fill.fill_type == "solid"
    return rgb(content.font.color, "000000"), rgb(fill.fgColor, "FFFFFF") if solid else "FFFFFF"


def rgb(colour: Color | None, otherwise: str) -> str:
    """Return a colour as six digits, another where it cannot be told."""
    if colour is None:
        return otherwise
    if colour.type == "rgb" and isinstance(colour.rgb, str):
        return colour.rgb[-6:].upper()
    if colour.type == "theme" and not colour.tint:
        return _THEME.get(colour.theme, otherwise)
    if colour.type == "indexed" and colour.indexed < len(COLOR_INDEX):
        return str(COLOR_INDEX[colour.indexed])[-6:].upper()
    return otherwise


def contrast(text: str, fill: str) -> float:
    """The contrast of two colours by WCAG 2: 1 is none, 21 is black on white."""
    light, dark = sorted((_luminance(text), _luminance(fill)), reverse=True)
    return (light + 0.05) / (dark + 0.05)


def _luminance(colour: str) -> float:
    parts = (int(colour[n : n + 2], 16) / 255 for n in (0, 2, 4))
    r, g, b = (p / 12.92 if p <= 0.04045 else ((p + 0.055) / 1.055) ** 2.4 for p in parts)
    return 0.2126 * r + 0.7152 * g + 0.0722 * b
