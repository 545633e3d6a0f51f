"""The modes of a shear building: one singular value decomposition a building, kept for the next call.

With L the matrix of ones on and below the diagonal, w the weights and f the story flexibilities,
G = diag(sqrt(w)) L diag(sqrt(f)) has G G^T = sqrt(w) (flexibility matrix) sqrt(w): its singular values are
T sqrt(g)/(2 pi), its vectors the modes. Beside the eigenvalues of the stiffness matrix this keeps the long
periods to round-off however many stories there are, and takes levels without weight and rigid links as
they come.

A sheet asks for one level and one mode a cell: the results of the last few buildings are kept by the bytes
of their levels, so that a building is solved once and not once a cell.
"""

from __future__ import annotations

from dataclasses import dataclass, fields
from functools import lru_cache
from typing import Final

import numpy as np
from numpy.typing import ArrayLike, NDArray

from engine import levels
from engine.dynamics.chain import chained, checked_stiffnesses, flexibilities, pick, place_of
from engine.errors import ImpossibleValue, NotApplicable
from engine.require import Array, at_least

#: periods below this part of the longest are lost in its round-off
RESOLVED: Final = 1e-7
#: ordinates and sums closer than this count as equal
EQUAL: Final = 1e-9
#: both directions of a building, and of the one it is compared with
KEPT: Final = 4


@dataclass(frozen=True, slots=True)
class Modes:
    """The modes of a building, the longest period first; levels from the lowest up.

    Axes: (..., levels, modes) for ``shape`` and ``shear``, (..., modes) for the others but the heights.
    ``extent`` is the displacement g (T/2 pi)^2 of an oscillator under 1 g. ``shear`` is the story shear
    where the modal coefficient C_sm is 1.
    """

    heights: Array
    flexibility: Array
    extent: Array
    shape: Array
    shear: Array
    participation: Array
    share: Array
    count: NDArray[np.intp]

    def __post_init__(self) -> None:
        """Close the arrays to writing: they are handed out again."""
        for field in fields(self):
            getattr(self, field.name).setflags(write=False)

    def number(self, name: str, mode: ArrayLike) -> NDArray[np.intp]:
        """Return the index of a mode; refuse what is no number of a mode of the building."""
        asked = at_least(1, name, mode)
        if (asked % 1 != 0).any():
            raise ImpossibleValue(name, levels.first(asked, asked % 1 != 0), "must be a whole number")
        beyond = asked > self.count
        if beyond.any():
            most = int(self.count.min())
            raise NotApplicable(
                name, levels.first(asked, beyond), f"must be at most {most}, the number of modes"
            )
        return asked.astype(np.intp) - 1

    def of(self, values: Array, mode: ArrayLike) -> Array:
        """Return the value of a mode out of one for each mode."""
        return pick(values, self.number("mode", mode))

    def at(self, values: Array, mode: ArrayLike, h_x: ArrayLike, base: bool = False) -> Array:
        """Return the value of a mode at a level out of one for each level and mode."""
        level = place_of(h_x, self.heights, base)
        flat = values.reshape(*values.shape[:-2], -1)
        return pick(flat, level * values.shape[-1] + self.number("mode", mode))


def solved(weights: ArrayLike, stiffnesses: ArrayLike, heights: ArrayLike) -> Modes:
    """Return the modes of a building; levels in any order give the same ones."""
    h = levels.checked_heights(heights)
    w = levels.checked_weights(weights, h)
    h, w, k = np.broadcast_arrays(h, w, checked_stiffnesses(stiffnesses, h))
    found = _solved(h.shape, h.tobytes(), w.tobytes(), k.tobytes())
    _refuse_lost(found.share)  # not kept with the results: a refusal would be solved for in each cell
    return found


@lru_cache(maxsize=KEPT)
def _solved(shape: tuple[int, ...], heights: bytes, weights: bytes, stiffnesses: bytes) -> Modes:
    h, w, k = chained(*(np.frombuffer(data).reshape(shape) for data in (heights, weights, stiffnesses)))
    f = flexibilities(k, h)
    period, drift = _decomposed(w, f)
    phi = _normalised(np.cumsum(np.sqrt(f)[..., None] * drift, axis=-2))
    excitation = (w[..., None] * phi).sum(axis=-2)
    inertia = (w[..., None] * phi**2).sum(axis=-2)
    exists = period > RESOLVED * period[..., :1]
    participation = np.divide(excitation, inertia, out=np.zeros_like(inertia), where=exists)
    share = participation * excitation / levels.total(w)[..., None]
    force = w[..., None] * phi * participation[..., None, :]
    shear = np.cumsum(force[..., ::-1, :], axis=-2)[..., ::-1, :]
    return Modes(h, f, period**2, phi, shear, participation, share, np.asarray(exists.sum(axis=-1)))


def _decomposed(w: Array, f: Array) -> tuple[Array, Array]:
    """The singular values T sqrt(g)/(2 pi), and the drifts of the modes in parts of sqrt(f)."""
    G = np.tril(np.sqrt(w)[..., :, None] * np.sqrt(f)[..., None, :])
    try:
        _, values, vectors = np.linalg.svd(G)
    except np.linalg.LinAlgError:
        raise ImpossibleValue(
            "stiffnesses", "out of reach", "the numbers are too large or too small"
        ) from None
    return values, np.swapaxes(vectors, -1, -2)


def _normalised(shapes: Array) -> Array:
    """The shapes with 1 as their largest ordinate; of equally large ones the highest."""
    size = np.abs(shapes)
    largest = size >= (1 - EQUAL) * size.max(axis=-2, keepdims=True)
    top = shapes.shape[-2] - 1 - np.argmax(largest[..., ::-1, :], axis=-2)
    ordinate = np.take_along_axis(shapes, top[..., None, :], axis=-2)
    # a mode without period is a level without weight or a rigid link, and may have no shape at all
    return np.divide(shapes, ordinate, out=np.zeros_like(shapes), where=ordinate != 0)


def _refuse_lost(share: Array) -> None:
    """Refuse a building with weight in modes too short beside the longest to be told from 0."""
    held = levels.total(share)
    lost = held < 1 - EQUAL
    if lost.any():
        raise ImpossibleValue(
            "stiffnesses", levels.first(held, lost), "stories differ too much: weight is lost in the modes"
        )
