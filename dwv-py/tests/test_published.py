"""Every value of the published tables, asked of the edition; each check names its source."""

from __future__ import annotations

import tomllib
from pathlib import Path
from typing import Any

import dwv
import pytest

PUBLISHED = Path(__file__).parents[2] / "tests" / "published"
NOT_ASKED = {"expect", "source", "note"}
"""The keys of a check that are no part of its question."""


def checks() -> list[tuple[str, dict[str, Any]]]:
    found: list[tuple[str, dict[str, Any]]] = []
    for path in sorted(PUBLISHED.glob("*-tables.toml")):
        edition = path.name.removesuffix("-tables.toml")
        found += [(edition, check) for check in tomllib.loads(path.read_text(encoding="utf-8"))["check"]]
    return found


def name(value: object) -> str | None:
    if not isinstance(value, dict):
        return None
    return " ".join(str(part) for key, part in value.items() if key not in NOT_ASKED)


CHECKS = checks()


def test_the_published_checks_are_there() -> None:
    assert "npc-2015" in {edition for edition, _ in CHECKS}, f"no check of npc-2015 was found in {PUBLISHED}"


@pytest.mark.parametrize(("edition", "check"), CHECKS, ids=name)
def test_published(edition: str, check: dict[str, Any]) -> None:
    assert check["source"], "a check names its source"
    question = {key: value for key, value in check.items() if key not in NOT_ASKED}
    assert dwv.edition(edition).answer(question).text == check["expect"]
