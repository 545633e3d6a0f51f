"""``storyledger compare``: what changed between two issues of a workbook, and what it did to the results."""

from __future__ import annotations

import json
from collections.abc import Iterator
from dataclasses import dataclass
from pathlib import Path
from typing import Any, Final

import click

from xlbridge.audit.compare.change import TOLERANCE, Change, Of, Result, shown
from xlbridge.audit.compare.changes import Issues
from xlbridge.audit.compare.influence import Influences, influences
from xlbridge.audit.report.as_json import plain
from xlbridge.audit.report.page import CAUTIONS
from xlbridge.audit.subject import Subject
from xlbridge.cli.failure import CLEAN, FINDINGS
from xlbridge.cli.own_template import own_template
from xlbridge.values import CellError

SHOWN: Final = 20
TITLES: Final = {
    Of.INPUT: "changed inputs",
    Of.ROW: "rows of entries added, removed or moved",
    Of.SHEET: "sheets",
    Of.LINE: "rows and columns of sheets",
    Of.FORMULA: "changed formulas",
    Of.CONTENT: "changed texts and numbers outside the inputs",
    Of.FORMAT: "number formats that show another thing",
    Of.NAME: "changed names",
}


@dataclass(frozen=True)
class Comparison:
    """All that is said of two issues."""

    issues: Issues
    changes: list[Change]
    results: list[Result]
    influences: Influences | None

    @classmethod
    def of(cls, issues: Issues) -> Comparison:
        """Compare them."""
        changes = [*issues.inputs(), *issues.cells()]
        return cls(issues, changes, list(issues.results()), influences(issues, changes))


@click.command("compare")
@click.argument("old", type=click.Path(path_type=Path))
@click.argument("new", type=click.Path(path_type=Path))
@click.option("--results", "all_results", is_flag=True, help="List every result that differs.")
@click.option("--json", "json_wanted", is_flag=True, help="Print the comparison as JSON.")
def command(old: Path, new: Path, all_results: bool, json_wanted: bool) -> int:
    """Say what changed from the issue OLD of a workbook to the issue NEW, and what each change did.

    Levels are known by their names, wherever they stand. Each changed input is made alone in OLD and solved
    again, so that it shows which result it moved. Exit code 1 says that something differs.
    """
    found = Comparison.of(Issues.of(Subject.open(old, own_template), Subject.open(new, own_template)))
    if json_wanted:
        click.echo(json.dumps(_record(found), indent=1, ensure_ascii=False))
    else:
        click.echo("\n".join([f"{old.name} against {new.name}", *_lines(found, all_results)]))
    return FINDINGS if found.changes or any(r.differs for r in found.results) else CLEAN


def _lines(found: Comparison, all_results: bool) -> Iterator[str]:
    yield from _change_lines(found.changes)
    for side, issue in (("old", found.issues.old), ("new", found.issues.new)):
        if issue.own and issue.own.unread:
            yield f"not compared: the inputs of the {side} issue, because {issue.own.unread}"
    if not found.issues.comparable:
        yield "results not compared: the issues are not both ours and readable, or not in the same units"
        return
    both = [result for result in found.results if None not in (result.old, result.new)]
    moved = [result for result in both if result.differs]
    gone = sum(result.new is None for result in found.results)
    come = len(found.results) - len(both) - gone
    further = "".join(f", {n} {what}" for n, what in ((gone, "gone"), (come, "new")) if n)
    yield f"results: {len(both)} in both, {len(moved)} differ{further}"
    words = [result for result in moved if result.change is None]
    yield from (f"  {_result(result)}" for result in (moved if all_results else words))
    if found.influences is None:
        yield "what each change did is not known: one of the two cannot be solved from its inputs"
    elif found.changes:
        yield from _influence_lines(found.influences)


def _change_lines(changes: list[Change]) -> Iterator[str]:
    """The changes by what they are of; those of one cause are one line."""
    for of, title in TITLES.items():
        mine = [change for change in changes if change.of is of]
        causes: dict[str, list[Change]] = {}
        for number, change in enumerate(mine):
            causes.setdefault(change.cause or str(number), []).append(change)
        if mine:
            yield f"{title}: {len(mine)}"
        for group in list(causes.values())[:SHOWN]:
            where = f"{group[0].cell}: " if group[0].cell else ""
            more = f" (and {len(group) - 1} more like it)" if len(group) > 1 else ""
            yield f"  {where}{group[0].words}{more}"
        if len(causes) > SHOWN:
            yield f"  and {len(causes) - SHOWN} more, see --json"
    if not changes:
        yield "nothing changed"


def _result(result: Result) -> str:
    if result.change is None:
        return f"{result.path}: {shown(result.old)}, now {shown(result.new)}"
    numbers = f"{result.path}: {result.old:.6g}, now {result.new:.6g}"
    return f"{numbers} ({_change(result.change, result.old)})"


def _influence_lines(found: Influences) -> Iterator[str]:
    """For each headline result the changes that moved it, the largest first."""
    for key in (key for key in found.old if key in found.new):
        total = found.new[key] - found.old[key]
        parts = sorted(
            ((one.moved.get(key, 0.0), one.words) for one in found.single), key=lambda p: -abs(p[0])
        )
        parts = [(by, words) for by, words in parts if by]
        if total or parts:
            yield f"{key}: {found.old[key]:.6g}, now {found.new[key]:.6g} ({_change(total, found.old[key])})"
            yield from (f"  {_change(by, found.old[key])} by {words}" for by, words in parts[:SHOWN])
            if abs(found.interplay[key]) > TOLERANCE * max(1.0, abs(found.new[key])):
                yield f"  {_change(found.interplay[key], found.old[key])} by the changes together"
    for one in (one for one in found.single if one.reason):
        yield f"not known what this did: {one.words}, because {one.reason}"


def _change(by: float, of: float) -> str:
    return f"{by:+.4g}, {100 * by / of:+.2f} %" if of else f"{by:+.4g}"


def _record(found: Comparison) -> dict[str, Any]:
    return {
        "cautions": list(CAUTIONS),
        "changes": [_change_record(change) for change in found.changes],
        "results": [_result_record(result) for result in found.results],
        "influence": _influence_record(found.influences) if found.influences else None,
    }


def _change_record(change: Change) -> dict[str, Any]:
    return {
        "of": change.of.value,
        "path": change.path,
        "cell": str(change.cell) if change.cell else None,
        "old": _plain(change.old),
        "new": _plain(change.new),
        "unit": change.unit,
        "words": change.words,
    }


def _result_record(r: Result) -> dict[str, Any]:
    numbers = {"change": r.change, "per_cent": r.per_cent}
    return {"path": r.path, "old": _plain(r.old), "new": _plain(r.new), "differs": r.differs, **numbers}


def _influence_record(found: Influences) -> dict[str, Any]:
    return {
        "old": dict(found.old),
        "new": dict(found.new),
        "alone": [
            {"words": one.words, "moved": dict(one.moved), "because": one.reason or None}
            for one in found.single
        ],
        "together": found.interplay,
    }


def _plain(value: Any) -> Any:
    return plain(value) if isinstance(value, CellError) else value
