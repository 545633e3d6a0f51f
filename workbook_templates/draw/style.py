"""How the sheets look: one face, three weights of border, and a letter, a border and a fill for each role."""

from __future__ import annotations

from typing import Final

from openpyxl.cell import Cell, MergedCell
from openpyxl.styles import Alignment, Border, Font, PatternFill, Side
from openpyxl.styles.differential import DifferentialStyle

from engine.units import SI
from workbook_templates.declare import Quantity, Role

AnyCell = Cell | MergedCell

FACE: Final = "Calibri"
INK: Final = "1B1B1B"
RULE: Final = "7A7A7A"
BAND: Final = "E4E1EC"

TITLE = Font(name=FACE, size=15, bold=True, color=INK)
HEADING = Font(name=FACE, size=11, bold=True, color=INK)
BODY = Font(name=FACE, size=10, color=INK)
BOLD = Font(name=FACE, size=10, bold=True, color=INK)
SMALL = Font(name=FACE, size=8, color="3D3D3D")
LINKED = Font(name=FACE, size=10, color=INK, underline="single")

_THIN = Side(style="thin", color=RULE)
_HAIR = Side(style="hair", color=RULE)
_MEDIUM = Side(style="medium", color=INK)
_DOTTED = Side(style="dotted", color=RULE)

GUARD_FILL = PatternFill("solid", fgColor="C9C6D3")
BAND_FILL = PatternFill("solid", fgColor=BAND)
FAIL = DifferentialStyle(font=Font(bold=True, color="6B0012"), fill=PatternFill(bgColor="F9DDE0"))
LOOK = DifferentialStyle(font=Font(bold=True, color="4A3400"), fill=PatternFill(bgColor="FBEFC9"))

RIGHT = Alignment(horizontal="right", vertical="center")
TEXT = Alignment(horizontal="left", vertical="center", wrap_text=True, indent=1)
INDENTED = Alignment(horizontal="left", vertical="center", indent=1)
TOP = Alignment(wrap_text=True, vertical="top")
LEFT = Alignment(horizontal="left", vertical="center")
WRAP = Alignment(wrap_text=True, vertical="center")
CENTRE = Alignment(horizontal="center", vertical="center", wrap_text=True)

#: role -> border and fill; the letter is the role's first.
ROLES: Final = {
    Role.INPUT: (Border(_THIN, _THIN, _THIN, _THIN), PatternFill("solid", fgColor="EAF3F1")),
    Role.FIXED: (Border(_DOTTED, _DOTTED, _DOTTED, _DOTTED), PatternFill("solid", fgColor="EFEFEF")),
    Role.LINK: (Border(bottom=_DOTTED), None),
    Role.CALCULATION: (Border(bottom=_HAIR), None),
    Role.RESULT: (Border(top=_THIN, bottom=_MEDIUM), PatternFill("solid", fgColor="F6F4FB")),
    Role.VERDICT: (Border(left=_MEDIUM, bottom=_HAIR), None),
}

_DECIMALS: Final = {
    "none": 3,
    "time": 3,
    "acceleration": 3,
    "length": 2,
    "force": 1,
    "moment": 0,
}


def letter(role: Role) -> str:
    """Return the letter that marks a role."""
    return role.value[0]


def number_format(q: Quantity, system: str) -> str:
    """Return the number format of a quantity: text stays text, units set the decimals."""
    if q.unit == "text":
        return "@" if q.role in (Role.INPUT, Role.FIXED) else "General"
    decimals = q.decimals
    if decimals is None:
        decimals = _DECIMALS.get(q.unit, 1 if system == SI else 3)
    return f"#,##0.{'0' * decimals}".rstrip(".")


def dress(cell: AnyCell, role: Role, number_format: str = "General") -> None:
    """Give a cell the look of its role."""
    border, fill = ROLES[role]
    cell.font = BOLD if role is Role.RESULT else BODY
    cell.border = border
    if fill is not None:
        cell.fill = fill
    cell.number_format = number_format
    text = number_format in ("@", "General")
    cell.alignment = TEXT if text else RIGHT


def write(cell: AnyCell, value: object, font: Font = BODY, alignment: Alignment | None = None) -> None:
    """Write a label."""
    cell.value = value
    cell.font = font
    if alignment is not None:
        cell.alignment = alignment
