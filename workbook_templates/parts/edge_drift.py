"""Drift along the edges: the design story drift of a torsionally irregular building."""

from __future__ import annotations

from workbook_templates.declare import Block, Part, Quantity, Role

CALC, RESULT = Role.CALCULATION, Role.RESULT

DUE = Block(
    "Drift along the edges",
    (
        Quantity(
            "edges_due",
            "The design story drift is taken along the edges",
            "text",
            CALC,
            "=ELF_DRIFT_EDGES({TIR_building},{SDC})",
            symbol="-",
        ),
    ),
)

DRIFTS = Block(
    "Drift along the edges",
    (
        *(
            Quantity(
                f"Delta_edge_{edge}",
                f"Story drift of edge {edge}, amplified",
                "displacement",
                CALC,
                f"=ELF_DEFLECTION({{Delta_{edge}}},{{C_d}},{{I_e}})",
                rule="edge_drift",
                symbol=f"Delta, edge {edge}",
                width=12,
            )
            for edge in (1, 2)
        ),
        Quantity(
            "Delta_checked",
            "Design story drift, edges where due",
            "displacement",
            RESULT,
            "=ELF_DRIFT_CHECKED({Delta},{Delta_edge_1},{Delta_edge_2},{edges_due})",
            symbol="Delta, checked",
            width=12,
        ),
    ),
    per_direction=True,
)

PART = Part(
    "edge_drift",
    "Drift along the edges",
    criteria=(DUE,),
    bands=(DRIFTS,),
    takes={key: {"Delta": "Delta_checked"} for key in ("theta", "Delta_amplified")},
    requires=("drift", "torsion"),
)
