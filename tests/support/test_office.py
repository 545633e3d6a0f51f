"""The tests' own LibreOffice does what it is told, and nothing is left behind."""

from __future__ import annotations

from pathlib import Path

import pytest
from openpyxl import Workbook, load_workbook

from tests.conftest import require_office
from tests.support import office as offices
from tests.support.office import Office, OfficeError
from xlbridge.values import CellError


@pytest.fixture
def path(tmp_path: Path) -> Path:
    book = Workbook()
    sheet = book.active
    sheet.title = "Data"
    for row, cells in enumerate([(2.0, "=A1*2"), (3.0, "=A2*2"), (0.0, "=1/A3"), (None, '="te"&"xt"')], 1):
        for column, cell in enumerate(cells, 1):
            sheet.cell(row, column, cell)
    sheet["C1"], sheet["C2"] = "=A1>1", "=NA()"
    book.save(tmp_path / "book.xlsx")
    return tmp_path / "book.xlsx"


def test_values_of_every_kind(office: Office, path: Path) -> None:
    found = {cell: value for (_, cell), value in office.values(path).items()}
    assert found == {
        "B1": 4.0,
        "B2": 6.0,
        "B3": CellError("#DIV/0!"),
        "B4": "text",
        "C1": True,
        "C2": CellError("#N/A"),
    }
    assert found["B3"].reason == "Err:532"
    assert [entry.name for entry in path.parent.iterdir()] == ["book.xlsx"]


def test_editing(office: Office, path: Path) -> None:
    with office.open(path) as book:
        book.set_formula("Data", "D1", '=IF(Data!$A1>2,SUM($A$1:$A$3),"low")')
        book.fill_down("Data", "D1:D3")
        book.insert_rows("Data", 2)
        book.set_value("Data", "A2", 10.0)
        book.recalculate()
        assert book.read("Data", "D1:D4") == [["low"], [None], [15.0], ["low"]]
        assert book.formula("Data", "D3") == '=IF($Data.$A3>2;SUM($A$1:$A$4);"low")'
        book.delete_rows("Data", 2)
        book.recalculate()
        assert book.value("Data", "D2") == 5.0


def test_storing(office: Office, path: Path, tmp_path: Path) -> None:
    with office.open(path) as book:
        stored = book.store(tmp_path / "stored.xlsx")
        assert book.pdf(tmp_path / "stored.pdf").read_bytes().startswith(b"%PDF")
        assert book.sheets() == ["Data"]
    assert load_workbook(stored, data_only=True)["Data"]["B2"].value == 6


def test_a_refused_job_says_why(office: Office, path: Path) -> None:
    with office.open(path) as book, pytest.raises(OfficeError, match=r"read: .*NoSuchElement"):
        book.read("Nowhere", "A1")


def test_ending_leaves_no_process(office: Office) -> None:
    with Office() as second:
        process = Path(f"/proc/{second._office_id}")
        assert process.exists() or not Path("/proc").exists()
        assert second.version == office.version
    assert not process.exists()


def test_without_an_office_tests_are_skipped_or_fail(monkeypatch: pytest.MonkeyPatch) -> None:
    monkeypatch.setattr("xlbridge.calc.office.installation", lambda: None)
    monkeypatch.delenv(offices.REQUIRED, raising=False)
    with pytest.raises(pytest.skip.Exception, match="LibreOffice"):
        require_office()
    monkeypatch.setenv(offices.REQUIRED, "1")
    with pytest.raises(pytest.fail.Exception, match="LibreOffice"):
        require_office()
