"""Function names in an .xlsx: the worksheet's own, and those by which Calc knows an extension's functions.

Calc 7.4 reads and writes an extension's function by its programmatic name only; later versions read both.
Excel may write a prefix before a function of an add-in. Calc also hands a blank cell over as 0 where a
reference to one cell stands for a value, but as a blank where a range stands: so the form for Calc writes
``B4:B4`` for ``B4`` in the arguments of our functions, and the form for Excel takes it back.
"""

from __future__ import annotations

import io
import re
import zipfile
from collections.abc import Callable, Iterator, Mapping, Sequence
from html import unescape
from types import MappingProxyType
from typing import Final, TypeAlias
from xml.sax.saxutils import escape

from openpyxl.formula.tokenizer import Token, Tokenizer

from xlbridge.calc.identity import PROGRAMMATIC

Convert: TypeAlias = Callable[[str], str]

_FORMULAS: Final = re.compile(
    r"(<(?P<tag>(?:\w+:)?(?:f|formula|formula1|formula2|definedName|calculatedColumnFormula|totalsRowFormula))"
    r"(?:\s[^<>]*)?(?<!/)>)([^<]*)(?=</(?P=tag)>)"
)
_PARTS: Final = re.compile(r"xl/(workbook\.xml|worksheets/[^/]+\.xml|tables/[^/]+\.xml)")
_PREFIX: Final = re.compile(r"^(\[\d+\]!|_xll\.|_xldudf_)+", re.IGNORECASE)
#: a name of up to three letters, which alone beside a colon would be a column; and what is no reference
_SHORT: Final = re.compile(r"[A-Za-z]{1,3}")
_SHORT_RANGE: Final = re.compile(r'"(?:[^"]|"")*"|\((' + _SHORT.pattern + r")\):\(\1\)")

_CALC: Final[Mapping[str, str]] = MappingProxyType(dict(PROGRAMMATIC))
_EXCEL: Final[Mapping[str, str]] = MappingProxyType(
    {written: name for name, word in PROGRAMMATIC.items() for written in (word, name)}
)


def for_calc(package: bytes) -> bytes:
    """Return the package of a workbook with the functions as every version of Calc reads them."""
    return _converted(package, calc_formula)


def for_excel(package: bytes) -> bytes:
    """Return the package of a workbook with the functions by their worksheet names."""
    return _converted(package, excel_formula)


def calc_formula(text: str) -> str:
    """Return a formula (without the sign =) as Calc reads it.

    >>> calc_formula("ELF_EXPONENT(T_X)")
    'ORG.STORYLEDGER.ADDIN.FUNCTIONS.ELFEXPONENT(T_X:T_X)'
    """
    return _rewritten(text, _CALC, _as_range)


def excel_formula(text: str) -> str:
    """Return a formula (without the sign =) as it is written for Excel.

    >>> excel_formula("ORG.STORYLEDGER.ADDIN.FUNCTIONS.ELFEXPONENT(Site!B4:B4)")
    'ELF_EXPONENT(Site!B4)'
    """
    joined = _SHORT_RANGE.sub(lambda match: f"{match[1]}:{match[1]}" if match[1] else match[0], text)
    return _rewritten(joined, _EXCEL, _as_cell)


def _converted(package: bytes, convert: Convert) -> bytes:
    packed = io.BytesIO()
    with zipfile.ZipFile(io.BytesIO(package)) as source, zipfile.ZipFile(packed, "w") as target:
        for part in source.infolist():
            data = source.read(part)
            target.writestr(part, _part(data, convert) if _PARTS.fullmatch(part.filename) else data)
    return packed.getvalue()


def _part(data: bytes, convert: Convert) -> bytes:
    def replace(match: re.Match[str]) -> str:
        formula = unescape(match[3])
        converted = convert(formula)
        return match[0] if converted == formula else match[1] + escape(converted)

    return _FORMULAS.sub(replace, data.decode("utf-8")).encode("utf-8")


def _rewritten(text: str, names: Mapping[str, str], argument: Callable[[str], str]) -> str:
    """A formula with our functions renamed, and each reference that is an argument of one rewritten."""
    if not any(name in text.upper() for name in names):
        return text
    tokens = Tokenizer(f"={text}").items
    inside = _lone_arguments(tokens, names)
    return "".join(_written(t, names, argument if place in inside else str) for place, t in enumerate(tokens))


def _written(token: Token, names: Mapping[str, str], argument: Callable[[str], str]) -> str:
    value = str(token.value)
    if token.type == Token.FUNC and token.subtype == Token.OPEN:
        called = _called(token)
        return f"{names[called]}(" if called in names else value
    return argument(value)


def _called(token: Token) -> str:
    return _PREFIX.sub("", str(token.value)).removesuffix("(").upper()


def _lone_arguments(tokens: Sequence[Token], names: Mapping[str, str]) -> frozenset[int]:
    """The places of references that are, alone, an argument of one of our functions."""
    words = [place for place, token in enumerate(tokens) if token.type != Token.WSPACE]
    ours = dict(_openings(tokens, names))
    return frozenset(
        here
        for before, here, after in zip(words, words[1:], words[2:], strict=False)
        if ours[here] and tokens[here].subtype == Token.RANGE
        if tokens[before].type == Token.SEP or tokens[before].subtype == Token.OPEN
        if tokens[after].type == Token.SEP or tokens[after].subtype == Token.CLOSE
    )


def _openings(tokens: Sequence[Token], names: Mapping[str, str]) -> Iterator[tuple[int, bool]]:
    """Whether each place stands directly between the brackets of one of our functions."""
    open_: list[bool] = [False]
    for place, token in enumerate(tokens):
        if token.subtype == Token.OPEN:
            open_.append(token.type == Token.FUNC and _called(token) in names)
        elif token.subtype == Token.CLOSE:
            open_.pop()
        yield place, open_[-1]


def _as_range(reference: str) -> str:
    """A reference to one cell, or a name, as a range; structured references stay."""
    sheet, bang, cell = reference.rpartition("!")
    if not bang and _SHORT.fullmatch(cell):
        return f"({cell}):({cell})"
    return reference if ":" in cell or "[" in cell else f"{sheet}{bang}{cell}:{cell}"


def _as_cell(reference: str) -> str:
    """A range of a cell to itself as that cell."""
    sheet, bang, area = reference.rpartition("!")
    first, _, last = area.partition(":")
    return f"{sheet}{bang}{first}" if first == last else reference
