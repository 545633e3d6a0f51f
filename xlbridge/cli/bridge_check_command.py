"""``storyledger bridge-check``: a workbook that shows whether the functions work in a spreadsheet program."""

from __future__ import annotations

from pathlib import Path
from typing import Final

import click

from workbook_templates import bridge, build
from xlbridge.catalogue import CATALOGUE
from xlbridge.cli import macro_kit
from xlbridge.cli.failure import Refusal
from xlbridge.cli.files import refuse_existing, write_new

BOOK: Final = ".xlsx"


@click.command("bridge-check")
@click.argument("book", type=click.Path(path_type=Path))
@click.option("--force", is_flag=True, help="Replace an existing BOOK.")
def command(book: Path, force: bool) -> None:
    """Make BOOK, with each function's worked example: expected, actual, verdict.

    Open it once after installation. A name in .xlsm gets xlwings' macros for Excel, one in .xlsx is for
    LibreOffice Calc or for an Excel that has the functions by other means. No value is stored in it: what it
    shows, the spreadsheet program has computed.
    """
    refuse_existing(book, force)
    if book.suffix.lower() == BOOK:
        write_new(book, build.package(bridge.draw()), force)
        click.echo(f"{book}: one line for each of {len(CATALOGUE)} functions")
        return
    if book.suffix.lower() != macro_kit.ENDING:
        raise Refusal(f"{book}: the name of the check ends in {macro_kit.ENDING} or {BOOK}")
    macro_kit.refuse_unfit(book, force)
    workbook = bridge.draw(_versions())
    macro_kit.fit_out(workbook)
    write_new(book, build.package(workbook), force)
    module = macro_kit.write_module(book, force)
    click.echo(f"{book}: one line for each of {len(CATALOGUE)} functions; import {module} into it once")


def _versions() -> tuple[bridge.Line, ...]:
    """The versions that must be those of the macros and of this check: only Excel's bridge is asked."""
    from xlbridge.excel.versions import VERSIONS

    return tuple(
        bridge.Line(f"Version of {part} that answers", VERSIONS[part], f'=STORYLEDGER_VERSION("{part}")')
        for part in ("storyledger", "xlwings")
    )
