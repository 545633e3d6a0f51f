"""The evaluator: values, array formulas, names, tables, cycles, and what is refused instead of guessed."""

from __future__ import annotations

import random
from collections.abc import Mapping, Sequence

import pytest
from hypothesis import given, settings
from hypothesis import strategies as st
from openpyxl import Workbook
from openpyxl.workbook.defined_name import DefinedName
from openpyxl.worksheet.formula import ArrayFormula, DataTableFormula
from openpyxl.worksheet.table import Table

from xlbridge.headless.book import Book
from xlbridge.headless.evaluate import Evaluator, Waiting
from xlbridge.headless.operands import NotEvaluated
from xlbridge.headless.references import Cell, parse_address
from xlbridge.values import OMITTED, Argument, CellError, Scalar, Value


def _show(arguments: Sequence[Argument]) -> Value:
    return "|".join(map(repr, arguments))


FUNCTIONS = {
    "elf_show": _show,
    "ELF_DOUBLE": lambda arguments: tuple(tuple(2 * value for value in row) for row in arguments[0]),
    "ELF_ONE": lambda arguments: ((7.0,),),
    "ELF_FIRST": lambda arguments: arguments[0],
}


def evaluator(cells: Mapping[str, object], **sheets: Mapping[str, object]) -> Evaluator:
    """An evaluator of a workbook whose first sheet is Main."""
    workbook = Workbook()
    workbook.active.title = "Main"
    for name in sheets:
        workbook.create_sheet(name)
    for name, content in {"Main": cells, **sheets}.items():
        for address, value in content.items():
            workbook[name][address] = value
    return Evaluator(Book.of(workbook), FUNCTIONS)


def value(run: Evaluator, address: str, sheet: str = "Main") -> Scalar:
    return run.value(sheet, *parse_address(address))


def reason(run: Evaluator, address: str, sheet: str = "Main") -> str:
    with pytest.raises(NotEvaluated) as refusal:
        value(run, address, sheet)
    return str(refusal.value)


DATA: Mapping[str, object] = {
    "A1": 1, "A2": 2, "A3": 3, "B1": 10, "B2": 20, "B3": 30, "C1": "text", "C2": True, "C3": "#N/A",
}  # fmt: skip


@pytest.mark.parametrize(
    ("formula", "expected"),
    [
        ("=-A2^2", 4.0),
        ("=A2^A3^A2", 64.0),
        ("=A1+A2*A3", 7.0),
        ("=B1%", 0.1),
        ('=A1&"-"&C1', "1-text"),
        ('=C1="TEXT"', True),
        ("=A2>=B1", False),
        ("=D9", 0.0),
        ("=D9+1", 1.0),
        ('=D9&""', ""),
        ("=C3+1", CellError("#N/A")),
        ("=1/D9", CellError("#DIV/0!")),
        ("=SUM(A1:A3,B1)", 16.0),
        ("=SUM(A1:INDEX(A1:A3,2))", 3.0),
        ("=SUM(INDEX(A1:B3,1,1):B2)", 33.0),
        ("=SUM(A:A)", 6.0),
        ("=SUM(Main!1:2)", 33.0),
        ("=SUM({1,2;3,4})", 10.0),
        ("={5}+1", 6.0),
        ("=SUMPRODUCT((A1:A3>1)*B1:B3)", 50.0),
        ("=SUMPRODUCT(A1:A3*2)", 12.0),
        ("=IF(A1=1,B1,1/0)", 10.0),
        ("=IF(A1=1,,5)", 0.0),
        ("=SUM(IF(A1=1,A1:A3,B1:B3))", 6.0),
        ("=IFERROR(C3,5)", 5.0),
        ("=ROW()", 5.0),
        ("=COLUMN()", 5.0),
        ("=_xlfn.SUM(A1:A2)", 3.0),
        ("=elf_show(A1,A1:B2,,C1)", "1.0|((1.0, 10.0), (2.0, 20.0))|OMITTED|'text'"),
        ("=_xll.ELF_SHOW(D9,A1+1,{1,2})", "None|2.0|((1.0, 2.0),)"),
        ("=ELF_SHOW(C3)", "CellError(code='#N/A', reason='')"),
        ("=SUM(ELF_DOUBLE(A1:A3))", 12.0),
        ("=ELF_ONE()+1", 8.0),
        ("=ELF_FIRST(D9)", 0.0),
        ("=ELF_FIRST(A1)&TRUE", "1TRUE"),
    ],
)
def test_formula_has_the_value(formula: str, expected: Scalar) -> None:
    result = value(evaluator({**DATA, "E5": formula}), "E5")
    assert result == expected
    assert type(result) is type(expected)


@pytest.mark.parametrize(
    ("formula", "words"),
    [
        ("=A1:A3", "A1:A3 stands where one value belongs .implicit intersection"),
        ("=A1:A3*2", "implicit intersection"),
        ("=-A1:A3", "implicit intersection"),
        ("=A:A", "implicit intersection"),
        ("=ABS(A1:A3)", "implicit intersection"),
        ("=SUM(A1:A3*2)", "implicit intersection"),
        ("={1,2}", "an array stands where one value belongs"),
        ("=ELF_DOUBLE(A1:A3)", "an array stands where one value belongs"),
        ("=ELF_SHOW(A1:A3*2)", "implicit intersection"),
        ("=SUM(A1:A3 A2:B2)", "intersection of references"),
        ("=SUM((A1:A3,B1))", "union of references"),
        ("=SUM(A1:5)", "does not join two references"),
        ("=SUM(1:INDEX(A1:A3,1))", "does not join two references"),
        ("=SUM(A1:ABS(A1))", "does not join two references"),
        ("=SUM(A1:Other!B2)", "cannot be read|two sheets|several sheets"),
        ("=SUM(INDEX(A1:A3,1):INDEX(Other!A1:A3,1))", "joins cells of two sheets"),
        ("=Nowhere!A1", "a sheet that the workbook does not have"),
        ("=NOSUCH(1)", "the function NOSUCH is not among those"),
        ("=LET(x,1,x)", "the function LET is not among those"),
        ("=S_DS", "the name S_DS is not defined"),
        ("=Story[w_x]", "a table that the workbook does not have"),
        ("=[@w_x]", "a table that the workbook does not have"),
        ("=[1]Main!A1", "another workbook"),
        ("=A1+", "cannot be read at character 5"),
        ("=ROWS(A:A)", "would count the blanks"),
        ("=COUNTBLANK(A:A)", "would count the blanks"),
        ('=COUNTIF(A:A,"<>1")', "would count the blanks"),
        ("=COUNTIF(A:A,D9)", "would count the blanks"),
        ("=SUMPRODUCT((A:A>1)*1)", "over whole columns or rows"),
        ("=TODAY()", "TODAY"),
        ("=" + "IF(A1," * 900 + "1" + ")" * 900, "nested too deeply"),
    ],
)
def test_formula_outside_the_subset_is_refused(formula: str, words: str) -> None:
    run = evaluator({**DATA, "E5": formula}, Other={"A1": 1})
    with pytest.raises(NotEvaluated, match=words):
        value(run, "E5")


def test_a_refused_branch_that_is_not_taken_does_not_matter() -> None:
    assert value(evaluator({"A1": "=IF(TRUE,1,NOSUCH())"}), "A1") == 1.0


def test_a_long_sum_is_evaluated() -> None:
    assert value(evaluator({"A1": 1, "B1": "=" + "+".join(["A1"] * 3000)}), "B1") == 3000.0


def test_cells_of_other_sheets_are_read_in_any_case() -> None:
    run = evaluator({"A1": "=other!A1+'Other'!$A$2+SUM(OTHER!A1:A2)"}, Other={"A1": 1, "A2": "=A1*2"})
    assert value(run, "A1", "MAIN") == 6.0
    with pytest.raises(NotEvaluated, match="no sheet Third"):
        value(run, "A1", "Third")


def test_constants_and_blanks_are_values_too() -> None:
    run = evaluator({"A1": 5})
    assert value(run, "A1") == 5.0
    assert value(run, "Z9") is None


def test_array_formulas_fill_their_cells() -> None:
    run = evaluator(
        {
            **DATA,
            "E1": ArrayFormula("E1:E3", "=A1:A3*B1:B3"),
            "F1": ArrayFormula("F1:G4", "=A1:A3"),
            "H1": ArrayFormula("H1", "=A1:A3+1"),
            "I1": ArrayFormula("I1:I2", "=A2"),
            "J1": ArrayFormula("J1:K2", "=ELF_DOUBLE(A1:B2)"),
            "L1": ArrayFormula("L1:L2", "=D8:D9"),
            "M1": ArrayFormula("M1", "=SUM(IF(A1:A3>1,B1:B3,0))"),
            "E5": "=SUM(E1:E3)",
        }
    )
    results = run.evaluate_all().values
    column = {address: results["Main", address] for address in ("E1", "E2", "E3", "E5")}
    assert column == {"E1": 10.0, "E2": 40.0, "E3": 90.0, "E5": 140.0}
    assert [results["Main", f"{c}{r}"] for r in (1, 2, 3, 4) for c in "FG"] == [
        1.0, 1.0, 2.0, 2.0, 3.0, 3.0, CellError("#N/A"), CellError("#N/A"),
    ]  # fmt: skip
    assert [results["Main", address] for address in ("H1", "I1", "I2", "L1", "L2", "M1")] == [
        2.0, 2.0, 2.0, 0.0, 0.0, 50.0,
    ]  # fmt: skip
    assert [results["Main", address] for address in ("J1", "K1", "J2", "K2")] == [2.0, 20.0, 4.0, 40.0]


def test_an_array_formula_that_fails_fails_in_all_its_cells() -> None:
    run = evaluator({"A1": ArrayFormula("A1:A2", "=NOSUCH()"), "B1": "=A2"})
    assert "NOSUCH" in reason(run, "A1")
    assert "NOSUCH" in reason(run, "A2")
    assert reason(run, "B1").startswith("waits for Main!A2")


def test_an_array_formula_of_several_cells_has_no_own_row() -> None:
    assert "does not stand in one cell" in reason(evaluator({"A1": ArrayFormula("A1:A2", "=ROW()")}), "A1")


def test_data_tables_are_refused() -> None:
    run = evaluator({"A1": DataTableFormula("A1:A2", r1="B1")})
    assert "data table" in reason(run, "A2")


def _named(*names: tuple[str, str, str | None]) -> Evaluator:
    workbook = Workbook()
    workbook.active.title = "Main"
    other = workbook.create_sheet("Other")
    for sheet, start in ((workbook["Main"], 1), (other, 100)):
        for row in range(3):
            sheet.cell(row + 1, 1, start + row)
    for name, text, scope in names:
        target = workbook if scope is None else workbook[scope]
        target.defined_names[name] = DefinedName(name, attr_text=text)
    for sheet in workbook:
        sheet["C1"], sheet["C2"], sheet["C3"] = "=K*2", "=SUM(Heights)", "=Other!k"
    return Evaluator(Book.of(workbook), {})


def test_a_name_of_the_sheet_shadows_the_name_of_the_workbook() -> None:
    run = _named(("k", "Main!$A$2", None), ("k", "Other!$A$3", "Other"), ("Heights", "Main!$A$1:$A$3", None))
    assert [value(run, address, "Main") for address in ("C1", "C2", "C3")] == [4.0, 6.0, 102.0]
    assert [value(run, address, "Other") for address in ("C1", "C2", "C3")] == [204.0, 6.0, 102.0]


def test_names_stand_for_values_formulas_and_whole_columns() -> None:
    run = _named(("k", "SUM(Heights)/2", None), ("Heights", "Main!$A:$A", None))
    assert [value(run, address) for address in ("C1", "C2")] == [6.0, 6.0]
    run = _named(("k", "0.75", None), ("Heights", "Main!$A$1:$A$3*2", None))
    assert [value(run, address) for address in ("C1", "C2")] == [1.5, 12.0]


@pytest.mark.parametrize(
    ("text", "words"),
    [
        ("Main!A1", "moves with the cell"),
        ("Main!$A1", "moves with the cell"),
        ("Main!$A$1:A$2", "moves with the cell"),
        ("SUM(Main!A:A)", "moves with the cell"),
        ("$A$1", "without naming a sheet"),
        ("k+1", "defined by itself"),
        ("#REF!+", "cannot be read"),
        ("Gone!$A$1", "does not have"),
        ("Main!$A$1:$A$3", "implicit intersection"),
    ],
)
def test_names_that_cannot_be_followed_are_refused(text: str, words: str) -> None:
    assert words in reason(_named(("k", text, None)), "C1")


def test_table_references() -> None:
    workbook = Workbook()
    sheet = workbook.active
    for row in (["Level", "w_x", "share"], ["2", 300, "=[@[w_x]]/SUM(Story[w_x])"], ["1", 100, 0]):
        sheet.append(row)
    sheet["C3"] = "=Story[[#This Row],[w_x]]/SUM(Story[w_x])"
    sheet["E9"] = "=Story[[#Headers],[w_x]]"
    sheet["E8"] = "=Story[@w_x]"
    sheet.add_table(Table(displayName="Story", ref="A1:C3"))
    workbook["Sheet"].tables["Story"]._initialise_columns()
    for column, name in zip(sheet.tables["Story"].tableColumns, ["Level", "w_x", "share"], strict=True):
        column.name = name
    run = Evaluator(Book.of(workbook), {})
    assert [value(run, address, "Sheet") for address in ("C2", "C3", "E9")] == [0.75, 0.25, "w_x"]
    assert "does not stand in a row" in reason(run, "E8", "Sheet")


def test_a_cycle_is_named_cell_by_cell_in_each_of_its_cells() -> None:
    run = evaluator(
        {"A1": "=Other!B1+1", "C1": "=A1", "D1": "=C1", "E1": "=5"}, Other={"B1": "=SUM(Main!A1:A3)"}
    )
    refused = run.evaluate_all().not_evaluated
    assert refused == {
        Cell("Main", 1, 1): "circular reference: Main!A1 -> Other!B1 -> Main!A1",
        Cell("Other", 1, 2): "circular reference: Other!B1 -> Main!A1 -> Other!B1",
        Cell("Main", 1, 3): "waits for Main!A1: circular reference: Main!A1 -> Other!B1 -> Main!A1",
        Cell("Main", 1, 4): "waits for Main!C1, which waits for Main!A1: "
        "circular reference: Main!A1 -> Other!B1 -> Main!A1",
    }
    assert value(run, "E1") == 5.0


@pytest.mark.parametrize("formula", ["=A1", "=A1+1", "=SUM(A1:A2)", "=SUM(A:A)", "=IFERROR(A1,0)"])
def test_a_cell_that_reads_itself_is_a_cycle(formula: str) -> None:
    assert reason(evaluator({"A1": formula}), "A1") == "circular reference: Main!A1 -> Main!A1"


def test_a_cell_on_the_way_to_a_cycle_is_not_named_in_it() -> None:
    run = evaluator({"A1": "=B1", "B1": "=C1", "C1": "=D1+1", "D1": "=C1"})
    circle = "circular reference: Main!C1 -> Main!D1 -> Main!C1"
    assert reason(run, "A1") == f"waits for Main!B1, which waits for Main!C1: {circle}"
    assert reason(run, "C1") == circle


def test_an_array_formula_in_a_cycle_is_named_by_its_first_cell() -> None:
    run = evaluator({"A1": ArrayFormula("A1:A2", "=B1:B2"), "B2": "=A2"})
    assert reason(run, "B2") == "circular reference: Main!B2 -> Main!A1 -> Main!B2"


def test_the_root_of_a_refusal_is_known() -> None:
    run = evaluator({"A1": "=NOSUCH()", "A2": "=A1", "A3": "=A2", "A4": "=A3"})
    with pytest.raises(Waiting) as refusal:
        value(run, "A4")
    assert refusal.value.root == Cell("Main", 1, 1)
    assert "NOSUCH" in refusal.value.root_reason


@pytest.mark.parametrize("step", [1, -1])
def test_a_chain_of_fifty_thousand_cells_is_evaluated(step: int) -> None:
    length = 50_000
    rows = range(1, length + 1)[::step]
    cells: dict[str, object] = {f"A{row}": f"=A{row - step}+1" for row in rows}
    cells[f"A{rows[0]}"] = 1
    assert value(evaluator(cells), f"A{rows[-1]}") == float(length)


def test_a_cycle_of_twenty_thousand_cells_is_found() -> None:
    cells = {f"A{row}": f"=A{row + 1}" for row in range(1, 20_000)}
    run = evaluator({**cells, "A20000": "=A1"})
    words = reason(run, "A1")
    assert words.startswith("circular reference: Main!A1 -> Main!A2 -> Main!A3 -> ")
    assert words.endswith(" -> Main!A19999 -> Main!A20000 -> Main!A1")
    assert "Main!A100 -> (19,801 more cells) -> Main!A19902" in words
    assert reason(run, "A7").startswith("circular reference: Main!A7 -> Main!A8 -> ")


def test_a_cycle_of_two_hundred_cells_names_them_all() -> None:
    cells = {f"A{row}": f"=A{row + 1}" for row in range(1, 200)}
    words = reason(evaluator({**cells, "A200": "=A1"}), "A1")
    assert [word for word in words.split() if "!" in word] == [f"Main!A{row}" for row in (*range(1, 201), 1)]


def test_results_are_in_order_of_sheet_row_and_column() -> None:
    run = evaluator({"B2": "=1", "A2": "=2", "C1": "=NOSUCH()"}, Other={"A1": "=3"})
    results = run.evaluate_all()
    assert [str(result.cell) for result in results.cells] == ["Main!C1", "Main!A2", "Main!B2", "Other!A1"]
    assert results.values == {("Main", "A2"): 2.0, ("Main", "B2"): 1.0, ("Other", "A1"): 3.0}
    assert list(results.not_evaluated) == [Cell("Main", 1, 3)]


def test_a_formula_in_no_cell() -> None:
    bare = Evaluator(None, FUNCTIONS)
    assert bare.evaluate_text("=-2^2") == 4.0
    assert bare.evaluate_text("{1,2}*2") == ((2.0, 4.0),)
    assert bare.evaluate_text("=elf_show(,2)") == f"{OMITTED!r}|2.0"
    for text in ("=A1", "=SUM(A1:A2)", "=Main!A1", "=k", "=ROW()", "=1+"):
        with pytest.raises(NotEvaluated):
            bare.evaluate_text(text)


def test_a_formula_in_no_cell_reads_a_workbook() -> None:
    run = evaluator({"A1": "=A2+1", "A2": 4, "A3": "=NOSUCH()"})
    assert run.evaluate_text("=A1*2", "main") == 10.0
    assert run.evaluate_text("=Main!A1:A2") == ((5.0,), (4.0,))
    assert run.evaluate_text("=Main!Z1") == 0.0
    with pytest.raises(NotEvaluated, match="needs a workbook"):
        run.evaluate_text("=A1")
    with pytest.raises(NotEvaluated, match="waits for Main!A3"):
        run.evaluate_text("=A3", "Main")
    with pytest.raises(NotEvaluated, match="no sheet Third"):
        run.evaluate_text("=1", "Third")


_operations = st.sampled_from(["=A{0}+{2}", "=SUM(A{0}:A{1})", "=A{0}-A{1}", "=MAX(A{0},A{1})", "={2}"])


@settings(max_examples=60, deadline=None)
@given(
    st.lists(st.tuples(_operations, st.integers(1, 12), st.integers(1, 12), st.integers(-9, 9)), max_size=12),
    st.randoms(use_true_random=False),
)
def test_the_order_of_evaluation_does_not_matter(
    formulas: list[tuple[str, int, int, int]], chance: random.Random
) -> None:
    cells = {
        f"A{row}": text.format(min(a, b), max(a, b), number)
        for row, (text, a, b, number) in enumerate(formulas, 1)
    }
    in_order = evaluator(cells).evaluate_all()
    shuffled, order = evaluator(cells), list(cells)
    chance.shuffle(order)
    values, refused = {}, set()
    for address in order:
        try:
            values["Main", address] = value(shuffled, address)
        except NotEvaluated:
            refused.add(address)
    assert values == in_order.values
    assert refused == {cell.address for cell in in_order.not_evaluated}
