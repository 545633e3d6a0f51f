"""What a finding does to the headline results: the workbook computed again with what is expected put back."""

from __future__ import annotations

from collections.abc import Iterable, Iterator, Mapping
from dataclasses import replace
from typing import Final

from xlbridge.audit.finding import Effect, Finding, NotChecked, Observation
from xlbridge.audit.subject import Subject
from xlbridge.audit.template import Headline
from xlbridge.headless.book import Book, Formula
from xlbridge.headless.compute import FUNCTIONS
from xlbridge.headless.evaluate import Evaluator
from xlbridge.headless.operands import NotEvaluated
from xlbridge.headless.references import Cell, parse_bounds
from xlbridge.values import Scalar

#: the kinds whose expected content can be put back into the cell
RESTORED: Final = frozenset(
    {
        *("constant_for_formula", "formula_missing", "row_not_filled", "formula_differs", "constant_changed"),
        *("other_reference", "range_shorter", "range_longer", "check_disarmed"),
        *("input_changed", "formula_changed"),
    }
)
STALE: Final = "stale_value"
#: each takes one computation of what the headline results read
AT_MOST: Final = 40

Values = Mapping[Cell, Scalar]


def with_effects(subject: Subject, findings: tuple[Finding, ...]) -> tuple[Finding, ...]:
    """Return the findings with what each does to the headline results; only the first of very many."""
    headlines = subject.own.headlines if subject.own else ()
    concerned = weighed(findings)[:AT_MOST]
    if not headlines or not concerned:
        return findings
    now = _values(subject.evaluator, headlines)
    found = {f.number: tuple(_effects(headlines, *_sides(subject, f, headlines, now))) for f in concerned}
    return tuple(replace(f, effects=found.get(f.number, ())) for f in findings)


def weighed(findings: tuple[Finding, ...]) -> list[Finding]:
    """The findings whose effect can be computed: what is expected is known, and the cell is still there."""
    return [
        f
        for f in findings
        if f.kind.key == STALE or (f.kind.key in RESTORED and all(p.address for p in f.places))
    ]


def not_weighed(subject: Subject, findings: tuple[Finding, ...]) -> tuple[NotChecked, ...]:
    """Say so where there are more findings than are weighed."""
    beyond = weighed(findings)[AT_MOST:] if subject.own and subject.own.headlines else []
    if not beyond:
        return ()
    what = f"effects of {len(beyond)} findings, from number {beyond[0].number} on,"
    return (NotChecked(what, f"only the first {AT_MOST} are weighed against the headline results"),)


def restored(book: Book, observations: Iterable[Observation]) -> Book:
    """Return the workbook with the expected content in the cells of these observations, or none if empty."""
    formulas = {sheet: dict(cells) for sheet, cells in book.formulas.items()}
    constants = {sheet: dict(cells) for sheet, cells in book.constants.items()}
    for o in observations:
        bounds = parse_bounds(o.place.address)
        cell = Cell(o.place.sheet, bounds.top, bounds.left)
        formulas[cell.sheet].pop((cell.row, cell.column), None)
        constants[cell.sheet].pop((cell.row, cell.column), None)
        if o.expected.startswith("="):
            formulas[cell.sheet][cell.row, cell.column] = Formula(cell, o.expected, bounds)
        elif o.expected and (value := _literal(o.expected)) is not None:
            constants[cell.sheet][cell.row, cell.column] = value
    return replace(book, formulas=formulas, constants=constants)


def _sides(
    subject: Subject, finding: Finding, headlines: tuple[Headline, ...], now: Values
) -> tuple[Values, Values]:
    """The headline values with the finding and without it.

    A stale value is one that the file shows: there the stored values stand against the recomputed ones.
    """
    if finding.kind.key == STALE:
        return {h.cell: subject.book.stored(h.cell) for h in headlines}, now
    try:
        mended = Evaluator(restored(subject.book, finding.observations), FUNCTIONS)
    except NotEvaluated:
        return now, {}  # what is expected is nothing that a cell can hold
    return now, _values(mended, headlines)


def _values(evaluator: Evaluator, headlines: tuple[Headline, ...]) -> Values:
    return dict(_evaluated(evaluator, headlines))


def _evaluated(evaluator: Evaluator, headlines: tuple[Headline, ...]) -> Iterator[tuple[Cell, Scalar]]:
    for headline in headlines:
        try:
            yield headline.cell, evaluator.value(*headline.cell)
        except NotEvaluated:
            continue


def _effects(headlines: tuple[Headline, ...], as_is: Values, without: Values) -> Iterator[Effect]:
    """The effect on each headline result that is a number both with the finding and without it."""
    for headline in headlines:
        first, second = as_is.get(headline.cell), without.get(headline.cell)
        if isinstance(first, float) and isinstance(second, float):
            yield Effect(headline.name, headline.unit, first, second)


def _literal(text: str) -> Scalar:
    value = Evaluator(None, {}).evaluate_text(f"={text}")
    return None if isinstance(value, tuple) else value
