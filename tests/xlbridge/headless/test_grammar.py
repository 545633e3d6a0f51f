"""The grammar: what formulas mean, what is refused, and that a rendered formula reads the same."""

from __future__ import annotations

import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

from xlbridge.headless.grammar import read_formula
from xlbridge.headless.nodes import (
    ArrayConstant,
    Binary,
    Call,
    Constant,
    Join,
    Missing,
    Name,
    Node,
    Reference,
    TableReference,
    Unary,
    render,
    walk,
)
from xlbridge.headless.operands import NotEvaluated
from xlbridge.headless.reference_text import read_reference
from xlbridge.headless.references import Bounds
from xlbridge.headless.shapes import parse
from xlbridge.values import ERROR_CODES, CellError

ONE, TWO, THREE = Constant(1.0), Constant(2.0), Constant(3.0)


@pytest.mark.parametrize(
    ("text", "node"),
    [
        ("=-2^2", Binary("^", Unary("-", TWO), TWO)),
        ("=2^-2", Binary("^", TWO, Unary("-", TWO))),
        ("=1^2^3", Binary("^", Binary("^", ONE, TWO), THREE)),
        ("=2^1%", Binary("^", TWO, Unary("%", ONE))),
        ("=-1%", Unary("%", Unary("-", ONE))),
        ("=1+2*3", Binary("+", ONE, Binary("*", TWO, THREE))),
        ("=1-2-3", Binary("-", Binary("-", ONE, TWO), THREE)),
        ("=(1-(2-3))", Binary("-", ONE, Binary("-", TWO, THREE))),
        ("=1&2+3", Binary("&", ONE, Binary("+", TWO, THREE))),
        ("=1=2&3", Binary("=", ONE, Binary("&", TWO, THREE))),
        ("=1<=2<>3", Binary("<>", Binary("<=", ONE, TWO), THREE)),
        ("= 1 +\n2 ", Binary("+", ONE, TWO)),
        ("=1.5E-3", Constant(0.0015)),
        ("=.5", Constant(0.5)),
        ('="say ""A1"""', Constant('say "A1"')),
        ("=true", Constant(True)),
        ("=FALSE", Constant(False)),
        ("=SDS*2", Binary("*", Name(None, "SDS"), TWO)),
        ("='My sheet'!k.1", Name("My sheet", "k.1")),
        ("=XFE1", Name(None, "XFE1")),
        ("=LOG10(1)", Call("LOG10", (ONE,))),
        ("=_xlfn._xlws.FILTER(1)", Call("FILTER", (ONE,))),
        ("=_xll.elf_cvx(1)", Call("ELF_CVX", (ONE,))),
        ("=PI()", Call("PI", ())),
        ("=IF(1,,2)", Call("IF", (ONE, Missing(), TWO))),
        ("=F(1,)", Call("F", (ONE, Missing()))),
        ("=F(,)", Call("F", (Missing(), Missing()))),
        ('={1,-2;"a",#N/A}', ArrayConstant(((1.0, -2.0), ("a", CellError("#N/A"))))),
        ("={TRUE}", ArrayConstant(((True,),))),
        ("=Sheet1!#REF!", Constant(CellError("#REF!"))),
        ("=#REF!A1:B2", Constant(CellError("#REF!"))),
    ],
)
def test_formula_means(text: str, node: Node) -> None:
    assert read_formula(text) == node


@pytest.mark.parametrize("code", ERROR_CODES)
def test_every_error_value_can_be_written(code: str) -> None:
    assert read_formula(f"={code}") == Constant(CellError(code))


@pytest.mark.parametrize(
    ("text", "sheet", "bounds", "whole"),
    [
        ("A1", None, (1, 1, 1, 1), False),
        ("$xfd$1048576", None, (1_048_576, 16_384, 1_048_576, 16_384), False),
        ("B2:A1", None, (1, 1, 2, 2), False),
        ("Sheet1!$C$12:$C$73", "Sheet1", (12, 3, 73, 3), False),
        ("'Bob''s sheet'!A1:B2", "Bob's sheet", (1, 1, 2, 2), False),
        ("'2024'!A1", "2024", (1, 1, 1, 1), False),
        ("C:$A", None, (1, 1, 1_048_576, 3), True),
        ("3:5", None, (3, 1, 5, 16_384), True),
        ("'a b'!$3:$3", "a b", (3, 1, 3, 16_384), True),
    ],
)
def test_reference_means(text: str, sheet: str | None, bounds: tuple[int, ...], whole: bool) -> None:
    assert read_formula(f"={text}") == Reference(text, sheet, Bounds(*bounds), whole)


@pytest.mark.parametrize(
    ("text", "node"),
    [
        ("T[w x]", TableReference("T", (), "w x", "w x")),
        ("T[]", TableReference("T", (), None, None)),
        ("T[#All]", TableReference("T", ("#All",), None, None)),
        ("T[@w]", TableReference("T", ("#This Row",), "w", "w")),
        ("T[@[w x]]", TableReference("T", ("#This Row",), "w x", "w x")),
        ("T[@]", TableReference("T", ("#This Row",), None, None)),
        ("[@w]", TableReference(None, ("#This Row",), "w", "w")),
        ("T[[#this row],[w x]]", TableReference("T", ("#This Row",), "w x", "w x")),
        ("T[[#Headers],[#Data],[a]:[b]]", TableReference("T", ("#Headers", "#Data"), "a", "b")),
        ("T[ [#Totals] , [a] ]", TableReference("T", ("#Totals",), "a", "a")),
        ("T['[w'] '#1]", TableReference("T", (), "[w] #1", "[w] #1")),
    ],
)
def test_table_reference_means(text: str, node: TableReference) -> None:
    assert read_formula(f"={text}") == node
    assert read_formula(render(node)) == node


@pytest.mark.parametrize(
    ("text", "place", "reason"),
    [
        ("=", 2, "the formula ends where a value is expected"),
        ("=1+", 4, "the formula ends"),
        ("=1+*2", 4, "[*] stands where a value"),
        ("=(1", 4, "to close the parenthesis"),
        ("=SUM(1", 7, r"to close SUM\("),
        ("=1)", 3, "nothing can follow"),
        ("=2a", 3, "nothing can follow"),
        ('="abc', 2, "text is never closed"),
        ("='abc", 2, "apostrophe"),
        ("=@A1", 2, "operator @"),
        ("=A1#", 4, "spilled range"),
        ("=1?2", 3, "'[?]' means nothing"),
        ("={1,2;3}", 2, "different lengths"),
        ("={1,A1}", 5, "constants only"),
        ('={-"a"}', 4, "constants only"),
        ("={1", 4, "to close the array"),
        ("=1E999", 2, "too large"),
        ("=T[a", 3, "bracket is never closed"),
        ("=T[[a]", 3, "bracket is never closed"),
        ("=T[#Some]", 2, "#Some is not a part"),
        ("=T[[a],[b]]", 2, "not well formed"),
        ("=T[[a]:[b]:[c]]", 2, "not well formed"),
    ],
)
def test_unreadable_formula_is_refused_at_its_place(text: str, place: int, reason: str) -> None:
    with pytest.raises(NotEvaluated, match=f"at character {place}: .*{reason}"):
        parse(text)


@pytest.mark.parametrize(
    ("text", "reason"),
    [
        ("=[1]Sheet1!A1", "another workbook"),
        ("='[Old book.xlsx]Sheet 1'!A1:B2", "another workbook"),
        ("=[2]!k", "another workbook"),
        ("=SUM(Sheet1:Sheet3!A1)", "several sheets"),
        ("=A0", "outside the sheet"),
        ("=A1048577", "outside the sheet"),
        ("=A1:XFE1", "outside the sheet"),
        ("=" + "(" * 5000 + "1" + ")" * 5000, "nested too deeply"),
    ],
)
def test_formula_outside_the_subset_is_refused(text: str, reason: str) -> None:
    with pytest.raises(NotEvaluated, match=reason):
        parse(text)


def test_spaces_and_commas_between_references() -> None:
    a, b = read_reference("A1"), read_reference("B1")
    assert read_formula("=A1 B1") == Join(" ", a, b)
    assert read_formula("=SUM((A1,B1))") == Call("SUM", (Join(",", a, b),))
    assert read_formula("=A1:INDEX(B1,1)") == Join(":", a, Call("INDEX", (b, ONE)))
    assert read_formula("=A1 +B1") == Binary("+", a, b)


def test_a_long_sum_and_sixty_four_levels_of_nesting_are_read() -> None:
    long_sum = "=" + "+".join(["A1"] * 4000)
    assert render(parse(long_sum)) == long_sum[1:]
    numbers = "=A1+" + "+".join(["1"] * 3000)
    assert render(parse(numbers)) == numbers[1:]
    deep = "=" + "IF(A1," * 64 + "1" + ")" * 64
    assert render(parse(deep)) == deep[1:]


@pytest.mark.parametrize(
    ("first", "second"),
    [
        ("=A1*$B$2+SUM(C1:C9)", "=A7*$B$2+SUM(C3:D9)"),
        ("=IF(A1>0,-A1%,T[w])", "=IF('a b'!Z9>0,-A2%,T[w])"),
        ('="A1"&A1', '="A1"&B2'),
        ('="A1"&A1', '="B1"&A1'),
        ("=T[A1]+A1", "=T[B1]+A2"),
        ("='A1 x'!B1+A1", "='A2 x'!B1+A1"),
        ("=A1+k", "=ZZZ1+k"),
        ("=A1:INDEX(B1,1)", "=A1:B2:INDEX(B1,1)"),
        ("=LOG10(A1)", "=LOG10(A2)"),
    ],
)
def test_a_second_formula_of_a_shape_is_read_as_the_grammar_reads_it(first: str, second: str) -> None:
    parse(first)
    assert parse(second) == read_formula(second)


def test_a_shape_known_does_not_let_a_bad_reference_through() -> None:
    parse("=A1+123.25")
    with pytest.raises(NotEvaluated, match="outside the sheet"):
        parse("=A1048577+123.25")


_numbers = st.floats(0, 1e300, allow_nan=False).map(Constant)
_texts = st.text(st.characters(codec="utf-8", exclude_categories=["Cs", "Cc"]), max_size=6)
_references = st.sampled_from(
    ["A1", "$B$2", "C3:D4", "Sheet1!E5", "'My ''x'''!F6:G$7", "A:A", "$2:3", "Sheet1!$H:I"]
).map(read_reference)
_tables = st.builds(
    lambda table, items, columns: TableReference(table, items, columns[0], columns[1]),
    st.sampled_from(["T", "Story_table", None]),
    st.sampled_from([(), ("#This Row",), ("#Headers", "#Data"), ("#All",)]),
    st.tuples(*[_texts.filter(lambda t: t.strip() and t[0] not in "#@")] * 2),
)
_cells = st.one_of(st.floats(-1e9, 1e9), _texts, st.booleans(), st.sampled_from(ERROR_CODES).map(CellError))
_arrays = st.integers(1, 3).flatmap(
    lambda width: st.lists(st.tuples(*[_cells] * width), min_size=1, max_size=3).map(
        lambda rows: ArrayConstant(tuple(rows))
    )
)
_atoms = st.one_of(
    _numbers,
    _texts.map(Constant),
    st.booleans().map(Constant),
    st.sampled_from(ERROR_CODES).map(CellError).map(Constant),
    _references,
    st.sampled_from([Name(None, "S_DS"), Name("Sheet1", "k.x"), Name("a b", "_n")]),
    _tables,
    _arrays,
)


def _compound(inner: st.SearchStrategy[Node]) -> st.SearchStrategy[Node]:
    binary = st.sampled_from(["+", "-", "*", "/", "^", "&", "=", "<>", "<", "<=", ">", ">="])
    computed = st.builds(Call, st.just("INDEX"), st.tuples(inner))
    return st.one_of(
        st.builds(Binary, binary, inner, inner),
        st.builds(Unary, st.sampled_from(["-", "+", "%"]), inner),
        st.builds(Join, st.just(","), inner, inner),
        st.builds(Join, st.sampled_from([" ", ":"]), _references, computed),
        st.builds(Join, st.sampled_from([" ", ":"]), computed, _references | computed),
        st.builds(
            Call,
            st.sampled_from(["SUM", "LOG10", "ELF_CVX"]),
            st.lists(inner | st.just(Missing()), min_size=2, max_size=3).map(tuple),
        ),
    )


@settings(max_examples=300, deadline=None)
@given(st.recursive(_atoms, _compound, max_leaves=12))
def test_a_rendered_formula_reads_the_same(node: Node) -> None:
    text = render(node)
    assert read_formula(text) == node
    assert parse(text) == node


@settings(max_examples=200, deadline=None)
@given(st.text(alphabet="A1$:!'\"[]{}(),;+-*/^&=<>% #@.eE_xT", max_size=25))
def test_any_text_is_read_or_refused(text: str) -> None:
    try:
        node = parse("=" + text)
    except NotEvaluated:
        return
    assert read_formula(render(node)) == node


def test_walk_goes_from_left_to_right() -> None:
    found = [part.text for part in walk(parse("=A1+SUM(B1,-C1)*D1")) if isinstance(part, Reference)]
    assert found == ["A1", "B1", "C1", "D1"]
