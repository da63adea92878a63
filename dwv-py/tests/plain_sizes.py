"""Vents and sizes of the plain solver, from the same definitions."""

from __future__ import annotations

from fractions import Fraction
from typing import Any

from plain_solver import SIZES, House, metres, table

MAJOR = {"stack vent", "vent stack", "vent header"}


def half(stack: str) -> str:
    """The smallest size that is half of a stack."""
    inches = {size: Fraction(size.split("-")[0]) + sum(map(Fraction, size.split("-")[1:])) for size in SIZES}
    return next(size for size in SIZES if 2 * inches[size] >= inches[stack])


class SizedHouse(House):
    """A drawing with the names, loads, lengths and sizes of its vents, and the sizes of its drains."""

    def __init__(self, drawing: dict[str, Any]) -> None:
        """Reads and sizes the drawing of a layout file."""
        super().__init__(drawing)
        self.found = {fixture: self.protection(fixture) for fixture in self.fixtures}
        self.roles = {vent: self.vent_role(vent) for vent in self.vents}
        self.size_all()

    # --- vents ----------------------------------------------------------------------------------------------------

    def after(self, vent: str) -> str | None:
        """The vent that a vent runs into."""
        return self.rising.get(self.vents[vent]["to"])

    def before(self, vent: str) -> list[str]:
        """The vents that run into a vent."""
        return [other for other in self.vents if self.after(other) == vent]

    def counted(self, vent: str) -> list[str]:
        """The fixtures that a vent is sized for: those that it protects, and those whose next vent it is."""
        own = [fixture for fixture, found in self.found.items() if found is not None and found[1] == vent]
        for fixture, found in self.found.items():
            if found is None and not self.exempt(fixture):
                ways = self.downstream(self.own_drain(fixture)[-1])[1:]
                if next((air[2] for pipe in ways if (air := self.air(pipe)) is not None), None) == vent:
                    own.append(fixture)
        return own

    def foot_role(self, vent: str) -> tuple[str, frozenset[str] | None] | None:
        """What a vent is called by the joint on a drain where it begins."""
        drain = self.leaving.get(self.vents[vent]["from"])
        if drain is None:
            return None
        protected = [found for found in self.found.values() if found is not None and found[1] == vent]
        direct = sum(found[0] is None for found in protected)
        stack = self.stacks.get(drain)
        if stack is not None:
            if self.line(drain) not in stack:
                return ("stack vent", stack)
            below = [pipe for pipe in self.downstream(drain)[1:] if pipe in stack]
            if not any(len(self.arriving(pipe)) > 1 for pipe in below):
                return ("vent stack", stack)
        else:
            feet = [self.stacks[pipe] for pipe in self.arriving(drain) if pipe in self.stacks]
            if feet and direct == 0:
                last = self.latest([pipe for pipe in self.arriving(drain) if pipe in self.stacks])
                return ("vent stack", self.stacks[last])
        if not protected:
            return ("spare vent", None)
        if len(protected) == direct == 1:
            return ("individual vent", None)
        arms = sum(self.is_fixture_drain(pipe) for pipe in self.arriving(drain))
        if len(protected) == direct == 2 and arms == 2:
            return ("dual vent", None)
        return ("continuous vent", None)

    def vent_role(self, vent: str) -> tuple[str, frozenset[str] | None]:
        """What a vent is called, and its stack."""
        own = self.foot_role(vent)
        roles = ([own] if own else []) + [self.vent_role(other) for other in self.before(vent)]
        majors = [role for role in roles if role[0] in MAJOR]
        if len(majors) > 1:
            return ("vent header", None)
        if majors:
            return majors[0]
        return roles[0] if len(roles) == 1 else ("branch vent", None)

    def first_major(self, vent: str | None) -> str | None:
        """The first major vent on the way out."""
        while vent is not None and self.roles[vent][0] not in MAJOR:
            vent = self.after(vent)
        return vent

    def extra(self, vent: str) -> Fraction:
        """What other vents bring to a major vent: traps that do not drain through its stack."""
        stack = self.roles[vent][1]
        inside = set(self.traps(self.foot(stack))) if stack else set()
        load = Fraction(0)
        for other in self.vents:
            if self.first_major(other) == vent:
                load += sum((self.fixture_load(it) for it in self.counted(other) if it not in inside), Fraction(0))
        return load

    def vent_load(self, vent: str) -> Fraction:
        """The load that a vent is sized by."""
        name, stack = self.roles[vent]
        if name == "vent header":
            drain = self.leaving.get(self.vents[vent]["from"], "")
            own = self.load(self.foot(self.stacks[drain])) if drain in self.stacks else Fraction(0)
            joined = (self.vent_load(other) for other in self.before(vent) if self.roles[other][0] in MAJOR)
            return sum(joined, Fraction(0)) + self.extra(vent) + own
        if stack is not None:
            return self.load(self.foot(stack)) + self.stack_extra(vent)
        own = sum((self.fixture_load(fixture) for fixture in self.counted(vent)), Fraction(0))
        return own + sum((self.vent_load(other) for other in self.before(vent)), Fraction(0))

    def stack_extra(self, vent: str) -> Fraction:
        """What has joined a stack vent up to here."""
        majors = [other for other in self.before(vent) if self.roles[other][0] in MAJOR]
        return self.extra(vent) + sum((self.stack_extra(other) for other in majors), Fraction(0))

    def own_length(self, vent: str) -> Fraction:
        """The length of a vent by itself."""
        return metres(self.vents[vent]["length"])

    def behind(self, vent: str) -> Fraction:
        """The longest way from where counting begins to the end of a vent."""
        name = self.roles[vent][0]
        alike = [
            other
            for other in self.before(vent)
            if name == "vent header" or (self.roles[other][0] in MAJOR) == (name in MAJOR)
        ]
        return self.own_length(vent) + max((self.behind(other) for other in alike), default=Fraction(0))

    def ahead(self, vent: str) -> Fraction:
        """The way from the end of a vent to a major vent, or for a major vent to open air."""
        onward = self.after(vent)
        if onward is None or (self.roles[vent][0] not in MAJOR and self.roles[onward][0] in MAJOR):
            return Fraction(0)
        return self.own_length(onward) + self.ahead(onward)

    def developed(self, vent: str) -> Fraction | None:
        """The developed length, where it counts."""
        if self.roles[vent][0] in {"individual vent", "dual vent", "spare vent"}:
            return None
        return self.behind(vent) + self.ahead(vent)

    def largest_trap(self, vent: str) -> str | None:
        """The largest trap that gets its air through a vent."""
        traps = [self.trap(fixture) for fixture in self.counted(vent)]
        traps += [trap for other in self.before(vent) if (trap := self.largest_trap(other)) is not None]
        return max(traps, key=SIZES.index, default=None)

    # --- sizes ----------------------------------------------------------------------------------------------------

    def for_length(self, ask: str, length: Fraction, **operands: Any) -> str:
        """The smallest vent that may be as long."""
        for size in SIZES:
            longest = table(ask, vent=size, **operands)
            if longest == "not known":
                # The weakest cell: the next heavier row's.
                longest = table(ask, vent=size, **{**operands, "load": 24})
            if longest == "not limited" or (longest.endswith(" m") and metres(longest) >= length):
                return size
        raise AssertionError(ask)

    def wet_end(self, drain: str) -> str | None:
        """The last drain of the wet vent that a drain is part of."""
        users = [found[0] for found in self.found.values() if found is not None and found[0] is not None]
        chains = []
        for user in set(users):
            chain = [user]
            while (air := self.air(chain[-1])) is not None and air[1] is not None:
                chain.append(air[1])
            chains.append(chain)
        mine = [chain for chain in chains if drain in chain]
        return max(mine, key=lambda chain: len(chain[: chain.index(drain)]))[0] if mine else None

    def drain_minimums(self, drain: str, vents: dict[str, str], sizes: dict[str, str]) -> list[str]:
        """Every minimum of a drain."""
        name, load, closets = self.name(drain), float(self.load(drain)), self.closets(drain)
        asks = [sizes[other] for other in self.arriving(drain)]
        start = self.drains[drain]["from"]
        if start in self.rising:
            asks.append(vents[self.rising[start]])
        if start in self.fixtures:
            asks.append(self.trap(start))
        long_offset = name.endswith("offset") and self.offset_length(drain) >= Fraction(3, 2)
        if name in {"trap arm", "fixture drain", "branch"} or long_offset:
            asks.append(table("drain-for-load", role="branch", load=load))
        if name == "building drain" or long_offset:
            asks.append(table("drain-for-load", role="building-drain", load=load))
        if "stack" in name:
            asks.append(table("drain-for-load", role="stack", load=load))
            asks.append(table("drain-for-load", role="stack-storey", load=float(self.heaviest_storey(drain))))
        if closets:
            asks.append("3")
        if closets > 2 and name in {"branch", "building drain"}:
            asks.append("4")
        if closets > 6 and "stack" in name:
            asks.append("4")
        if name == "building drain" and self.drains[drain].get("underground"):
            asks.append("4")
        return asks + self.wet_minimums(drain)

    def wet_minimums(self, drain: str) -> list[str]:
        """What a wet vent asks for."""
        end = self.wet_end(drain)
        if end is None:
            return []
        served = [it for it, found in self.found.items() if found and found[0] and self.wet_end(found[0]) == end]
        last = [fixture for fixture in served if (found := self.found[fixture]) and found[0] == end]
        load = self.load(end) + (sum(map(self.fixture_load, last), Fraction(0)) if len(last) > 2 else 0)
        closet = any(self.fixtures[fixture]["kind"] == "water-closet" for fixture in served)
        takes = {size: table("wet-vent-capacity", size=size, water_closet=closet) for size in SIZES}
        known = [size for size in SIZES if takes[size][0].isdigit()]
        fits = [size for size in known if Fraction(takes[size]) >= load]
        trap = max((self.trap(fixture) for fixture in served), key=SIZES.index)
        return [fits[0] if fits else known[-1], table("vent-for-trap", trap=trap)]

    def offset_length(self, drain: str) -> Fraction:
        """The length of the level stretch of a stack that a drain is part of."""
        stack = self.stacks[drain]
        stretch = {drain}
        while True:
            near = {
                pipe
                for pipe in stack
                if not self.vertical(pipe) and (self.next(pipe) in stretch or pipe in {self.next(at) for at in stretch})
            }
            if near <= stretch:
                return sum(map(self.length, stretch), Fraction(0))
            stretch |= near

    def heaviest_storey(self, drain: str) -> Fraction:
        """The most that enters a stack on one storey, down to a drain."""
        by_storey: dict[str, Fraction] = {}
        at: str | None = drain
        stack = self.stacks[drain]
        while at is not None and at in stack:
            above = self.line(at)
            above = above if above in stack else None
            entering = self.load(at) - (self.load(above) if above else 0)
            start = self.drains[at]["from"]
            level = (self.joints.get(start) or self.fixtures[start])["level"]
            by_storey[level] = by_storey.get(level, Fraction(0)) + entering
            at = above
        return max(by_storey.values())

    def vent_minimums(self, vent: str, sizes: dict[str, str], feet: dict[str, str], vents: dict[str, str]) -> list[str]:
        """Every minimum of a vent."""
        stack = self.roles[vent][1]
        load, length = float(self.vent_load(vent)), self.developed(vent)
        asks = [vents[other] for other in self.before(vent)]
        if (trap := self.largest_trap(vent)) is not None:
            asks.append(table("vent-for-trap", trap=trap))
        if stack is not None and length is not None:
            foot = self.foot(stack)
            asks.append(self.for_length("stack-vent-longest", length, stack=feet[foot], load=load))
            asks.append(half(sizes[foot]))
        elif length is not None:
            asks.append(self.for_length("vent-longest", length, load=load))
            stand_in = table("drain-for-load", role="stack", load=load)
            asks.append(self.for_length("stack-vent-longest", length, stack=stand_in, load=load))
        if vent == self.large_vent():
            asks.append("3")
        return asks

    def large_vent(self) -> str | None:
        """The stack vent that gives the building drain its 3 in."""

        def rank(vent: str) -> tuple[bool, bool]:
            stack = self.roles[vent][1]
            assert stack is not None
            onward = self.next(self.foot(stack))
            at_end = onward in self.main and not any(pipe in self.main for pipe in self.arriving(onward or ""))
            return (at_end, self.closets(self.foot(stack)) > 0)

        begins = [
            vent
            for vent, (name, stack) in self.roles.items()
            if name == "stack vent" and stack and self.leaving.get(self.vents[vent]["from"]) in stack
        ]
        most = max(map(rank, begins), default=None)
        best = [vent for vent in begins if rank(vent) == most]
        return best[0] if len(best) == 1 else None

    def size_all(self) -> None:
        """Sizes drains and vents until nothing changes."""
        by_water = sorted(self.drains, key=lambda drain: (len(self.upstream(drain)), drain))
        by_air = sorted(self.vents, key=lambda vent: len(list(self.chain(vent))), reverse=True)
        vents = dict.fromkeys(self.vents, SIZES[0])
        sizes: dict[str, str] = {}
        feet: dict[str, str] = {}
        while True:
            seen = (dict(sizes), dict(vents))
            for drain in by_water:
                sizes[drain] = max([SIZES[0], *self.drain_minimums(drain, vents, sizes)], key=SIZES.index)
            feet = feet or dict(sizes)
            for vent in by_air:
                vents[vent] = max([SIZES[0], *self.vent_minimums(vent, sizes, feet, vents)], key=SIZES.index)
            if seen == (sizes, vents):
                break
        self.drain_sizes, self.vent_sizes = sizes, vents

    def chain(self, vent: str | None) -> Any:
        """A vent and those that it runs through."""
        while vent is not None:
            yield vent
            vent = self.after(vent)
