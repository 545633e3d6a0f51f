"""Function names in an .xlsx: there for Calc, back for Excel, and nothing else changed."""

from __future__ import annotations

import io
import zipfile
from html import unescape
from pathlib import Path

import openpyxl
import pytest
from openpyxl import Workbook
from openpyxl.formatting.rule import FormulaRule
from openpyxl.workbook.defined_name import DefinedName
from openpyxl.worksheet.datavalidation import DataValidation
from openpyxl.worksheet.formula import ArrayFormula

from tests.support.story_books import story_book
from workbook_templates.parts import together
from xlbridge.calc.names import calc_formula, excel_formula, for_calc, for_excel

OURS = "ORG.STORYLEDGER.ADDIN.FUNCTIONS."
PAIRS = {
    "ELF_EXPONENT(T_X)": f"{OURS}ELFEXPONENT(T_X:T_X)",
    "ELF_IE(SDC)": f"{OURS}ELFIE((SDC):(SDC))",
    "ELF_CVX(B4,C4,B$3:B$9,C$3:C$9,k_X)*2": f"{OURS}ELFCVX(B4:B4,C4:C4,B$3:B$9,C$3:C$9,k_X:k_X)*2",
    "IF(A1>0,ELF_FX(V_X,D4),A2)": f"IF(A1>0,{OURS}ELFFX(V_X:V_X,D4:D4),A2)",
    "ELF_DRIFT(B4-B5,0,-C4,I_e)": f"{OURS}ELFDRIFT(B4-B5,0,-C4,I_e:I_e)",
    "ELF_FX(SUM(A1,A2),'O s'!$B$3)": f"{OURS}ELFFX(SUM(A1,A2),'O s'!$B$3:$B$3)",
    "ELF_FX(ELF_FX(A1,1),Table1[w])": f"{OURS}ELFFX({OURS}ELFFX(A1:A1,1),Table1[w])",
    "ELF_FX( A1 ,{1,2})": f"{OURS}ELFFX( A1:A1 ,{{1,2}})",
    '"ELF_FX(A1)"&ELF_CU(0.4)&"(R):(R)"': f'"ELF_FX(A1)"&{OURS}ELFCU(0.4)&"(R):(R)"',
    "ELF_FX*ELF_UNKNOWN(A1)+SUM(B1:B1)": "ELF_FX*ELF_UNKNOWN(A1)+SUM(B1:B1)",
}


@pytest.mark.parametrize("excel", PAIRS)
def test_there_and_back(excel: str) -> None:
    assert calc_formula(excel) == PAIRS[excel]
    assert excel_formula(PAIRS[excel]) == excel


@pytest.mark.parametrize("prefix", ["[1]!", "_xll.", "_xldudf_", ""])
@pytest.mark.parametrize("name", ["ELF_CU", "elf_cu"])
def test_what_programs_put_before_a_name_falls_away(prefix: str, name: str) -> None:
    assert calc_formula(f"1+{prefix}{name}(0.4)") == f"1+{OURS}ELFCU(0.4)"
    assert excel_formula(f"1+{prefix}{name}(0.4)") == "1+ELF_CU(0.4)"


def test_both_ways_twice_is_once() -> None:
    for excel, calc in PAIRS.items():
        assert calc_formula(calc_formula(excel)) == calc
        assert excel_formula(excel_formula(calc)) == excel


def test_every_place_of_a_formula_in_the_package(tmp_path: Path) -> None:
    book = Workbook()
    sheet = book.active
    sheet["A1"], sheet["A2"] = "ELF_CU(A1) as text", '=ELF_CU(A3)&"<&>"'
    sheet["B1"] = ArrayFormula("B1:B2", "=ELF_FX(A1,C1:C2)")
    rule = DataValidation("custom", formula1="ELF_CU(A1)>1")
    rule.add("A3")
    sheet.add_data_validation(rule)
    sheet.conditional_formatting.add("A3", FormulaRule(["ELF_CU(A3)>1"]))
    book.defined_names["C_u"] = DefinedName("C_u", attr_text="ELF_CU(Sheet!$A$3)")
    path = tmp_path / "book.xlsx"
    book.save(path)
    converted = for_calc(path.read_bytes())
    (tmp_path / "calc.xlsx").write_bytes(converted)
    opened = openpyxl.load_workbook(tmp_path / "calc.xlsx")
    calc = opened.active
    assert calc["A1"].value == "ELF_CU(A1) as text"
    assert calc["A2"].value == f'={OURS}ELFCU(A3:A3)&"<&>"'
    assert calc["B1"].value.text == f"={OURS}ELFFX(A1:A1,C1:C2)"
    assert calc.data_validations.dataValidation[0].formula1 == f"{OURS}ELFCU(A1:A1)>1"
    assert next(iter(calc.conditional_formatting)).rules[0].formula == [f"{OURS}ELFCU(A3:A3)>1"]
    assert opened.defined_names["C_u"].attr_text == f"{OURS}ELFCU(Sheet!$A$3:$A$3)"
    assert parts(for_excel(converted)) == parts(path.read_bytes())


def test_a_whole_workbook_comes_back(tmp_path: Path) -> None:
    given = {"edition": "7-22", "units": "us", "parts": list(together("7-22"))}
    path = story_book(tmp_path, given)
    converted = for_calc(path.read_bytes())
    before, there, back = parts(path.read_bytes()), parts(converted), parts(for_excel(converted))
    changed = {name for name, data in there.items() if data != before[name]}
    assert changed
    assert all(name.startswith("xl/worksheets/sheet") for name in changed)
    assert {name: data for name, data in back.items() if name not in changed} == {
        name: data for name, data in before.items() if name not in changed
    }
    for name in changed:
        assert b"ORG." in there[name]
        assert unescape(back[name].decode()) == unescape(before[name].decode())


def parts(package: bytes) -> dict[str, bytes]:
    with zipfile.ZipFile(io.BytesIO(package)) as archive:
        return {name: archive.read(name) for name in archive.namelist()}
