"""Faults in how a workbook looks, prints and calculates: every number is right, and misleads."""

from __future__ import annotations

from collections.abc import Callable

from openpyxl.formatting.rule import FormulaRule
from openpyxl.styles import Alignment, Font, PatternFill

from tests.support.faults.catalogue import fault
from tests.support.faults.scene import CHECKS, CRITERIA, Scene
from xlbridge.headless.references import Cell, column_letters


def shown(scene: Scene) -> Cell:
    return scene.pick(scene.numeric(scene.level_rows))


def _styled(scene: Scene, cell: Cell, **style: object) -> None:
    for name, value in style.items():
        setattr(scene.at(cell), name, value)
    scene.touch(str(cell))


# number formats


@fault("structure", "format_misleads")
def format_shows_thousands(scene: Scene) -> None:
    """A comma at the end of the number format divides what is shown by a thousand."""
    _styled(scene, shown(scene), number_format="#,##0.0,")


@fault("structure", "format_misleads")
def format_shows_another_number(scene: Scene) -> None:
    """The number format is a number in quotes: the cell shows it whatever it holds."""
    _styled(scene, shown(scene), number_format='"412.5"')


@fault("structure", "format_misleads")
def format_puts_a_digit_in(scene: Scene) -> None:
    """The number format writes a digit before the number."""
    _styled(scene, shown(scene), number_format='"1"0.000')


@fault("structure", "format_misleads")
def format_hides_the_sign(scene: Scene) -> None:
    """The number format shows negative numbers as positive."""
    _styled(scene, shown(scene), number_format="0.000;0.000")


@fault("structure", "format_misleads")
def format_shows_nothing(scene: Scene) -> None:
    """The number format shows nothing."""
    _styled(scene, shown(scene), number_format=";;;")


@fault("structure", "format_misleads")
def format_says_that_it_holds(scene: Scene) -> None:
    """The number format of a verdict shows a text of its own."""
    _styled(scene, scene.pick(scene.verdicts), number_format='0;0;0;"✓ holds"')


@fault("structure", "format_coarse", "format_misleads")
def format_with_no_decimals(scene: Scene) -> None:
    """A ratio is shown with no decimals: 1.4 is 1."""
    cells = [c for c in scene.numeric(scene.level_rows) if "0.0000" in str(scene.at(c).number_format)]
    _styled(scene, scene.pick(cells), number_format="0")


@fault("structure", "format_misleads")
def format_of_an_entry_in_per_cent(scene: Scene) -> None:
    """An entry is shown in per cent."""
    _styled(scene, scene.entry("site.S_DS"), number_format="0.0%")


# colours and fonts


@fault("structure", "text_unseen")
def white_text(scene: Scene) -> None:
    """A number is white on white."""
    _styled(scene, shown(scene), font=Font(color="FFFFFFFF"), fill=PatternFill())


@fault("structure", "text_unseen")
def verdict_in_white(scene: Scene) -> None:
    """A verdict is white on white."""
    cell = scene.pick(scene.verdicts)
    _styled(scene, cell, font=Font(color="FFFFFFFF"), fill=PatternFill("solid", fgColor="FFFFFFFF"))


@fault("structure", "text_unseen")
def blacked_out(scene: Scene) -> None:
    """A number stands in black on black."""
    fill = PatternFill("solid", fgColor="FF000000")
    _styled(scene, shown(scene), font=Font(color="FF000000"), fill=fill)


@fault("structure", "text_unseen")
def text_of_one_point(scene: Scene) -> None:
    """A number is set in one point."""
    _styled(scene, shown(scene), font=Font(size=1))


@fault("structure", "text_unseen", missed="what pushes a text out of its cell is not compared")
def pushed_out_of_the_cell(scene: Scene) -> None:
    """A verdict is indented until it leaves its cell."""
    _styled(scene, scene.pick(scene.verdicts), alignment=Alignment(horizontal="left", indent=200))


# marks


@fault("structure", "mark_changed")
def marks_removed(scene: Scene) -> None:
    """The marks of the verdicts are gone: a failure looks like the rest."""
    sheet = scene.book[CHECKS]
    sheet.conditional_formatting = type(sheet.conditional_formatting)()
    scene.touch_one_of(CHECKS, f"{CHECKS}!A1:Z999")


@fault("structure", "mark_changed", "mark_overlaid")
def failures_marked_as_held(scene: Scene) -> None:
    """The mark of a failure has the colours of one that holds."""
    rules = [rule for area in scene.book[CHECKS].conditional_formatting for rule in area.rules]
    for rule in rules:
        rule.dxf = rules[0].dxf
    scene.causes = 2  # the status has a mark of its own
    scene.touch_one_of(CHECKS, f"{CHECKS}!A1:Z999")


@fault("structure", "mark_hides")
def mark_that_hides(scene: Scene) -> None:
    """A rule of the user's turns a column of results white where a limit is exceeded."""
    cell = scene.pick(scene.numeric(scene.level_rows))
    letter, rows = column_letters(cell.column), [place.row for place in scene.column(cell)]
    area = f"{letter}{min(rows)}:{letter}{max(rows)}"
    rule = FormulaRule(formula=[f"{letter}{min(rows)}>0"], font=Font(color="FFFFFFFF"))
    scene.book[cell.sheet].conditional_formatting.add(area, rule)
    scene.touch(f"{cell.sheet}!{area}")


# rules for entries


@fault("structure", "entry_rule_missing")
def entry_rules_removed(scene: Scene) -> None:
    """The rules for the entries of a sheet are gone."""
    scene.book[CRITERIA].data_validations.dataValidation = []
    scene.touch(f"{CRITERIA}!A1:Z999")


def _rule(scene: Scene, change: Callable[[object], None]) -> None:
    rules = [r for r in scene.book[CRITERIA].data_validations.dataValidation if r.type == "decimal"]
    rule = scene.pick(rules)
    change(rule)
    scene.touch(*(f"{CRITERIA}!{area}" for area in str(rule.sqref).split()))


@fault("structure", "entry_rule_widened")
def entry_rule_widened(scene: Scene) -> None:
    """The rule of an entry lets everything pass."""

    def widen(rule: object) -> None:
        rule.operator, rule.formula1, rule.formula2 = "greaterThan", "-1E9", None  # type: ignore[attr-defined]

    _rule(scene, widen)


@fault("structure", "entry_rule_widened")
def entry_rule_only_warns(scene: Scene) -> None:
    """The rule of an entry tells, and lets pass."""

    def warn(rule: object) -> None:
        rule.errorStyle = "information"  # type: ignore[attr-defined]

    _rule(scene, warn)


@fault("structure", "entry_rule_widened", "entry_rule_missing")
def entry_rule_silent(scene: Scene) -> None:
    """The rule of an entry is there, but its message is switched off."""

    def silence(rule: object) -> None:
        rule.showErrorMessage = False  # type: ignore[attr-defined]

    _rule(scene, silence)
