"""What several tests speak of."""

from __future__ import annotations

import dwv
import pytest


@pytest.fixture
def layout() -> dwv.Layout:
    """One kitchen sink with its vent, made up for the tests."""
    return (
        dwv.Layout.builder("one sink", frost_can_close_vents=True)
        .level("main", "0 m")
        .fixture("KS", "kitchen-sink", "main", height="0.45 m")
        .joint("J1", "main", height="0.4 m")
        .joint("S", "main", height="-1 m")
        .drain("d1", "KS", "J1", length="0.9 m")
        .drain("d2", "J1", "S", runs="vertical")
        .vent("v1", "J1", "T1", length="6.1 m")
        .terminal("T1", above="300 mm")
        .sewer("S", invert="-1 m")
        .build()
    )


@pytest.fixture
def sizing(layout: dwv.Layout) -> dwv.Sizing:
    """One kitchen sink with its vent, sized."""
    return dwv.size(layout)
