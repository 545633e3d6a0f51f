"""The check lines as data. Left and right are formulas in built-in functions only."""

from __future__ import annotations

from workbook_templates.declare import Check, Part

_DISTINCT = '=SUMPRODUCT(({all}<>"")*(COUNTIF({all},{all})>1))'


def _repeated(key: str) -> str:
    return _DISTINCT.replace("{all}", f"{{{key}:all}}")


CHECKS = (
    Check("Every level has an elevation", "=COUNT({elevation:all})", "=COUNTA({name:all})"),
    Check("Every level has a seismic weight", "=COUNT({w_x:all})", "=COUNTA({name:all})"),
    Check("Every level lies above the base", '=COUNTIF({h_x:all},">0")', "=COUNTA({name:all})"),
    Check("Levels with a name that another level has", _repeated("name"), "=0"),
    Check(
        "Levels at the elevation of another level (two roofs are legal)", _repeated("h_x"), "=0", warning=True
    ),
    Check("S_D1 is not above S_DS", "={S_D1}", "={S_DS}", "at most", unit="acceleration", warning=True),
    Check("Sum of C_vx is 1", "={C_vx:total}", "=1", tolerance=1e-9, per_direction=True, decimals=4),
    Check("Sum of F_x is V", "={F_x:total}", "={V}", tolerance=1e-9, unit="force", per_direction=True),
    Check(
        "Rows of the story table that stand outside the guard rows",
        "=COUNTA({name:wide})-COUNTA({name:all})-2",
        "=0",
    ),
    Check(
        "Story shear at the base is V",
        "={V_x:base}",
        "={V}",
        tolerance=1e-9,
        unit="force",
        per_direction=True,
    ),
    Check(
        "Overturning moment at the base is the sum of F_x h_x",
        "={M_x:base}",
        "=SUMPRODUCT({F_x:all}*{h_x:all})",
        tolerance=1e-9,
        unit="moment",
        per_direction=True,
    ),
    Check("Period used is not above C_u T_a", "={T}", "={T_max}", "at most", unit="time", per_direction=True),
    Check(
        "Every story has displacements",
        "=COUNT({delta_xe:all})",
        "=COUNTA({name:all})",
        per_direction=True,
        part=Part.DRIFT,
    ),
    Check(
        "Largest drift over its limit",
        "={drift_over_limit:total}",
        "=1",
        "at most",
        decimals=3,
        per_direction=True,
        part=Part.DRIFT,
    ),
    Check(
        "Largest theta is not above theta_max",
        "={theta:total}",
        "={theta_max}",
        "at most",
        decimals=4,
        per_direction=True,
        part=Part.DRIFT,
    ),
    Check(
        "0.10 is not above theta_max (else both limits hold: redesign rules before amplifying)",
        "=0.1",
        "={theta_max}",
        "at most",
        decimals=4,
        per_direction=True,
        warning=True,
        part=Part.DRIFT,
    ),
)
