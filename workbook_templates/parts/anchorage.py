"""Structural walls out of plane (12.11): the force of the wall and that of its anchorage."""

from __future__ import annotations

from workbook_templates.declare import Block, Part, Quantity, Role, Table, always, by_units, entry

INPUT, CALC, RESULT = Role.INPUT, Role.CALCULATION, Role.RESULT

WALLS = Block(
    "Wall and anchor",
    (
        Quantity(
            "anchor_name",
            "Wall and place of the anchor",
            "text",
            INPUT,
            symbol="wall",
            stored="name",
            width=24,
            starter=lambda start: f"Wall {start.count - start.level + 1}",
        ),
        entry("W_w", "ELF_FP_WALL.W_w", rule="F_p_wall", starter=by_units(10.0, 45.0)),
        entry(
            "W_p",
            "ELF_FP_ANCHOR.W_p",
            "Weight tributary to the anchor",
            rule="F_p_anchor",
            starter=by_units(5.0, 22.0),
        ),
        entry(
            "anchor_diaphragm",
            "ELF_KA.diaphragm",
            "Diaphragm that holds the anchor",
            rule="k_a",
            symbol="diaphragm",
            stored="diaphragm",
            starter=always("flexible"),
        ),
        entry("L_f", "ELF_KA.L_f", rule="k_a", starter=by_units(60.0, 18.0)),
        Quantity(
            "anchor_source",
            "Source of the inputs in this row",
            "text",
            INPUT,
            symbol="source",
            stored="source",
            width=24,
        ),
    ),
)

FORCES = Block(
    "Forces out of plane",
    (
        Quantity(
            "F_p_wall",
            "Force of the wall",
            "force",
            RESULT,
            "=ELF_FP_WALL({S_DS},{I_e},{W_w})",
            symbol="F_p, wall",
        ),
        Quantity(
            "k_a", "Amplification by the diaphragm", "none", CALC, "=ELF_KA({L_f},{anchor_diaphragm},{units})"
        ),
        Quantity(
            "F_p_anchor",
            "Force of the anchorage",
            "force",
            RESULT,
            "=ELF_FP_ANCHOR({S_DS},{k_a},{I_e},{W_p})",
            symbol="F_p, anchor",
        ),
    ),
)

_TEXT = "structural walls out of plane and their anchorage"
PART = Part(
    "anchorage",
    "Walls out of plane",
    tables=(Table("Anchorage", "Walls out of plane", _TEXT, "anchor", bands=(WALLS, FORCES), start=4),),
)
