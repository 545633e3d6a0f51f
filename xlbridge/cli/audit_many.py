"""Many workbooks audited at once: which files, a journal to go on from, a bar on a terminal, a summary."""

from __future__ import annotations

import json
import os
from collections.abc import Callable, Iterator, Sequence
from dataclasses import replace
from pathlib import Path
from typing import Final

import click
from rich.console import Console
from rich.progress import track

from xlbridge.audit import many
from xlbridge.audit.many import Outcome
from xlbridge.audit.report import summary
from xlbridge.cli.failure import BAD_INPUT, CLEAN, FINDINGS, INCOMPLETE, Refusal
from xlbridge.cli.files import refuse_existing, write_new
from xlbridge.cli.own_template import own_template

ENDINGS: Final = (".xlsx", ".xlsm")
FORMS: Final[dict[str, Callable[[Sequence[Outcome]], str]]] = {
    ".html": summary.as_html,
    ".json": summary.as_json,
    ".csv": summary.as_csv,
}
CODES: Final = {
    "✓ clean": CLEAN,
    "✗ findings": FINDINGS,
    "– incomplete": INCOMPLETE,
    "✗ not audited": BAD_INPUT,
}


def workbooks(given: Sequence[Path]) -> list[Path]:
    """Return the files, those of folders included; a file that a program holds open is none."""
    found = [path for each in given for path in (_inside(each) if each.is_dir() else [each])]
    if not found:
        raise Refusal(f"{given[0]}: there is no workbook in the folder")
    return list(dict.fromkeys(found))


def audit_many(
    paths: list[Path], jobs: int | None, wanted: Path | None, journal: Path | None, force: bool, as_json: bool
) -> int:
    """Audit the files, write and print the summary; the exit code is that of the worst."""
    if wanted:
        if wanted.suffix.lower() not in FORMS:
            raise Refusal(f"{wanted}: a summary ends in {', '.join(FORMS)}")
        refuse_existing(wanted, force)
    known = dict(_journal(journal)) if journal else {}
    found = {
        path: replace(known[digest], path=str(path))
        for path in paths
        if (digest := many.sha256(path)) in known
    }
    left = [path for path in paths if path not in found]
    running = many.many(left, own_template, jobs or os.cpu_count() or 1)
    console = Console(stderr=True)
    bar = track(running, "audit", total=len(left), console=console, disable=not console.is_terminal)
    try:
        for outcome in bar:
            found[Path(outcome.path)] = outcome
            if journal and outcome.sha256:
                _note(journal, outcome)
    except KeyboardInterrupt:
        running.close()
        ways = f"; go on with --resume {journal}" if journal else ""
        raise Refusal(f"interrupted, {len(found)} of {len(paths)} audited{ways}") from None
    ordered = [found[path] for path in paths]
    if wanted:
        write_new(wanted, FORMS[wanted.suffix.lower()](ordered).encode(), force)
    click.echo(summary.as_json(ordered) if as_json else "\n".join(_lines(ordered)))
    return max(CODES[outcome.verdict] for outcome in ordered)


def _inside(folder: Path) -> list[Path]:
    return sorted(
        path
        for path in folder.rglob("*")
        if path.suffix.lower() in ENDINGS and not path.name.startswith("~$") and path.is_file()
    )


def _journal(path: Path) -> Iterator[tuple[str, Outcome]]:
    """The outcomes of an earlier run by the hash of the file; a line that was cut off counts for nothing."""
    for line in path.read_text(encoding="utf-8").splitlines() if path.exists() else ():
        try:
            outcome = Outcome(**json.loads(line))
        except (json.JSONDecodeError, TypeError):
            continue
        yield outcome.sha256, outcome


def _note(path: Path, outcome: Outcome) -> None:
    record = {key: value for key, value in outcome.record().items() if key != "verdict"}
    with path.open("a", encoding="utf-8") as lines:
        lines.write(json.dumps(record, ensure_ascii=False) + "\n")


def _lines(outcomes: list[Outcome]) -> Iterator[str]:
    for o in outcomes:
        counts = f"checked {o.checked} of {o.formula_cells}, {o.errors} errors, {o.warnings} warnings"
        yield f"{o.verdict:<14} {o.path}: {o.failure or counts}"
    clean = sum(o.verdict == "✓ clean" for o in outcomes)
    yield f"{clean} of {len(outcomes)} clean"
