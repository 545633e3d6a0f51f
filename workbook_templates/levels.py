"""The story table as data: one row is one level, one column one quantity, one band one purpose."""

from __future__ import annotations

from workbook_templates.declare import Block, Part, Quantity, Role
from xlbridge.catalogue.entry import ANY, NOT_NEGATIVE

INPUT, CALC, RESULT, VERDICT = Role.INPUT, Role.CALCULATION, Role.RESULT, Role.VERDICT
DRIFT = Part.DRIFT

LEVEL = Block(
    "Levels",
    (
        Quantity("name", "Level", "text", INPUT, symbol="x", width=15),
        Quantity("elevation", "Elevation", "length", INPUT, span=ANY, symbol="z_x"),
        Quantity("w_x", "Seismic weight", "force", INPUT, span=NOT_NEGATIVE, rule="W", total="sum"),
        Quantity("source", "Source of the inputs in this row", "text", INPUT, symbol="source", width=24),
        Quantity("h_x", "Height above base", "length", CALC, "={elevation}-{base_elevation}", total="max"),
        Quantity("h_sx", "Story height", "length", CALC, "=ELF_HSX({h_x},{h_x:all})"),
    ),
)

FORCES = Block(
    "Story forces",
    (
        Quantity(
            "C_vx",
            "Distribution factor",
            "none",
            CALC,
            "=ELF_CVX({w_x},{h_x},{w_x:all},{h_x:all},{k})",
            decimals=4,
            total="sum",
        ),
        Quantity("F_x", "Story force", "force", RESULT, "=ELF_FX({V},{C_vx})", total="sum"),
        Quantity(
            "V_x",
            "Story shear",
            "force",
            RESULT,
            "=ELF_VX({h_x},{F_x:all},{h_x:all})",
            base="=ELF_VX({h_x},{F_x:all},{h_x:all})",
        ),
        Quantity(
            "M_x",
            "Overturning moment",
            "moment",
            RESULT,
            "=ELF_MX({h_x},{F_x:all},{h_x:all})",
            base="=ELF_MX({h_x},{F_x:all},{h_x:all})",
            width=13,
        ),
    ),
    per_direction=True,
)

GRAVITY = Block(
    "Stories",
    (
        Quantity(
            "P_x", "Vertical load at and above", "force", INPUT, span=NOT_NEGATIVE, rule="theta", part=DRIFT
        ),
        Quantity(
            "h_sx_drift",
            "Story height, drift unit",
            "displacement",
            CALC,
            "={h_sx}*{displacement_per_length}",
            symbol="h_sx, drift unit",
            part=DRIFT,
        ),
    ),
)

STORY_DRIFT = Block(
    "Drift and stability",
    (
        Quantity(
            "delta_xe", "Elastic displacement", "displacement", INPUT, span=ANY, rule="delta_x", part=DRIFT
        ),
        Quantity(
            "delta_xe_below",
            "Same, level below",
            "displacement",
            CALC,
            "=ELF_BELOW({h_x},{delta_xe:all},{h_x:all})",
            symbol="delta_xe below",
            part=DRIFT,
        ),
        Quantity(
            "delta_x",
            "Amplified deflection",
            "displacement",
            CALC,
            "=ELF_DEFLECTION({delta_xe},{C_d},{I_e})",
            part=DRIFT,
        ),
        Quantity(
            "Delta",
            "Design story drift",
            "displacement",
            RESULT,
            "=ELF_DRIFT({delta_xe},{delta_xe_below},{C_d},{I_e})",
            part=DRIFT,
        ),
        Quantity(
            "theta",
            "Stability coefficient",
            "none",
            RESULT,
            "=ELF_THETA({P_x},{Delta},{I_e},{V_x},{h_sx_drift},{C_d})",
            decimals=4,
            total="max",
            part=DRIFT,
        ),
        Quantity(
            "theta_factor",
            "P-delta factor",
            "none",
            CALC,
            "=ELF_PDELTA_FACTOR({theta})",
            symbol="1/(1-theta)",
            part=DRIFT,
        ),
        Quantity(
            "theta_verdict",
            "What theta asks for",
            "text",
            VERDICT,
            "=ELF_PDELTA_STATUS({theta},{theta_max})",
            symbol="P-delta",
            part=DRIFT,
            width=27,
        ),
        Quantity(
            "Delta_amplified",
            "Drift with P-delta",
            "displacement",
            RESULT,
            "={Delta}*{theta_factor}",
            rule="theta_amplifier",
            symbol="Delta, P-delta",
            part=DRIFT,
        ),
        Quantity(
            "Delta_a",
            "Allowable drift",
            "displacement",
            CALC,
            "=ELF_DRIFT_LIMIT({h_sx_drift},{drift_structure},{risk_category},{rho_drift})",
            part=DRIFT,
        ),
        Quantity(
            "drift_over_limit",
            "Drift over limit",
            "none",
            RESULT,
            "={Delta_amplified}/{Delta_a}",
            rule="Delta_a",
            symbol="Delta/Delta_a",
            total="max",
            part=DRIFT,
            width=12,
        ),
        Quantity(
            "drift_verdict",
            "Drift verdict",
            "text",
            VERDICT,
            '=IF({drift_over_limit}<=1,"✓ within limit","✗ above limit")',
            symbol="drift",
            part=DRIFT,
            width=14,
        ),
    ),
    per_direction=True,
)

BANDS = (LEVEL, FORCES, GRAVITY, STORY_DRIFT)
