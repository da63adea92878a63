"""Sizing: the rows, the lookups, the schedules, other threads."""

from __future__ import annotations

import csv
import dataclasses
import io
import json
import pickle
from concurrent.futures import ThreadPoolExecutor
from pathlib import Path
from typing import Any, get_args

import dwv
import pytest

HOUSE = Path(__file__).parents[2] / "python-examples" / "house.layout.json"


@pytest.fixture(scope="module")
def house() -> dwv.Sizing:
    return dwv.size(HOUSE)


def plain(row: Any) -> Any:
    """A row as the canonical JSON has it."""
    if dataclasses.is_dataclass(row):
        names = [field.name for field in dataclasses.fields(row)]
        return {name.rstrip("_"): plain(getattr(row, name)) for name in names}
    return [plain(inner) for inner in row] if isinstance(row, tuple | list) else row


def test_rows_hold_what_the_canonical_result_holds(house: dwv.Sizing) -> None:
    result = json.loads(house.to_json())
    assert list(result) == ["format", "summary", "pipes", "vents", "terminals", "fixtures", "findings"]
    assert plain(house.summary) == result["summary"]
    for rows in ("pipes", "vents", "terminals", "fixtures", "findings"):
        assert plain(getattr(house, rows)) == result[rows]
        assert result[rows], f"the house has no {rows}: nothing was compared"
        keys = [list(row) for row in result[rows]]
        names = [[field.name.rstrip("_") for field in dataclasses.fields(row)] for row in getattr(house, rows)]
        assert names == keys


def test_loads_and_lengths_are_floats_and_counts_are_not(house: dwv.Sizing) -> None:
    for pipe in house.pipes:
        assert type(pipe.load) is float
        assert type(pipe.traps) is int
        assert pipe.length_m is None or type(pipe.length_m) is float
    assert type(house.summary.load) is float
    assert type(house.summary.drains) is int


def test_one_sink(sizing: dwv.Sizing) -> None:
    """NPC 2015 Table 2.4.9.3.: a domestic sink loads 1.5 FU, trap 1-1/2 in; Table 2.5.7.1.: its vent is 1-1/4 in."""
    assert [pipe.id for pipe in sizing.pipes] == ["d2", "d1"]
    arm = sizing.pipe("d1")
    assert (arm.name, arm.load, arm.size, arm.length_m) == ("trap arm", 1.5, "1-1/2", 0.9)
    assert [reason.asks for reason in arm.reasons if reason.governs] == ["1-1/2"]
    assert sizing.vent("v1").size == "1-1/4"
    assert sizing.fixture("KS").protected_by == "v1"
    assert sizing.fixture("KS").air_path == ("v1", "T1")
    assert sizing.terminal("T1").above_m == 0.3
    assert sizing.why("v1").startswith("`v1`, ")


def test_rows_are_values(house: dwv.Sizing) -> None:
    again = dwv.size(HOUSE)
    for rows in ("pipes", "vents", "terminals", "fixtures", "findings"):
        mine, yours = getattr(house, rows), getattr(again, rows)
        assert mine == yours
        assert mine is not getattr(house, rows)
        assert len({hash(row) for row in mine}) == len(mine)
        assert pickle.loads(pickle.dumps(mine)) == mine
        assert eval(repr(mine), vars(dwv)) == mine
        with pytest.raises(dataclasses.FrozenInstanceError):
            setattr(mine[0], dataclasses.fields(mine[0])[0].name, "other")


def test_an_unknown_id_is_refused_with_the_nearest(house: dwv.Sizing) -> None:
    for find in (house.pipe, house.vent, house.fixture, house.terminal, house.why):
        with pytest.raises(dwv.QuestionError, match="did you mean `WC-A`") as caught:
            find("WC-AA")
        assert caught.value.faults[0].code == "unknown-id"
        assert isinstance(caught.value, LookupError)
    with pytest.raises(dwv.QuestionError, match="`va` is no drain"):
        house.pipe("va")


def test_schedules_are_tables(house: dwv.Sizing) -> None:
    for name in get_args(dwv.ScheduleName):
        table = house.schedule(name)
        assert table.to_text() in house.to_text()
        assert len(table) == len(table.rows) > 0
        read = list(csv.reader(io.StringIO(table.to_csv(), newline="")))
        assert read[0] == list(table.heads)
        # A negative number is no formula; anything else that looks like one is led by an apostrophe.
        assert [[cell.removeprefix("'") for cell in row] for row in read[1:]] == [
            [cell.removeprefix("'") for cell in row] for row in table.rows
        ]
        assert pickle.loads(pickle.dumps(table)) == table
        html = table._repr_html_()
        assert html.count("<tr>") == len(table) + 1
    assert len(house.schedule("pipes")) == len(house.pipes)
    with pytest.raises(dwv.QuestionError, match="did you mean `vents`"):
        house.schedule("vent")  # type: ignore[arg-type]


def test_a_table_of_another_width_is_refused() -> None:
    with pytest.raises(ValueError, match=r"rows\[1\]: 1 cells, expected 2"):
        dwv.Table("t", ("a", "b"), (False, True), (("1", "2"), ("3",)))
    with pytest.raises(ValueError, match="right: 1 cells, expected 2"):
        dwv.Table("t", ("a", "b"), (False,), ())


def test_html_is_escaped() -> None:
    html = dwv.Table("<t>", ("a&b",), (True,), (("<script>",),))._repr_html_()
    assert "<script>" not in html
    assert "&lt;script&gt;" in html


def test_layouts_are_taken_in_every_form(layout: dwv.Layout, tmp_path: Path) -> None:
    path = tmp_path / "sink.layout.json"
    path.write_text(layout.to_json(), encoding="utf-8")
    forms: list[Any] = [layout.to_json(), layout.to_json().encode(), path, json.loads(layout.to_json())]
    for form in forms:
        assert dwv.size(form) == dwv.size(layout)
        assert dwv.size(form).to_json() == dwv.size(layout).to_json()


def test_an_edition_can_be_named_or_handed_over(layout: dwv.Layout) -> None:
    elsewhere = dwv.Layout.from_json(layout.to_json().replace("npc-2015", "of-another-place"))
    with pytest.raises(dwv.EditionError, match="of-another-place"):
        dwv.size(elsewhere)
    named = dwv.size(elsewhere, edition="npc-2015")
    assert named.edition == "npc-2015"
    assert dwv.size(elsewhere, edition=dwv.edition("npc-2015")) == named


def test_values_that_nobody_has_seen_in_print_can_be_refused(house: dwv.Sizing) -> None:
    strict = dwv.size(HOUSE, unattested="refuse")
    unsure = {vent.id for vent in house.vents if vent.status == "provisional"}
    assert unsure
    assert {vent.id for vent in strict.vents if vent.size is None} == unsure
    assert strict != house
    assert (strict.unattested, house.unattested) == ("refuse", "tell")


def test_a_sizing_is_a_value(house: dwv.Sizing) -> None:
    again = dwv.size(HOUSE)
    assert again == house
    assert hash(again) == hash(house)
    assert type(house.layout) is dwv.Layout
    for protocol in range(pickle.HIGHEST_PROTOCOL + 1):
        other = pickle.loads(pickle.dumps(house, protocol))
        assert other == house
        assert other.to_json() == house.to_json()
    for name in ("layout", "pipes", "remark"):
        with pytest.raises(AttributeError):
            setattr(house, name, None)
    assert repr(house).startswith("<dwv.Sizing of <dwv.Layout 'Alder")


def test_threads_give_the_same_bytes(house: dwv.Sizing) -> None:
    content = HOUSE.read_bytes()
    with ThreadPoolExecutor(8) as pool:
        sized = list(pool.map(lambda _: dwv.size(content), range(64)))
        assert {sizing.to_json() for sizing in sized} == {house.to_json()}
        # One sizing, asked by all threads at once.
        rows = list(pool.map(lambda _: sized[0].pipes, range(64)))
    assert all(pipes == house.pipes for pipes in rows)
