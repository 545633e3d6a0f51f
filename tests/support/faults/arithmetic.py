"""Faults in what a formula computes."""

from __future__ import annotations

import re

from tests.support.faults import formula_text as texts
from tests.support.faults.catalogue import fault
from tests.support.faults.scene import Scene

FORM = ("formula_differs",)


@fault("formula", *FORM)
def sign_flipped(scene: Scene) -> None:
    """A plus becomes a minus, or the other way round."""
    table = {"+": "-", "-": "+"}
    scene.rewrite(scene.formulas, lambda text: texts.operators(text, scene.random, table))


@fault("formula", *FORM)
def operator_replaced(scene: Scene) -> None:
    """A product becomes a quotient, or the other way round."""
    table = {"*": "/", "/": "*"}
    scene.rewrite(scene.rows, lambda text: texts.operators(text, scene.random, table))


@fault("formula", *FORM)
def comparison_turned(scene: Scene) -> None:
    """A comparison looks the other way."""
    table = {"<=": ">=", ">=": "<=", "<": ">", ">": "<"}
    scene.rewrite(scene.formulas, lambda text: texts.operators(text, scene.random, table))


@fault("formula", *FORM)
def limit_no_longer_included(scene: Scene) -> None:
    """A comparison leaves its limit out, or takes it in."""
    table = {"<=": "<", ">=": ">", "<": "<=", ">": ">="}
    scene.rewrite(scene.formulas, lambda text: texts.operators(text, scene.random, table))


@fault("formula", "constant_changed")
def number_inside_changed(scene: Scene) -> None:
    """A number inside a formula has another value."""
    change = lambda value: f"{float(value) * 1.2 or 1:.6g}"  # noqa: E731
    scene.rewrite(scene.formulas, lambda text: texts.numbers(text, scene.random, change))


@fault("formula", "constant_changed")
def allowance_widened(scene: Scene) -> None:
    """The allowance for round-off inside a verdict becomes 10 per cent."""
    scene.rewrite(scene.rows, lambda text: text.replace("1E-12", "0.1", 1))


@fault("formula", *FORM)
def exponent_dropped(scene: Scene) -> None:
    """A power becomes a product with its exponent."""
    scene.rewrite(scene.formulas, lambda text: texts.operators(text, scene.random, {"^": "*"}))


@fault("formula", *FORM)
def argument_left_out(scene: Scene) -> None:
    """The last argument of a function is missing."""

    def shorter(text: str) -> str | None:
        call = texts.arguments(text)
        return f"={call[0]}({','.join(call[1][:-1])})" if call and len(call[1]) > 1 else None

    scene.rewrite(scene.formulas, shorter)


@fault("formula", *FORM, "other_reference")
def arguments_exchanged(scene: Scene) -> None:
    """Two arguments of a function change places."""

    def exchanged(text: str) -> str | None:
        call = texts.arguments(text)
        if not call or len(call[1]) < 2:
            return None
        place = scene.random.randrange(len(call[1]) - 1)
        parts = call[1]
        parts[place], parts[place + 1] = parts[place + 1], parts[place]
        return f"={call[0]}({','.join(parts)})"

    scene.rewrite(scene.formulas, exchanged)


@fault("formula", *FORM)
def related_function(scene: Scene) -> None:
    """A function gives way to one of its relatives."""
    table = {"ELF_VX": "ELF_MX", "ELF_MX": "ELF_VX", "ELF_HX": "ELF_BELOW", "ELF_DEFLECTION": "ELF_DRIFT"}
    table |= {"SUM": "AVERAGE", "MAX": "MIN", "MIN": "MAX", "COUNT": "COUNTA", "AND": "OR"}
    scene.rewrite(scene.formulas, lambda text: texts.functions(text, scene.random, table))


def _appended(scene: Scene, tail: str) -> None:
    scene.rewrite(scene.numeric(scene.rows), lambda text: text + tail)


def _wrapped(scene: Scene, form: str) -> None:
    scene.rewrite(scene.numeric(scene.rows), lambda text: form.format(text.removeprefix("=")))


@fault("formula", *FORM)
def unit_factor_added(scene: Scene) -> None:
    """A conversion of units is put into one formula."""
    _appended(scene, scene.pick(["*1000", "/9.81", "*12", "/4.448"]))


@fault("formula", *FORM)
def plug_number_added(scene: Scene) -> None:
    """A number is added to a formula so that a total comes out."""
    _appended(scene, scene.pick(["+50", "-12.5", "+0.01"]))


@fault("formula", *FORM)
def tiny_plug(scene: Scene) -> None:
    """So little is added that no printed digit moves."""
    _appended(scene, "+1E-11")


@fault("formula", *FORM)
def rounding_inserted(scene: Scene) -> None:
    """A value is rounded in the middle of the chain."""
    _wrapped(scene, "=ROUND({},1)")


@fault("formula", *FORM, "error_hidden")
def failure_hidden(scene: Scene) -> None:
    """A failure is turned into a zero: nobody sees that a level is missing."""
    _wrapped(scene, "=IFERROR({},0)")


@fault("formula", *FORM)
def capped(scene: Scene) -> None:
    """A result is capped at a number."""
    _wrapped(scene, "=MIN({},1000000)")


@fault("formula", *FORM)
def sign_taken_away(scene: Scene) -> None:
    """A result is made positive whatever it is."""
    _wrapped(scene, "=ABS({})")


@fault("formula", *FORM)
def result_as_text(scene: Scene) -> None:
    """A result is turned into a text with two decimals."""
    _wrapped(scene, '=TEXT({},"0.00")')


@fault("formula", *FORM)
def per_cent_sign(scene: Scene) -> None:
    """A per cent sign at the end divides the result by a hundred."""
    _wrapped(scene, "=({})%")


@fault("formula", *FORM, "volatile_function")
def chance_added(scene: Scene) -> None:
    """A random number times zero: nothing changes, but the workbook is never calculated to the end."""
    _appended(scene, "+0*RAND()")


@fault("formula", *FORM, "volatile_function")
def date_switch(scene: Scene) -> None:
    """A formula gives something else after a date far ahead."""
    _wrapped(scene, "=IF(TODAY()>73050,0,{0})")


@fault("formula", *FORM)
def whole_column_alike(scene: Scene) -> None:
    """Every formula of a column gets the same factor: the column is consistent, and wrong."""
    for cell in scene.column(scene.pick(scene.numeric(scene.rows))):
        scene.write(cell, f"{scene.text(cell)}*0.9")


@fault("formula", "constant_changed")
def verdict_words_exchanged(scene: Scene) -> None:
    """A verdict says that all is well where it is not."""

    def said(text: str) -> str:
        return text.replace('"✗ above limit"', '"✓ within limit"')

    scene.rewrite(scene.formulas, said)


@fault("formula", *FORM)
def condition_always_true(scene: Scene) -> None:
    """The condition of an IF is TRUE, whatever the numbers say."""
    scene.rewrite(scene.formulas, lambda text: re.sub(r"\bIF\([^(),\"]+,", "IF(TRUE,", text, count=1))


@fault("formula", *FORM)
def total_by_hand(scene: Scene) -> None:
    """A total is written as a sum of single cells: the next level is not in it."""
    cell = scene.pick(c for c in scene.totals if "SUM(" in scene.text(c))
    scene.write(cell, "=" + "+".join(place.address for place in scene.column(cell)))


@fault("formula", *FORM)
def total_of_what_is_shown(scene: Scene) -> None:
    """A total adds only the rows that a filter shows."""
    scene.rewrite(scene.totals, lambda text: text.replace("SUM(", "SUBTOTAL(109,", 1))
