"""``storyledger names``: the functions of a workbook as Calc, or as Excel, reads them."""

from __future__ import annotations

from collections.abc import Callable
from pathlib import Path
from typing import Final

import click

from xlbridge.calc.names import for_calc, for_excel
from xlbridge.cli.failure import Refusal
from xlbridge.cli.files import refuse_existing, refuse_input, write_new
from xlbridge.headless.opening import BookError, read_file

FORMS: Final[dict[str, Callable[[bytes], bytes]]] = {"calc": for_calc, "excel": for_excel}


@click.command("names")
@click.argument("book", type=click.Path(path_type=Path))
@click.option("--for", "program", type=click.Choice(list(FORMS)), required=True, help="Who is to read it.")
@click.option("-o", "--output", type=click.Path(path_type=Path), help="The copy [BOOK-calc, BOOK-excel].")
@click.option("--force", is_flag=True, help="Replace an existing output.")
def command(book: Path, program: str, output: Path | None, force: bool) -> None:
    """Copy BOOK with its functions named as LibreOffice Calc, or as Excel, reads them.

    Calc before version 25 finds the functions of an extension in an .xlsx by its own long names only, and
    stores them so. Only formulas with our functions change.
    """
    target = output or book.with_name(f"{book.stem}-{program}{book.suffix}")
    if target.suffix.lower() != book.suffix.lower():
        raise Refusal(f"{target}: the copy of a workbook keeps its ending, {book.suffix or 'none'}")
    refuse_input(target, book)
    refuse_existing(target, force)
    try:
        write_new(target, FORMS[program](read_file(book)), force)
    except BookError as error:
        raise Refusal(str(error)) from error
    click.echo(f"{target}: functions named for {program}")
