"""Seismic Design Category: both tables, the rule for large S_1, Table 11.6-1 alone where it may be used."""

from __future__ import annotations

from workbook_templates.declare import YES_NO, Block, Check, Part, Quantity, Role, entry

CALC = Role.CALCULATION


def _both(key: str) -> str:
    """Return the formula that says yes where a row of the directions does in both."""
    return f'=IF(AND({key}_X="yes",{key}_Y="yes"),"yes","no")'


def _short(key: str, text: str, condition: str) -> Quantity:
    return Quantity(key, text, "text", CALC, f'=IF({condition},"yes","no")', rule="SDC_alone", symbol="-")


DIRECTION = Block(
    "Conditions of Table 11.6-1 alone",
    (
        _short("T_a_short", "T_a is below 0.8 T_S", "{T_a}<0.8*{T_S}"),
        _short("T_drift_short", "The period for drift is below T_S", "{T}<{T_S}"),
        _short(
            "on_plateau",
            "C_s is that of the plateau",
            "ABS({C_s}-{C_s_plateau})<=1E-12*{C_s_plateau}",
        ),
    ),
    per_direction=True,
)

_TABLES = "{S_DS},{S_D1},{S_1},{risk_category},{alone_used}"
CATEGORY = Block(
    "Seismic Design Category, worked out",
    (
        Quantity(
            "short_table_alone",
            "Table 11.6-1 alone shall be used where its conditions hold",
            "text",
            Role.INPUT,
            choices=YES_NO,
            rule="SDC_alone",
            symbol="-",
            default=False,
        ),
        entry(
            "rigid_diaphragms", "ELF_SDC_ALONE.rigid_diaphragms", rule="SDC_alone", symbol="-", default=False
        ),
        Quantity(
            "alone_permitted",
            "Table 11.6-1 alone is permitted",
            "text",
            CALC,
            f"=ELF_SDC_ALONE({{S_1}},{_both('T_a_short')[1:]},{_both('T_drift_short')[1:]},"
            f"{_both('on_plateau')[1:]},{{rigid_diaphragms}})",
            symbol="-",
        ),
        Quantity(
            "alone_used",
            "Table 11.6-1 alone is used",
            "text",
            CALC,
            '=IF(AND({short_table_alone}="yes",{alone_permitted}="yes"),"yes","no")',
            rule="SDC_alone",
            symbol="-",
        ),
        Quantity(
            "SDC_short",
            "By Table 11.6-1, from S_DS",
            "text",
            CALC,
            "=ELF_SDC_SDS({S_DS},{risk_category})",
            symbol="SDC, S_DS",
        ),
        Quantity(
            "SDC_one",
            "By Table 11.6-2, from S_D1",
            "text",
            CALC,
            "=ELF_SDC_SD1({S_D1},{risk_category})",
            symbol="SDC, S_D1",
        ),
        Quantity("SDC", "Seismic Design Category", "text", Role.RESULT, f"=ELF_SDC({_TABLES})"),
        Quantity(
            "SDC_reason", "What gives it", "text", CALC, f"=ELF_SDC_REASON({_TABLES})", symbol="-", lines=2
        ),
    ),
)

PART = Part(
    "category",
    "Seismic Design Category",
    criteria=(CATEGORY, DIRECTION),
    checks=(
        Check(
            "Table 11.6-1 alone is wanted, but not permitted",
            '=IF(AND({short_table_alone}="yes",{alone_permitted}<>"yes"),1,0)',
            "=0",
            warning=True,
        ),
    ),
    brought_by=("short_table_alone", "rigid_diaphragms"),
)
