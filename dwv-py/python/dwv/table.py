"""Schedules as tables of texts."""

from __future__ import annotations

from dataclasses import dataclass

from . import _dwv


@dataclass(frozen=True, slots=True)
class Table:
    r"""A table of texts, as a schedule shows it.

    A data frame takes it as `pandas.DataFrame(table.rows, columns=table.heads)`; a notebook shows it as a table.

    Args:
        title: What it is called.
        heads: The heads of its columns.
        right: Which columns are set to the right.
        rows: Its rows, each with a cell for each column.

    Raises:
        ValueError: A row or `right` has not one cell for each head.

    >>> table = Table("VENTS", ("vent", "size in"), (False, True), (("v1", "1-1/2"), ("v2", "2")))
    >>> print(table.to_text(), end="")
    VENTS
    vent  size in
    ----  -------
    v1      1-1/2
    v2          2
    >>> table.to_csv()
    'vent,size in\r\nv1,1-1/2\r\nv2,2\r\n'
    """

    title: str
    """What it is called."""
    heads: tuple[str, ...]
    """The heads of its columns."""
    right: tuple[bool, ...]
    """Which columns are set to the right."""
    rows: tuple[tuple[str, ...], ...]
    """Its rows, each with a cell for each column."""

    def __post_init__(self) -> None:
        """Takes any lists, and refuses rows of another width than the heads."""
        object.__setattr__(self, "heads", tuple(self.heads))
        object.__setattr__(self, "right", tuple(self.right))
        object.__setattr__(self, "rows", tuple(tuple(row) for row in self.rows))
        for what, cells in [("right", self.right), *((f"rows[{index}]", row) for index, row in enumerate(self.rows))]:
            if len(cells) != len(self.heads):
                raise ValueError(f"{what}: {len(cells)} cells, expected {len(self.heads)}, one for each head")

    def __len__(self) -> int:
        """How many rows it has."""
        return len(self.rows)

    def to_text(self) -> str:
        """The table as aligned text with its title and heads."""
        return _dwv.table_text(*self._cells())

    def to_csv(self) -> str:
        """The table as comma-separated values (RFC 4180), safe to open in a spreadsheet.

        Write it with `newline=""`: its lines end in a carriage return and a line feed already.
        """
        return _dwv.table_csv(*self._cells())

    def _cells(self) -> tuple[str, list[str], list[bool], list[list[str]]]:
        return self.title, list(self.heads), list(self.right), [list(row) for row in self.rows]

    def _repr_html_(self) -> str:
        from html import escape

        styles = [' style="text-align: right"' if right else ' style="text-align: left"' for right in self.right]

        def line(tag: str, cells: tuple[str, ...]) -> str:
            row = (f"<{tag}{style}>{escape(cell)}</{tag}>" for cell, style in zip(cells, styles, strict=True))
            return f"<tr>{''.join(row)}</tr>"

        head, rows = line("th", self.heads), "".join(line("td", row) for row in self.rows)
        return f"<table><caption>{escape(self.title)}</caption><thead>{head}</thead><tbody>{rows}</tbody></table>"
