"""Diaphragms: the design force of each level with its lower and upper limit."""

from __future__ import annotations

from workbook_templates.declare import Block, Check, Part, Quantity, Role
from xlbridge.catalogue.entry import NOT_NEGATIVE

WEIGHTS = Block(
    "Diaphragms",
    (
        Quantity(
            "w_px",
            "Weight tributary to the diaphragm",
            "force",
            Role.INPUT,
            span=NOT_NEGATIVE,
            rule="F_px",
            linked="={w_x}",
        ),
    ),
)

_ARGUMENTS = "({w_px},{h_x},{F_x:all},{w_x:all},{h_x:all},{S_DS},{I_e})"
FORCES = Block(
    "Diaphragm forces",
    (
        Quantity("F_px", "Diaphragm design force", "force", Role.RESULT, f"=ELF_FPX{_ARGUMENTS}"),
        Quantity(
            "F_px_bound",
            "Which equation governs",
            "text",
            Role.CALCULATION,
            f"=ELF_FPX_GOVERNS{_ARGUMENTS}",
            symbol="F_px governs",
            width=38,
        ),
    ),
    per_direction=True,
)

CHECKS = (
    Check(
        "Levels whose w_px is above their weight",
        "=SUMPRODUCT(1*({w_px:all}>{w_x:all}*(1+1E-9)))",
        "=0",
    ),
)

PART = Part("diaphragm", "Diaphragms", bands=(WEIGHTS, FORCES), checks=CHECKS)
