"""The whole equivalent lateral force package of one building, from its inputs alone."""

from __future__ import annotations

from dataclasses import replace

import numpy as np

from engine import hazard, occupancy, stability, vertical
from engine.building import drifts, periods, strength
from engine.building.parts import drift_forces, with_parts
from engine.building.prepare import prepared
from engine.building.records import Building
from engine.building.results import DirectionResult, Package
from engine.building.weights import level_weights
from engine.levels import TOLERANCE
from engine.require import Array


def solve(building: Building) -> Package:
    """Return the whole package of a building; a refusal names the field or the level.

    >>> from engine.building.reading import from_mapping
    >>> frame = {"system": "walls", "R": 5, "Omega_0": 2.5, "C_d": 5}
    >>> frame |= {"period_system": "all other", "drift_structure": "all other"}
    >>> site = {"S_DS": 0.6, "S_D1": 0.41, "S_1": 0.45, "T_L": 4, "risk_category": "II"}
    >>> roof = {"name": "Roof", "elevation": 20, "weight": 300}
    >>> job = {"title": "Shed", "edition": "7-22", "units": "us"}
    >>> found = solve(from_mapping(job | {"site": site, "direction": {"X": frame}, "level": [roof]}))
    >>> print(found.direction["X"].V, found.direction["X"].M_base)
    36.0 720.0
    """
    building = prepared(building)
    site = building.site
    h = np.array([level.elevation - site.base_elevation for level in building.level])
    w = level_weights(building)
    package = Package(
        title=building.title,
        edition=building.edition,
        units=building.units,
        I_e=float(occupancy.importance_factor(site.risk_category)),
        T_0=float(hazard.corner_period_T0(site.S_DS, site.S_D1)),
        T_S=float(hazard.corner_period_TS(site.S_DS, site.S_D1)),
        W=float(w.sum()),
        h_n=float(h.max()),
        levels=tuple(level.name for level in building.level),
        w_x=w,
        h_x=h,
        h_sx=np.asarray(vertical.story_height(h, h)),
        direction={},
        warnings=(
            *_shared_heights(building, h),
            *_raised_ratios(building),
            *periods.doubts(building, float(h.max())),
            *drift_forces.said(building),
        ),
    )
    package = replace(
        package, direction={name: _direction(building, package, name) for name in building.direction}
    )
    return with_parts(building, package)


def _direction(building: Building, package: Package, name: str) -> DirectionResult:
    given = building.direction[name]
    found = strength.strength(building, package, name)
    found |= strength.forces(package, found)
    found |= drifts.limits(building, package, given)
    F_x, _ = drift_forces.of_displacements(building, package, name, found)
    return DirectionResult(**found, **drifts.drifts(building, package, name, F_x))


def _shared_heights(building: Building, h: Array) -> list[str]:
    order = np.argsort(h, kind="stable")
    close = np.diff(h[order]) <= TOLERANCE * h.max()
    return [
        f"two levels at one elevation: {building.level[a].name} and {building.level[b].name}"
        for a, b, same in zip(order[:-1], order[1:], close, strict=True)
        if same
    ]


def _raised_ratios(building: Building) -> list[str]:
    return [
        f"direction {name}: beta = {given.beta:g} raised to 1.25/Omega_0 = {floor:.4g}"
        for name, given in building.direction.items()
        if (floor := float(stability.demand_ratio(given.beta, given.Omega_0, building.edition))) > given.beta
    ]
