"""Story stiffness route: elastic displacements of a shear building, for drifts before an analysis."""

from __future__ import annotations

from workbook_templates.declare import Part, Quantity, Role

PART = Part(
    "stiffness_route",
    "Displacements from story stiffness",
    replaces=(
        Quantity(
            "delta_xe",
            "Elastic displacement, from story stiffness",
            "displacement",
            Role.CALCULATION,
            "=ELF_DELTA_XE({h_x},{F_x:all},{K_x:all},{h_x:all})",
        ),
    ),
    requires=("drift", "stiffness"),
)
