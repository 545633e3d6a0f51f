"""Irregularities over the stories and in plan, with their types and what they entail."""

from __future__ import annotations

from workbook_templates.declare import (
    DIRECTIONS,
    YES_NO,
    Block,
    Check,
    Part,
    Quantity,
    Role,
    always,
    by_units,
    entry,
)
from workbook_templates.parts.shared import (
    CATEGORY,
    entails,
    irregular,
    signed,
    types_found,
)
from xlbridge.catalogue.entry import POSITIVE

INPUT, CALC, VERDICT = Role.INPUT, Role.CALCULATION, Role.VERDICT
_EXCEPTIONS = "{drift_exception},{SDC},{edition}"


def _in_plan(key: str, text: str, kind: str, call: str, rule: str, lines: int) -> tuple[Quantity, Quantity]:
    """Return the verdict on one irregularity and the row of what it entails."""
    verdict = Quantity(f"{key}_status", text, "text", VERDICT, signed(call), rule=rule, symbol="-")
    return verdict, entails(key, f'LEFT({{{key}_status}},1)<>"!"', f'"{kind}"', lines)


def _question(key: str, text: str) -> Quantity:
    return Quantity(
        key,
        text,
        "text",
        INPUT,
        choices=YES_NO,
        rule="judged_irregularity",
        symbol="-",
        starter=always(False),
    )


def _judged(key: str, answer: str, kind: str, lines: int) -> tuple[Quantity, Quantity]:
    call = f'ELF_IRREGULARITY("{kind}",{{{answer}}},{{edition}})'
    return _in_plan(key, kind.capitalize(), kind, call, "judged_irregularity", lines)


PLAN = Block(
    "Irregularities of the building",
    (
        Quantity(
            "drift_exception",
            "No story drift ratio is above 1.3 times that of the story above, both directions",
            "text",
            INPUT,
            choices=YES_NO,
            rule="drift_exception",
            symbol="-",
            default=False,
        ),
        *types_found("weight", "weight_status", "weight_irregularity", "weight", lines=4),
        entry(
            "reentrant_ratio",
            "ELF_REENTRANT_STATUS.ratio",
            "Re-entrant corner: smaller projection over plan dimension",
            rule="reentrant",
            symbol="p/L",
            starter=always(0.0),
        ),
        *_in_plan(
            "reentrant",
            "Re-entrant corner",
            "re-entrant corner",
            "ELF_REENTRANT_STATUS({reentrant_ratio},{edition})",
            "reentrant",
            lines=3,
        ),
        entry(
            "diaphragm_opening",
            "ELF_DIAPHRAGM_STATUS.opening",
            rule="diaphragm_discontinuity",
            symbol="-",
            starter=always(0.0),
        ),
        entry(
            "diaphragm_change",
            "ELF_DIAPHRAGM_STATUS.change",
            rule="diaphragm_discontinuity",
            symbol="-",
            starter=always(0.0),
        ),
        *_in_plan(
            "discontinuity",
            "Diaphragm discontinuity",
            "diaphragm discontinuity",
            "ELF_DIAPHRAGM_STATUS({diaphragm_opening},{diaphragm_change},{edition})",
            "diaphragm_discontinuity",
            lines=3,
        ),
        _question("out_of_plane_offset", "A vertical element is offset out of its plane"),
        *_judged("out_of_plane", "out_of_plane_offset", "out-of-plane offset", lines=7),
        _question("nonparallel_system", "Vertical elements are not parallel to the main axes"),
        *_judged("nonparallel", "nonparallel_system", "nonparallel system", lines=2),
    ),
)

STORIES = Block(
    "Irregularities over the stories",
    (
        *types_found("soft", "soft_status", "soft_story", "extreme soft story", "soft story", lines=4),
        *types_found("weak", "weak_status", "weak_story", "extreme weak story", "weak story", lines=3),
        *types_found("geometric", "geometric_status", "geometric", "geometric", lines=4),
        _question("in_plane_discontinuity", "A vertical element is offset or loses stiffness in its plane"),
        *_judged("in_plane", "in_plane_discontinuity", "in-plane discontinuity", lines=5),
    ),
    per_direction=True,
)

STIFFNESSES = Block(
    "Story stiffness",
    (
        Quantity(
            "K_x",
            "Lateral stiffness of the story",
            "stiffness",
            INPUT,
            span=POSITIVE,
            rule="soft_story",
            starter=by_units(1000.0, 175.0),
        ),
    ),
    per_direction=True,
)

WEIGHTS = Block(
    "Weights of levels",
    (
        Quantity(
            "weight_ratio",
            "Weight over lighter neighbour",
            "none",
            CALC,
            "=ELF_WEIGHT_RATIO({h_x},{w_x:all},{h_x:all})",
            symbol="w_x/w_neighbour",
            width=13,
        ),
        Quantity(
            "weight_status",
            "Weight irregularity",
            "text",
            VERDICT,
            signed(f"ELF_WEIGHT_STATUS({{h_x}},{{w_x:all}},{{h_x:all}},{_EXCEPTIONS})"),
            symbol="weight",
            width=50,
        ),
    ),
)

_K, _STRENGTHS, _DIMENSIONS = (f"({{h_x}},{{{key}:all}},{{h_x:all}}" for key in ("K_x", "strength", "L_sys"))
SOFTNESS = Block(
    "Soft stories",
    (
        Quantity(
            "soft_ratio",
            "Stiffness over story above",
            "none",
            CALC,
            f"=ELF_SOFT_RATIO{_K})",
            symbol="K_x/K_above",
        ),
        Quantity(
            "soft_ratio_three",
            "Stiffness over mean of three above",
            "none",
            CALC,
            f"=ELF_SOFT_RATIO_THREE{_K})",
            symbol="K_x/K_mean",
        ),
        Quantity(
            "soft_status",
            "Soft story",
            "text",
            VERDICT,
            signed(f"ELF_SOFT_STATUS{_K},{_EXCEPTIONS})"),
            symbol="soft story",
            width=60,
        ),
    ),
    per_direction=True,
)

STRENGTHS = Block(
    "Strength and dimensions",
    (
        entry(
            "strength",
            "ELF_WEAK_RATIO.strengths",
            "Lateral strength of the story",
            rule="weak_story",
            starter=by_units(900.0, 4000.0),
            symbol="strength",
        ),
        Quantity(
            "weak_ratio",
            "Strength over story above",
            "none",
            CALC,
            f"=ELF_WEAK_RATIO{_STRENGTHS})",
            symbol="strength ratio",
        ),
        Quantity(
            "weak_status",
            "Weak story",
            "text",
            VERDICT,
            signed(f"ELF_WEAK_STATUS{_STRENGTHS},{{edition}})"),
            symbol="weak story",
            width=28,
        ),
        entry(
            "L_sys",
            "ELF_GEOMETRY_RATIO.dimensions",
            "Dimension of the system",
            rule="geometric",
            starter=by_units(60.0, 18.0),
            symbol="L_sys",
        ),
        Quantity(
            "geometric_ratio",
            "Over smaller neighbour",
            "none",
            CALC,
            f"=ELF_GEOMETRY_RATIO{_DIMENSIONS})",
            symbol="L_sys ratio",
        ),
        Quantity(
            "geometric_status",
            "Geometric irregularity",
            "text",
            VERDICT,
            signed(f"ELF_GEOMETRY_STATUS{_DIMENSIONS},{{edition}})"),
            symbol="geometric",
            width=22,
        ),
    ),
    per_direction=True,
)

_NAMES = "=COUNTA({name:all})"


def _found(text: str, key: str, per_direction: bool = False) -> Check:
    left = f'=IF(LEFT({{{key}_status}},1)="!",1,0)'
    return Check(text, left, "=0", warning=True, per_direction=per_direction)


STIFFNESS_PART = Part(
    "stiffness",
    "Story stiffness",
    bands=(STIFFNESSES,),
    checks=(Check("Every story has a stiffness", "=COUNT({K_x:all})", _NAMES, per_direction=True),),
    needs=tuple(f"K_x_{d}" for d in DIRECTIONS),
)

PART = Part(
    "irregularity",
    "Irregularities",
    criteria=(CATEGORY, PLAN, STORIES),
    bands=(WEIGHTS, SOFTNESS, STRENGTHS),
    checks=(
        Check("Every story has a strength", "=COUNT({strength:all})", _NAMES, per_direction=True),
        Check("Every story has a dimension of the system", "=COUNT({L_sys:all})", _NAMES, per_direction=True),
        irregular("Levels with a weight irregularity, not exempt", "weight_status"),
        irregular("Soft stories, not exempt", "soft_status", per_direction=True),
        irregular("Weak stories", "weak_status", per_direction=True),
        irregular("Stories with a geometric irregularity", "geometric_status", per_direction=True),
        _found("In-plane discontinuity", "in_plane", per_direction=True),
        _found("Re-entrant corner", "reentrant"),
        _found("Diaphragm discontinuity", "discontinuity"),
        _found("Out-of-plane offset", "out_of_plane"),
        _found("Nonparallel system", "nonparallel"),
    ),
    needs=tuple(f"{key}_{d}" for key in ("strength", "L_sys") for d in DIRECTIONS),
    requires=("stiffness",),
)
