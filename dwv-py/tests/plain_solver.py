"""A second, slow and plain solver: dictionaries and definitions, no order of passes and no columns.

It names and loads a drawing and traces its air from the definitions in words, asks the edition for table values only,
and is compared with the engine on random drawings. It knows no bathroom groups, no stated sizes and no custom fixtures.
"""

from __future__ import annotations

import json
from fractions import Fraction
from functools import cache
from typing import Any

import dwv

SIZES = ["1-1/4", "1-1/2", "2", "3", "4", "5", "6", "8", "10", "12", "15"]
EDITION = dwv.edition("npc-2015")


@cache
def ask(question: str) -> str:
    """The edition's answer to a question written as JSON."""
    return EDITION.answer(question).text


def table(ask_for: str, **operands: Any) -> str:
    """One table value."""
    return ask(json.dumps({"ask": ask_for, **operands}))


def metres(text: str) -> Fraction:
    """A length in metres, exactly."""
    return Fraction(round(dwv.length_m(text) * 10**9), 10**9)


class House:
    """A drawing with everything that follows from it."""

    def __init__(self, drawing: dict[str, Any]) -> None:
        """Reads the drawing of a layout file."""
        self.floor = {level["id"]: metres(level["floor"]) for level in drawing["levels"]}
        self.floors = sorted(set(self.floor.values()))
        self.joints = {joint["id"]: joint for joint in drawing["joints"]}
        self.fixtures = {fixture["id"]: fixture for fixture in drawing["fixtures"]}
        self.drains = {drain["id"]: drain for drain in drawing["drains"]}
        self.vents = {vent["id"]: vent for vent in drawing["vents"]}
        self.sewer = drawing["sewer"]["at"]
        self.leaving = {drain["from"]: drain["id"] for drain in drawing["drains"]}
        self.rising = {vent["from"]: vent["id"] for vent in drawing["vents"]}
        self.stacks = self.find_stacks()
        self.main = self.find_building_drain()

    # --- geometry -------------------------------------------------------------------------------------------------

    def height(self, end: str) -> Fraction:
        """The height of a fixture or joint."""
        element = self.joints.get(end) or self.fixtures[end]
        return self.floor[element["level"]] + metres(element.get("height", "0 m"))

    def drop(self, drain: str) -> Fraction:
        """How far the ends of a drain are apart in height."""
        return self.height(self.drains[drain]["from"]) - self.height(self.drains[drain]["to"])

    def length(self, drain: str) -> Fraction:
        """The length of a drain."""
        return metres(self.drains[drain]["length"]) if "length" in self.drains[drain] else self.drop(drain)

    def vertical(self, drain: str) -> bool:
        """Whether a drain runs vertically."""
        return bool(self.drains[drain]["runs"] == "vertical")

    def next(self, drain: str) -> str | None:
        """The drain that a drain runs into."""
        to = self.drains[drain]["to"]
        return None if to == self.sewer else self.leaving[to]

    def arriving(self, drain: str) -> list[str]:
        """The drains that run into the joint where a drain begins, by id."""
        start = self.drains[drain]["from"]
        return sorted(other for other in self.drains if self.drains[other]["to"] == start)

    def upstream(self, drain: str) -> list[str]:
        """A drain and everything that drains into it."""
        found = [drain]
        for other in self.arriving(drain):
            found += self.upstream(other)
        return found

    def downstream(self, drain: str) -> list[str]:
        """A drain and everything that it drains through."""
        way = [drain]
        while (onward := self.next(way[-1])) is not None:
            way.append(onward)
        return way

    def traps(self, drain: str) -> list[str]:
        """The fixtures that drain through a drain."""
        return [self.drains[at]["from"] for at in self.upstream(drain) if self.drains[at]["from"] in self.fixtures]

    # --- loads ----------------------------------------------------------------------------------------------------

    def trap(self, fixture: str) -> str:
        """The trap of a fixture: the size of its outlet."""
        return table("fixture-outlet", fixture=self.fixtures[fixture]["kind"])

    def fixture_load(self, fixture: str) -> Fraction:
        """The load of a fixture."""
        return Fraction(table("fixture-load", fixture=self.fixtures[fixture]["kind"]))

    def load(self, drain: str) -> Fraction:
        """The load on a drain."""
        return sum((self.fixture_load(fixture) for fixture in self.traps(drain)), Fraction(0))

    def closets(self, drain: str) -> int:
        """The water closets that drain through a drain."""
        return sum(self.fixtures[fixture]["kind"] == "water-closet" for fixture in self.traps(drain))

    # --- stacks and the main line ---------------------------------------------------------------------------------

    def storeys(self, top: Fraction, foot: Fraction) -> int:
        """How many storeys lie between two heights; drains may hang 450 mm below the floor above."""
        pairs = zip(self.floors, self.floors[1:], strict=False)
        return sum(top >= above - Fraction(45, 100) and foot <= below for below, above in pairs)

    def line(self, drain: str) -> str | None:
        """The arriving drain that a line comes down: straight before bent, then highest, then with most load."""
        ranked = {
            other: (self.vertical(other), top, self.load(other))
            for other in self.arriving(drain)
            if (top := self.line_top(other)) is not None
        }
        best = max(ranked.values(), default=None)
        return self.latest([other for other, rank in ranked.items() if rank == best]) if ranked else None

    def line_top(self, drain: str) -> Fraction | None:
        """The top of the vertical run that a drain is part of, or from whose foot it comes."""
        above = self.line(drain)
        if self.vertical(drain):
            if above is not None and self.vertical(above):
                return self.line_top(above)
            return self.height(self.drains[drain]["from"])
        return self.line_top(above) if above is not None else None

    def find_stacks(self) -> dict[str, frozenset[str]]:
        """For each drain of a stack all drains of it."""
        lines: list[dict[str, Any]] = []
        of: dict[str, dict[str, Any]] = {}
        # From the fixtures down: a drain with more upstream comes later.
        for drain in sorted(self.drains, key=lambda drain: (len(self.upstream(drain)), drain)):
            if not self.vertical(drain):
                continue
            above = self.line(drain)
            if above is not None and self.vertical(above):
                of[drain] = of[above]
                of[drain]["runs"][-1].append(drain)
                continue
            of[drain] = {"runs": [[drain]], "offsets": [], "before": above}
            lines.append(of[drain])
        merged: list[dict[str, Any]] = []
        for line in lines:
            stretch: list[str] = []
            at = line["before"]
            while at is not None and not self.vertical(at):
                stretch.append(at)
                at = self.line(at)
            upper = next((other for other in merged if at in other["runs"][-1]), None) if at is not None else None
            foot = self.height(self.drains[line["runs"][0][-1]]["to"])
            own = self.storeys(self.height(self.drains[line["runs"][0][0]]["from"]), foot)
            line["passed"] = own
            if upper is not None and at is not None:
                top = self.height(self.drains[upper["runs"][0][0]]["from"])
                together = self.storeys(top, foot)
                short = sum((self.length(pipe) for pipe in stretch), Fraction(0)) < Fraction(3, 2)
                alone = len(self.traps(stretch[0])) == len(self.traps(at))
                if (upper["passed"] and own) or ((short or alone) and together > upper["passed"] + own):
                    upper["runs"].append(line["runs"][0])
                    upper["offsets"].append(stretch)
                    upper["passed"] = max(together, upper["passed"] + own)
                    continue
            merged.append(line)
        stacks = {}
        for line in merged:
            if line["passed"]:
                parts = frozenset(pipe for group in line["runs"] + line["offsets"] for pipe in group)
                stacks.update(dict.fromkeys(parts, parts))
        return stacks

    def foot(self, stack: frozenset[str]) -> str:
        """The lowest drain of a stack."""
        return next(pipe for pipe in stack if self.next(pipe) not in stack)

    def top(self, stack: frozenset[str]) -> str:
        """The highest drain of a stack."""
        return next(pipe for pipe in stack if self.line(pipe) not in stack)

    def way_out(self, drain: str) -> Fraction:
        """How far the upper end of a drain is from the sewer."""
        return sum((self.length(pipe) for pipe in self.downstream(drain)), Fraction(0))

    def find_building_drain(self) -> set[str]:
        """The main line inside. Random drawings have nothing outside."""
        feet: dict[str, bool] = {}
        for stack in set(self.stacks.values()):
            onward = self.next(self.foot(stack))
            if onward is not None and not any(pipe in self.stacks for pipe in self.downstream(onward)):
                feet[onward] = max(feet.get(onward, False), self.closets(self.foot(stack)) > 0)
        if feet:
            soil = [pipe for pipe, takes_closet in feet.items() if takes_closet] or list(feet)
            most = max(self.way_out(pipe) for pipe in soil)
            start: str | None = self.latest([pipe for pipe in soil if self.way_out(pipe) == most])
        else:
            junctions = [pipe for pipe in self.drains if len(self.arriving(pipe)) > 1 and pipe not in self.stacks]
            if not junctions:
                return set()

            def rank(pipe: str) -> tuple[bool, Fraction, Fraction]:
                closet = self.closets(pipe) > 0
                return (closet, Fraction(0) if closet else self.load(pipe), self.way_out(pipe))

            most_rank = max(rank(pipe) for pipe in junctions)
            start = self.latest([pipe for pipe in junctions if rank(pipe) == most_rank])
        while start is not None and self.vertical(start):
            start = self.next(start)
        return set(self.downstream(start)) - set(self.stacks) if start is not None else set()

    def latest(self, pipes: list[str]) -> str:
        """Of equals: the one numbered last. Water runs to a higher number, and ids decide between branches."""
        order: list[str] = []

        def visit(pipe: str) -> None:
            for other in self.arriving(pipe):
                visit(other)
            order.append(pipe)

        for pipe in sorted(pipe for pipe in self.drains if self.next(pipe) is None):
            visit(pipe)
        return max(pipes, key=order.index)

    def name(self, drain: str) -> str:
        """What a drain is called."""
        if drain in self.stacks:
            soil = self.closets(self.foot(self.stacks[drain])) > 0
            word = "soil stack" if soil else "waste stack"
            return word if self.vertical(drain) else f"{word} offset"
        if drain in self.main:
            return "building drain"
        if any(pipe in self.stacks for pipe in self.upstream(drain)):
            return "branch"
        if len(self.traps(drain)) != 1:
            return "branch"
        fixture = self.traps(drain)[0]
        arm = self.arm(fixture)
        return "trap arm" if arm is not None and drain in arm else "fixture drain"

    def is_fixture_drain(self, drain: str) -> bool:
        """Whether a drain carries one trap only, below no stack and off the main line."""
        plain = drain not in self.stacks and drain not in self.main
        return plain and len(self.traps(drain)) == 1 and not any(pipe in self.stacks for pipe in self.upstream(drain))

    # --- air ------------------------------------------------------------------------------------------------------

    def air(self, drain: str) -> tuple[Fraction, str | None, str] | None:
        """Where air comes from at the joint where a drain begins: how far, through which drain, from which vent."""
        start = self.drains[drain]["from"]
        if start in self.rising:
            return (Fraction(0), None, self.rising[start])
        best: tuple[Fraction, str, str] | None = None
        for other in self.arriving(drain):
            if self.drains[other]["from"] in self.fixtures or other in self.main:
                continue
            above = self.air(other)
            if above is not None:
                far = above[0] + self.length(other)
                if best is None or far < best[0] or (far == best[0] and self.latest([best[1], other]) == best[1]):
                    best = (far, other, above[2])
        return best

    def own_drain(self, fixture: str) -> list[str]:
        """The fixture drain of a trap, down to where air is admitted or other waste joins."""
        way = [self.leaving[fixture]]
        while True:
            joint = self.next(way[-1])
            if joint is None or self.air(joint) is not None or not self.is_fixture_drain(joint):
                return way
            way.append(joint)

    def exempt(self, fixture: str) -> bool:
        """Whether a floor drain has trap and length to go without a vent."""
        if self.fixtures[fixture]["kind"] != "floor-drain" or SIZES.index(self.trap(fixture)) < SIZES.index("3"):
            return False
        return sum((self.length(pipe) for pipe in self.own_drain(fixture)), Fraction(0)) >= Fraction(45, 100)

    def protection(self, fixture: str) -> tuple[str | None, str] | None:
        """The drain that brings air to a trap, when one does, and the vent; none without air."""
        joint = self.next(self.own_drain(fixture)[-1])
        found = self.air(joint) if joint is not None else None
        if found is None or (found[1] is not None and self.exempt(fixture)):
            return None
        return (found[1], found[2])

    def arm(self, fixture: str) -> list[str] | None:
        """The trap arm, when air is admitted at its end."""
        way = self.own_drain(fixture)
        return way if self.protection(fixture) is not None and self.is_fixture_drain(way[-1]) else None
