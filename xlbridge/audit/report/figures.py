"""The figures of the report as SVG text: level results over the height, and the sheets as a map."""

from __future__ import annotations

from collections.abc import Iterable, Iterator, Mapping, Sequence
from dataclasses import dataclass
from html import escape
from itertools import pairwise
from math import floor, log10
from typing import Any, Final

from xlbridge.audit.audit import Audit, State
from xlbridge.audit.template import OwnTemplate
from xlbridge.headless.references import Cell

WIDTH, HEIGHT, LEFT, RIGHT, TOP, BOTTOM = 380, 300, 78, 16, 30, 40
LINES: Final = {"X": "", "Y": "7 4"}
#: how large the map is drawn, and how many rows or columns without formulas it shows at most in a row
SCALE, GAP = 1.4, 2
#: the mark in a box, besides its fill
MARKS: Final = {State.FINDING: "l4 4m0-4l-4 4", State.NOT_CHECKED: "m0 2h4"}
CELL: Final = 7
#: how a state looks in the map: a mark as well as a fill, so that it reads without colour
FILLS: Final = {State.VERIFIED: "#ffffff", State.FINDING: "#7f1d1d", State.NOT_CHECKED: "#9a9a9a"}


@dataclass(frozen=True, slots=True)
class Figure:
    """One figure: its caption, the picture, and the same in words."""

    caption: str
    svg: str
    words: str


def figures(audit: Audit) -> Iterator[Figure]:
    """Yield what the results allow: story forces, story shears, drifts against their limit."""
    own = audit.subject.own
    if own is None or own.unread:
        return
    heights, names = own.results.get("h_x"), [row.get("name", "") for row in own.inputs.get("level", ())]
    for key, caption, limit in (
        ("F_x", "Story forces F_x", None),
        ("V_x", "Story shears V_x", None),
        ("drift_over_limit", "Design story drift over its limit", 1.0),
    ):
        lines = {name: found.get(key) for name, found in own.results["direction"].items()}
        if numbers(heights) and lines and all(map(numbers, lines.values())):
            unit = _unit(own, f".{key}[")
            title = f"{caption} [{unit}]" if unit else caption
            svg = _over_height(title, _unit(own, "h_x["), heights or [], lines, limit)
            yield Figure(title, svg, _words(names, lines))


def _unit(own: OwnTemplate, part: str) -> str:
    """The unit of the column whose paths hold this part; none for a number without one."""
    return next((m.unit for path, m in own.meanings.items() if part in path), "").removeprefix("-")


def numbers(values: Any) -> bool:
    """Whether these are the numbers of a column that can be drawn."""
    return isinstance(values, list) and bool(values) and all(isinstance(v, float) for v in values)


def _words(names: Sequence[str], lines: Mapping[str, Sequence[float]]) -> str:
    largest = (
        f"direction {d}: largest {max(v):.4g} at {names[v.index(max(v))] if len(names) == len(v) else '?'}"
        for d, v in lines.items()
        if isinstance(v, list)
    )
    return "; ".join(largest)


def _over_height(
    title: str, unit: str, heights: Sequence[float], lines: Mapping[str, Sequence[float]], limit: float | None
) -> str:
    """A chart of values over the height: a line a direction, told apart by dashes, and a limit."""
    most = max((*(abs(v) for line in lines.values() for v in line), limit or 0.0)) or 1.0
    top = max(heights) or 1.0

    def x(value: float) -> float:
        return LEFT + (WIDTH - LEFT - RIGHT) * value / (1.08 * most)

    def y(height: float) -> float:
        return HEIGHT - BOTTOM - (HEIGHT - TOP - BOTTOM) * height / top

    parts = [
        f'<svg role="img" viewBox="0 0 {WIDTH} {HEIGHT}" class="chart"><title>{escape(title)}</title>',
        f'<path d="M{LEFT} {TOP}V{HEIGHT - BOTTOM}H{WIDTH - RIGHT}" class="axis"/>',
        *(_tick(x(value), value) for value in _round_values(most)),
        *(
            f'<text x="{LEFT - 6}" y="{y(h) + 4:.1f}" class="end">{h:.4g}</text>'
            for h in (0.0, *_few(heights))
        ),
        f'<text x="4" y="{TOP - 12}">h_x{f" [{escape(unit)}]" if unit else ""}</text>',
    ]
    for n, (name, values) in enumerate(lines.items()):
        points = " ".join(f"{x(v):.1f},{y(h):.1f}" for h, v in sorted(zip(heights, values, strict=False)))
        dash = LINES.get(name, "")
        parts.append(f'<polyline points="{points}" class="line" stroke-dasharray="{dash}"/>')
        parts += [
            f'<circle cx="{x(v):.1f}" cy="{y(h):.1f}" r="2.4"/>'
            for h, v in zip(heights, values, strict=False)
        ]
        at = LEFT + 110 + 90 * n
        parts.append(f'<path d="M{at} {TOP - 16}h26" class="line" stroke-dasharray="{dash}"/>')
        parts.append(f'<text x="{at + 31}" y="{TOP - 12}">{escape(name)}</text>')
    if limit is not None:
        parts.append(f'<path d="M{x(limit):.1f} {TOP}V{HEIGHT - BOTTOM}" class="limit"/>')
        parts.append(f'<text x="{x(limit) - 4:.1f}" y="{TOP + 12}" class="end">limit</text>')
    return "".join((*parts, "</svg>"))


def _tick(at: float, value: float) -> str:
    foot = HEIGHT - BOTTOM
    number = f'<text x="{at:.1f}" y="{foot + 18}" class="mid">{value:.3g}</text>'
    return f'<path d="M{at:.1f} {foot}v5" class="axis"/>{number}'


def _round_values(most: float) -> list[float]:
    """Three to six round values from 0 up to the largest."""
    power = 10.0 ** floor(log10(most / 3))
    step = next(power * n for n in (1, 2, 5, 10) if most / (power * n) < 6)
    return [step * n for n in range(int(most / step) + 1)]


def _few(heights: Sequence[float]) -> list[float]:
    """At most eight heights, so that their labels do not touch."""
    known = sorted(set(heights))
    step = -(-len(known) // 8)
    return known[::-1][::step]


@dataclass(frozen=True, slots=True)
class SheetMap:
    """One sheet: how many cells are in each state, and the picture of them."""

    sheet: str
    counts: Mapping[str, int]
    svg: str


def sheet_maps(audit: Audit) -> Iterator[SheetMap]:
    """Yield a map of each sheet that has formula cells."""
    for sheet in audit.subject.book.sheets:
        cells = {cell: state for cell, state in audit.states.items() if cell.sheet == sheet}
        if cells:
            counts = {state.value: sum(s is state for s in cells.values()) for state in State}
            yield SheetMap(sheet, counts, _map(sheet, cells))


def _map(sheet: str, cells: Mapping[Cell, State]) -> str:
    down, across = _packed(c.row for c in cells), _packed(c.column for c in cells)
    layers = []
    for state in State:
        places = [(CELL * across[c.column], CELL * down[c.row]) for c, s in cells.items() if s is state]
        boxes = "".join(f"M{x + 0.5} {y + 0.5}h6v6h-6z" for x, y in places)
        if boxes:
            layers.append(f'<path d="{boxes}" fill="{FILLS[state]}" class="box"/>')
        if places and state in MARKS:
            marks = "".join(f"M{x + 1.5} {y + 1.5}{MARKS[state]}" for x, y in places)
            layers.append(f'<path d="{marks}" class="{state.replace(" ", "-")}-mark"/>')
    title = f"<title>{escape(sheet)}: formula cells and their state</title>"
    width, height = CELL * (max(across.values()) + 1) + 1, CELL * (max(down.values()) + 1) + 1
    size = f'width="{SCALE * width:g}" height="{SCALE * height:g}"'
    return f'<svg role="img" viewBox="0 0 {width} {height}" {size} class="map">{title}{"".join(layers)}</svg>'


def _packed(lines: Iterable[int]) -> dict[int, int]:
    """Place rows or columns: those without formulas leave a gap of a few at most.

    >>> _packed([5, 6, 8, 900])
    {5: 0, 6: 1, 8: 3, 900: 6}
    """
    order = sorted(set(lines))
    places = {order[0]: 0}
    for before, line in pairwise(order):
        places[line] = places[before] + min(line - before, GAP + 1)
    return places
