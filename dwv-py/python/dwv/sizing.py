"""Sizing a layout."""

from __future__ import annotations

import os
from collections.abc import Mapping
from typing import TYPE_CHECKING, Any, Literal, TypeVar, get_args

from . import _dwv
from .code_edition import Edition
from .errors import DrawingError, Fault, FormatError, QuantityError, QuestionError
from .layout import Layout
from .rows import FindingRow, FixtureRow, PipeRow, Summary, TerminalRow, VentRow
from .table import Table

ScheduleName = Literal["pipes", "vents", "fixtures", "inverts", "findings"]
"""The schedules of a sizing."""

Unattested = Literal["tell", "refuse"]
"""What to do with a size that rests on a value that nobody has seen in print: give it and say so, or give none."""

_Row = TypeVar("_Row", PipeRow, VentRow, TerminalRow, FixtureRow)


class Sizing(_dwv.Sizing):
    """A sized drawing: an immutable value with the answer and the reasons. `dwv.size` makes it.

    >>> sizing.pipe("d1").size
    '1-1/2'
    >>> sizing.pipe("d1").name
    'trap arm'
    >>> print(sizing.schedule("vents").to_text())  # doctest: +ELLIPSIS
    VENT SCHEDULE (from open air inward)
    ...
    """

    __slots__ = ()

    if TYPE_CHECKING:

        @property
        def layout(self) -> Layout:
            """The drawing."""

    @property
    def summary(self) -> Summary:
        """What was sized, by which edition and readings, and how sure it is."""
        return self._result.summary

    @property
    def pipes(self) -> list[PipeRow]:
        """The drains, from the sewer upstream."""
        return list(self._result.pipes)

    @property
    def vents(self) -> list[VentRow]:
        """The vents, from open air inward."""
        return list(self._result.vents)

    @property
    def terminals(self) -> list[TerminalRow]:
        """Where vents end in open air, by id."""
        return list(self._result.terminals)

    @property
    def fixtures(self) -> list[FixtureRow]:
        """The fixtures, in the order of their drains from the sewer upstream."""
        return list(self._result.fixtures)

    @property
    def findings(self) -> list[FindingRow]:
        """What breaks the code and what cannot be decided, in the order of the checks."""
        return list(self._result.findings)

    def pipe(self, id: str) -> PipeRow:
        """The drain with this id.

        Raises:
            QuestionError: No drain has this id; the nearest is named.
        """
        return self._find("drain", self._result.pipes, id)

    def vent(self, id: str) -> VentRow:
        """The vent with this id.

        Raises:
            QuestionError: No vent has this id; the nearest is named.
        """
        return self._find("vent", self._result.vents, id)

    def terminal(self, id: str) -> TerminalRow:
        """The terminal with this id.

        Raises:
            QuestionError: No terminal has this id; the nearest is named.
        """
        return self._find("terminal", self._result.terminals, id)

    def fixture(self, id: str) -> FixtureRow:
        """The fixture with this id.

        Raises:
            QuestionError: No fixture has this id; the nearest is named.
        """
        return self._find("fixture", self._result.fixtures, id)

    def _find(self, what: str, rows: tuple[_Row, ...], id: str) -> _Row:
        for row in rows:
            if row.id == id:
                return row
        self.why(id)  # Refuses an id that nothing has, and names the nearest.
        message = f"`{id}` is no {what}"
        raise QuestionError(message, (Fault("unknown-id", "", id, message),))

    def schedule(self, name: ScheduleName) -> Table:
        """A schedule as a table: `pipes`, `vents`, `fixtures`, `inverts` or `findings`.

        Raises:
            QuestionError: No schedule has this name.
        """
        cells = self._schedule(name)
        if cells is None:
            raise _no_schedule(name)
        title, heads, right, rows = cells
        return Table(title, tuple(heads), tuple(right), tuple(tuple(row) for row in rows))

    def __eq__(self, other: object) -> bool:
        """Whether the same drawing was sized by the same edition in the same way."""
        return self._key() == other._key() if isinstance(other, Sizing) else NotImplemented

    def __hash__(self) -> int:
        """Goes by the drawing, the edition and what is done with unattested values."""
        return hash(self._key())

    def __repr__(self) -> str:
        """The drawing, the edition and what is done with unattested values."""
        return f"<dwv.Sizing of {self.layout!r} by {self.edition}, unattested={self.unattested!r}>"

    def __reduce__(self) -> tuple[Any, ...]:
        """Sizes the drawing again in another process."""
        return type(self), self._key()

    def _key(self) -> tuple[Layout, str, str]:
        return self.layout, self.edition, self.unattested


def size(
    layout: Layout | str | bytes | bytearray | os.PathLike[str] | Mapping[str, object],
    *,
    edition: str | Edition | None = None,
    unattested: Unattested = "tell",
) -> Sizing:
    """Sizes a layout. Other threads of Python run meanwhile.

    Args:
        layout: A layout, its JSON as `str` or `bytes`, a `pathlib.Path` to its file, or a dict as such a file has it.
        edition: The code edition to size by; not stated, the one that the layout names.
        unattested: `tell` gives a size that rests on a value nobody has seen in print and says so, `refuse` gives none.

    Raises:
        FormatError: The layout cannot be read; all its faults together.
        DrawingError: It reads well, but it is no drainage system; all its faults together.
        EditionError: No edition has this id.
        QuestionError: `unattested` is neither `tell` nor `refuse`.
        OSError: The file cannot be read.

    >>> size(layout).vent("v1").size
    '1-1/4'
    """
    drawing, file = _drawing(layout)
    by = edition.id if isinstance(edition, Edition) else edition
    try:
        return Sizing(drawing, by, unattested)
    except (FormatError, DrawingError, QuantityError) as error:
        error.file = file
        raise


def _drawing(
    layout: Layout | str | bytes | bytearray | os.PathLike[str] | Mapping[str, object],
) -> tuple[Layout, str | None]:
    if isinstance(layout, Layout):
        return layout, None
    if isinstance(layout, os.PathLike):
        return Layout.from_file(layout), os.fspath(layout)
    if isinstance(layout, Mapping):
        return Layout.from_dict(layout), None
    try:
        return Layout.from_json(layout), None
    except FormatError as error:
        if isinstance(layout, str) and not layout.lstrip().startswith("{"):
            error.add_note("a text is taken as JSON; to read a file, pass `pathlib.Path(...)`")
        raise


def _no_schedule(name: str) -> QuestionError:
    from difflib import get_close_matches

    names = get_args(ScheduleName)
    near = get_close_matches(name, names, n=1)
    help_ = f"did you mean `{near[0]}`?" if near else f"known schedules: {', '.join(names)}"
    message = f"no schedule has the name `{name}`"
    return QuestionError(f"{message}; {help_}", (Fault("unknown-word", "name", None, message, help_),))
