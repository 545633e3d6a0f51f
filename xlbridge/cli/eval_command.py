"""``storyledger eval``: one formula, with its work shown."""

from __future__ import annotations

from collections.abc import Callable, Sequence
from dataclasses import dataclass

import click

from xlbridge import work
from xlbridge.catalogue import CATALOGUE
from xlbridge.cli.failure import CLEAN, FINDINGS, INCOMPLETE
from xlbridge.headless.compute import FUNCTIONS
from xlbridge.headless.evaluate import Evaluator
from xlbridge.headless.operands import NotEvaluated
from xlbridge.values import Argument, CellError, Scalar, Value

Function = Callable[[Sequence[Argument]], Value]


@dataclass(frozen=True, slots=True)
class Call:
    """One call of a worksheet function, as it was made."""

    name: str
    arguments: tuple[Argument, ...]
    result: Value


@click.command("eval")
@click.argument("formula")
@click.option("--work", "show_work", is_flag=True, help="Show equation, numbers put in, and clause.")
def command(formula: str, show_work: bool) -> int:
    """Evaluate FORMULA, such as "=ELF_TA(60,""all other"",""us"")", outside any workbook."""
    calls: list[Call] = []
    functions = {name: _recorded(name, function, calls) for name, function in FUNCTIONS.items()}
    try:
        value = Evaluator(None, functions).evaluate_text("=" + formula.removeprefix("="))
    except NotEvaluated as reason:
        click.echo(f"not evaluated, because {reason}")
        return INCOMPLETE
    rows = value if isinstance(value, tuple) else ((value,),)
    for row in rows:
        click.echo("\t".join(map(_shown, row)))
    for call in calls if show_work else ():
        click.echo(_work(call))
    errors = [cell for row in rows for cell in row if isinstance(cell, CellError)]
    for error in dict.fromkeys(error.reason for error in errors):
        click.echo(f"because {error or 'the formula gives an error value'}")
    return FINDINGS if errors else CLEAN


def _recorded(name: str, function: Function, calls: list[Call]) -> Function:
    def called(arguments: Sequence[Argument]) -> Value:
        result = function(arguments)
        calls.append(Call(name, tuple(arguments), result))
        return result

    return called


def _shown(cell: Scalar) -> str:
    if isinstance(cell, bool):
        return "TRUE" if cell else "FALSE"
    return f"{cell:.15g}" if isinstance(cell, float) else str(cell if cell is not None else "")


def _work(call: Call) -> str:
    entry = CATALOGUE[call.name]
    lines = [f"{entry.name}: {entry.summary}", f"  {work.equation(entry)}"]
    if not isinstance(call.result, CellError):
        lines.append(f"  {work.numbers_line(entry, call.arguments, call.result)}")
    for found in entry.clauses.values():
        lines.append(f"  {found.standard} {found}{f' ({found.note})' if found.note else ''}")
    return "\n".join(lines)
