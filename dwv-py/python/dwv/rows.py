"""Results as rows: frozen values whose attributes are named as the keys of the canonical result.

`from` is a word of Python, so that key is the attribute `from_`. Names end in the unit: `length_m` is in metres. Loads
are in fixture units, sizes are nominal inches as the trade writes them (`"1-1/2"`). `None` stands where nothing can be
said.
"""

from __future__ import annotations

import json
from dataclasses import dataclass, fields
from typing import Any, Literal, TypeVar

Status = Literal["decided", "provisional", "cannot-decide"]
"""How far a size is decided; `provisional` rests on a value that nobody has seen in print."""

Witness = Literal[
    "printed-two", "printed-one", "printed-provincial", "common-practice", "engine", "disputed", "memory", "unsure"
]
"""How sure a value of an edition is, the best first."""

Severity = Literal["violation", "cannot-decide", "caution"]
"""How grave a finding is."""


@dataclass(frozen=True, slots=True, kw_only=True)
class ReasonRow:
    """One minimum of a size."""

    rule: str
    """The stable name of the rule."""
    says: str
    """What it says, such as `branch table, 6 FU`."""
    asks: str
    """The size that it asks for."""
    clause: str
    """The clause with the edition."""
    witness: Witness
    """How sure the value is."""
    governs: bool
    """Whether it governs the size."""


@dataclass(frozen=True, slots=True, kw_only=True)
class PipeRow:
    """A drain."""

    id: str
    """The id in the drawing."""
    name: str
    """What it is called, such as `trap arm`."""
    from_: str
    """Where it begins."""
    to: str
    """Where it ends."""
    load: float
    """The load in fixture units."""
    traps: int
    """The traps upstream."""
    water_closets: int
    """The water closets upstream."""
    size: str | None
    """The size; none when it cannot be decided."""
    status: Status
    """How far the size is decided."""
    governed_by: str
    """What governs the size, in words."""
    clause: str
    """The clause that governs the size."""
    room: float | None
    """The fixture units that it could still take before a table asks for more."""
    wet_vent: bool
    """Whether it serves as a wet vent."""
    vertical: bool
    """Whether it runs vertically."""
    slope: str | None
    """The slope as it was written, or as a ratio."""
    length_m: float | None
    """The developed length in metres."""
    fall_m: float | None
    """The fall in metres."""
    invert_up_m: float | None
    """The invert at the upper end in metres."""
    invert_down_m: float | None
    """The invert at the lower end in metres."""
    reasons: tuple[ReasonRow, ...]
    """Every minimum."""


@dataclass(frozen=True, slots=True, kw_only=True)
class VentRow:
    """A vent."""

    id: str
    """The id in the drawing."""
    name: str
    """What it is called, such as `stack vent`."""
    from_: str
    """Where it begins."""
    to: str
    """Where it ends."""
    ends_at: str
    """The terminal or valve that its air comes from."""
    largest_trap: str | None
    """The largest trap that gets its air here."""
    load: float
    """The load in fixture units that it is sized by."""
    developed_length_m: float | None
    """The developed length in metres that it is sized by; none where length does not count."""
    length_m: float | None
    """Its own length in metres."""
    size: str | None
    """The size; none when it cannot be decided."""
    status: Status
    """How far the size is decided."""
    governed_by: str
    """What governs the size, in words."""
    clause: str
    """The clause that governs the size."""
    reasons: tuple[ReasonRow, ...]
    """Every minimum."""


@dataclass(frozen=True, slots=True, kw_only=True)
class TerminalRow:
    """Where a vent ends in open air."""

    id: str
    """The id in the drawing."""
    vent: str
    """The vent that ends here."""
    through: Literal["roof", "wall"]
    """What it passes."""
    above_m: float | None
    """How far it ends above the roof or the ground, in metres."""
    size: str | None
    """The size where it passes to open air; none when it cannot be decided."""
    status: Status
    """How far the size is decided."""
    governed_by: str
    """What governs the size, in words."""
    clause: str
    """The clause that governs the size."""
    reasons: tuple[ReasonRow, ...]
    """Every minimum."""


@dataclass(frozen=True, slots=True, kw_only=True)
class FixtureRow:
    """A fixture with its load and its air."""

    id: str
    """The id in the drawing."""
    kind: str
    """Its kind in words."""
    level: str
    """Its level."""
    trap: str
    """The size of its trap."""
    outlet: str | None
    """The least size of its outlet pipe, when the edition lists it."""
    outlet_m: float | None
    """The length of its outlet pipe in metres, when stated."""
    load: float
    """Its load in fixture units."""
    load_clause: str
    """Where the load comes from."""
    load_witness: Witness | None
    """How sure the load is; none when the drawing states it."""
    future: bool
    """Only provided for; it counts all the same."""
    trap_arm_m: float | None
    """The developed length of the trap arm in metres; none when no air reaches it or a length is missing."""
    trap_arm_fall_m: float | None
    """How far the trap arm falls, in metres."""
    protected_by: str | None
    """The vent that protects it; none when it has none."""
    air: str
    """How it gets its air, in words."""
    air_path: tuple[str, ...]
    """The way of its air: drains that serve as wet vents, vents, and the terminal or valve."""


@dataclass(frozen=True, slots=True, kw_only=True)
class FindingRow:
    """Something that breaks the code, or that cannot be decided."""

    check: str
    """The stable name of the check."""
    severity: Severity
    """How grave it is."""
    element: str | None
    """The id of the element; none for the whole drawing."""
    message: str
    """What was found, in words."""
    remedy: str
    """How to mend it."""
    clause: str
    """The clause."""


@dataclass(frozen=True, slots=True, kw_only=True)
class Summary:
    """What was sized, by which edition and readings, and how sure it is."""

    name: str
    """What the drawing is called."""
    edition: str
    """The id of the edition."""
    title: str
    """The title of the edition."""
    readings: tuple[str, ...]
    """The readings in force, in words."""
    fixtures: int
    """How many fixtures there are."""
    drains: int
    """How many drains."""
    vents: int
    """How many vents."""
    load: float
    """The load at the sewer in fixture units."""
    unattested: str | None
    """Which sizes rest on values that nobody has seen in print; none when all were seen."""
    caution: str
    """The caution that every report carries."""


@dataclass(frozen=True, slots=True, kw_only=True)
class Result:
    """The whole canonical result."""

    format: str
    """The name of its format, `dwv-sizing/1`."""
    summary: Summary
    """The head."""
    pipes: tuple[PipeRow, ...]
    """The drains, from the sewer upstream."""
    vents: tuple[VentRow, ...]
    """The vents, from open air inward."""
    terminals: tuple[TerminalRow, ...]
    """The terminals by id."""
    fixtures: tuple[FixtureRow, ...]
    """The fixtures, in the order of their drains from the sewer upstream."""
    findings: tuple[FindingRow, ...]
    """What was found, in the order of the checks."""


Row = TypeVar("Row", ReasonRow, PipeRow, VentRow, TerminalRow, FixtureRow, FindingRow, Summary)


def read_result(json_text: str) -> Result:
    """Reads the canonical result."""
    result = json.loads(json_text)
    return Result(
        format=result["format"],
        summary=_row(Summary, result["summary"]),
        pipes=_rows(PipeRow, result["pipes"]),
        vents=_rows(VentRow, result["vents"]),
        terminals=_rows(TerminalRow, result["terminals"]),
        fixtures=_rows(FixtureRow, result["fixtures"]),
        findings=_rows(FindingRow, result["findings"]),
    )


def _rows(kind: type[Row], rows: list[dict[str, Any]]) -> tuple[Row, ...]:
    return tuple(_row(kind, row) for row in rows)


def _row(kind: type[Row], row: dict[str, Any]) -> Row:
    if "from" in row:
        row["from_"] = row.pop("from")
    if "reasons" in row:
        row["reasons"] = tuple(ReasonRow(**reason) for reason in row["reasons"])
    for key in _LISTS[kind]:
        row[key] = tuple(row[key])
    for key in _NUMBERS[kind]:
        if row[key] is not None:
            row[key] = float(row[key])
    return kind(**row)


_KINDS = (ReasonRow, PipeRow, VentRow, TerminalRow, FixtureRow, FindingRow, Summary)

_LISTS: dict[type, list[str]] = {
    kind: [field.name for field in fields(kind) if str(field.type) == "tuple[str, ...]"] for kind in _KINDS
}
"""The attributes that are lists of texts."""


_NUMBERS: dict[type, list[str]] = {
    kind: [field.name for field in fields(kind) if str(field.type).startswith("float")] for kind in _KINDS
}
"""The attributes that are no counts, although JSON may write them as whole numbers."""
