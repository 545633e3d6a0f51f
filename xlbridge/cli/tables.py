"""The package of results as plain text."""

from __future__ import annotations

from collections.abc import Iterable, Iterator
from typing import Any

from engine.building import DirectionResult, Package
from engine.editions import clause
from engine.units import symbol
from xlbridge.cli import CAUTION

#: heading, values, number format ("" for text)
Column = tuple[str, Iterable[Any], str]


def package_text(package: Package) -> str:
    """Return the package: what holds for both directions, then each direction level by level."""
    force, length = symbol("force", package.units), symbol("length", package.units)
    lines = [
        f"{package.title}   ASCE/SEI {package.edition}",
        f"W = {package.W:.6g} {force}   h_n = {package.h_n:.6g} {length}   I_e = {package.I_e:g}",
    ]
    for name, result in package.direction.items():
        lines += ["", f"Direction {name}", *_summary(package, result), *_aligned(_columns(package, result))]
        lines += [f"! {text}" for text in _exceeded(package, result)]
    return "\n".join([*lines, "", *(f"! {text}" for text in package.warnings), _doubts(package), CAUTION])


def _exceeded(package: Package, result: DirectionResult) -> Iterator[str]:
    """Name the levels whose drift or theta is above its limit."""
    if result.drift_over_limit is not None:
        for level, ratio in zip(package.levels, result.drift_over_limit, strict=True):
            if ratio > 1:
                yield f"{level}: drift is {ratio:.3f} times its limit"
    if result.theta is not None:
        for level, theta in zip(package.levels, result.theta, strict=True):
            if theta > result.theta_max:
                yield f"{level}: theta = {theta:.4f} is above theta_max = {result.theta_max:.4f}"


def _doubts(package: Package) -> str:
    """Name the rules that could not be confirmed in a public source."""
    doubtful = [key for key in package.rules if clause(package.edition, key).confidence != "H"]
    return f"From memory or uncertain, in the words of --json: {', '.join(dict.fromkeys(doubtful))}."


def _summary(package: Package, result: DirectionResult) -> list[str]:
    force, moment = symbol("force", package.units), symbol("moment", package.units)
    periods = f"T_a = {result.T_a:.4g}, C_u T_a = {result.T_max:.4g}"
    return [
        f"T = {result.T:.4g} s ({periods})   k = {result.k:.4g}",
        f"C_s = {result.C_s:.4g}, {result.governing_bound}",
        f"V = {result.V:.6g} {force}   M at the base = {result.M_base:.6g} {moment}",
    ]


def _columns(package: Package, result: DirectionResult) -> list[Column]:
    force, moment = symbol("force", package.units), symbol("moment", package.units)
    length, drift = symbol("length", package.units), symbol("displacement", package.units)
    columns: list[Column] = [
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


def _aligned(columns: list[Column]) -> Iterator[str]:
    """Return the columns as lines: text to the left, numbers to the right, nothing cut off."""
    filled = []
    for heading, values, form in columns:
        cells = [heading, *(format(value, form) for value in values)]
        width = max(map(len, cells))
        filled.append([cell.rjust(width) if form else cell.ljust(width) for cell in cells])
    return ("  ".join(row).rstrip() for row in zip(*filled, strict=True))
