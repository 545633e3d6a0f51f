"""Formulas with our functions written in built-in functions."""

from __future__ import annotations

import pytest

from xlbridge.native import DEEPEST, LONGEST, NoNative, in_builtin_functions


@pytest.mark.parametrize(
    ("formula", "written"),
    [
        ("=ELF_V(C_s,W)", "=C_s*W"),
        ("=1+ELF_V(A1+B1,W)^2", "=1+((A1+B1)*W)^2"),
        ("=ELF_CS_PLATEAU(A1,B1*C1,-D1)", "=A1/(B1*C1/-D1)"),
        ("=ELF_V(ELF_FX(A1-B1,C1),D1)", "=C1*(A1-B1)*D1"),
        ("=-ELF_ECC(A1,B1)%", "=-(A1-B1)%"),
        ("=ELF_STORIES+SUM(A1:A3)", "=ELF_STORIES+SUM(A1:A3)"),
        ('=IF(A1="ELF_V(",ELF_TA_STORIES(7),{1,2})', '=IF(A1="ELF_V(",0.1*7,{1,2})'),
    ],
)
def test_arguments_take_their_places_in_parentheses_where_needed(formula: str, written: str) -> None:
    assert in_builtin_functions(formula) == written


def test_an_argument_left_out_takes_its_default() -> None:
    three = in_builtin_functions("=ELF_LEVEL_WEIGHT(A1:A3,B1:B3,units)")
    assert three == in_builtin_functions("=ELF_LEVEL_WEIGHT(A1:A3,B1:B3,units,)")
    assert three == '=SUMPRODUCT(A1:A3*B1:B3)/IF(units="us",1000,1)+0'
    assert in_builtin_functions("=ELF_LEVEL_WEIGHT(A1:A3,B1:B3,units,C1)").endswith("+C1")


def test_a_function_without_an_expression_is_named() -> None:
    with pytest.raises(NoNative, match="ELF_MODE_PERIOD has no expression"):
        in_builtin_functions("=IF(A1,ELF_MODE_PERIOD(1,A1:A3,B1:B3,C1:C3,units),0)")


def test_a_formula_too_long_for_excel_is_refused() -> None:
    summed = "=" + "+".join(["ELF_FA(S_S,site_class,exception)"] * 3)
    assert 2000 < len(in_builtin_functions(summed)) <= LONGEST
    with pytest.raises(NoNative, match=f"more than {LONGEST:,}"):
        in_builtin_functions("=" + "+".join(["ELF_FA(S_S,site_class,exception)"] * 9))


def test_functions_nested_too_deeply_for_excel_are_refused() -> None:
    def nested(count: int) -> str:
        return "=ELF_V(1," + "ABS(" * count + "A1" + ")" * count + ")"

    assert in_builtin_functions(nested(DEEPEST)).startswith("=1*ABS(")
    with pytest.raises(NoNative, match=f"more than {DEEPEST}"):
        in_builtin_functions(nested(DEEPEST + 1))
