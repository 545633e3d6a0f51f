"""The demonstration's building: invented, with one drift above its limit on purpose."""

from __future__ import annotations

from importlib.resources import files


def building_text() -> str:
    """Return the BUILDING.toml of the demonstration."""
    return (files(__name__) / "building.toml").read_text(encoding="utf-8")
