"""The engine against the plain solver, on random drawings."""

import random
from typing import Any

import dwv
import pytest
from plain_solver import House

KINDS = ["water-closet", "bathtub", "shower", "kitchen-sink", "clothes-washer", "laundry-tray", "floor-drain", "bidet"]


def draw(seed: int) -> dict[str, Any]:
    """A random tree of drains with fixtures and vents."""
    dice = random.Random(seed)
    levels = [{"id": f"level {storey}", "floor": f"{storey * 29 / 10} m"} for storey in range(8)]
    heights = [-12]
    joints: list[dict[str, Any]] = []
    drains: list[dict[str, Any]] = []
    ends = set()

    def place(height: int) -> dict[str, Any]:
        storey = min(max((height + 5) // 29, 0), 7)
        return {"level": f"level {storey}", "height": f"{(height - storey * 29) / 10} m"}

    for number in range(1, dice.randint(2, 16)):
        to, far = dice.randrange(len(heights)), dice.randint(3, 40)
        vertical = dice.random() < 0.45
        pipe: dict[str, Any] = {"id": f"d{number:02}", "from": f"J{number:02}", "to": f"J{to:02}"}
        pipe |= {"runs": "vertical"} if vertical else {"runs": "level", "length": f"{far / 10} m"}
        drains.append(pipe)
        heights.append(heights[to] + (far if vertical else 0))
        ends |= {number}
        ends -= {to}
    joints = [{"id": f"J{number:02}", **place(height)} for number, height in enumerate(heights)]
    where = sorted(ends) + [dice.randrange(1, len(heights)) for _ in range(dice.randint(0, 10))]
    fixtures = []
    for number, joint in enumerate(where):
        fixtures.append({"id": f"F{number:02}", "kind": dice.choice(KINDS), **place(heights[joint])})
        arm = {"id": f"f{number:02}", "from": f"F{number:02}", "to": f"J{joint:02}", "runs": "level"}
        drains.append({**arm, "length": f"{dice.randint(3, 20) / 10} m"})
    vents, terminals = [], []
    for joint in dice.sample(range(1, len(heights)), dice.randint(0, len(heights) - 1)):
        vents.append({"id": f"v{joint:02}", "from": f"J{joint:02}", "to": f"T{joint:02}", "length": "4 m"})
        terminals.append({"id": f"T{joint:02}", "through": "roof", "above": "300 mm"})
    return {
        "format": "dwv-layout/1",
        "name": f"random {seed}",
        "edition": "npc-2015",
        "frost_can_close_vents": True,
        "levels": levels,
        "fixtures": fixtures,
        "joints": joints,
        "drains": drains,
        "vents": vents,
        "terminals": terminals,
        "sewer": {"at": "J00", "invert": "-3 m"},
    }


def compare(drawing: dict[str, Any]) -> None:
    """Compares every name, load, trap arm and protecting vent."""
    house, sizing = House(drawing), dwv.size(drawing)
    engine = {pipe.id: (pipe.name, pipe.load, pipe.water_closets, pipe.vertical) for pipe in sizing.pipes}
    plain = {
        drain: (house.name(drain), float(house.load(drain)), house.closets(drain), house.vertical(drain))
        for drain in house.drains
    }
    assert engine == plain
    protected = {row.id: row.protected_by for row in sizing.fixtures}
    traps = {fixture: house.protection(fixture) for fixture in house.fixtures}
    assert protected == {fixture: found[1] if found else None for fixture, found in traps.items()}
    wet = {pipe.id for pipe in sizing.pipes if pipe.wet_vent}
    brought = {found[0] for found in traps.values() if found and found[0]}
    assert brought <= wet


@pytest.mark.parametrize("seed", range(400))
def test_random_drawing(seed: int) -> None:
    compare(draw(seed))
