"""Draw the figures: native charts over the story table, levels in building order, limits as lines."""

from __future__ import annotations

from collections.abc import Mapping

from openpyxl.chart import BarChart, Reference, ScatterChart, Series
from openpyxl.chart.shapes import GraphicalProperties
from openpyxl.drawing.line import LineProperties
from openpyxl.worksheet.pagebreak import Break
from openpyxl.worksheet.worksheet import Worksheet

from engine.units import symbol
from workbook_templates.declare import DIRECTIONS, Curve, Figure, Role
from workbook_templates.draw import sheets, style
from workbook_templates.inputs import Inputs
from workbook_templates.layout import CRITERIA, FIGURES, LEVELS, TOP_GUARD, Layout

#: direction -> colour and dash; they differ in lightness too, so they hold in black and white.
LINES = {"X": ("1F3A5F", "solid"), "Y": ("B8651B", "sysDash")}
#: the same for lines in one chart, with a marker; a third one for what stands beside
STROKES = (
    (*LINES["X"], "circle"),
    (*LINES["Y"], "diamond"),
    ("5B7F3A", "lgDash", "triangle"),
)
LIMIT_ROW = 4
ON_A_PAGE = 2
WIDTH, HEIGHT, ROWS = 19.0, 9.6, 20  # cm, cm, sheet rows: two charts on one upright page


def draw(book: Mapping[str, Worksheet], layout: Layout, inputs: Inputs) -> None:
    """Place the charts one below the other."""
    sheet, levels = book[FIGURES], book[LEVELS]
    sheets.head(sheet, "Figures")
    sheet.column_dimensions["A"].width = 30
    figures = [one for part in layout.parts for figure in part.figures for one in _split(figure)]
    limited = [figure for figure, _ in figures if figure.limit is not None]
    top = LIMIT_ROW + len(limited) + 1
    for number, (figure, directions) in enumerate(figures):
        draw_one = _bars if figure.bars else _profile
        chart = draw_one(levels, layout, inputs, figure, directions)
        if figure in limited:
            chart.series.append(_limit_line(sheet, figure, LIMIT_ROW + limited.index(figure)))
        _place(sheet, chart, top + ROWS * number)
    curves = [curve for part in layout.parts for curve in part.curves]
    for number, curve in enumerate(curves, len(figures)):
        _place(sheet, _curves(book, layout, inputs, curve), top + ROWS * number)
    sheets.page(sheet, inputs.units, "1:2", landscape=False)
    for number in range(ON_A_PAGE, len(figures) + len(curves), ON_A_PAGE):
        sheet.row_breaks.append(Break(id=top + ROWS * number - 2))


def _split(figure: Figure) -> list[tuple[Figure, tuple[str, ...]]]:
    """One chart for both directions, or one for each where further columns stand beside it."""
    return [(figure, (d,)) for d in DIRECTIONS] if figure.beside else [(figure, DIRECTIONS)]


def _place(sheet: Worksheet, chart: BarChart | ScatterChart, row: int) -> None:
    chart.width, chart.height = WIDTH, HEIGHT
    sheet.add_chart(chart, f"A{row}")


def _curves(book: Mapping[str, Worksheet], layout: Layout, inputs: Inputs, curve: Curve) -> ScatterChart:
    """Columns of a table over one of its columns, and a marked point of each direction."""
    chart = ScatterChart()
    chart.style, chart.scatterStyle = 13, "lineMarker"
    grid = layout.grid(curve.over)
    quantities = {c.quantity.key: c.quantity for c in grid.columns}
    x, *ys = (
        Reference(book[grid.table.sheet], range_string=f"{grid.table.sheet}!{layout.level_range(key, None)}")
        for key in (curve.over, *curve.keys)
    )
    for key, y, line in zip(curve.keys, ys, LINES.values(), strict=False):
        series = Series(y, x, title=quantities[key].shown_symbol)
        _stroke(series, *line)
        series.marker.symbol = "none"
        chart.series.append(series)
    chart.series.extend(_point(layout, curve, direction) for direction in DIRECTIONS)
    chart.x_axis.scaling.min = chart.y_axis.scaling.min = 0
    x_title, y_title = (
        f"{q.text} [{symbol(q.unit, inputs.units)}]"
        for q in (quantities[curve.over], quantities[curve.keys[0]])
    )
    _finish(chart, curve.title, x_title, y_title)
    return chart


def _point(layout: Layout, curve: Curve, direction: str) -> Series:
    x, y = (
        Reference(range_string=f"{CRITERIA}!{layout.criteria_cell(key, direction)}") for key in curve.point
    )
    series = Series(y, x, title=f"{curve.point[0]}, direction {direction}")
    series.marker.symbol, series.marker.size = ("circle" if direction == "X" else "diamond"), 9
    series.marker.graphicalProperties = GraphicalProperties(solidFill=LINES[direction][0])
    series.graphicalProperties = GraphicalProperties(ln=LineProperties(noFill=True))
    series.smooth = False
    return series


def _title(layout: Layout, inputs: Inputs, figure: Figure) -> str:
    q = next(c.quantity for c in layout.table if c.quantity.key == figure.key)
    return figure.title if q.unit == "none" else f"{figure.title} [{symbol(q.unit, inputs.units)}]"


def _range(levels: Worksheet, layout: Layout, key: str, direction: str | None) -> Reference:
    column = levels[f"{layout.column(key, direction)}1"].column
    return Reference(levels, min_col=column, min_row=TOP_GUARD, max_row=layout.bottom_guard)


def _bars(
    levels: Worksheet, layout: Layout, inputs: Inputs, figure: Figure, directions: tuple[str, ...]
) -> BarChart:
    """A quantity level by level."""
    chart = BarChart()
    chart.type, chart.gapWidth = "bar", 60
    for direction in directions:
        series = Series(_range(levels, layout, figure.key, direction), title=f"Direction {direction}")
        series.graphicalProperties = GraphicalProperties(solidFill=LINES[direction][0])
        chart.series.append(series)
    chart.set_categories(_range(levels, layout, "name", None))
    chart.x_axis.scaling.orientation = "maxMin"  # the first row of the table is the highest level
    chart.y_axis.crosses = "max"
    title = _title(layout, inputs, figure)
    _finish(chart, title, "Level", title)
    return chart


def _profile(
    levels: Worksheet, layout: Layout, inputs: Inputs, figure: Figure, directions: tuple[str, ...]
) -> ScatterChart:
    """A quantity over the height above the base."""
    chart = ScatterChart()
    chart.style, chart.scatterStyle = 13, "lineMarker"
    places = [(key, direction) for key in (figure.key, *figure.beside) for direction in directions]
    names = {c.quantity.key: c.quantity.shown_symbol for c in layout.table}
    for (key, direction), (colour, dash, marker) in zip(places, STROKES, strict=False):
        x, y = _range(levels, layout, key, direction), _range(levels, layout, "h_x", None)
        series = Series(y, x, title=names[key] if figure.beside else f"Direction {direction}")
        _stroke(series, colour, dash)
        series.marker.symbol, series.marker.size = marker, 6
        chart.series.append(series)
    chart.x_axis.scaling.min = chart.y_axis.scaling.min = 0
    title = _title(layout, inputs, figure)
    if figure.beside:
        title = f"{title}, direction {directions[0]}"
    _finish(chart, title, title, f"Height above base h_x [{symbol('length', inputs.units)}]")
    return chart


def _limit_line(sheet: Worksheet, figure: Figure, row: int) -> Series:
    """The limit as a vertical line: two points in cells that anyone can read, values before heights."""
    style.write(sheet.cell(row, 1), f"Limit line, {figure.key}: value, height", style.SMALL)
    for column, value in enumerate((figure.limit, figure.limit, 0, "=h_n"), 2):
        sheet.cell(row, column, value)
        style.dress(sheet.cell(row, column), Role.LINK, "0.00")
    x = Reference(sheet, min_col=2, max_col=3, min_row=row)
    y = Reference(sheet, min_col=4, max_col=5, min_row=row)
    series = Series(y, x, title="Limit")
    _stroke(series, "8A0F1E", "lgDash")
    series.marker.symbol = "none"
    return series


def _stroke(series: Series, colour: str, dash: str) -> None:
    series.graphicalProperties = GraphicalProperties(
        ln=LineProperties(solidFill=colour, prstDash=dash, w=22000)
    )
    series.smooth = False


def _finish(chart: BarChart | ScatterChart, title: str, x_title: str, y_title: str) -> None:
    chart.title, chart.legend.position = title, "r"
    chart.x_axis.title, chart.y_axis.title = x_title, y_title
    chart.x_axis.delete = chart.y_axis.delete = False
    chart.y_axis.number_format, chart.y_axis.numFmt.sourceLinked = "General", False
    chart.display_blanks = "gap"
