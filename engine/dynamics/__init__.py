"""The building as a shear building: story stiffness, modes, and the modal response to a spectrum (12.9.1).

A story model: each level carries its weight and stands on one story with a stiffness, a story force over
the drift it causes. Levels stand on the LAST axis, in any order. Levels at one height move together and
stand on one story. Floors are taken as rigid and torsion is left out, so that the model stands in for an
analysis until there is one, and serves as a comparison afterwards.

``stories`` holds the static rules, ``modes`` the modes and what they hold of the weight, ``response`` the
response in one mode, ``combination`` the sums over modes and the scaling, ``combined`` both
in one; ``eigen`` solves for the modes.
"""

from engine.dynamics.combination import (
    absolute_sum,
    complete_combination,
    correlation,
    drift_scale,
    force_scale,
    square_root_of_squares,
)
from engine.dynamics.combined import COMBINATIONS, combined_drift, combined_shear
from engine.dynamics.modes import (
    VERDICTS,
    mode_participation,
    mode_period,
    mode_shape,
    mode_weight_share,
    modes_needed,
    modes_verdict,
    modes_weight_share,
)
from engine.dynamics.response import (
    modal_coefficient,
    modal_displacement,
    modal_drift,
    modal_force,
    modal_shear,
)
from engine.dynamics.stories import elastic_displacement, story_stiffness

__all__ = [
    "COMBINATIONS",
    "VERDICTS",
    "absolute_sum",
    "combined_drift",
    "combined_shear",
    "complete_combination",
    "correlation",
    "drift_scale",
    "elastic_displacement",
    "force_scale",
    "modal_coefficient",
    "modal_displacement",
    "modal_drift",
    "modal_force",
    "modal_shear",
    "mode_participation",
    "mode_period",
    "mode_shape",
    "mode_weight_share",
    "modes_needed",
    "modes_verdict",
    "modes_weight_share",
    "square_root_of_squares",
    "story_stiffness",
]
