"""Names, loads, sizes and grades of building drainage, waste and vent piping, with the clause behind each number.

    import dwv
    from pathlib import Path

    sizing = dwv.size(Path("house.layout.json"))
    print(sizing.to_text())
    print(sizing.why("bd1"))

Examples in this package speak of `layout`, one kitchen sink with its vent, and `sizing`, the same sized.

Results support, and do not replace, the local code in force, the authority having jurisdiction and a licensed
practitioner.
"""

from ._dwv import __version__
from .builder import LayoutBuilder
from .code_edition import Answer, DrainRole, Edition, edition, editions
from .errors import (
    DrawingError,
    DwvError,
    EditionError,
    Fault,
    FormatError,
    InternalError,
    QuantityError,
    QuestionError,
)
from .layout import Layout, layout_schema
from .quantity import fall, length_m
from .rows import FindingRow, FixtureRow, PipeRow, ReasonRow, Severity, Status, Summary, TerminalRow, VentRow, Witness
from .sizing import ScheduleName, Sizing, Unattested, size
from .table import Table

__all__ = [
    "Answer",
    "DrainRole",
    "DrawingError",
    "DwvError",
    "Edition",
    "EditionError",
    "Fault",
    "FindingRow",
    "FixtureRow",
    "FormatError",
    "InternalError",
    "Layout",
    "LayoutBuilder",
    "PipeRow",
    "QuantityError",
    "QuestionError",
    "ReasonRow",
    "ScheduleName",
    "Severity",
    "Sizing",
    "Status",
    "Summary",
    "Table",
    "TerminalRow",
    "Unattested",
    "VentRow",
    "Witness",
    "__version__",
    "edition",
    "editions",
    "fall",
    "layout_schema",
    "length_m",
    "size",
]
