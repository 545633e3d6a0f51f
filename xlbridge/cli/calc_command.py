"""``storyledger calc``: recalculate a workbook and store the values in a copy."""

from __future__ import annotations

import json
from collections.abc import Callable, Mapping
from pathlib import Path
from typing import Any

import click

from xlbridge.cli.failure import CLEAN, FINDINGS, INCOMPLETE, Refusal
from xlbridge.cli.files import refuse_existing
from xlbridge.cli.in_calc import in_calc
from xlbridge.headless.compute import compute_into
from xlbridge.values import CellError, Scalar

SHOWN = 20


@click.command("calc")
@click.argument("book", type=click.Path(path_type=Path))
@click.option(
    "-o",
    "--output",
    type=click.Path(path_type=Path),
    help="The computed copy [BOOK-computed.xlsx].",
)
@click.option("--json", "as_json", is_flag=True, help="Print counts, errors and every value as JSON.")
@click.option(
    "--with",
    "engine",
    type=click.Choice(("headless", "calc")),
    default="headless",
    help="Who computes: no spreadsheet program, or LibreOffice Calc with our functions [headless].",
)
@click.option("--force", is_flag=True, help="Replace an existing output.")
def command(book: Path, output: Path | None, as_json: bool, engine: str, force: bool) -> int:
    """Recalculate BOOK and store the values in a copy.

    The copy shows its numbers on a machine without the add-in; formulas and everything else in it are what
    they were. Exit code 1 says that cells hold error values, 2 that some could not be evaluated (they are
    stored as #N/A).
    """
    target = output or book.with_name(f"{book.stem}-computed{book.suffix}")
    if target.suffix.lower() != book.suffix.lower():
        raise Refusal(f"{target}: the copy of a workbook keeps its ending, {book.suffix or 'none'}")
    refuse_existing(target, force)
    computed = in_calc(book, target, force) if engine == "calc" else compute_into(book, target, force)
    if as_json:
        record = {"output": str(target), **computed.summary(), "values": _values(computed.values)}
        click.echo(json.dumps(record, indent=1, ensure_ascii=False))
    else:
        click.echo(_report(computed.summary(), target))
    if computed.not_evaluated:
        return INCOMPLETE
    return FINDINGS if computed.errors else CLEAN


def _values(values: Mapping[tuple[str, str], Scalar]) -> dict[str, dict[str, Any]]:
    sheets: dict[str, dict[str, Any]] = {}
    for (sheet, address), value in values.items():
        sheets.setdefault(sheet, {})[address] = _plain(value)
    return sheets


def _plain(value: Scalar) -> Any:
    return {"error": value.code, "reason": value.reason} if isinstance(value, CellError) else value


def _report(summary: dict[str, Any], target: Path) -> str:
    lines = [
        f"{summary['computed']} of {summary['formula_cells']} formula cells computed, "
        f"{len(summary['errors'])} with an error value, {len(summary['not_evaluated'])} not evaluated",
        *_by_reason(summary["errors"], lambda e: f"{e['error']}  {e['reason']}"),
        *_by_reason(summary["not_evaluated"], lambda n: f"not evaluated, because {n['reason']}"),
    ]
    return "\n".join([*lines, f"stored in {target}"])


def _by_reason(records: list[dict[str, str]], words: Callable[[dict[str, str]], str]) -> list[str]:
    """One line a reason with its cells: those of our own functions first, they are nearest to the cause."""
    cells: dict[str, list[str]] = {}
    for record in sorted(records, key=lambda record: not record["reason"].startswith("ELF_")):
        cells.setdefault(words(record), []).append(record["cell"])
    lines = [f"  {_listed(places)}  {reason}" for reason, places in list(cells.items())[:SHOWN]]
    return [*lines, f"  and {len(cells) - SHOWN} more reasons: see --json"] if len(cells) > SHOWN else lines


def _listed(cells: list[str]) -> str:
    more = f" and {len(cells) - 3} more" if len(cells) > 3 else ""
    return f"{', '.join(cells[:3])}{more}"
