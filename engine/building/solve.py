"""The whole equivalent lateral force package of one building, from its inputs alone."""

from __future__ import annotations

from dataclasses import replace
from typing import Any

import numpy as np

from engine import base_shear, drift, hazard, occupancy, period, stability, vertical
from engine.building.parts import with_parts
from engine.building.records import Building, Direction, level_label
from engine.building.results import DirectionResult, Package, texts
from engine.building.weights import level_weights
from engine.errors import ImpossibleValue
from engine.levels import TOLERANCE
from engine.require import Array
from engine.units import DISPLACEMENT_PER_LENGTH


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
        warnings=(*_shared_heights(building, h), *_raised_ratios(building)),
    )
    package = replace(
        package, direction={name: _direction(building, package, name) for name in building.direction}
    )
    return with_parts(building, package)


def _direction(building: Building, package: Package, name: str) -> DirectionResult:
    given = building.direction[name]
    strength = _strength(building, package, given)
    levels = _levels(package, strength)
    limits = _limits(building, package, given)
    drifts = _drifts(building, package, name)
    second = _second_order(building, package, given, {**levels, **limits, **drifts})
    return DirectionResult(**strength, **levels, **limits, **drifts, **second)


def _strength(building: Building, package: Package, given: Direction) -> dict[str, Any]:
    site, I_e, R = building.site, package.I_e, given.R
    T_a = float(period.approximate_period(package.h_n, given.period_system, building.units))
    C_u = float(period.upper_limit_coefficient(site.S_D1))
    T = T_a if given.T_computed is None else float(period.design_period(T_a, C_u, given.T_computed))
    spectrum = (site.S_DS, site.S_D1, site.S_1, T, site.T_L, R, I_e, building.edition)
    C_s = float(base_shear.response_coefficient(*spectrum))
    return {
        "T_a": T_a,
        "C_u": C_u,
        "T_max": float(period.period_limit(C_u, T_a)),
        "T": T,
        "C_s_plateau": float(base_shear.coefficient_plateau(site.S_DS, R, I_e)),
        "C_s_cap": float(base_shear.coefficient_cap(site.S_D1, T, site.T_L, R, I_e)),
        "C_s_min": float(base_shear.coefficient_minimum(site.S_DS, I_e)),
        "C_s_min_S1": float(base_shear.coefficient_minimum_near_fault(site.S_1, R, I_e)),
        "C_s": C_s,
        "governing_bound": base_shear.governing_bound(*spectrum),
        "V": float(base_shear.base_shear(C_s, package.W)),
        "k": float(vertical.exponent(T, given.k_rule)),
    }


def _levels(package: Package, strength: dict[str, Any]) -> dict[str, Any]:
    w, h = package.w_x, package.h_x
    C_vx = vertical.distribution_factors(w, h, strength["k"])
    F = vertical.story_force(strength["V"], C_vx)
    return {
        "C_vx": C_vx,
        "F_x": F,
        "V_x": vertical.story_shear(h, F, h),
        "V_base": float(vertical.story_shear(0.0, F, h)),
        "M_x": vertical.overturning_moment(h, F, h),
        "M_base": float(vertical.overturning_moment(0.0, F, h)),
    }


def _limits(building: Building, package: Package, given: Direction) -> dict[str, Any]:
    rho = given.rho if given.moment_frames_only else 1.0
    beta = float(stability.demand_ratio(given.beta, given.Omega_0, building.edition))
    allowable = drift.allowable_drift(package.h_sx, given.drift_structure, building.site.risk_category, rho)
    return {
        "Delta_a": allowable * DISPLACEMENT_PER_LENGTH[building.units],
        "beta_used": beta,
        "theta_max": float(stability.stability_limit(given.C_d, beta)),
    }


def _drifts(building: Building, package: Package, name: str) -> dict[str, Any]:
    given, h = building.direction[name], package.h_x
    elastic = [getattr(level, f"delta_xe_{name}") for level in building.level]
    if elastic[0] is None:
        return {}
    lower = vertical.value_below(h, elastic, h)
    Delta = drift.design_story_drift(elastic, lower, given.C_d, package.I_e)
    return {
        "delta_x": drift.amplified_deflection(elastic, given.C_d, package.I_e),
        "Delta": Delta,
        "drift_ratio": Delta / (package.h_sx * DISPLACEMENT_PER_LENGTH[building.units]),
    }


def _second_order(
    building: Building, package: Package, given: Direction, known: dict[str, Any]
) -> dict[str, Any]:
    if "Delta" not in known:
        return {}
    if building.level[0].P_x is None:
        return {"drift_over_limit": known["Delta"] / known["Delta_a"]}
    P_x = np.array([level.P_x for level in building.level], dtype=np.float64)
    _refuse_where(
        building, "V_x", known["V_x"], known["V_x"] <= 0, "must be above 0 for a stability coefficient"
    )
    h_sx = package.h_sx * DISPLACEMENT_PER_LENGTH[building.units]
    theta = np.asarray(
        stability.stability_coefficient(P_x, known["Delta"], package.I_e, known["V_x"], h_sx, given.C_d)
    )
    _refuse_where(building, "theta", theta, theta >= 1, "must be below 1: the story is unstable")
    factor = stability.second_order_factor(theta)
    return {
        "theta": theta,
        "theta_factor": factor,
        "theta_verdict": texts(stability.stability_verdict(theta, known["theta_max"])),
        "Delta_amplified": known["Delta"] * factor,
        "drift_over_limit": known["Delta"] * factor / known["Delta_a"],
    }


def _refuse_where(building: Building, symbol: str, values: Array, bad: Any, allowed: str) -> None:
    for place in np.flatnonzero(bad):
        label = level_label(int(place) + 1, building.level[place].name)
        raise ImpossibleValue(f"{label}: {symbol}", float(values[place]), allowed)


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
