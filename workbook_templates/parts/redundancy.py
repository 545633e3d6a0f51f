"""Redundancy: the factor of each direction by its conditions, compared with the one that is entered."""

from __future__ import annotations

from workbook_templates.declare import Block, Check, Part, Quantity, Role, always, entry
from workbook_templates.parts.shared import CATEGORY

_ARGUMENTS = "({SDC},{configuration},TIR_max_X,TIR_max_Y,{edition})"

TORSION = Block(
    "Torsional irregularity, for redundancy",
    (
        entry(
            "TIR_max",
            "ELF_AX_APPLIED.TIR",
            "Largest torsional irregularity ratio; 1 for flexible diaphragms",
            rule="TIR",
            symbol="TIR, largest",
            starter=always(1.0),
        ),
    ),
    per_direction=True,
    without="torsion",
)

REDUNDANCY = Block(
    "Redundancy",
    (
        entry("configuration", "ELF_RHO.configuration", rule="rho_value", symbol="-", default="none"),
        Quantity(
            "rho_rule",
            "Redundancy factor by the rule",
            "none",
            Role.RESULT,
            f"=ELF_RHO{_ARGUMENTS}",
            symbol="rho, rule",
            decimals=2,
        ),
        Quantity(
            "rho_reason",
            "Why",
            "text",
            Role.CALCULATION,
            f"=ELF_RHO_REASON{_ARGUMENTS}",
            symbol="-",
            lines=3,
        ),
    ),
    per_direction=True,
)

PART = Part(
    "redundancy",
    "Redundancy",
    criteria=(CATEGORY, TORSION, REDUNDANCY),
    checks=(
        Check(
            "Redundancy factor as entered is that of the rule",
            "={rho}",
            "={rho_rule}",
            tolerance=1e-12,
            per_direction=True,
            warning=True,
            decimals=2,
        ),
    ),
)
