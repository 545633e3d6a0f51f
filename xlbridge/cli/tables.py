"""The package of results as plain-text tables."""

from __future__ import annotations

from collections.abc import Sequence

from rich.console import Console
from rich.table import Table

from engine.building import DirectionResult, Package
from engine.units import symbol
from xlbridge.cli import CAUTION

Columns = Sequence[tuple[str, Sequence[object], str]]


def show_package(package: Package) -> None:
    """Print the package: what holds for both directions, then each direction level by level."""
    console = Console(highlight=False)
    force, length = symbol("force", package.units), symbol("length", package.units)
    console.print(f"{package.title}   ASCE/SEI {package.edition}", style="bold", markup=False)
    console.print(f"W = {package.W:.6g} {force}   h_n = {package.h_n:.6g} {length}   I_e = {package.I_e:g}")
    for name, result in package.direction.items():
        _show_direction(console, package, name, result)
    for warning in package.warnings:
        console.print(f"! {warning}", markup=False)
    console.print(f"\n{CAUTION}", style="dim")


def _show_direction(console: Console, package: Package, name: str, result: DirectionResult) -> None:
    force, moment = symbol("force", package.units), symbol("moment", package.units)
    console.print(f"\nDirection {name}", style="bold")
    console.print(
        f"T = {result.T:.4g} s (T_a = {result.T_a:.4g}, C_u T_a = {result.T_max:.4g})   k = {result.k:.4g}"
    )
    console.print(f"C_s = {result.C_s:.4g}, {result.governing_bound}", markup=False)
    console.print(f"V = {result.V:.6g} {force}   M at the base = {result.M_base:.6g} {moment}")
    table = Table(box=None, pad_edge=False, padding=(0, 2))
    for heading, values, form in _columns(package, result):
        table.add_column(heading, justify="left" if form == "" else "right", no_wrap=form != "")
    rows = zip(
        *([format(v, form) for v in values] for _, values, form in _columns(package, result)), strict=True
    )
    for row in rows:
        table.add_row(*row)
    console.print(table)


def _columns(package: Package, result: DirectionResult) -> Columns:
    force, moment = symbol("force", package.units), symbol("moment", package.units)
    length, drift = symbol("length", package.units), symbol("displacement", package.units)
    columns = [
        ("level", package.levels, ""),
        (f"h_x [{length}]", package.h_x, ".2f"),
        (f"w_x [{force}]", package.w_x, ".1f"),
        ("C_vx", result.C_vx, ".4f"),
        (f"F_x [{force}]", result.F_x, ".1f"),
        (f"V_x [{force}]", result.V_x, ".1f"),
        (f"M_x [{moment}]", result.M_x, ".0f"),
    ]
    if result.Delta is not None:
        columns.append((f"Delta [{drift}]", result.Delta, ".3f"))
    if result.drift_over_limit is not None:
        columns.append(("Delta/Delta_a", result.drift_over_limit, ".3f"))
    if result.theta is not None:
        columns.append(("theta", result.theta, ".4f"))
    return columns
