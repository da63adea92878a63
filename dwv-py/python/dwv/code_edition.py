"""Code editions, and plain questions to them."""

from __future__ import annotations

from collections.abc import Mapping
from dataclasses import dataclass
from typing import Any, Literal, cast

from . import _dwv
from .errors import Fault, QuestionError
from .json_text import json_text
from .rows import Witness

DrainRole = Literal["branch", "stack", "stack-storey", "building-drain"]
"""What a drain does: `stack` is asked by its load in all, `stack-storey` by the load of one storey."""


@dataclass(frozen=True, slots=True)
class Answer:
    """An answer with its source."""

    text: str
    """The answer: `6`, `1.8 m`, `1:50`, `not permitted`, `not limited`, `not known`."""
    clause: str
    """The clause or table with the edition."""
    witness: Witness
    """How sure it is."""


class Edition:
    """A code edition that comes with the engine: an immutable value.

    >>> code = edition("npc-2015")
    >>> answer = code.answer({"ask": "vent-for-trap", "trap": "2"})
    >>> answer.text, answer.clause
    ('1-1/2', 'NPC 2015 Table 2.5.7.1.')
    """

    __slots__ = ("_edition",)
    _edition: _dwv.Edition

    def __init__(self, id: str, /) -> None:
        """Finds the edition with this id."""
        object.__setattr__(self, "_edition", _dwv.Edition(id))

    def __setattr__(self, name: str, value: object) -> None:
        """Refuses: an edition does not change."""
        raise AttributeError(f"an edition does not change: `{name}`")

    def __delattr__(self, name: str) -> None:
        """Refuses: an edition does not change."""
        raise AttributeError(f"an edition does not change: `{name}`")

    @property
    def id(self) -> str:
        """Its id, such as `npc-2015`."""
        return self._edition.id

    @property
    def title(self) -> str:
        """Its title in full."""
        return self._edition.title

    def __eq__(self, other: object) -> bool:
        """Whether it is the same edition."""
        return self.id == other.id if isinstance(other, Edition) else NotImplemented

    def __hash__(self) -> int:
        """Goes by the id."""
        return hash((Edition, self.id))

    def __repr__(self) -> str:
        """The call that gives it."""
        return f"dwv.edition({self.id!r})"

    def __reduce__(self) -> tuple[Any, ...]:
        """Finds it again in another process."""
        return Edition, (self.id,)

    def provenance(self) -> str:
        """Where every value comes from: table or clause, how sure it is and its sources, in Markdown."""
        return self._edition.provenance()

    def unattested(self) -> list[str]:
        """The values that nobody has seen in print, or that sources dispute: clause, what it says, how sure it is."""
        return self._edition.unattested()

    def fixture_kinds(self) -> list[str]:
        """The words for kinds of fixtures in layout files, in the order of the fixture table."""
        return self._edition.fixture_kinds()

    def answer(self, question: Mapping[str, object] | str) -> Answer:
        """Answers a question.

        Args:
            question: What is asked, such as `{"ask": "vent-for-trap", "trap": "2"}`, as a dict or as JSON.

        Raises:
            QuestionError: It is no question, or it asks for a kind or a rule that the edition does not have.

        >>> edition("npc-2015").answer({"ask": "branch-capacity", "size": "3"}).text
        '27'
        """
        if isinstance(question, Mapping):
            question = json_text(question, QuestionError).decode("utf-8", "surrogatepass")
        text, clause, witness = self._edition.answer(question)
        return Answer(text, clause, cast("Witness", witness))

    def vent_for_trap(self, trap: str | float) -> str:
        """The least vent for the largest trap served.

        Args:
            trap: The size of the trap in inches, such as `"1-1/2"`.

        Raises:
            QuestionError: The size is none of the trade's.

        >>> edition("npc-2015").vent_for_trap("2")
        '1-1/2'
        """
        return self.answer({"ask": "vent-for-trap", "trap": trap}).text

    def drain_for_load(self, role: DrainRole, load: str | float, slope: str | None = None) -> str:
        """The least drain for a load, by the table of its role alone.

        Other rules may ask for more: size a layout to have them all.

        Args:
            role: What the drain does.
            load: The load in fixture units.
            slope: The slope of a building drain; not stated, the least for the size.

        Raises:
            QuestionError: The role, load or slope cannot be read.

        >>> edition("npc-2015").drain_for_load("branch", 6)
        '2'
        """
        return self.answer({"ask": "drain-for-load", "role": role, "load": load, "slope": slope}).text

    def load_of_fixture(self, kind: str, trap: str | float | None = None) -> float:
        """The load of a kind of fixture in fixture units.

        Args:
            kind: One of `fixture_kinds()`.
            trap: The size of the trap in inches, for kinds whose load depends on it; not stated, that of the table.

        Raises:
            QuestionError: The edition does not list the kind, or gives no load for it.

        >>> edition("npc-2015").load_of_fixture("kitchen-sink")
        1.5
        """
        text = self.answer({"ask": "fixture-load", "fixture": kind, "trap": trap}).text
        try:
            return float(text)
        except ValueError:
            message = f"the load of `{kind}` is {text} in {self.id}"
            raise QuestionError(message, (Fault("fixture-incomplete", "fixture", None, message),)) from None

    def longest_trap_arm(self, size: str | float) -> str:
        """The longest developed length of a trap arm, such as `"1.8 m"`.

        Args:
            size: The size of the trap arm in inches.

        Raises:
            QuestionError: The size is none of the trade's.

        >>> edition("npc-2015").longest_trap_arm("1-1/2")
        '1.8 m'
        """
        return self.answer({"ask": "trap-arm-longest", "size": size}).text


def editions() -> list[str]:
    """The ids of the editions that come with the engine.

    >>> editions()
    ['npc-2015']
    """
    return _dwv.edition_ids()


def edition(id: str) -> Edition:
    """The edition with this id.

    Raises:
        EditionError: No edition has this id; the nearest is named.

    >>> edition("npc-2015").id
    'npc-2015'
    """
    return Edition(id)
