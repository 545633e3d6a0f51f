"""Random shear buildings, and the matrices of a shear building written out by the textbook."""

from __future__ import annotations

import numpy as np
from hypothesis import Phase, settings
from hypothesis import strategies as st

#: shrinking an eigenproblem shows little and takes long
FEW = settings(max_examples=30, deadline=None, phases=(Phase.explicit, Phase.reuse, Phase.generate))


@st.composite
def models(draw, most=12, least=1):
    """Levels from the lowest up: weights, stiffnesses, heights."""
    n = draw(st.integers(least, most))
    seed = np.random.default_rng(draw(st.integers(0, 2**32 - 1)))
    return {
        "weights": seed.uniform(50.0, 5000.0, n),
        "stiffnesses": seed.uniform(20.0, 4000.0, n),
        "heights": np.cumsum(seed.uniform(8.0, 20.0, n)),
    }


def stiffness_matrix(stiffnesses):
    """k_j + k_(j+1) on the diagonal, -k_(j+1) beside it."""
    k = np.asarray(stiffnesses, dtype=float)
    above = np.append(k[1:], 0.0)
    return np.diag(k + above) - np.diag(k[1:], 1) - np.diag(k[1:], -1)


def ordinates(function, model, modes, **more):
    """A response at all levels (rows) in the first modes (columns)."""
    h = np.asarray(model["heights"])
    return np.array([[function(mode=m, h_x=h_x, **more, **model) for m in modes] for h_x in h])
