"""Serves one private LibreOffice: JSON jobs on stdin, JSON answers on stdout, one a line.

Run by a Python that has ``uno`` (Debian: /usr/bin/python3), not by the one that asks:
``office_driver.py SOFFICE_BIN [ADDINS_FOLDER]``. The office has a profile of its own in a temporary
folder, listens on a pipe of its own, and is ended by its process id. When stdin ends, all is cleaned up.
"""

import json
import os
import shutil
import subprocess
import sys
import tempfile
import time
import uuid

import uno
from com.sun.star.beans import PropertyValue
from com.sun.star.connection import NoConnectException

START_AGAIN = 81  # how the first start on a fresh profile ends
FORMULA_CELLS = 16  # com.sun.star.sheet.CellFlags.FORMULA
ERRORS = {
    502: "#VALUE!",
    503: "#NUM!",
    504: "#VALUE!",
    519: "#VALUE!",
    521: "#NULL!",
    523: "#NUM!",
    524: "#REF!",
    525: "#NAME?",
    532: "#DIV/0!",
    32767: "#N/A",
}


def url(path):
    return uno.systemPathToFileUrl(os.path.abspath(path))


def properties(**values):
    return tuple(PropertyValue(name, 0, value, 0) for name, value in values.items())


class Office:
    """A running office; a class with __enter__ because contextlib cannot pass UNO exceptions on."""

    def __init__(self, program, addins, folder):
        self.pipe, self.folder = "storyledger" + uuid.uuid4().hex, folder
        self.command = [
            program,
            "--headless",
            "--invisible",
            "--norestore",
            "--nologo",
            "--nodefault",
            "--nofirststartwizard",
            f"--accept=pipe,name={self.pipe};urp;StarOffice.ComponentContext",
            "-env:UserInstallation=" + url(os.path.join(folder, "profile")),
        ]
        if addins:
            self.command.append("-env:BUNDLED_EXTENSIONS=" + url(addins))

    def __enter__(self):
        self._start()
        try:
            self.context = self._connect(time.monotonic() + 120)
        except BaseException:
            self._end()
            raise
        self.desktop = self.service("com.sun.star.frame.Desktop")
        return self

    def __exit__(self, *_):
        try:
            self.desktop.terminate()
            self.process.wait(20)
        except Exception:  # an office that is gone or stuck cannot be asked to leave
            pass
        self._end()

    def service(self, name):
        return self.context.ServiceManager.createInstanceWithContext(name, self.context)

    def _start(self):
        environment = dict(os.environ, LC_ALL="C.UTF-8", LANGUAGE="en_US")
        self.process = subprocess.Popen(
            self.command, env=environment, stdin=subprocess.DEVNULL, stdout=subprocess.DEVNULL, stderr=2
        )

    def _connect(self, deadline):
        local = uno.getComponentContext()
        name = "com.sun.star.bridge.UnoUrlResolver"
        resolver = local.ServiceManager.createInstanceWithContext(name, local)
        while time.monotonic() < deadline:
            try:
                return resolver.resolve(f"uno:pipe,name={self.pipe};urp;StarOffice.ComponentContext")
            except NoConnectException:
                if self.process.poll() == START_AGAIN:
                    self._start()
                elif self.process.returncode is not None:
                    raise RuntimeError(f"the office ended with {self.process.returncode}") from None
                time.sleep(0.05)
        raise TimeoutError("the office did not answer")

    def _end(self):
        if self.process.poll() is None:
            self.process.kill()
        self.process.wait()


class Jobs:
    """What can be asked for; each public method is one job."""

    def __init__(self, office):
        self.office, self.books, self.count = office, {}, 0

    def open(self, path):
        """Load a copy, so that no lock file appears beside the workbook."""
        self.count += 1
        folder = os.path.join(self.office.folder, str(self.count))
        os.mkdir(folder)
        copy = shutil.copy(path, folder)
        book = self.office.desktop.loadComponentFromURL(url(copy), "_blank", 0, properties(Hidden=True))
        if book is None:
            raise ValueError(f"cannot load {os.path.basename(path)}")
        self.books[self.count] = book
        return self.count

    def close(self, book):
        self.books.pop(book).close(True)

    def recalculate(self, book):
        self.books[book].calculateAll()

    def formulas(self, book):
        """Values of all formula cells by sheet and address."""
        return {sheet.Name: dict(formula_cells(sheet)) for sheet in self.books[book].Sheets}

    def store(self, book, path, filter="Calc MS Excel 2007 XML"):
        self.books[book].storeToURL(url(path), properties(FilterName=filter, Overwrite=True))

    def pdf(self, book, path):
        self.store(book, path, "calc_pdf_Export")

    def version(self):
        access = self.office.service("com.sun.star.configuration.ConfigurationProvider")
        arguments = properties(nodepath="/org.openoffice.Setup/Product")
        product = access.createInstanceWithArguments(
            "com.sun.star.configuration.ConfigurationAccess", arguments
        )
        return product.getByName("ooSetupVersionAboutBox")


def formula_cells(sheet):
    for block in sheet.queryContentCells(FORMULA_CELLS):
        first = block.RangeAddress
        for row, line in enumerate(values(block), first.StartRow + 1):
            for column, value in enumerate(line, first.StartColumn):
                yield f"{letters(column)}{row}", value


def values(block):
    data = block.getDataArray()  # one call for the block; only what it leaves open is asked cell by cell
    return [
        [value_of(block, row, column, value) for column, value in enumerate(line)]
        for row, line in enumerate(data)
    ]


def value_of(block, row, column, value):
    """A float, a text, a boolean, None for an empty cell or {"error": kind, "code": Calc's number}."""
    if isinstance(value, float) and value not in (0.0, 1.0):
        return value
    cell = block.getCellByPosition(column, row)
    if code := cell.getError():
        return {"error": ERRORS.get(code, "#VALUE!"), "code": code}
    if isinstance(value, float):
        return {"TRUE": True, "FALSE": False}.get(cell.String, value)
    return None if cell.Type.value == "EMPTY" else cell.String


def letters(column):
    head, tail = divmod(column, 26)
    return (letters(head - 1) if head else "") + chr(65 + tail)


def answer(jobs, line):
    job = json.loads(line)
    try:
        return {"result": getattr(jobs, job["job"])(*job["arguments"], **job["options"])}
    except Exception as error:
        return {"failed": f"{type(error).__name__}: {error}"}


def main(kind=Jobs):
    program, addins = sys.argv[1], sys.argv[2] if len(sys.argv) > 2 else None
    with (
        tempfile.TemporaryDirectory(prefix="storyledger-office-") as folder,
        Office(program, addins, folder) as office,
    ):
        jobs = kind(office)
        print(json.dumps({"office": office.process.pid}), flush=True)
        for line in sys.stdin:
            print(json.dumps(answer(jobs, line)), flush=True)


if __name__ == "__main__":
    main()
