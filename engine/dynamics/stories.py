"""Displacements of a shear building from its story stiffness, and the story stiffness from displacements."""

from __future__ import annotations

import numpy as np
from numpy.typing import ArrayLike

from engine import levels
from engine.dynamics.chain import (
    chained,
    checked_stiffnesses,
    flexibilities,
    from_the_top,
    of_story,
    pick,
    place_of,
)
from engine.errors import ImpossibleValue
from engine.require import Array, Result, finite, formula


@formula
def elastic_displacement(
    h_x: ArrayLike, forces: ArrayLike, stiffnesses: ArrayLike, heights: ArrayLike
) -> Result:
    """Elastic displacement of a level of a shear building under story forces.

    delta_xe = sum(V_i/k_i) over the stories from the base up to h_x

    Parameters
        h_x: height of a level, or 0 for the base [ft or m]; any shape, broadcast with the leading axes
        forces: story forces [kip or kN], signed; shape (..., n)
        stiffnesses: stiffness of the story below each level [kip/in or kN/mm], above 0; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n), n 1 to 1,000
    Returns
        delta_xe [in or mm], the broadcast shape
    Raises
        NotApplicable: h_x is neither a level nor the base, or levels at one height hold different stiffness
    Notes
        Bending of the building as a whole, and rotation of its base, are not in it.
    Example
        >>> levels = {"stiffnesses": [60, 50, 30], "heights": [12, 24, 36]}
        >>> print(elastic_displacement(h_x=24, forces=[10, 20, 30], **levels))
        2.0

    Reference
        rule story_stiffness: 7-16 12.8.6; 7-22 12.8.6
    """
    h = levels.checked_heights(heights)
    F = levels.per_level("forces", finite("forces", forces), h)
    h, F, k = chained(h, F, checked_stiffnesses(stiffnesses, h))
    place = levels.position(h_x, h, base=True)
    drifts = from_the_top(F) * flexibilities(k, h)
    return levels.total(np.where(h <= place + levels.slack(h), drifts, 0.0))


@formula
def story_stiffness(
    h_x: ArrayLike, forces: ArrayLike, displacements: ArrayLike, heights: ArrayLike
) -> Result:
    """Stiffness of the story below a level, from the story forces and the displacements that they cause.

    k_x = V_x/(delta_xe - delta_e below)

    Parameters
        h_x: height of a level above the base [ft or m]; any shape, broadcast with the leading axes
        forces: story forces [kip or kN], signed; shape (..., n)
        displacements: elastic displacements of all levels under these forces [in or mm]; shape (..., n)
        heights: heights of all levels above the base [ft or m], above 0; shape (..., n), n 1 to 1,000
    Returns
        k_x [kip/in or kN/mm], the broadcast shape
    Raises
        ImpossibleValue: the drift is 0 or against the story shear. NotApplicable: h_x is not a level, or
        levels at one height hold different displacements
    Example
        >>> print(story_stiffness(h_x=24, forces=[10, 20, 30], displacements=[1, 2, 3], heights=[12, 24, 36]))
        50.0

    Reference
        rule story_stiffness: 7-16 12.8.6; 7-22 12.8.6
    """
    h = levels.checked_heights(heights)
    F = levels.per_level("forces", finite("forces", forces), h)
    h, F, delta = chained(h, F, levels.per_level("displacements", finite("displacements", displacements), h))
    drifts: Array = np.diff(of_story("displacements", delta, h), axis=-1, prepend=0.0)
    story = place_of(h_x, h, base=False)
    drift, V_x = pick(drifts, story), pick(from_the_top(F), story)
    against = ~(V_x * np.sign(drift) > 0)
    if against.any():
        raise ImpossibleValue(
            "displacements", levels.first(drift, against), "the drift of a story must go with its shear"
        )
    return V_x / drift
