"""``storyledger audit``: go through a workbook cell by cell, and prove it or name what is wrong."""

from __future__ import annotations

import json
from collections.abc import Callable, Iterator, Mapping
from pathlib import Path
from typing import Final, TypeAlias

import click

from xlbridge.audit import acceptance
from xlbridge.audit.audit import Audit, audit
from xlbridge.audit.finding import Effect
from xlbridge.audit.kinds import KINDS, Severity
from xlbridge.audit.record import Record
from xlbridge.audit.report import as_json
from xlbridge.audit.report.marked import marked
from xlbridge.audit.report.page import page
from xlbridge.audit.subject import Subject
from xlbridge.cli.audit_many import audit_many, workbooks
from xlbridge.cli.failure import CLEAN, FINDINGS, INCOMPLETE, Refusal
from xlbridge.cli.files import refuse_existing, refuse_input, write_new
from xlbridge.cli.own_template import own_template

SHOWN = 6


def _html(outcome: Audit, record: Record) -> bytes:
    return page(outcome, record).encode()


def _json(outcome: Audit, record: Record) -> bytes:
    return json.dumps(as_json.record(outcome), indent=1, ensure_ascii=False).encode()


Form: TypeAlias = Callable[[Audit, Record], bytes]

FORMS: Final[Mapping[str, Form]] = {".html": _html, ".json": _json}


def forms(book: Path) -> dict[str, Form]:
    """Return the forms of a report by ending; the marked copy of a workbook has its own ending."""
    return {**FORMS, ".xlsm" if book.suffix.lower() == ".xlsm" else ".xlsx": marked}


def _print_kinds(context: click.Context, _: click.Parameter, wanted: bool) -> None:
    """Print the closed catalogue of what can be found."""
    if not wanted or context.resilient_parsing:
        return
    for kind in KINDS.values():
        click.echo(f"{kind.key} ({kind.severity}, {kind.method}): {kind.title}")
        click.echo(f"   {kind.meaning} {kind.remedy}")
    context.exit()


@click.command("audit")
@click.argument("books", metavar="BOOK [MORE]...", nargs=-1, required=True, type=click.Path(path_type=Path))
@click.option(
    "--kinds",
    is_flag=True,
    expose_value=False,
    is_eager=True,
    callback=_print_kinds,
    help="List what can be found, with meaning and remedy.",
)
@click.option("--json", "json_wanted", is_flag=True, help="Print the audit as JSON.")
@click.option(
    "--report",
    "reports",
    multiple=True,
    type=click.Path(path_type=Path),
    help="F.html, F.json, or F.xlsx for a marked copy; repeatable.",
)
@click.option("--against", type=click.Path(path_type=Path), help="The issue of BOOK that was checked last.")
@click.option(
    "--record", type=click.Path(path_type=Path), help="The check record saved from an earlier page."
)
@click.option("--accept", type=click.Path(path_type=Path), help="A TOML file of findings that are right.")
@click.option("--force", is_flag=True, help="Replace existing reports.")
@click.option("--jobs", type=click.IntRange(1, 64), help="Of many: processes at a time [one a core].")
@click.option("--summary", type=click.Path(path_type=Path), help="Of many: F.html, F.json or F.csv.")
@click.option("--resume", type=click.Path(path_type=Path), help="Of many: a journal, F.jsonl, to go on from.")
def command(
    books: tuple[Path, ...],
    json_wanted: bool,
    reports: tuple[Path, ...],
    against: Path | None,
    record: Path | None,
    accept: Path | None,
    force: bool,
    jobs: int | None,
    summary: Path | None,
    resume: Path | None,
) -> int:
    """Prove BOOK cell by cell and from its inputs alone, or name what is wrong.

    Exit code 1 says that there are errors or warnings, 2 that something could not be checked. Of several
    files, or of a folder, several processes share the work, and a summary is given.
    """
    if len(books) > 1 or books[0].is_dir():
        if reports or against or record or accept:
            raise Refusal("--report, --against, --record and --accept are of one workbook: give one")
        return audit_many(workbooks(books), jobs, summary, resume, force, json_wanted)
    if jobs or summary or resume:
        raise Refusal("--jobs, --summary and --resume are of many workbooks: give several, or a folder")
    return _audit_one(books[0], json_wanted, reports, against, record, accept, force)


def _audit_one(
    book: Path,
    json_wanted: bool,
    reports: tuple[Path, ...],
    against: Path | None,
    record: Path | None,
    accept: Path | None,
    force: bool,
) -> int:
    made_by = forms(book)
    for target in reports:
        if target.suffix.lower() not in made_by:
            raise Refusal(f"{target}: a report of this workbook ends in {', '.join(made_by)}")
        refuse_input(target, book)
        refuse_existing(target, force)
    right = acceptance.read(accept.read_text(encoding="utf-8")) if accept else ()
    said = Record.read(record.read_text(encoding="utf-8")) if record else Record()
    outcome = audit(Subject.open(book, own_template, against), right)
    for target in reports:
        write_new(target, made_by[target.suffix.lower()](outcome, said), force)
    if json_wanted:
        click.echo(json.dumps(as_json.record(outcome), indent=1, ensure_ascii=False))
    else:
        click.echo("\n".join(lines(outcome)))
    return exit_code(outcome)


def _moved(effect: Effect) -> str:
    """What a finding does to one result, in words."""
    by = "" if effect.per_cent is None else f" ({effect.per_cent:+.2f} %)"
    unit = "" if effect.unit == "-" else f" {effect.unit}"
    return f"{effect.headline}: {effect.value:.6g}{unit}, without it {effect.without:.6g}{by}"


def exit_code(outcome: Audit) -> int:
    """Return the exit code of one audit."""
    if outcome.count(Severity.ERROR) or outcome.count(Severity.WARNING):
        return FINDINGS
    return INCOMPLETE if outcome.not_checked else CLEAN


def lines(outcome: Audit) -> Iterator[str]:
    """Yield the audit in words."""
    counts = f"checked {outcome.checked_cells} of {outcome.formula_cells} formula cells"
    yield f"{outcome.subject.path.name}: {counts}"
    for finding in outcome.findings:
        places = [str(place) for place in finding.places]
        more = f" and {len(places) - SHOWN} more" if len(places) > SHOWN else ""
        yield f"{finding.number}  {finding.kind.severity}: {finding.kind.title}"
        yield f"   {', '.join(places[:SHOWN])}{more}"
        yield f"   {finding.words}"
        yield from (f"   {_moved(effect)}" for effect in finding.effects if effect.change)
        if finding.accepted:
            yield f"   {finding.accepted}"
    for missing in outcome.not_checked[:SHOWN]:
        yield f"not checked: {missing.what} {missing.place}, because {missing.because}"
    if len(outcome.not_checked) > SHOWN:
        yield f"not checked: {len(outcome.not_checked) - SHOWN} more, see --json"
    yield ", ".join(f"{outcome.count(severity)} {severity}s" for severity in Severity)
