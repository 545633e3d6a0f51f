"""``storyledger print``: a workbook as a calculation package in PDF."""

from __future__ import annotations

import hashlib
import re
import zipfile
from io import BytesIO
from pathlib import Path
from tempfile import TemporaryDirectory
from typing import Final

import click

from xlbridge.calc import office, recalculate
from xlbridge.cli.failure import INCOMPLETE, Refusal
from xlbridge.cli.files import refuse_existing, write_new
from xlbridge.cli.in_calc import refusal
from xlbridge.headless.compute import compute_into

#: the digits of the hash that are printed
DIGITS: Final = 12
_SHEET: Final = re.compile(r"xl/worksheets/[^/]+\.xml")
_FILE_NAME: Final = re.compile(rb"(<(?:\w+:)?oddFooter>[^<]*?&amp;F)")


@click.command("print")
@click.argument("book", type=click.Path(path_type=Path))
@click.option("-o", "--output", type=click.Path(path_type=Path), help="The PDF [BOOK.pdf].")
@click.option("--force", is_flag=True, help="Replace an existing output.")
def command(book: Path, output: Path | None, force: bool) -> int:
    """Print BOOK to a PDF through LibreOffice Calc, recalculated first, so that no page shows an old number.

    Where the footer of a page names the file, the first digits of the file's SHA-256 stand beside it.
    """
    target = output or book.with_suffix(".pdf")
    if target.suffix.lower() != ".pdf":
        raise Refusal(f"{target}: the printed package ends in .pdf")
    refuse_existing(target, force)
    with TemporaryDirectory(prefix="storyledger-print-") as folder:
        copy = Path(folder, book.name)
        computed = compute_into(book, copy)
        copy.write_bytes(_stamped(copy.read_bytes(), hashlib.sha256(book.read_bytes()).hexdigest()))
        try:
            printed = recalculate.pdf(copy)
        except office.OfficeError as error:
            raise refusal(error) from error
    write_new(target, printed, force)
    missing = len(computed.not_evaluated)
    click.echo(f"{target}: printed, {missing} cells not evaluated" if missing else f"{target}: printed")
    return INCOMPLETE if missing else 0


def _stamped(package: bytes, digest: str) -> bytes:
    """The package with the hash of the file beside its name in the footers."""
    stamp = rb"\g<1>   sha256 " + digest[:DIGITS].encode()
    packed = BytesIO()
    with zipfile.ZipFile(BytesIO(package)) as source, zipfile.ZipFile(packed, "w") as target:
        for part in source.infolist():
            data = source.read(part)
            target.writestr(part, _FILE_NAME.sub(stamp, data) if _SHEET.fullmatch(part.filename) else data)
    return packed.getvalue()
