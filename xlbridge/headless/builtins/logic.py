"""Functions of truth and choice."""

from __future__ import annotations

from typing import Final

from xlbridge.headless.builtins.builtin import Builtin, Lazy, invoke
from xlbridge.headless.coercion import Fault, logical, plain
from xlbridge.headless.operands import Area, NotEvaluated, Operand
from xlbridge.headless.operators import compare
from xlbridge.values import CellError, Omitted, Scalar


def _chosen(branch: Lazy) -> Operand:
    """Evaluate a branch; one that was left empty is 0."""
    result = branch()
    return 0.0 if isinstance(result, Omitted) else result


def _if(condition: bool, then: Lazy, otherwise: Lazy | None = None) -> Operand:
    if condition:
        return _chosen(then)
    return False if otherwise is None else _chosen(otherwise)


def _ifs(*pairs: Lazy) -> Operand:
    """A chain of IFs: a later condition is evaluated only where the earlier ones are false."""
    if len(pairs) < 2:
        raise Fault("#N/A", "no condition of IFS is true")
    condition, then, *rest = pairs
    return invoke(_IF, [condition(), then, lambda: _ifs(*rest)])


def _iferror(value: Scalar, otherwise: Lazy) -> Operand:
    return _chosen(otherwise) if isinstance(value, CellError) else value


def _ifna(value: Scalar, otherwise: Lazy) -> Operand:
    return _chosen(otherwise) if value == CellError("#N/A") else value


def _switch(value: Scalar, *cases: Lazy) -> Operand:
    for case, then in zip(cases[::2], cases[1::2], strict=False):
        wanted = plain(case())
        if isinstance(wanted, CellError):
            raise Fault(wanted)
        if isinstance(wanted, tuple):
            raise NotEvaluated("an array as a case of SWITCH")
        if compare(value, wanted) == 0:
            return _chosen(then)
    if len(cases) % 2:
        return _chosen(cases[-1])
    raise Fault("#N/A", "no case of SWITCH fits")


def _choose(index: float, *choices: Lazy) -> Operand:
    if not 1.0 <= index < len(choices) + 1:
        raise Fault("#VALUE!", f"CHOOSE has no choice number {index:g}")
    return _chosen(choices[int(index) - 1])


def _truths(operands: tuple[Operand, ...]) -> list[bool]:
    """The truth values of all arguments; text and blanks met through a range do not count."""
    truths: list[bool] = []
    for operand in operands:
        value = plain(operand)
        if isinstance(operand, Area | tuple):
            grid = value if isinstance(value, tuple) else ((value,),)
            truths += [logical(cell) for row in grid for cell in row if not isinstance(cell, str | None)]
        else:
            truths.append(logical(value))  # type: ignore[arg-type]
    if not truths:
        raise Fault("#VALUE!", "no logical values")
    return truths


_IF: Final = Builtin("IF", "bll", _if, 2)
FUNCTIONS: Final = (
    _IF,
    Builtin("IFS", "l*", _ifs, 2),
    Builtin("IFERROR", "sl", _iferror, catches=True),
    Builtin("IFNA", "sl", _ifna, catches=True),
    Builtin("SWITCH", "sl*", _switch, 3),
    Builtin("CHOOSE", "nl*", _choose),
    Builtin("AND", "g*", lambda *operands: all(_truths(operands))),
    Builtin("OR", "g*", lambda *operands: any(_truths(operands))),
    Builtin("XOR", "g*", lambda *operands: sum(_truths(operands)) % 2 == 1),
    Builtin("NOT", "b", lambda value: not value),
    Builtin("TRUE", "", lambda: True),
    Builtin("FALSE", "", lambda: False),
)
