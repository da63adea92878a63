"""Layouts: what the user draws."""

from __future__ import annotations

import os
from collections.abc import Iterable, Mapping
from pathlib import Path
from typing import TYPE_CHECKING, Any, Self

from . import _dwv
from .errors import DwvError, FormatError
from .json_text import json_text

if TYPE_CHECKING:
    from .builder import LayoutBuilder, LengthUnit


class Layout(_dwv.Layout):
    """A drawn drainage and vent system: an immutable value, the same as a file of the format `dwv-layout/1`.

    Make one with `from_file`, `from_json`, `from_dict` or `build`. Whether the drawing is a drainage system is asked
    when it is sized.

    >>> Layout.from_json(layout.to_json()) == layout
    True
    >>> layout
    <dwv.Layout 'one sink', npc-2015: 1 fixtures, 2 drains, 1 vents>
    """

    __slots__ = ()

    @classmethod
    def from_json(cls, text: str | bytes | bytearray) -> Self:
        """Reads a layout file's text.

        Args:
            text: JSON of the format `dwv-layout/1`; bytes are UTF-8.

        Raises:
            FormatError: All faults of the text together, each with its path; or where it is no JSON.

        >>> Layout.from_json('{"format": "dwv-layout/1", "nam": "Heron"}')
        Traceback (most recent call last):
        ...
        dwv.errors.FormatError: 6 faults:
        ...
        """
        if isinstance(text, str):
            # A lone surrogate is no UTF-8: the engine says so.
            return cls(text.encode("utf-8", "surrogatepass"))
        if isinstance(text, bytes | bytearray):
            return cls(bytes(text))
        raise TypeError(f"a layout is JSON in a `str` or `bytes`, not a `{type(text).__name__}`")

    @classmethod
    def from_file(cls, path: str | os.PathLike[str]) -> Self:
        """Reads a layout file.

        Raises:
            OSError: The file cannot be read.
            FormatError: All faults of the file together; `error.file` and the message name the file.
        """
        content = Path(path).read_bytes()
        try:
            return cls.from_json(content)
        except DwvError as error:
            error.file = os.fspath(path)
            raise

    @classmethod
    def from_dict(cls, drawing: Mapping[str, object]) -> Self:
        """Reads a layout from a dict with the keys of a layout file.

        JSON text is quicker when there is one already.

        Raises:
            FormatError: All faults of the dict together, each with its path.
        """
        return cls.from_json(json_text(drawing, FormatError))

    @classmethod
    def builder(
        cls,
        name: str,
        edition: str = "npc-2015",
        *,
        units: LengthUnit | None = None,
        frost_can_close_vents: bool | None = None,
        pipe_sizes: Iterable[str | float] | None = None,
        building_drain_ends_at: str | None = None,
    ) -> LayoutBuilder:
        """Begins a layout, to be drawn element by element and finished by `build()`.

        Args:
            name: What the drawing is called in schedules.
            edition: The code edition to size by.
            units: The unit of lengths that are bare numbers; without it every length names its unit.
            frost_can_close_vents: Whether frost can close a vent where it passes the roof; not stated, taken as yes.
            pipe_sizes: The pipe sizes at hand in inches; not stated, every size of the edition.
            building_drain_ends_at: The joint where the building drain ends upstream, to mark it.
        """
        from .builder import LayoutBuilder

        return LayoutBuilder(
            name,
            edition,
            units=units,
            frost_can_close_vents=frost_can_close_vents,
            pipe_sizes=pipe_sizes,
            building_drain_ends_at=building_drain_ends_at,
        )

    def __repr__(self) -> str:
        """Its name, its edition and how much it holds."""
        fixtures, drains, vents = self._counts()
        return f"<dwv.Layout {self.name!r}, {self.edition}: {fixtures} fixtures, {drains} drains, {vents} vents>"

    def __reduce__(self) -> tuple[Any, ...]:
        """Reads it again in another process."""
        return type(self), (self.to_json().encode(),)


def layout_schema() -> str:
    """The JSON Schema (draft 2020-12) of layout files, for editors and other programs.

    >>> "dwv-layout/1" in layout_schema()
    True
    """
    return _dwv.layout_schema()
