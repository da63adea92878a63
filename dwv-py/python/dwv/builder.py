"""Drawing a layout in Python."""

from __future__ import annotations

from collections.abc import Iterable, Mapping
from typing import Literal, Self

from .layout import Layout

LengthUnit = Literal["m", "cm", "mm", "ft", "in", "ft-in"]
"""The unit that bare numbers can be declared to count in."""

Length = str | float
"""A length with its unit, such as `"1.2 m"` or `"3'-6 1/2\\""`, or a number in the unit declared for the layout."""

Size = str | float
"""A pipe or trap size in inches, such as `"1-1/2"`."""

Position = tuple[Length, Length]
"""A place on the plan: two distances from any origin, the same for all levels."""

DrainName = Literal["trap-arm", "fixture-drain", "branch", "stack", "building-drain", "building-sewer"]
"""A name that can be stated for a drain."""

VentName = Literal[
    "individual-vent", "dual-vent", "continuous-vent", "branch-vent", "stack-vent", "vent-stack", "vent-header"
]
"""A name that can be stated for a vent."""


class LayoutBuilder:
    r"""Gathers the elements of a layout; begun by `Layout.builder`.

    Every method adds one element and returns the builder. Nothing is judged before `build()`, which then tells all
    faults at once, each with its path.

    >>> drawing = (
    ...     Layout.builder("Heron, kitchen", frost_can_close_vents=True)
    ...     .level("main", "0 m")
    ...     .fixture("KS", "kitchen-sink", "main", height="450 mm")
    ...     .joint("J1", "main", height="0.4 m")
    ...     .joint("S", "main", height="-1 m")
    ...     .drain("d1", "KS", "J1", length="3'-6 1/2\"")
    ...     .drain("d2", "J1", "S", runs="vertical")
    ...     .vent("v1", "J1", "T1", length="6.1 m")
    ...     .terminal("T1", above="300 mm")
    ...     .sewer("S", invert="-1 m")
    ...     .build()
    ... )
    >>> drawing.name
    'Heron, kitchen'
    """

    __slots__ = ("_drawing", "_elements")

    def __init__(
        self,
        name: str,
        edition: str = "npc-2015",
        *,
        units: LengthUnit | None = None,
        frost_can_close_vents: bool | None = None,
        pipe_sizes: Iterable[Size] | None = None,
        building_drain_ends_at: str | None = None,
    ) -> None:
        """Begins a layout; see `Layout.builder`."""
        stated = {
            "format": "dwv-layout/1",
            "name": name,
            "edition": edition,
            "units": units,
            "frost_can_close_vents": frost_can_close_vents,
            "pipe_sizes": None if pipe_sizes is None else list(pipe_sizes),
            "building_drain_ends_at": building_drain_ends_at,
        }
        self._drawing = _stated(stated)
        self._elements: dict[str, list[dict[str, object]]] = {"levels": [], "fixtures": [], "drains": []}

    def _add(self, elements: str, stated: Mapping[str, object]) -> Self:
        self._elements.setdefault(elements, []).append(_stated(stated))
        return self

    def level(self, id: str, floor: Length) -> Self:
        """Adds a floor of the building.

        Args:
            id: Its id, such as `main`.
            floor: The height of the finished floor above any datum; below it negative.
        """
        return self._add("levels", {"id": id, "floor": floor})

    def fixture(
        self,
        id: str,
        kind: str,
        level: str,
        *,
        height: Length | None = None,
        trap: Size | None = None,
        load: str | float | None = None,
        at: Position | None = None,
        group: str | None = None,
        outlet_length: Length | None = None,
        continuous_flow: str | None = None,
        semi_continuous_flow: str | None = None,
        future: bool = False,
    ) -> Self:
        """Adds a fixture with its trap.

        Args:
            id: Its id, such as `KS`.
            kind: A kind of the edition's fixture table, such as `kitchen-sink`, or `custom`.
            level: The level that it stands on.
            height: The height of the trap weir above the floor of the level; not stated, 0.
            trap: The size of the trap; not stated, that of the fixture table.
            load: The load in fixture units, for a custom fixture or where the maker states more than the table.
            at: Where its trap is on the plan.
            group: The bathroom group that it belongs to: fixtures of one bathroom share a word here.
            outlet_length: The developed length of the pipe between the fixture's outlet and its trap.
            continuous_flow: The flow of equipment that runs on and on, such as `"0.3 L/s"`.
            semi_continuous_flow: The flow of equipment that runs now and then for a while.
            future: Only provided for; it counts all the same.
        """
        stated = {
            "id": id,
            "kind": kind,
            "level": level,
            "at": at,
            "height": height,
            "trap": trap,
            "load": load,
            "continuous_flow": continuous_flow,
            "semi_continuous_flow": semi_continuous_flow,
            "group": group,
            "outlet_length": outlet_length,
            "future": future or None,
        }
        return self._add("fixtures", stated)

    def joint(self, id: str, level: str, *, height: Length | None = None, at: Position | None = None) -> Self:
        """Adds a place where pipes meet.

        Args:
            id: Its id, such as `J1`.
            level: The level that it belongs to: what joins a stack here counts for this storey.
            height: Its height above the floor of the level, under it negative; not stated, 0.
            at: Where it is on the plan.
        """
        return self._add("joints", {"id": id, "level": level, "at": at, "height": height})

    def drain(
        self,
        id: str,
        from_: str,
        to: str,
        *,
        runs: Literal["level", "vertical", "sloped"] = "level",
        length: Length | None = None,
        drop: Length | None = None,
        slope: str | None = None,
        size: Size | None = None,
        name: DrainName | None = None,
        underground: bool = False,
        outside: bool = False,
        turns: int | None = None,
    ) -> Self:
        """Adds a pipe that carries waste, drawn in the direction of flow.

        Args:
            id: Its id, such as `d1`.
            from_: The fixture or joint where it begins.
            to: The joint where it ends.
            runs: Level at grade, straight down (or within 45° of it), or at a stated drop or slope.
            length: Its developed length; not stated, worked out from positions or heights.
            drop: How far its lower end is below its upper end, for vertical and sloped pipe.
            slope: Its slope, such as `"1:50"`; not stated, the least that the edition allows.
            size: Its size, where it is fixed already: never less than this, and a finding if the code asks more.
            name: Its name in the code's terms, to state it; a name that the drawing contradicts is a finding.
            underground: In or under the ground.
            outside: Outside the building's wall.
            turns: The sum of its turns in degrees.
        """
        stated = {
            "id": id,
            "from": from_,
            "to": to,
            "runs": runs,
            "length": length,
            "drop": drop,
            "slope": slope,
            "size": size,
            "name": name,
            "underground": underground or None,
            "outside": outside or None,
            "turns": turns,
        }
        return self._add("drains", stated)

    def vent(
        self,
        id: str,
        from_: str,
        to: str,
        *,
        length: Length | None = None,
        size: Size | None = None,
        name: VentName | None = None,
    ) -> Self:
        """Adds a pipe that carries air, drawn toward the open air.

        Args:
            id: Its id, such as `v1`.
            from_: The joint where it leaves a drain or other vents.
            to: The joint, terminal or valve where it ends.
            length: Its developed length; not stated, worked out from positions and heights.
            size: Its size, where it is fixed already.
            name: Its name in the code's terms, to state it.
        """
        stated = {"id": id, "from": from_, "to": to, "length": length, "size": size, "name": name}
        return self._add("vents", stated)

    def terminal(
        self,
        id: str,
        *,
        through: Literal["roof", "wall"] = "roof",
        above: Length | None = None,
        level: str | None = None,
        height: Length | None = None,
        at: Position | None = None,
    ) -> Self:
        """Adds the place where a vent ends in open air.

        Args:
            id: Its id, such as `T1`.
            through: Roof or wall.
            above: How far it ends above the roof, or, through a wall, above the ground.
            level: The level that its place is measured from.
            height: Its height above the floor of `level`.
            at: Where it is on the plan.
        """
        stated = {"id": id, "through": through, "level": level, "at": at, "height": height, "above": above}
        return self._add("terminals", stated)

    def valve(
        self,
        id: str,
        *,
        grounds: Literal["island", "frost", "renovation", "not-practical"] | None = None,
        level: str | None = None,
        height: Length | None = None,
        at: Position | None = None,
    ) -> Self:
        """Adds an air admittance valve.

        Args:
            id: Its id, such as `A1`.
            grounds: Why it is permitted where it stands.
            level: The level that its place is measured from.
            height: Its height above the floor of `level`.
            at: Where it is on the plan.
        """
        return self._add("valves", {"id": id, "grounds": grounds, "level": level, "at": at, "height": height})

    def cleanout(self, id: str, at: str) -> Self:
        """Adds a cleanout.

        Args:
            id: Its id, such as `CO1`.
            at: The joint where it gives access.
        """
        return self._add("cleanouts", {"id": id, "at": at})

    def sewer(self, at: str, *, invert: Length | None = None) -> Self:
        """States the connection to the public sewer or the disposal system; stated again, the last counts.

        Args:
            at: The joint where the building's piping ends.
            invert: The invert of the connection above the datum of the levels; not stated, inverts cannot be given.
        """
        self._drawing["sewer"] = _stated({"at": at, "invert": invert})
        return self

    def build(self) -> Layout:
        """The layout as drawn so far.

        Raises:
            FormatError: All faults of the drawing together, each with its path, such as `fixtures[2].trap`.
        """
        return Layout.from_dict({**self._drawing, **self._elements})


def _stated(values: Mapping[str, object]) -> dict[str, object]:
    return {key: value for key, value in values.items() if value is not None}
