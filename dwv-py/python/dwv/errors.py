"""What is raised when an input is refused."""

from __future__ import annotations

from dataclasses import dataclass
from typing import Any


@dataclass(frozen=True, slots=True)
class Fault:
    """One fault of an input: where it is, what it is and how to mend it."""

    code: str
    """The stable name of the kind of fault, such as `unknown-key`."""
    path: str
    """Where in the input, such as `drains[3].to`; empty when the whole input is meant."""
    element: str | None
    """The id of the element, where it has one."""
    message: str
    """What was found and what was expected, in one line."""
    help: str | None = None
    """The likely fix."""


class DwvError(Exception):
    """An input that is refused, with all the faults that were found in it.

    Attributes:
        message: All faults in words.
        faults: The faults as data, in the order of the input; at most 100.
        total: How many faults there are, with those that are not listed.
        file: The file that was read, when one was.
    """

    def __init__(self, message: str, faults: tuple[Fault, ...] = (), total: int | None = None, file: str | None = None):
        """Keeps the words, the faults and the file."""
        super().__init__(message)
        self.message = message
        self.faults = tuple(faults)
        self.total = len(self.faults) if total is None else total
        self.file = file

    def __str__(self) -> str:
        """All faults in words, led by the file."""
        return self.message if self.file is None else f"{self.file}: {self.message}"

    def __reduce__(self) -> tuple[Any, ...]:
        """Makes it again, with its faults and its notes, in another process."""
        return type(self), (self.message, self.faults, self.total, self.file), self.__dict__


class FormatError(DwvError, ValueError):
    """The input is no layout file: not UTF-8, not JSON, a key or a value that the format does not have."""


class DrawingError(DwvError, ValueError):
    """The layout reads well, but it is no drainage system: an unknown id, a cycle, no way to the sewer."""


class QuantityError(DwvError, ValueError):
    """A quantity cannot be read: a length without a unit, a size that the trade does not list."""


class EditionError(DwvError, LookupError):
    """No edition has this id."""


class QuestionError(DwvError, LookupError):
    """A question that the edition or the sizing cannot answer: an id, a kind or a schedule that is not there."""


class InternalError(DwvError):
    """A mistake of the engine itself; please report it."""
