"""Drift and stability: design story drifts against their limits, and P-delta."""

from __future__ import annotations

from workbook_templates.declare import (
    DIRECTIONS,
    Block,
    Check,
    Figure,
    Headline,
    Part,
    Quantity,
    Role,
    by_units,
)
from xlbridge.catalogue.entry import ANY, NOT_NEGATIVE

INPUT, FIXED, CALC = Role.INPUT, Role.FIXED, Role.CALCULATION
RESULT, VERDICT = Role.RESULT, Role.VERDICT
#: what the verdicts allow for round-off
ROUND_OFF = 1e-12

LIMITS = Block(
    "Drift and stability limits",
    (
        Quantity(
            "rho_drift",
            "Divisor of the allowable drift",
            "none",
            CALC,
            '=IF({moment_frames_only}="yes",{rho},IF({moment_frames_only}="no",1,NA()))',
            rule="rho_drift",
            symbol="rho",
            decimals=2,
        ),
        Quantity(
            "beta_used",
            "Shear ratio used, with its lower limit where the edition has one",
            "none",
            CALC,
            "=ELF_BETA({beta},{Omega_0},{edition})",
            symbol="beta",
            decimals=3,
        ),
        Quantity(
            "theta_max",
            "Upper limit of the stability coefficient",
            "none",
            CALC,
            "=ELF_THETA_MAX({C_d},{beta_used})",
            decimals=4,
        ),
    ),
    per_direction=True,
)

UNITS = Block(
    "Units of drift",
    (
        Quantity(
            "displacement_per_length",
            "Displacement units in one length unit (fixed)",
            "none",
            FIXED,
            symbol="-",
            decimals=0,
        ),
    ),
)

STORIES = Block(
    "Stories",
    (
        Quantity(
            "P_x",
            "Vertical load at and above",
            "force",
            INPUT,
            span=NOT_NEGATIVE,
            rule="theta",
            starter=lambda s: (1000.0 if s.units == "us" else 4500.0) * (s.count - s.level + 1),
        ),
        Quantity(
            "h_sx_drift",
            "Story height, drift unit",
            "displacement",
            CALC,
            "={h_sx}*{displacement_per_length}",
            symbol="h_sx, drift unit",
        ),
    ),
)

STORY_DRIFT = Block(
    "Drift and stability",
    (
        Quantity(
            "delta_xe",
            "Elastic displacement",
            "displacement",
            INPUT,
            span=ANY,
            rule="delta_x",
            starter=by_units(0.25, 6.0, per_level=True),
        ),
        Quantity(
            "delta_xe_below",
            "Same, level below",
            "displacement",
            CALC,
            "=ELF_BELOW({h_x},{delta_xe:all},{h_x:all})",
            symbol="delta_xe below",
        ),
        Quantity(
            "delta_x", "Amplified deflection", "displacement", CALC, "=ELF_DEFLECTION({delta_xe},{C_d},{I_e})"
        ),
        Quantity(
            "Delta",
            "Design story drift",
            "displacement",
            RESULT,
            "=ELF_DRIFT({delta_xe},{delta_xe_below},{C_d},{I_e})",
        ),
        Quantity(
            "theta",
            "Stability coefficient",
            "none",
            RESULT,
            "=ELF_THETA({P_x},{Delta},{I_e},{V_x},{h_sx_drift},{C_d})",
            decimals=4,
            total="max",
        ),
        Quantity(
            "theta_factor",
            "P-delta factor",
            "none",
            CALC,
            "=ELF_PDELTA_FACTOR({theta})",
            symbol="1/(1-theta)",
        ),
        Quantity(
            "theta_verdict",
            "What theta asks for",
            "text",
            VERDICT,
            "=ELF_PDELTA_STATUS({theta},{theta_max})",
            symbol="P-delta",
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
        ),
        Quantity(
            "Delta_a",
            "Allowable drift",
            "displacement",
            CALC,
            "=ELF_DRIFT_LIMIT({h_sx_drift},{drift_structure},{risk_category},{rho_drift})",
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
            width=12,
        ),
        Quantity(
            "drift_verdict",
            "Drift verdict",
            "text",
            VERDICT,
            '=IF({drift_over_limit}<=1+1E-12,"✓ within limit","✗ above limit")',
            symbol="drift",
            width=14,
        ),
    ),
    per_direction=True,
)

CHECKS = (
    Check(
        "Every story has displacements", "=COUNT({delta_xe:all})", "=COUNTA({name:all})", per_direction=True
    ),
    Check(
        "Largest drift over its limit",
        "={drift_over_limit:total}",
        "=1",
        "at most",
        ROUND_OFF,
        per_direction=True,
        decimals=3,
    ),
    Check(
        "Largest theta is not above theta_max",
        "={theta:total}",
        "={theta_max}",
        "at most",
        ROUND_OFF,
        per_direction=True,
        decimals=4,
    ),
    Check(
        "theta_max is at least 0.10 (if not, theta between the two needs no amplifying but is unstable)",
        "=0.1",
        "={theta_max}",
        "at most",
        per_direction=True,
        warning=True,
        decimals=4,
    ),
)

PART = Part(
    "drift",
    "Drift and stability",
    criteria=(UNITS, LIMITS),
    bands=(STORIES, STORY_DRIFT),
    checks=CHECKS,
    headlines=(
        Headline("Largest drift over limit", "none", "={drift_over_limit:total}"),
        Headline("Largest theta", "none", "={theta:total}"),
    ),
    figures=(Figure("drift_over_limit", "Drift over its limit, Delta/Delta_a", limit=1.0),),
    needs=("P_x", *(f"delta_xe_{direction}" for direction in DIRECTIONS)),
)
