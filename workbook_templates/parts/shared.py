"""What several parts bring along, once: the Seismic Design Category, words of verdicts and consequences."""

from __future__ import annotations

from typing import Any, Final

from workbook_templates.declare import Block, Check, Quantity, Role, always, entry

CATEGORY = Block(
    "Seismic Design Category",
    (entry("SDC", "ELF_AX_APPLIED.SDC", rule="SDC", starter=always("D")),),
    without="category",
)
STORIES = Block(
    "Stories",
    (
        entry(
            "N",
            "ELF_SDS_CAP.N",
            "Number of stories above the base",
            rule="T_a_stories",
            decimals=0,
            starter=lambda start: float(start.count),
        ),
    ),
)
#: what a row of consequences shows where no irregularity is found
NO_TYPE: Final = "none"


def signed(call: str) -> str:
    """Return the formula of a verdict behind its sign: ! for a type of irregularity, ✓ for none."""
    return f'=SUBSTITUTE("✓ "&{call},"✓ Type","! Type")'


def worst(verdicts: str, *types: str) -> str:
    """Return the formula of the first of the types that a verdict of the column ends with.

    An exempt type ends with its exception, so it does not count; an error in the column stays an error.
    """
    formula = f'"{NO_TYPE}"'
    for kind in reversed(types):
        ending = f", {kind}"
        counted = f'SUMPRODUCT(1*(RIGHT({{{verdicts}:all}},{len(ending)})="{ending}"))'
        formula = f'IF({counted}>0,"{kind}",{formula})'
    return f"={formula}"


def types_found(key: str, verdicts: str, rule: str, *types: str, lines: int) -> tuple[Quantity, Quantity]:
    """Return the row of the worst type in a column of verdicts, and the row of what it entails."""
    found = Quantity(
        f"{key}_type",
        f"Worst of all stories: {types[-1]}",
        "text",
        Role.CALCULATION,
        worst(verdicts, *types),
        rule=rule,
        symbol="-",
    )
    return found, entails(key, f'{{{key}_type}}="{NO_TYPE}"', f"{{{key}_type}}", lines)


def entails(key: str, none: str, kind: str, lines: int) -> Quantity:
    """Return the row of consequences: a dash where the condition ``none`` holds.

    ``lines`` is the room that the longest row of the table takes.
    """
    call = f"ELF_CONSEQUENCE({kind},{{SDC}},{{edition}})"
    return Quantity(
        f"{key}_entails",
        "What it entails",
        "text",
        Role.CALCULATION,
        f'=IF({none},"-",{call})',
        symbol="-",
        lines=lines,
    )


def irregular(text: str, verdicts: str, **more: Any) -> Check:
    """Return the warning that counts the verdicts of a column that found a type, exempt ones left out."""
    cells = f"{{{verdicts}:all}}"
    counted = f'(LEFT({cells},1)="!")*ISERROR(SEARCH("exempt",{cells}))'
    return Check(text, f"=SUMPRODUCT({counted})", "=0", warning=True, **more)
