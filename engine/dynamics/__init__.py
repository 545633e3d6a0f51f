"""The building as a shear building: story stiffness, modes, and the modal response to a spectrum (12.9.1).

A story model: each level carries its weight and stands on one story with a stiffness, a story force over
the drift it causes. Levels stand on the LAST axis, in any order. Levels at one height move together and
stand on one story. Floors are taken as rigid and torsion is left out, so that the model stands in for an
analysis until there is one, and serves as a comparison afterwards.

``stories`` holds the static rules, ``modes`` the modes and what they hold of the weight, ``response`` the
response in one mode, ``combination`` the sums over modes and the scaling; ``eigen`` solves for the modes.
"""

from engine.dynamics import combination, modes, response, stories

__all__ = ["combination", "modes", "response", "stories"]
