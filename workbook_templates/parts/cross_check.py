"""Cross-check: the rules of the story table once more in built-in functions, beside those that call ours.

Each cell takes the same entries as the one that it checks, so that a difference shows where it arises. The
columns stand in the story table: on a sheet of their own they would not follow a level that is put in.
"""

from __future__ import annotations

from dataclasses import replace

from workbook_templates.declare import Block, Check, Part, Quantity, Role
from workbook_templates.parts import drift, story

CALC = Role.CALCULATION
#: both are the same expression in double precision; what is left is the order of a sum
ROUND_OFF = 1e-12


def _block(title: str, sources: tuple[Block, ...], keys: tuple[str, ...], difference: str) -> Block:
    """The quantities of these keys in built-in functions, and the largest difference over them."""
    known = {q.key: q for block in sources for q in block.quantities}
    terms = ",".join(f"ABS({{{key}}}-{{{key}_builtin}})/MAX(1,ABS({{{key}}}))" for key in keys)
    largest = Quantity(
        difference, "Largest difference, of 1 or of the value", "none", CALC, f"=MAX({terms})",
        symbol=difference.replace("_", ", "), decimals=12, total="max", width=15,
    )  # fmt: skip
    return Block(title, (*(_in_builtin_functions(known[key]) for key in keys), largest), per_direction=True)


def _in_builtin_functions(q: Quantity) -> Quantity:
    return replace(
        q,
        key=f"{q.key}_builtin",
        text=f"{q.text}, in built-in functions",
        role=CALC,
        symbol=f"{q.shown_symbol}, built-in",
        builtin=q.key,
        total="",
        base="",
        width=max(q.width, 12),
    )


def _agree(text: str, difference: str) -> Check:
    return Check(text, f"={{{difference}}}", "=0", "at most", ROUND_OFF, per_direction=True, decimals=12)


PART = Part(
    "cross_check",
    "Cross-check in built-in functions",
    criteria=(
        _block(
            "Cross-check in built-in functions",
            (story.PERIOD, story.BASE_SHEAR),
            ("T_a", "C_u", "C_s", "V", "k"),
            "difference_criteria",
        ),
    ),
    bands=(
        _block(
            "Cross-check of the story forces",
            (story.FORCES,),
            ("C_vx", "F_x", "V_x", "M_x"),
            "difference_forces",
        ),
    ),
    checks=(
        _agree("Criteria: functions against built-in formulas", "difference_criteria"),
        _agree("Story forces: functions against built-in formulas", "difference_forces:total"),
    ),
)

DRIFT = Part(
    "drift_cross_check",
    "Cross-check of drift and stability in built-in functions",
    bands=(
        _block(
            "Cross-check of drift and stability",
            (drift.STORY_DRIFT,),
            ("Delta", "theta", "theta_factor", "Delta_a"),
            "difference_drift",
        ),
    ),
    checks=(_agree("Drift and stability: functions against built-in formulas", "difference_drift:total"),),
    requires=("cross_check", "drift"),
)

KEYS = (PART.key, DRIFT.key)
