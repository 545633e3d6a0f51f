"""Formulas at random, typed so that most of them have a value, over the sheet of ``differential_book``."""

from __future__ import annotations

import random
from collections.abc import Callable

NUMBER_CELLS = [f"Data!{column}{row}" for column in "ADF" for row in range(1, 9)]
TEXT_CELLS = [f"Data!$B${row}" for row in (1, 2, 3, 4, 6, 7, 8)]
MIXED_CELLS = [f"Data!C{row}" for row in (1, 2, 3, 5, 6, 8)] + [f"Data!E{row}" for row in range(1, 5)]
NUMBER_RANGES = ["Data!A1:A8", "Data!$D$1:$D$8", "Data!F1:F8", "Data!A2:A6", "Data!A1:A8"]
ANY_RANGES = [*NUMBER_RANGES, "Data!B1:B8", "Data!B1:D3"]
ARRAYS = ["Data!A1:A3", "Data!D1:D3", "Data!D1:F1", "Data!D1:F3", "Data!E1:E3", "{1,2,3}", "{4;5;6}", "2.5"]
CRITERIA = ['">2"', '"<=5"', '"<>4"', '"=10"', "1", '"alpha"', '"*a"', '"?eta"', '">=b"', '"<>"']


class Formulas:
    """A seeded source of formulas."""

    def __init__(self, seed: int) -> None:
        self._random = random.Random(seed)

    def formula(self) -> str:
        """Return a formula of any type."""
        kind = self._random.choices([self.number, self.text, self.logical], [6, 3, 3])[0]
        return "=" + kind(3)

    def array_formula(self) -> str:
        """Return an array formula, in braces."""
        return "{=" + self.array(3) + "}"

    def array(self, depth: int) -> str:
        if depth == 0 or self._random.random() < 0.2:
            return self._random.choice(ARRAYS)
        return self._random.choice(_ARRAY_RULES)(self, depth - 1)

    def number(self, depth: int) -> str:
        if depth == 0 or self._random.random() < 0.12:
            return self._number_leaf()
        return self._random.choice(_NUMBERS)(self, depth - 1)

    def text(self, depth: int) -> str:
        if depth == 0 or self._random.random() < 0.15:
            return self._random.choice([*TEXT_CELLS, '"level"', '"Roof 2"', '""', '"a b  c"'])
        return self._random.choice(_TEXTS)(self, depth - 1)

    def logical(self, depth: int) -> str:
        if depth == 0:
            return f"{self._number_leaf()}{self.comparison()}{self._number_leaf()}"
        return self._random.choice(_LOGICALS)(self, depth - 1)

    def _number_leaf(self) -> str:
        literals = ["0", "1", "2", "0.5", "3.75", "100", "1E-3", "12", "-4"]
        pool = self._random.choices([literals, NUMBER_CELLS, MIXED_CELLS], [4, 5, 0.5])[0]
        return self._random.choice(pool)

    def comparison(self) -> str:
        return self._random.choice(["=", "<>", "<", "<=", ">", ">="])

    def whole(self, least: int, most: int) -> str:
        return str(self._random.randint(least, most))

    def numbers(self) -> str:
        return self._random.choice(NUMBER_RANGES)

    def anything(self) -> str:
        return self._random.choice(ANY_RANGES)

    def mixed(self) -> str:
        return self._random.choice([*MIXED_CELLS, *NUMBER_CELLS[:4], *TEXT_CELLS[:2]])

    def criterion(self) -> str:
        return self._random.choice(CRITERIA)


_Rule = Callable[[Formulas, int], str]

_NUMBERS: list[_Rule] = [
    lambda f, d: f"{f.number(d)}+{f.number(d)}",
    lambda f, d: f"({f.number(d)}-{f.number(d)})",
    lambda f, d: f"({f.number(d)})*({f.number(d)})",
    lambda f, d: f"({f.number(d)})/({f.number(d)})",
    lambda f, d: f"ABS({f.number(d)})^{f.whole(1, 3)}",
    lambda f, d: f"-({f.number(d)})",
    lambda f, d: f"({f.number(d)})%",
    lambda f, d: f"ABS({f.number(d)})",
    lambda f, d: f"SIGN({f.number(d)})",
    lambda f, d: f"ROUND({f.number(d)},{f.whole(-2, 4)})",
    lambda f, d: f"ROUNDUP({f.number(d)},{f.whole(0, 3)})",
    lambda f, d: f"ROUNDDOWN({f.number(d)},{f.whole(0, 3)})",
    lambda f, d: f"INT({f.number(d)})",
    lambda f, d: f"TRUNC({f.number(d)},{f.whole(0, 2)})",
    lambda f, d: f"MOD({f.number(d)},{f.whole(2, 7)})",
    lambda f, d: f"QUOTIENT({f.number(d)},{f.whole(2, 7)})",
    lambda f, d: f"CEILING(ABS({f.number(d)}),{f.whole(1, 5)})",
    lambda f, d: f"FLOOR(ABS({f.number(d)}),0.5)",
    lambda f, d: f"MROUND(ABS({f.number(d)}),{f.whole(2, 5)})",
    lambda f, d: f"EVEN({f.number(d)})+ODD({f.number(d)})",
    lambda f, d: f"SQRT(ABS({f.number(d)}))",
    lambda f, d: f"EXP(MIN({f.number(d)},20))",
    lambda f, d: f"LN(ABS({f.number(d)})+1)",
    lambda f, d: f"LOG10(ABS({f.number(d)})+1)",
    lambda f, d: f"SIN({f.number(d)})+COS({f.number(d)})",
    lambda f, d: f"ATAN2({f.number(d)},{f.number(d)})",
    lambda f, d: f"MAX({f.number(d)},{f.numbers()})",
    lambda f, d: f"MIN({f.number(d)},{f.number(d)},{f.numbers()})",
    lambda f, d: f"SUM({f.numbers()},{f.number(d)})",
    lambda f, d: f"SUMSQ({f.number(d)},{f.number(d)})",
    lambda f, d: f"AVERAGE({f.numbers()})*{f.number(d)}",
    lambda f, d: f"PRODUCT({f.number(d)},{f.number(d)})",
    lambda f, d: f"COUNT({f.anything()})",
    lambda f, d: f"COUNTA({f.anything()})",
    lambda f, d: f"COUNTBLANK({f.anything()})",
    lambda f, d: f"COUNTIF({f.anything()},{f.criterion()})",
    lambda f, d: f"COUNTIFS(Data!A1:A8,{f.criterion()},Data!B1:B8,{f.criterion()})",
    lambda f, d: f"SUMIF(Data!A1:A8,{f.criterion()},Data!D1:D8)",
    lambda f, d: f"SUMIF(Data!B1:B8,{f.criterion()},Data!F1:F8)",
    lambda f, d: f"SUMIFS(Data!D1:D8,Data!A1:A8,{f.criterion()},Data!B1:B8,{f.criterion()})",
    lambda f, d: f"AVERAGEIF(Data!D1:D8,{f.criterion()})",
    lambda f, d: f"MAXIFS(Data!D1:D8,Data!A1:A8,{f.criterion()})",
    lambda f, d: f"SUMPRODUCT(Data!A1:A8,Data!D1:D8)+{f.number(d)}",
    lambda f, d: f"SUMPRODUCT((Data!A1:A8{f.comparison()}{f.number(d)})*Data!F1:F8)",
    lambda f, d: f"INDEX({f.numbers()},{f.whole(1, 5)})",
    lambda f, d: f"MATCH({f.number(d)},Data!D1:D8,1)",
    lambda f, d: f"MATCH({f.text(d)},Data!B1:B8,0)",
    lambda f, d: f"VLOOKUP({f.number(d)},Data!D1:F8,{f.whole(1, 3)})",
    lambda f, d: f"LOOKUP({f.number(d)},Data!D1:D8,Data!A1:A8)",
    lambda f, d: f"IF({f.logical(d)},{f.number(d)},{f.number(d)})",
    lambda f, d: f"IFERROR({f.number(d)},{f.number(d)})",
    lambda f, d: f"CHOOSE({f.whole(1, 3)},{f.number(d)},{f.number(d)},{f.number(d)})",
    lambda f, d: f"IFS({f.logical(d)},{f.number(d)},TRUE,{f.number(d)})",
    lambda f, d: f"SWITCH({f.whole(1, 3)},1,{f.number(d)},2,{f.number(d)},{f.number(d)})",
    lambda f, d: f"MEDIAN({f.numbers()},{f.number(d)})",
    lambda f, d: f"STDEV.S({f.numbers()})",
    lambda f, d: f"VAR.P({f.numbers()},{f.number(d)})",
    lambda f, d: f"LARGE({f.numbers()},{f.whole(1, 5)})",
    lambda f, d: f"SMALL({f.numbers()},{f.whole(1, 5)})",
    lambda f, d: f"RANK(Data!D{f.whole(1, 8)},Data!D1:D8,{f.whole(0, 1)})",
    lambda f, d: f"PERCENTILE({f.numbers()},0.{f.whole(0, 99)})",
    lambda f, d: f"QUARTILE({f.numbers()},{f.whole(0, 4)})",
    lambda f, d: f"FORECAST({f.number(d)},Data!A1:A8,Data!D1:D8)",
    lambda f, d: "SLOPE(Data!F1:F8,Data!D1:D8)+INTERCEPT(Data!A1:A8,Data!D1:D8)",
    lambda f, d: f"LEN({f.text(d)})",
    lambda f, d: f"FIND({f.text(d)},{f.text(d)})",
    lambda f, d: f"SEARCH({f.text(d)},{f.text(d)})",
    lambda f, d: f"CODE({f.text(d)})",
    lambda f, d: f'VALUE("{f.whole(0, 500)}")+{f.number(d)}',
    lambda f, d: f"ROWS({f.anything()})+COLUMNS({f.anything()})",
    lambda f, d: f"SUBTOTAL({f.whole(1, 11)},{f.numbers()})",
]
_TEXTS: list[_Rule] = [
    lambda f, d: f"{f.text(d)}&{f.text(d)}",
    lambda f, d: f"{f.text(d)}&{f.whole(0, 9)}",
    lambda f, d: f"LEFT({f.text(d)},{f.whole(0, 4)})",
    lambda f, d: f"RIGHT({f.text(d)},{f.whole(0, 4)})",
    lambda f, d: f"MID({f.text(d)},{f.whole(1, 4)},{f.whole(0, 4)})",
    lambda f, d: f"UPPER({f.text(d)})",
    lambda f, d: f"LOWER({f.text(d)})",
    lambda f, d: f"PROPER({f.text(d)})",
    lambda f, d: f"TRIM({f.text(d)})",
    lambda f, d: f'SUBSTITUTE({f.text(d)},"a","{f.whole(0, 9)}")',
    lambda f, d: f'REPLACE({f.text(d)},{f.whole(1, 3)},{f.whole(0, 2)},"xy")',
    lambda f, d: f"REPT({f.text(d)},{f.whole(0, 3)})",
    lambda f, d: f'TEXT({f.number(d)},"0.00")',
    lambda f, d: f'TEXT({f.number(d)},"#,##0.0")',
    lambda f, d: f'TEXT({f.number(d)},"0.0%")',
    lambda f, d: f"CONCATENATE({f.text(d)},{f.whole(1, 9)},{f.text(d)})",
    lambda f, d: f'TEXTJOIN("-",TRUE,{f.text(d)},Data!B1:B3)',
    lambda f, d: f"CONCAT(Data!B1:B3,{f.text(d)})",
    lambda f, d: f"IF({f.logical(d)},{f.text(d)},{f.text(d)})",
    lambda f, d: f"INDEX(Data!B1:B8,{f.whole(1, 4)})",
    lambda f, d: f"IFERROR({f.text(d)},{f.text(d)})",
    lambda f, d: f"T({f.mixed()})",
    lambda f, d: f"CHAR({f.whole(65, 90)})",
    lambda f, d: f"ADDRESS({f.whole(1, 99)},{f.whole(1, 99)},{f.whole(1, 4)})",
]
_LOGICALS: list[_Rule] = [
    lambda f, d: f"{f.number(d)}{f.comparison()}{f.number(d)}",
    lambda f, d: f"{f.number(d)}{f.comparison()}{f.number(d)}",
    lambda f, d: f"{f.text(d)}{f.comparison()}{f.text(d)}",
    lambda f, d: f"AND({f.logical(d)},{f.logical(d)})",
    lambda f, d: f"OR({f.logical(d)},{f.logical(d)})",
    lambda f, d: f"XOR({f.logical(d)},{f.logical(d)})",
    lambda f, d: f"NOT({f.logical(d)})",
    lambda f, d: f"ISNUMBER({f.mixed()})",
    lambda f, d: f"ISTEXT({f.mixed()})",
    lambda f, d: f"ISBLANK({f.mixed()})",
    lambda f, d: f"ISERROR({f.number(d)})",
    lambda f, d: f"ISNA({f.mixed()})",
    lambda f, d: f"EXACT({f.text(d)},{f.text(d)})",
    lambda f, d: f"ISEVEN({f.whole(-5, 9)})",
]
_ARRAY_RULES: list[_Rule] = [
    lambda f, d: f"({f.array(d)}+{f.array(d)})",
    lambda f, d: f"({f.array(d)}-{f.array(d)})",
    lambda f, d: f"{f.array(d)}*{f.array(d)}",
    lambda f, d: f"({f.array(d)})/({f.array(d)})",
    lambda f, d: f"-({f.array(d)})%",
    lambda f, d: f"ROUND({f.array(d)},{f.whole(0, 2)})",
    lambda f, d: f"SQRT(ABS({f.array(d)}))",
    lambda f, d: f"IF({f.array(d)}{f.comparison()}{f.array(d)},{f.array(d)},{f.number(d)})",
    lambda f, d: f"IFERROR({f.array(d)},{f.number(d)})",
    lambda f, d: f"TRANSPOSE({f.array(d)})",
    lambda f, d: f"INDEX(Data!D1:D8,{f.whole(1, 5)})+{f.array(d)}",
    lambda f, d: f"SUM({f.array(d)})*{f.array(d)}",
    lambda f, d: f'LEN({f.array(d)}&"xy")',
]


def sample(draw: Callable[[], str], count: int, longest: int = 400) -> list[str]:
    """Draw different formulas, none longer than ``longest`` characters."""
    found: dict[str, None] = {}
    while len(found) < count:
        formula = draw()
        if len(formula) <= longest:
            found[formula] = None
    return list(found)
