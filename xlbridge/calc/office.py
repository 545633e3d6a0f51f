"""A headless LibreOffice of our own, with a private profile, asked through ``office_driver.py``."""

from __future__ import annotations

import contextlib
import functools
import json
import os
import select
import shutil
import signal
import subprocess
from collections.abc import Iterator
from pathlib import Path
from typing import IO, Any, Final, Self, cast

from xlbridge.values import CellError

#: the variable that names the office's program folder, where it is in no usual place
PROGRAM: Final = "STORYLEDGER_OFFICE"
_PROGRAMS = ("/usr/lib/libreoffice/program", "/usr/lib64/libreoffice/program", "/opt/libreoffice/program")
_PYTHONS = ("/usr/bin/python3", "/usr/local/bin/python3")
_PATIENCE = 180.0  # seconds


class OfficeError(RuntimeError):
    """The office refused a job, or is gone."""


@functools.cache
def installation() -> tuple[Path, Path] | None:
    """The office's program and a Python that can talk to it, or None."""
    found = shutil.which("soffice")
    named = [os.environ[PROGRAM]] if PROGRAM in os.environ else []
    places: list[str | Path] = [*named, *([Path(found).resolve().parent] if found else []), *_PROGRAMS]
    folder = next((Path(place) for place in places if Path(place, "soffice.bin").exists()), None)
    if folder is None:
        return None
    pythons = [Path(python) for python in _PYTHONS] + [folder / "python"]
    return next(((folder / "soffice.bin", python) for python in pythons if _has_uno(python)), None)


def missing() -> str:
    """Why there is no office to ask; empty if there is one."""
    return "" if installation() else "LibreOffice Calc with its Python bridge (python3-uno) is not installed"


def _has_uno(python: Path) -> bool:
    if not python.exists():
        return False
    return subprocess.run([python, "-c", "import uno"], capture_output=True, check=False).returncode == 0


def _environment() -> dict[str, str]:
    """What the office may see: its own Python would take a virtual environment on the path for its home."""
    mine = {name: value for name, value in os.environ.items() if not name.startswith("PYTHON")}
    return mine | {"PATH": os.defpath}


class Office:
    """A running office; ``with Office() as office: …``.

    ``addins`` is a folder of unpacked extensions; ``variables`` are added to its environment. It is ended by
    its process id, never by name.
    """

    driver = Path(__file__).with_name("office_driver.py")

    def __init__(self, addins: Path | None = None, **variables: str) -> None:
        found = installation()
        if found is None:
            raise OfficeError(missing())
        program, python = found
        command = [str(python), str(self.driver), str(program), *([str(addins)] if addins else [])]
        self._driver = subprocess.Popen(
            command, stdin=subprocess.PIPE, stdout=subprocess.PIPE, env=_environment() | variables, text=True
        )
        self._questions = cast(IO[str], self._driver.stdin)
        self._answers = cast(IO[str], self._driver.stdout)
        try:
            self._office_id = int(self._receive()["office"])
        except OfficeError:
            self.end()
            raise

    def __enter__(self) -> Self:
        return self

    def __exit__(self, *_: object) -> None:
        self.end()

    def end(self) -> None:
        """End the office and its driver; both by process id if they do not leave by themselves."""
        with contextlib.suppress(BrokenPipeError):
            self._questions.close()
        try:
            self._driver.wait(40)
        except subprocess.TimeoutExpired:
            self._kill()
        self._answers.close()

    def job(self, name: str, *arguments: Any, **options: Any) -> Any:
        """Have one job of the driver done and return its result."""
        request = {"job": name, "arguments": arguments, "options": options}
        self._questions.write(json.dumps(request, default=str) + "\n")
        self._questions.flush()
        answer = self._receive()
        if "failed" in answer:
            raise OfficeError(f"{name}: {answer['failed']}")
        return answer["result"]

    @property
    def version(self) -> str:
        """The office's version number."""
        return str(self.job("version"))

    @contextlib.contextmanager
    def open(self, path: Path, recalculate: bool = True) -> Iterator[Book]:
        """Load a workbook (a copy of it) and recalculate everything in it."""
        book = Book(self, self.job("open", path))
        try:
            if recalculate:
                book.recalculate()
            yield book
        finally:
            self.job("close", book.number)

    def values(self, path: Path) -> dict[tuple[str, str], Any]:
        """The recalculated values of all formula cells of a workbook, by (sheet, address)."""
        with self.open(path) as book:
            return book.formulas()

    def _receive(self) -> dict[str, Any]:
        ready, _, _ = select.select([self._answers], [], [], _PATIENCE)
        line = self._answers.readline() if ready else ""
        if not line:
            self._kill()
            raise OfficeError("the office did not answer")
        return dict(json.loads(line))

    def _kill(self) -> None:
        self._driver.kill()
        self._driver.wait()
        with contextlib.suppress(AttributeError, ProcessLookupError):
            os.kill(self._office_id, signal.SIGKILL)


class Book:
    """A workbook open in the office. Addresses are A1 style, formulas as written in an .xlsx file.

    Values are floats, texts, booleans, None for an empty cell and :class:`CellError`, whose reason is
    Calc's own error number.
    """

    def __init__(self, office: Office, number: int) -> None:
        self.office, self.number = office, number

    def recalculate(self) -> None:
        """Recalculate every cell, also those with stored values."""
        self._job("recalculate")

    def formulas(self) -> dict[tuple[str, str], Any]:
        """The values of all formula cells by (sheet, address)."""
        found = self._job("formulas")
        return {(sheet, cell): value_of(v) for sheet, cells in found.items() for cell, v in cells.items()}

    def store(self, path: Path) -> Path:
        """Store as .xlsx."""
        self._job("store", path)
        return path

    def pdf(self, path: Path) -> Path:
        """Print to a PDF file."""
        self._job("pdf", path)
        return path

    def _job(self, name: str, *arguments: Any) -> Any:
        return self.office.job(name, self.number, *arguments)


def value_of(value: Any) -> Any:
    """Return a value as the driver sends it: an error value carries Calc's own number as its reason."""
    return CellError(value["error"], f"Err:{value['code']}") if isinstance(value, dict) else value
