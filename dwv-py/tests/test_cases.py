"""The cases that every face shares: each layout is sized to the same bytes as the file beside it."""

from __future__ import annotations

from pathlib import Path

import dwv
import pytest

CASES = Path(__file__).parents[2] / "tests" / "cases"
LAYOUTS = sorted(CASES.glob("**/*.layout.json"))


def beside(layout: Path) -> Path:
    return layout.with_name(layout.name.removesuffix(".layout.json") + ".sizing.json")


def test_no_case_is_lost() -> None:
    assert CASES.is_dir(), f"the shared cases are not at {CASES}"
    assert LAYOUTS, f"{CASES} holds no case"
    assert sorted(CASES.glob("**/*.sizing.json")) == [beside(layout) for layout in LAYOUTS]
    count = CASES / "count.txt"
    if count.exists():
        assert len(LAYOUTS) == int(count.read_text(encoding="utf-8")), f"write the number of cases into {count}"


@pytest.mark.parametrize("layout", LAYOUTS, ids=lambda layout: layout.name.removesuffix(".layout.json"))
def test_case(layout: Path) -> None:
    assert dwv.size(layout).to_json().encode() == beside(layout).read_bytes()
