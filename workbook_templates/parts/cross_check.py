"""Cross-check: the rules of the story table once more in built-in functions, beside those that call ours.

Each cell takes the same entries as the one that it checks, so that a difference shows where it arises. The
columns stand in the story table: on a sheet of their own they would not follow a level that is put in.
"""

from __future__ import annotations

from dataclasses import replace

from workbook_templates.declare import Block, Check, Part, Quantity, Role
from workbook_templates.parts import drift, story

#: both are the same expression in double precision; what is left is the order of a sum
ROUND_OFF = "1E-12"


def _known(*blocks: Block) -> dict[str, Quantity]:
    return {q.key: q for block in blocks for q in block.quantities}


CRITERIA = [_known(story.PERIOD, story.BASE_SHEAR)[key] for key in ("T_a", "C_u", "C_s", "V", "k")]
FORCES = [_known(story.FORCES)[key] for key in ("C_vx", "F_x", "V_x", "M_x")]
STORIES = [_known(drift.STORY_DRIFT)[key] for key in ("Delta", "theta", "theta_factor")]


def _block(title: str, quantities: list[Quantity]) -> Block:
    return Block(title, tuple(map(_in_builtin_functions, quantities)), per_direction=True)


def _in_builtin_functions(q: Quantity) -> Quantity:
    return replace(
        q,
        key=f"{q.key}_builtin",
        text=f"{q.text}, in built-in functions",
        role=Role.CALCULATION,
        symbol=f"{q.shown_symbol}, built-in",
        builtin=q.key,
        total="",
        base="",
        width=max(q.width, 12),
    )


def _agree(q: Quantity, rows: str = "") -> Check:
    """The line that compares a quantity with its twin: a criteria value, or all rows of a column."""
    ours, builtin = f"{{{q.key}{rows}}}", f"{{{q.key}_builtin{rows}}}"
    return Check(
        f"{q.text}: functions against built-in formulas, sum of differences",
        f"=SUMPRODUCT(ABS({ours}-{builtin}))",
        f"={ROUND_OFF}*SUMPRODUCT(ABS({ours}))",
        "at most",
        unit=q.unit,
        per_direction=True,
        decimals=12,
    )


PART = Part(
    "cross_check",
    "Cross-check in built-in functions",
    criteria=(_block("Cross-check in built-in functions", CRITERIA),),
    bands=(_block("Cross-check of the story forces", FORCES),),
    checks=(*map(_agree, CRITERIA), *(_agree(q, ":all") for q in FORCES)),
)

DRIFT = Part(
    "drift_cross_check",
    "Cross-check of drift and stability in built-in functions",
    bands=(_block("Cross-check of drift and stability", STORIES),),
    checks=tuple(_agree(q, ":all") for q in STORIES),
    requires=("cross_check", "drift"),
)

KEYS = (PART.key, DRIFT.key)
