"""Many workbooks audited at once: which files, a journal to go on from, a bar on a terminal, a summary."""

from __future__ import annotations

import json
import os
from collections.abc import Callable, Iterator, Sequence
from dataclasses import asdict, replace
from pathlib import Path
from typing import Final

import click
from rich.console import Console
from rich.progress import track

from engine.version import __version__
from xlbridge.audit import many
from xlbridge.audit.many import Outcome
from xlbridge.audit.report import summary
from xlbridge.cli.failure import BAD_INPUT, CLEAN, FINDINGS, INCOMPLETE, Refusal
from xlbridge.cli.files import refuse_existing, write_new
from xlbridge.cli.own_template import own_template

JOURNAL: Final = ".jsonl"
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
        for path in (paths if known else ())
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
        write_new(wanted, _bytes(FORMS[wanted.suffix.lower()](ordered)), force)
    text = summary.as_json(ordered) if as_json else "\n".join(map(_plain, _lines(ordered)))
    click.echo(_bytes(text).decode())
    return max(CODES[outcome.verdict] for outcome in ordered)


def _inside(folder: Path) -> list[Path]:
    return sorted(
        path
        for path in folder.rglob("*")
        if path.suffix.lower() in ENDINGS and not path.name.startswith("~$") and path.is_file()
    )


def _journal(path: Path) -> Iterator[tuple[str, Outcome]]:
    """The outcomes of an earlier run by the hash of the file.

    A line that was cut off, or that another version wrote, counts for nothing.
    """
    if path.suffix.lower() != JOURNAL:
        raise Refusal(f"{path}: a journal ends in {JOURNAL}")
    if not path.parent.is_dir():
        raise Refusal(f"{path}: the folder {path.parent} does not exist, make it first")
    text = path.read_text(encoding="utf-8", errors="replace") if path.exists() else ""
    for line in text.splitlines():
        try:
            record = json.loads(line)
            version, outcome = record.pop("storyledger"), Outcome(**record)
        except (ValueError, TypeError, AttributeError, KeyError):
            continue
        if version == __version__:
            yield outcome.sha256, outcome


def _note(path: Path, outcome: Outcome) -> None:
    """Add a line; it begins with an end of line where the last one was cut off, so that neither is lost."""
    record = {"storyledger": __version__, **asdict(outcome)}
    with path.open("a+b") as lines:
        size = lines.seek(0, os.SEEK_END)
        lines.seek(max(0, size - 1))
        cut = size and lines.read(1) != b"\n"
        lines.write(b"\n" * bool(cut) + _bytes(json.dumps(record, ensure_ascii=False)) + b"\n")


def _bytes(text: str) -> bytes:
    """A text in UTF-8; a byte of a file's name that is none there is written as its escape."""
    return text.encode("utf-8", "backslashreplace")


def _plain(line: str) -> str:
    """A line for a terminal: what would move its cursor, or begin another line, is written as its escape."""
    return "".join(c if c.isprintable() else c.encode("unicode_escape").decode() for c in line)


def _lines(outcomes: list[Outcome]) -> Iterator[str]:
    for o in outcomes:
        counts = f"checked {o.checked} of {o.formula_cells}, {o.errors} errors, {o.warnings} warnings"
        yield f"{o.verdict:<14} {o.path}: {o.failure or counts}"
    clean = sum(o.verdict == "✓ clean" for o in outcomes)
    yield f"{clean} of {len(outcomes)} clean"
